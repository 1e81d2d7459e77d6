import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing } from "@/lib/diagram/schema";
import type { PatchOperation } from "@/lib/rules/engine/types";
import type { Change, Conflict } from "./saveState";

/** Value at a JSON pointer, or undefined where there is none. */
export function valueAt(document: unknown, pointer: string): unknown {
  let value: unknown = document;
  for (const part of pointer.split("/").slice(1)) {
    if (typeof value !== "object" || value === null) return undefined;
    value = (value as Record<string, unknown>)[part.replace(/~1/g, "/").replace(/~0/g, "~")];
  }
  return value;
}

const touches = (path: string, other: string): boolean => path === other || path.startsWith(`${other}/`) || other.startsWith(`${path}/`);

/**
 * Puts a person's own unsaved changes on top of the server's drawing after they overlapped with someone else's.
 * "mine" keeps the person's values where both changed one; "theirs" leaves those out. Changes that no longer fit
 * (their element is gone) are left out and counted.
 */
export function settle(conflict: Conflict<Drawing>, pending: readonly Change[], keep: "mine" | "theirs"): { drawing: Drawing; changes: readonly Change[]; left: number } {
  let drawing = conflict.drawing;
  let left = 0;
  const changes: Change[] = [];
  for (const change of pending) {
    // A test holds the value before; in a settled conflict the person has already decided over it.
    const wanted = change.patches.filter((patch) => patch.op !== "test" && !(keep === "theirs" && conflict.overlapping.some((path) => touches(patch.path, path))));
    const done: PatchOperation[] = [];
    for (const patch of wanted) {
      try {
        drawing = applyPatches(drawing, [patch]);
        done.push(patch);
      } catch {
        left++;
      }
    }
    if (done.length > 0) changes.push({ title: change.title, patches: done });
  }
  return { drawing, changes, left };
}
