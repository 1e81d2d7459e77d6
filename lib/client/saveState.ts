import type { PatchOperation } from "@/lib/rules/engine/types";

/** Change made here that the server has not confirmed, as one step of the history. */
export interface Change { readonly title: string; readonly patches: readonly PatchOperation[] }

/** One save: the same `saveId` sent twice is stored once. */
export interface SaveBatch { readonly saveId: string; readonly baseSequence: number; readonly title: string; readonly patches: readonly PatchOperation[] }

/** Two people changed the same thing: both values, and the drawing as the server has it. */
export interface Conflict<Document> {
  readonly sequence: number;
  readonly drawing: Document;
  /** JSON pointers that both changed. */
  readonly overlapping: readonly string[];
  readonly theirs: readonly PatchOperation[];
  /** Names of the people whose edits these are, and when the last was made. */
  readonly by: readonly string[];
  readonly at: string | null;
}

export type SaveAnswer<Document> =
  | { readonly kind: "saved"; readonly sequence: number; readonly rebased: readonly PatchOperation[] }
  | { readonly kind: "conflict"; readonly conflict: Conflict<Document> }
  | { readonly kind: "offline" }
  | { readonly kind: "failed"; readonly detail: string; readonly requestId: string | null; readonly again: boolean };

export type SaveState<Document> =
  | { readonly kind: "saved" }
  | { readonly kind: "saving"; readonly kept: number }
  | { readonly kind: "offline"; readonly kept: number; readonly since: number }
  | { readonly kind: "failed"; readonly kept: number; readonly at: number; readonly detail: string; readonly requestId: string | null; readonly again: boolean }
  | { readonly kind: "conflict"; readonly kept: number; readonly conflict: Conflict<Document> };

const changes = (count: number): string => `${count} ${count === 1 ? "change" : "changes"}`;

/** The save state in words, as the bar shows it. */
export function saveWords(state: SaveState<unknown>, nothingDrawn: boolean): string {
  switch (state.kind) {
    case "saved": return nothingDrawn ? "Nothing drawn yet" : "All changes saved";
    case "saving": return "Saving";
    case "offline": return `${changes(state.kept)} kept here`;
    case "failed": return `${changes(state.kept)} kept here`;
    case "conflict": return state.conflict.overlapping.length === 1 ? "1 value to settle" : `${state.conflict.overlapping.length} values to settle`;
  }
}
