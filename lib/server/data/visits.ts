import "server-only";
import type { Transaction } from "sequelize";
import type { z } from "zod";
import type { VisitAnswer, VisitContent, VisitsAnswer, visitChange, visitInput } from "@/lib/api";
import { canonicalJson } from "@/lib/diagram/canonical";
import { VISIT_PARTS, emptyVisit, visitFiles, type VisitData } from "@/lib/diagram/siteVisit";
import { may, type Role } from "@/lib/policy";
import type { Job, SiteVisit } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { demand, jobAccess, rolesInJob, type Actor } from "./actor";
import { audit, changes } from "./audit";
import { database, inTransaction } from "./database";
import { refuseArchived } from "./jobs";
import { touchJob } from "./touch";

/** Visits of one job that are kept; more would be no visits any more. */
const VISITS_OF_ONE_JOB = 100;

const mayOf = (job: Job, roles: readonly Role[]): VisitAnswer["may"] =>
  ({ edit: may(roles, "visit.edit") && job.archivedAt === null, take: may(roles, "drawing.edit") && job.archivedAt === null });

function answer(row: SiteVisit, job: Job, roles: readonly Role[]): VisitAnswer {
  const { id, jobId, visitedOn, byName, data, version } = row;
  return {
    id, jobId, visitedOn, byName, data, version, createdBy: row.creator?.name ?? "", createdAt: row.createdAt.toISOString(), updatedBy: row.updater?.name ?? "",
    updatedAt: row.updatedAt.toISOString(), may: mayOf(job, roles),
  };
}
const names = () => (["creator", "updater"] as const).map((as) => ({ model: database().User, as, attributes: ["name"] }));
async function readAgain(id: string, job: Job, roles: readonly Role[], transaction: Transaction): Promise<VisitAnswer> {
  return answer(await database().SiteVisit.findByPk(id, { include: names(), transaction, rejectOnEmpty: true }), job, roles);
}

/** Visits of a job, the latest first. @throws Problem 404 or 403 */
export async function listVisits(actor: Actor, jobId: string): Promise<VisitsAnswer> {
  const { job, roles } = await jobAccess(actor, jobId, "visit.view");
  const rows = await database().SiteVisit.findAll({ where: { jobId }, include: names(), order: [["visitedOn", "DESC"], ["createdAt", "DESC"]], limit: VISITS_OF_ONE_JOB });
  return { jobNumber: job.number, jobName: job.name, visits: rows.map((row) => answer(row, job, roles)), may: mayOf(job, roles) };
}

/** @throws Problem 404, also for a visit of a job that the person may not see; 403 */
export async function getVisit(actor: Actor, visitId: string): Promise<VisitAnswer> {
  const row = await database().SiteVisit.findByPk(visitId, { include: names() });
  if (!row) throw notFound();
  const { job, roles } = await jobAccess(actor, row.jobId, "visit.view");
  return answer(row, job, roles);
}

/**
 * Stores a visit that was begun on a device. Sent again, because the answer was lost, it is stored once.
 * @throws Problem 404, 403; 409 when the job is archived; 422 naming the photo that is no file of the job
 */
export async function createVisit(actor: Actor, jobId: string, { id, ...content }: z.output<typeof visitInput>): Promise<VisitAnswer> {
  return inTransaction(async (transaction) => {
    const { SiteVisit, sequelize } = database();
    const { job, roles } = await jobAccess(actor, jobId, "visit.edit", { transaction });
    refuseArchived(job);
    // Two sends of the same visit at once: the second one waits and finds it.
    await sequelize.query("select pg_advisory_xact_lock(hashtextextended(:id, 0))", { replacements: { id }, transaction });
    const there = await SiteVisit.findByPk(id, { transaction });
    if (there) {
      if (there.jobId !== jobId || there.createdBy !== actor.id) throw unprocessable("id", "is taken");
      return readAgain(id, job, roles, transaction);
    }
    if ((await SiteVisit.count({ where: { jobId }, transaction })) >= VISITS_OF_ONE_JOB) throw conflict("visits-full", `There are ${VISITS_OF_ONE_JOB} visits in this job already.`);
    await refuseForeignFiles(jobId, visitFiles(content.data), transaction);
    await SiteVisit.create({ id, jobId, ...content, createdBy: actor.id, updatedBy: actor.id }, { transaction });
    await touchJob(jobId, transaction);
    await audit(transaction, actor, {
      action: "visit.create", subject: `visits/${id}`, companyId: job.companyId, jobId,
      detail: { visitedOn: content.visitedOn, byName: content.byName, ...visitChanges(null, content) },
    });
    return readAgain(id, job, roles, transaction);
  });
}

