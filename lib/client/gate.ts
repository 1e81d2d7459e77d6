import { applyCommand, type Command } from "@/lib/diagram/commands";
import type { Drawing } from "@/lib/diagram/schema";
import type { PatchOperation } from "@/lib/rules/engine/types";

export type Applied =
  | { readonly ok: true; readonly drawing: Drawing; readonly patches: readonly PatchOperation[]; readonly inverse: readonly PatchOperation[]; readonly title: string; readonly also: readonly string[] }
  | { readonly ok: false; readonly reason: string };

/** Applies commands one after the other as one change; the first refusal refuses all of them. The title is that of the first. */
export function applyAll(drawing: Drawing, commands: readonly Command[]): Applied {
  let now = drawing;
  let title = "";
  const patches: PatchOperation[] = [];
  const inverse: PatchOperation[] = [];
  const also: string[] = [];
  for (const command of commands) {
    const result = applyCommand(now, command);
    if (!result.ok) return { ok: false, reason: result.reason };
    now = result.drawing;
    title ||= result.title;
    patches.push(...result.patches);
    inverse.unshift(...result.inverse);
    also.push(...result.also);
  }
  return { ok: true, drawing: now, patches, inverse, title, also };
}
