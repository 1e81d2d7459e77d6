"use client";

import { createContext, useContext } from "react";
import type { VisitContent } from "@/lib/api";
import type { OpenVisit } from "@/lib/client/useVisit";
import type { VisitData } from "@/lib/diagram/siteVisit";

interface Value { open: OpenVisit; readOnly: boolean; jobId: string }
const Context = createContext<Value | null>(null);
export const VisitProvider = Context.Provider;

type Rows = "panels" | "found" | "lengths" | "places" | "photos";
type Groups = "service" | "temperatures" | "roof" | "grounding";

/** The open visit and ways to change a part of it. */
export function useVisitForm() {
  const value = useContext(Context);
  if (!value) throw new Error("a part of the visit's form stands outside of its provider");
  const { open: { keeper, queue, state, photos, addPhotos }, readOnly, jobId } = value;
  const change = (recipe: (data: VisitData) => VisitData) => keeper.change((content) => ({ ...content, data: recipe(content.data) }));
  return {
    jobId, readOnly, state, data: state.content.data, typed: state.typed, photos, queue, addPhotos,
    setHead: (head: Partial<Pick<VisitContent, "visitedOn" | "byName">>) => keeper.change((content) => ({ ...content, ...head })),
    setTyped: (field: string, text: string | null) => keeper.setTyped(field, text),
    set: <Part extends keyof VisitData>(part: Part, to: VisitData[Part]) => change((data) => ({ ...data, [part]: to })),
    setGroup: <Part extends Groups>(part: Part, to: Partial<VisitData[Part]>) => change((data) => ({ ...data, [part]: { ...data[part], ...to } })),
    setRow: <Part extends Rows>(part: Part, id: string, to: Partial<VisitData[Part][number]>) =>
      change((data) => ({ ...data, [part]: (data[part] as { id: string }[]).map((row) => (row.id === id ? { ...row, ...to } : row)) })),
    addRow: <Part extends Rows>(part: Part, row: VisitData[Part][number], index?: number) =>
      change((data) => { const rows = [...(data[part] as VisitData[Part][number][])]; rows.splice(index ?? rows.length, 0, row); return { ...data, [part]: rows }; }),
    removeRow: (part: Rows, id: string) => change((data) => ({ ...data, [part]: (data[part] as { id: string }[]).filter((row) => row.id !== id) })),
  };
}
