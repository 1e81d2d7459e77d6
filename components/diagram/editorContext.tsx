"use client";
import { createContext, useContext, type ReactNode } from "react";
import { useStore } from "zustand";
import type { Editor, EditorStore } from "@/lib/client/editorStore";

const Context = createContext<EditorStore | null>(null);

export function EditorProvider({ store, children }: { store: EditorStore; children: ReactNode }) {
  return <Context.Provider value={store}>{children}</Context.Provider>;
}

/** The store itself, for handlers that read the latest state without drawing again. */
export function useEditorStore(): EditorStore {
  const store = useContext(Context);
  if (!store) throw new Error("an editor part stands outside of EditorProvider");
  return store;
}

/** Part of the editor's state; draws again when that part changes. */
export function useEditor<T>(select: (editor: Editor) => T): T {
  return useStore(useEditorStore(), select);
}
