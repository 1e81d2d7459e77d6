import type { SaveConflict } from "@/lib/api";
import type { Drawing } from "@/lib/diagram/schema";
import { api, ApiProblem } from "./api";
import type { Conflict, SaveAnswer, SaveBatch } from "./saveState";

/** Answers that a later try may change: overload, restarts and lost sessions (people sign in again in another tab). */
const AGAIN = (status: number): boolean => status === 401 || status === 408 || status === 429 || status >= 500;

/** Sends one save and says what became of it. Never throws. */
export async function sendSave(drawingId: string, batch: SaveBatch): Promise<SaveAnswer<Drawing>> {
  try {
    const { sequence, rebased } = await api.saveDrawing(drawingId, { saveId: batch.saveId, baseSequence: batch.baseSequence, title: batch.title.slice(0, 200), patches: [...batch.patches] });
    return { kind: "saved", sequence, rebased };
  } catch (error) {
    if (!(error instanceof ApiProblem)) return { kind: "failed", detail: error instanceof Error ? error.message : String(error), requestId: null, again: true };
    if (error.status === 0) return { kind: "offline" };
    if (error.status === 409 && Array.isArray(error.body["overlapping"])) return { kind: "conflict", conflict: readConflict(error.body as unknown as SaveConflict) };
    const signedOut = error.status === 401;
    return { kind: "failed", detail: signedOut ? "You were signed out. Sign in again in another tab; the changes stay here." : error.message, requestId: error.requestId || null, again: AGAIN(error.status) };
  }
}

const readConflict = (body: SaveConflict): Conflict<Drawing> => ({
  sequence: body.sequence, drawing: body.drawing, overlapping: body.overlapping, theirs: body.theirs,
  by: [...new Set(body.edits.map((edit) => edit.author))].filter(Boolean), at: body.edits.at(-1)?.at ?? null,
});
