import "server-only";
import { Op, type Transaction } from "sequelize";
import type { JournalEntry, SaveAnswer, SaveConflict } from "@/lib/api";
import { canonicalJson } from "@/lib/diagram/canonical";
import { checkDocument } from "@/lib/diagram/check";
import { PatchError, applyPatches, overlaps } from "@/lib/diagram/patch";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import type { PatchOperation } from "@/lib/rules/engine/types";
import type { Drawing, DrawingPatch } from "@/models";
import { Problem, conflict, unprocessable } from "@/lib/server/http/problem";
import type { Actor } from "./actor";
import { audit } from "./audit";
import { database } from "./database";
import { markSealAgainstDraft } from "./sheetSets";
import { touchJob } from "./touch";

/** A drawing larger than this is no one-line, bytes of JSON. */
const DOCUMENT_BYTES = 4 * 1024 * 1024;

export interface Save {
  saveId: string; baseSequence: number; patches: PatchOperation[]; title: string;
  /** The job's jurisdiction was changed: its amendments may come into the drawing. Never set from a request. */
  amends?: boolean;
}

/** Journal entries after a sequence number, oldest first. */
export async function entriesAfter(drawingId: string, sequence: number, transaction?: Transaction, before?: number): Promise<JournalEntry[]> {
  const { DrawingPatch, User } = database();
  const rows = await DrawingPatch.findAll({
    where: { drawingId, sequence: { [Op.gt]: sequence, ...(before === undefined ? {} : { [Op.lt]: before }) } },
    include: [{ model: User, as: "author", attributes: ["name"] }], order: [["sequence", "ASC"]], transaction: transaction ?? null,
  });
  return rows.map(entry);
}

const entry = (row: DrawingPatch): JournalEntry => ({
  sequence: row.sequence, author: row.author?.name ?? "", authorId: row.authorId, at: row.createdAt.toISOString(), title: row.title, patches: row.patches,
});

const operations = (entries: readonly JournalEntry[]) => entries.flatMap((each) => each.patches);

/**
 * Writes one save into the journal of a drawing whose row is locked by the transaction. Edits that touch nothing that
 * others changed since the base are put on top of theirs; otherwise nothing is written.
 * @throws Problem 409 with both sides; 422 naming the place in the drawing that would be wrong
 */
export async function writeSave(drawing: Drawing, save: Save, actor: Actor, transaction: Transaction): Promise<SaveAnswer> {
  const { DrawingPatch } = database();
  const before = await DrawingPatch.findOne({ where: { drawingId: drawing.id, saveId: save.saveId }, transaction });
  if (before) {
    // The same id from somebody else is not the same save.
    if (before.authorId !== actor.id) throw unprocessable("saveId", "was used by somebody else");
    return { sequence: before.sequence, rebased: operations(await entriesAfter(drawing.id, before.baseSequence, transaction, before.sequence)) };
  }
  if (save.baseSequence > drawing.sequence) throw unprocessable("baseSequence", `is ahead of the drawing, which is at ${drawing.sequence}`);
  const theirs = await entriesAfter(drawing.id, save.baseSequence, transaction);
  const overlapping = overlaps(operations(theirs), save.patches);
  const clash = (paths: readonly string[], detail: string) => conflict("edit-conflict", detail, {
    theirs: operations(theirs), edits: theirs, yours: save.patches, overlapping: [...paths], sequence: drawing.sequence, drawing: drawing.document,
  } satisfies SaveConflict as unknown as Record<string, unknown>);
  if (overlapping.length > 0) throw clash(overlapping, "Somebody changed the same part of the drawing.");

  const merged = merge(drawing.document, save.patches, (error) => (theirs.length > 0
    ? clash([error.path], "Somebody changed what this edit rests on.")
    : unprocessable(`patches.${error.index}`, error.message, "patch")));
  refuseProtected(drawing.document, merged, save, actor);
  const wrong = checkDocument(merged);
  if (wrong.length > 0) {
    // Apart, both saves may well be whole: one deletes an end, the other draws a circuit to it.
    if (theirs.length > 0) {
      throw clash(wrong.map((each) => each.path), "Together with somebody's edit this would leave the drawing broken.");
    }
    throw new Problem(422, "document", "The drawing would be broken", `${wrong[0]?.path}: ${wrong[0]?.message}`, {
      field: wrong[0]?.path, errors: wrong.slice(0, 20).map((each) => ({ field: each.path, detail: each.message })),
    });
  }
  if (Buffer.byteLength(JSON.stringify(merged)) > DOCUMENT_BYTES) throw unprocessable("patches", "would make the drawing larger than 4 MB", "document-too-large");
  return commit(drawing, merged, save, theirs, actor, transaction);
}

/**
 * Parts of the drawing that decide whether a rule counts are no edits: amendments come from the jurisdiction, and a
 * finding is accepted in review, under a license. A statement carries the name of who saves it.
 */
function refuseProtected(before: DrawingDocument, after: DrawingDocument, save: Save, actor: Actor): void {
  const same = (one: unknown, other: unknown) => canonicalJson(one ?? null) === canonicalJson(other ?? null);
  if (!save.amends && !same(after.site?.amendments, before.site.amendments)) {
    throw unprocessable("site.amendments", "come with the jurisdiction; choose it on the job's page", "protected");
  }
  if (!save.amends && !same(after.site?.requirements, before.site.requirements)) {
    throw unprocessable("site.requirements", "come with the jurisdiction; choose it on the job's page", "protected");
  }
  const kept = Object.entries(after.acceptances ?? {}).every(([id, acceptance]) => same(acceptance, before.acceptances[id]));
  if (!kept) throw unprocessable("acceptances", "are written in review, by a licensee", "protected");
  // Who states something stands for it: nobody states in another's name.
  const foreign = Object.entries(after.statements ?? {}).find(([id, statement]) => statement?.by !== actor.name && !same(statement, before.statements?.[id]));
  if (foreign) throw unprocessable(`statements.${foreign[0]}.by`, "is the name of whoever makes the statement", "protected");
}

function merge(document: DrawingDocument, patches: PatchOperation[], refuse: (error: PatchError) => Problem): DrawingDocument {
  try {
    return applyPatches(document, patches);
  } catch (error) {
    if (error instanceof PatchError) throw refuse(error);
    throw error;
  }
}

async function commit(
  drawing: Drawing, merged: DrawingDocument, save: Save, theirs: JournalEntry[], actor: Actor, transaction: Transaction,
): Promise<SaveAnswer> {
  const { DrawingPatch } = database();
  const sequence = drawing.sequence + 1;
  await DrawingPatch.create(
    { drawingId: drawing.id, sequence, saveId: save.saveId, baseSequence: save.baseSequence, authorId: actor.id, title: save.title, patches: save.patches },
    { transaction },
  );
  await drawing.update({ document: merged, sequence, updatedBy: actor.id }, { transaction });
  await touchJob(drawing.jobId, transaction);
  await markSealAgainstDraft(drawing.jobId, merged, transaction, save.title);
  await audit(transaction, actor, {
    action: "drawing.save", subject: `drawings/${drawing.id}`, jobId: drawing.jobId, detail: { sequence, saveId: save.saveId, title: save.title, operations: save.patches.length },
  });
  return { sequence, rebased: operations(theirs) };
}
