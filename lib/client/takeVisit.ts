import type { DrawingAnswer } from "@/lib/api";
import type { Command } from "@/lib/diagram/commands";
import type { PatchOperation } from "@/lib/rules/engine/types";
import { api } from "./api";
import { applyAll } from "./gate";

/** A change of the drawing that was made outside of the editor, and how to take it back. */
export interface DrawingChange { readonly drawingId: string; readonly sequence: number; readonly title: string; readonly inverse: readonly PatchOperation[] }

/** Commands were refused by the drawing; nothing was saved. */
export class CommandsRefused extends Error { override readonly name = "CommandsRefused"; }

/**
 * Applies commands to a drawing as it was read and saves them as one step of its journal.
 * @throws ApiProblem, with code `edit-conflict` when somebody changed the same parts; CommandsRefused
 */
export async function changeDrawing(drawing: DrawingAnswer, commands: readonly Command[], title: string): Promise<DrawingChange> {
  const applied = applyAll(drawing.drawing, commands);
  if (!applied.ok) throw new CommandsRefused(applied.reason);
  const { sequence } = await api.saveDrawing(drawing.id, { saveId: crypto.randomUUID(), baseSequence: drawing.sequence, patches: [...applied.patches], title: title.slice(0, 200) });
  return { drawingId: drawing.id, sequence, title, inverse: applied.inverse };
}

/** Takes such a change back, as a step of its own. @throws ApiProblem, also when what was set has been changed since */
export async function takeBack(change: DrawingChange): Promise<void> {
  await api.saveDrawing(change.drawingId, { saveId: crypto.randomUUID(), baseSequence: change.sequence, patches: [...change.inverse], title: `undo ${change.title}`.slice(0, 200) });
}
