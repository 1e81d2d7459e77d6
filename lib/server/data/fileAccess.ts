import "server-only";
import type { Transaction } from "sequelize";
import { may, mayInCompany, type Role } from "@/lib/policy";
import type { StoredFile } from "@/models";
import { forbidden, notFound } from "@/lib/server/http/problem";
import { companyAccess, demand, jobAccess, rolesInJob, type Actor } from "./actor";
import { database } from "./database";

/** Where a file belongs: to a job, or to an entry of the company's library. */
export type FileOwner = { jobId: string } | { libraryEntryId: string };
/** The company a file counts to, and whether the person may remove files there. */
export interface PlaceAccess { companyId: string; remove: boolean }

export const placeOf = (owner: FileOwner) => ("jobId" in owner ? { jobId: owner.jobId } : { libraryEntryId: owner.libraryEntryId });

async function companyOfEntry(entryId: string, transaction?: Transaction): Promise<string> {
  const entry = await database().LibraryEntry.findByPk(entryId, { attributes: ["companyId"], transaction: transaction ?? null });
  if (!entry) throw notFound();
  return entry.companyId;
}

const rolesInCompany = async (actor: Actor, companyId: string, transaction?: Transaction): Promise<Role[]> =>
  (await database().Membership.findOne({ where: { companyId, userId: actor.id }, transaction: transaction ?? null }))?.roles ?? [];

/** Whether the person reads the drawing of any job of the company: what it was drawn from is theirs to see. */
async function readsDrawings(actor: Actor, companyId: string, transaction?: Transaction): Promise<boolean> {
  const { Job, JobMember } = database();
  const members = await JobMember.findAll({
    where: { userId: actor.id }, attributes: ["roles"], include: [{ model: Job, as: "job", attributes: [], where: { companyId }, required: true }],
    transaction: transaction ?? null,
  });
  return members.some((member) => may(member.roles, "drawing.view"));
}

/** @throws Problem 404 for who has nothing to do with the company, 403 for roles that do not see its library */
async function libraryView(actor: Actor, companyId: string, transaction?: Transaction): Promise<PlaceAccess> {
  const roles = await rolesInCompany(actor, companyId, transaction);
  if (!mayInCompany(roles, "library.view") && !(await readsDrawings(actor, companyId, transaction))) {
    throw roles.length === 0 ? notFound() : forbidden(`Your roles in this company (${roles.join(", ")}) do not allow this.`);
  }
  return { companyId, remove: mayInCompany(roles, "library.edit") };
}

/** @throws Problem 404 or 403 */
export async function listAccess(actor: Actor, owner: FileOwner): Promise<PlaceAccess> {
  if ("libraryEntryId" in owner) return libraryView(actor, await companyOfEntry(owner.libraryEntryId));
  const { job, roles } = await jobAccess(actor, owner.jobId, "files.view");
  return { companyId: job.companyId, remove: may(roles, "files.remove") };
}

/** @throws Problem 404 or 403 */
export async function addAccess(actor: Actor, owner: FileOwner, transaction?: Transaction): Promise<PlaceAccess> {
  if ("libraryEntryId" in owner) {
    const companyId = await companyOfEntry(owner.libraryEntryId, transaction);
    await companyAccess(actor, companyId, "library.edit", transaction);
    return { companyId, remove: true };
  }
  const { job, roles } = await jobAccess(actor, owner.jobId, "files.add", transaction ? { transaction } : {});
  return { companyId: job.companyId, remove: may(roles, "files.remove") };
}

/** Whether the person may do it with this file. @throws Problem 404 or 403 */
export async function fileAccess(actor: Actor, file: StoredFile, what: "view" | "remove", transaction?: Transaction): Promise<void> {
  if (!file.jobId) {
    const access = await libraryView(actor, file.companyId, transaction);
    if (what === "remove" && !access.remove) throw forbidden("Your roles in this company do not allow this.");
    return;
  }
  const job = await database().Job.findByPk(file.jobId, { transaction: transaction ?? null });
  if (!job) throw notFound();
  demand(await rolesInJob(actor.id, job, transaction), what === "view" ? "files.view" : "files.remove");
}
