import type { PatchOperation } from "@/lib/rules/engine/types";

/** One step that can be taken back: a gesture, a form edit, a paste. */
export interface HistoryStep {
  readonly title: string;
  readonly patches: readonly PatchOperation[];
  readonly inverse: readonly PatchOperation[];
}
export interface History { readonly past: readonly HistoryStep[]; readonly future: readonly HistoryStep[] }

export const EMPTY_HISTORY: History = { past: [], future: [] };
/** A working day of drawing; older steps leave first. */
export const HISTORY_LIMIT = 500;

/** Adds a step and forgets what had been undone. */
export const remember = (history: History, step: HistoryStep): History =>
  ({ past: [...history.past, step].slice(-HISTORY_LIMIT), future: [] });

export const stepBack = (history: History): History => {
  const step = history.past.at(-1);
  return step ? { past: history.past.slice(0, -1), future: [...history.future, step] } : history;
};
export const stepForward = (history: History): History => {
  const step = history.future.at(-1);
  return step ? { past: [...history.past, step], future: history.future.slice(0, -1) } : history;
};
/** Leaves out a step that can no longer be applied, because someone else changed the same thing since. */
export const dropLast = (history: History, side: "past" | "future"): History => ({ ...history, [side]: history[side].slice(0, -1) });