/**
 * Changes a visit.
 * @throws Problem 404, 403; 409 `stale-version` with the visit as it is now; 409 when the job is archived; 422
 */
export async function changeVisit(actor: Actor, visitId: string, { version, ...change }: z.output<typeof visitChange>): Promise<VisitAnswer> {
  return inTransaction(async (transaction) => {
    const { Job, SiteVisit } = database();
    const row = await SiteVisit.findByPk(visitId, { transaction, lock: transaction.LOCK.UPDATE });
    const job = row && (await Job.findByPk(row.jobId, { transaction }));
    if (!row || !job) throw notFound();
    const roles = await rolesInJob(actor.id, job, transaction);
    demand(roles, "visit.edit");
    refuseArchived(job);
    if (row.version !== version) {
      throw conflict("stale-version", "Somebody changed this visit in the meantime.", { visit: await readAgain(visitId, job, roles, transaction) });
    }
    const before: VisitContent = { visitedOn: row.visitedOn, byName: row.byName, data: row.data };
    const after: VisitContent = { visitedOn: change.visitedOn ?? before.visitedOn, byName: change.byName ?? before.byName, data: change.data ?? before.data };
    if (canonicalJson(before) === canonicalJson(after)) return readAgain(visitId, job, roles, transaction);
    const known = new Set(visitFiles(before.data));
    await refuseForeignFiles(row.jobId, visitFiles(after.data).filter((file) => !known.has(file)), transaction);
    await row.update({ ...after, version: version + 1, updatedBy: actor.id }, { transaction });
    await touchJob(row.jobId, transaction);
    await audit(transaction, actor, {
      action: "visit.edit", subject: `visits/${visitId}`, companyId: job.companyId, jobId: row.jobId,
      detail: { visitedOn: after.visitedOn, version: version + 1, ...visitChanges(before, after) },
    });
    return readAgain(visitId, job, roles, transaction);
  });
}

/** A visit shows photos of its own job alone. @throws Problem 422 */
async function refuseForeignFiles(jobId: string, files: readonly string[], transaction: Transaction): Promise<void> {
  const wanted = [...new Set(files)];
  if (wanted.length === 0) return;
  const found = await database().StoredFile.findAll({ where: { id: wanted, jobId }, attributes: ["id"], transaction });
  if (found.length < wanted.length) throw unprocessable("data", "shows a photo that is no file of this job", "unknown-file");
}

/** Most values that one entry of the log names. */
const VALUES = 60;
/** What changed, value by value: "panels 1 busA" from nothing to 200. */
function visitChanges(before: VisitContent | null, after: VisitContent): Record<string, unknown> {
  const differing = changes(before ? flat(before) : flat({ ...after, visitedOn: "", byName: "", data: emptyVisit() }), flat(after));
  const cut = (values: Readonly<Record<string, unknown>>) => Object.fromEntries(Object.entries(values).slice(0, VALUES));
  return { before: cut(differing.before), after: cut(differing.after) };
}

function flat({ visitedOn, byName, data }: VisitContent): Record<string, unknown> {
  const parts = VISIT_PARTS.flatMap((part) => leaves(part, data[part]));
  return Object.fromEntries([["visitedOn", visitedOn], ["byName", byName], ...parts]);
}
function leaves(name: string, value: VisitData[keyof VisitData] | unknown): [string, unknown][] {
  if (Array.isArray(value)) {
    const rows = value.some((each) => typeof each === "object" && each !== null);
    return rows ? value.flatMap((each, index) => leaves(`${name} ${index + 1}`, each)) : [[name, value.length > 0 ? value.join(", ") : null]];
  }
  if (typeof value === "object" && value !== null) {
    const record = value as Record<string, unknown>;
    if ("unit" in record) return [[name, `${String(record["value"])} ${String(record["unit"])}`]];
    return Object.entries(record).filter(([key]) => key !== "id").flatMap(([key, each]) => leaves(`${name} ${key}`, each));
  }
  return [[name, value ?? null]];
}
