import "server-only";
import type { DrawingAnswer, JournalEntry, SaveAnswer } from "@/lib/api";
import { may } from "@/lib/policy";
import { notFound } from "@/lib/server/http/problem";
import { jobAccess, type Actor } from "./actor";
import { database, inTransaction } from "./database";
import { entriesAfter, writeSave, type Save } from "./journal";
import { refuseArchived } from "./jobs";
import { draftLetter } from "./letters";

/** The drawing of a job as it is now, and what the person may do with it. */
export async function getDrawing(actor: Actor, jobId: string): Promise<DrawingAnswer> {
  const { job, roles } = await jobAccess(actor, jobId, "drawing.view");
  const drawing = await database().Drawing.findOne({ where: { jobId } });
  if (!drawing) throw notFound();
  return {
    id: drawing.id, jobId, jobNumber: job.number, jobName: job.name, sequence: drawing.sequence, drawing: drawing.document,
    revisionLetter: await draftLetter(jobId),
    may: { edit: may(roles, "drawing.edit") && job.archivedAt === null, issue: may(roles, "revision.issue") && job.archivedAt === null, seal: may(roles, "revision.seal", "in review") },
  };
}

/** Takes a save in: one transaction with the drawing's row locked, so that saves queue up one behind the other. */
export async function saveDrawing(actor: Actor, drawingId: string, save: Save): Promise<SaveAnswer> {
  return inTransaction(async (transaction) => {
    const drawing = await database().Drawing.findByPk(drawingId, { transaction, lock: transaction.LOCK.UPDATE });
    if (!drawing) throw notFound();
    const { job } = await jobAccess(actor, drawing.jobId, "drawing.edit", { transaction });
    refuseArchived(job);
    return writeSave(drawing, save, actor, transaction);
  });
}

/** Saves after a sequence number, for a page that catches up. */
export async function savesSince(actor: Actor, drawingId: string, since: number): Promise<{ sequence: number; entries: JournalEntry[] }> {
  const drawing = await database().Drawing.findByPk(drawingId, { attributes: ["id", "jobId", "sequence"] });
  if (!drawing) throw notFound();
  await jobAccess(actor, drawing.jobId, "drawing.view");
  return { sequence: drawing.sequence, entries: await entriesAfter(drawingId, since) };
}
