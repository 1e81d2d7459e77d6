import { createStore, type StoreApi } from "zustand/vanilla";
import type { Command } from "@/lib/diagram/commands";
import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing, ElementRef } from "@/lib/diagram/schema";
import type { CheckResult, PatchOperation } from "@/lib/rules/engine/types";
import { SELECT, type Notice, type Tool } from "./editorTypes";
import { applyAll } from "./gate";
import { dropLast, EMPTY_HISTORY, remember, stepBack, stepForward, type History } from "./history";
import type { Change, SaveState } from "./saveState";

export interface EditorState {
  readonly drawing: Drawing;
  readonly graph: DrawingGraph;
  readonly readOnly: boolean;
  readonly selection: readonly ElementRef[];
  readonly tool: Tool;
  readonly history: History;
  readonly notice: Notice | null;
  readonly save: SaveState<Drawing>;
  readonly check: CheckResult | null;
  readonly checkError: string | null;
  /** Key of the finding opened in the margin. */
  readonly opened: string | null;
  /** Element the canvas is asked to bring into view; `turn` repeats a request. */
  readonly reveal: { readonly ref: ElementRef; readonly turn: number } | null;
}

export interface EditorActions {
  /** Applies commands as one step of the history. False when refused; the reason is the notice. */
  run: (commands: readonly Command[], title?: string) => boolean;
  /** Shows commands without keeping them: each call starts again from the drawing before the gesture. */
  preview: (commands: readonly Command[], title?: string) => boolean;
  /** Makes the previewed change one step. */
  commit: () => void;
  cancel: () => void;
  undo: () => void;
  redo: () => void;
  select: (refs: readonly ElementRef[]) => void;
  setTool: (tool: Tool) => void;
  say: (text: string, tone?: Notice["tone"]) => void;
  open: (key: string | null) => void;
  show: (ref: ElementRef) => void;
  /** Applies other people's confirmed changes; false when they do not fit, and the drawing has to be read again. */
  takeOthers: (patches: readonly PatchOperation[]) => boolean;
  /** Replaces the drawing, after a conflict was settled or it was read again. */
  replace: (drawing: Drawing) => void;
  set: (part: Partial<Pick<EditorState, "save" | "check" | "checkError" | "readOnly">>) => void;
}
export type Editor = EditorState & EditorActions;
export type EditorStore = StoreApi<Editor>;

const exists = (drawing: Drawing, ref: ElementRef): boolean => Object.hasOwn(drawing[ref.collection], ref.id);

/**
 * State of one open drawing. Pointer, keyboard, grid and forms all end in `run` or `preview`/`commit`,
 * so that every change passes the same gate, the history and the save. `onChange` is told each confirmed step.
 */
export function createEditorStore(initial: { drawing: Drawing; readOnly: boolean }, onChange: (change: Change) => void): EditorStore {
  let gesture: { base: Drawing; title: string; patches: readonly PatchOperation[]; inverse: readonly PatchOperation[] } | null = null;
  let notices = 0;
  return createStore<Editor>((set, get) => {
    const put = (drawing: Drawing): void => {
      const { selection } = get();
      const kept = selection.filter((ref) => exists(drawing, ref));
      set({ drawing, graph: buildGraph(drawing), ...(kept.length === selection.length ? {} : { selection: kept }) });
    };
    const say = (text: string, tone: Notice["tone"] = "plain"): void => set({ notice: { id: ++notices, text, tone } });
    const travel = (side: "past" | "future"): void => {
      const { history, drawing, readOnly } = get();
      const step = history[side].at(-1);
      if (!step || readOnly) return;
      get().cancel();
      const patches = side === "past" ? step.inverse : step.patches;
      try {
        put(applyPatches(drawing, patches));
      } catch {
        set({ history: dropLast(history, side) });
        say(`Cannot ${side === "past" ? "undo" : "redo"} “${step.title}”: it has been changed since.`, "refused");
        return;
      }
      set({ history: side === "past" ? stepBack(history) : stepForward(history) });
      onChange({ title: side === "past" ? `undo ${step.title}` : step.title, patches });
      say(side === "past" ? `Undone: ${step.title}.` : `Done again: ${step.title}.`);
    };
    return {
      drawing: initial.drawing, graph: buildGraph(initial.drawing), readOnly: initial.readOnly,
      selection: [], tool: SELECT, history: EMPTY_HISTORY, notice: null, save: { kind: "saved" },
      check: null, checkError: null, opened: null, reveal: null,
      preview: (commands, title) => {
        if (get().readOnly) { say("This drawing is read-only.", "refused"); return false; }
        const base = gesture?.base ?? get().drawing;
        const applied = applyAll(base, commands);
        if (!applied.ok) { say(applied.reason, "refused"); return false; }
        gesture = { base, title: title ?? applied.title, patches: applied.patches, inverse: applied.inverse };
        put(applied.drawing);
        return true;
      },
      commit: () => {
        const done = gesture;
        gesture = null;
        if (!done || done.patches.length === 0) return;
        set({ history: remember(get().history, { title: done.title, patches: done.patches, inverse: done.inverse }) });
        onChange({ title: done.title, patches: done.patches });
      },
      cancel: () => {
        const base = gesture?.base;
        gesture = null;
        if (base) put(base);
      },
      run: (commands, title) => {
        get().cancel();
        if (!get().preview(commands, title)) { gesture = null; return false; }
        get().commit();
        return true;
      },
      undo: () => travel("past"),
      redo: () => travel("future"),
      select: (selection) => set({ selection: selection.filter((ref) => exists(get().drawing, ref)) }),
      setTool: (tool) => { if (!get().readOnly || tool.kind === "select") set({ tool }); },
      say,
      open: (opened) => set({ opened }),
      show: (ref) => set({ reveal: { ref, turn: (get().reveal?.turn ?? 0) + 1 } }),
      takeOthers: (patches) => {
        const live = gesture;
        try {
          const drawing = applyPatches(get().drawing, patches);
          // A running gesture starts from the merged drawing at its next preview.
          if (live) gesture = { ...live, base: applyPatches(live.base, patches) };
          put(drawing);
          return true;
        } catch {
          return false;
        }
      },
      replace: (drawing) => { gesture = null; put(drawing); },
      set: (part) => set(part),
    };
  });
}
