import "server-only";
import { randomUUID } from "node:crypto";
import { Op } from "sequelize";
import type { z } from "zod";
import type { HistoryLine, JobAnswer, duplicateInput, historyQuery } from "@/lib/api";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import type { Role } from "@/lib/policy";
import { notFound } from "@/lib/server/http/problem";
import { companyAccess, jobAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { historyWords } from "./historyWords";
import { numberTaken, takeNumber } from "./jobNumbers";
import { getJob } from "./jobs";
import { touchJob } from "./touch";

/** The drawing as a new job starts with it: nothing that was decided or granted for the old one comes along. */
function copyOf(document: DrawingDocument, name: string, number: string, whole: boolean): DrawingDocument {
  const titleBlock = { ...document.sheet.titleBlock, jobName: name, jobNumber: number, permitNumber: "", checkedBy: "" };
  if (!whole) return emptyDrawing(document.site, titleBlock);
  const { statements: _, ...rest } = document;
  // The picture under the sheet is of the old job's site, and one of its files.
  const { underlay: __, ...sheet } = document.sheet;
  return { ...rest, sheet: { ...sheet, titleBlock }, acceptances: {} };
}

/** Makes another job like this one. Who does it is its administrator, and designer where they design in the company. */
export async function duplicateJob(actor: Actor, jobId: string, input: z.output<typeof duplicateInput>): Promise<{ id: string }> {
  const { Drawing, Job, JobMember } = database();
  try {
    return await inTransaction(async (transaction) => {
      const { job } = await jobAccess(actor, jobId, "job.duplicate", { transaction });
      const roles = await companyAccess(actor, job.companyId, "jobs.create", transaction);
      const drawing = await Drawing.findOne({ where: { jobId }, transaction });
      if (!drawing) throw notFound();
      const { number } = await takeNumber(job.companyId, input.number, transaction);
      const made = await Job.create(
        { id: randomUUID(), companyId: job.companyId, number, name: input.name, jurisdictionId: job.jurisdictionId, createdBy: actor.id }, { transaction },
      );
      await Drawing.create(
        { jobId: made.id, document: copyOf(drawing.document, input.name, number, input.drawing), checkedSequence: null, checkedRuleSet: null, checkCounts: null, updatedBy: actor.id }, { transaction },
      );
      const own: Role[] = roles.includes("designer") ? ["administrator", "designer"] : ["administrator"];
      const others = input.people ? await JobMember.findAll({ where: { jobId }, transaction }) : [];
      await JobMember.bulkCreate(
        [{ jobId: made.id, userId: actor.id, roles: [...new Set([...own, ...(others.find((each) => each.userId === actor.id)?.roles ?? [])])] },
          ...others.filter((each) => each.userId !== actor.id).map((each) => ({ jobId: made.id, userId: each.userId, roles: each.roles }))], { transaction },
      );
      await audit(transaction, actor, { action: "job.duplicate", subject: `jobs/${made.id}`, companyId: job.companyId, jobId: made.id, detail: { from: job.number, number: made.number, drawing: input.drawing } });
      return { id: made.id };
    });
  } catch (error) {
    throw numberTaken(error);
  }
}

/** Puts a job into the archive, where it stays as it is, or takes it out again. */
export async function archiveJob(actor: Actor, jobId: string, archived: boolean): Promise<JobAnswer> {
  await inTransaction(async (transaction) => {
    const { job } = await jobAccess(actor, jobId, "job.archive", { transaction });
    if ((job.archivedAt !== null) === archived) return;
    await job.update({ archivedAt: archived ? new Date() : null, archivedBy: archived ? actor.id : null }, { transaction });
    await touchJob(jobId, transaction);
    await audit(transaction, actor, { action: "job.archive", subject: `jobs/${jobId}`, companyId: job.companyId, jobId, detail: { archived } });
  });
  return getJob(actor, jobId);
}

/** What people do many times in a row: one line tells how often. */
const REPEATED: Readonly<Record<string, (times: number) => string>> = {
  "drawing.save": (times) => `Changed the drawing, ${times} saves`,
  "visit.edit": (times) => `Changed a site visit, ${times} saves`,
};

/** What was done to a job, newest first, in words. Saves of one person to one thing in a row are one line. */
export async function jobHistory(actor: Actor, jobId: string, { before, limit }: z.output<typeof historyQuery>): Promise<{ entries: HistoryLine[]; more: boolean }> {
  await jobAccess(actor, jobId, "history.view");
  const { AuditEntry, User } = database();
  const rows = await AuditEntry.findAll({
    where: { jobId, ...(before === undefined ? {} : { id: { [Op.lt]: String(before) } }) },
    order: [["id", "DESC"]], limit: 4 * limit + 1,
  });
  const people = new Map((await User.findAll({ where: { id: [...new Set(rows.flatMap((row) => row.actorId ?? []))] }, attributes: ["id", "name"] })).map((user) => [user.id, user.name]));
  const entries: (HistoryLine & { actorId: string | null; action: string; subject: string; saves: number })[] = [];
  let read = 0;
  for (const row of rows.slice(0, 4 * limit)) {
    const last = entries.at(-1);
    const repeated = REPEATED[row.action];
    const joins = last && repeated && last.action === row.action && last.subject === row.subject && last.actorId === row.actorId;
    if (!joins && entries.length === limit) break;
    read += 1;
    if (joins) {
      last.saves += 1;
      last.id = Number(row.id);
      last.what = repeated(last.saves);
      if (row.action === "drawing.save") last.detail = null;
      continue;
    }
    const { what, detail } = historyWords(row.action, row.detail);
    entries.push({ id: Number(row.id), at: row.at.toISOString(), by: row.actorId ? people.get(row.actorId) ?? null : null, what, detail, actorId: row.actorId, action: row.action, subject: row.subject, saves: 1 });
  }
  return { entries: entries.map(({ actorId: _, action: __, subject: ___, saves: ____, ...line }) => line), more: read < rows.length };
}
