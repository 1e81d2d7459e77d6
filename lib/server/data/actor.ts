import "server-only";
import type { Transaction } from "sequelize";
import { may, mayInCompany, type CompanyAction, type JobAction, type Role } from "@/lib/policy";
import type { RevisionState } from "@/lib/workflow";
import type { Job } from "@/models";
import type { Origin } from "@/lib/server/http/connection";
import { forbidden, notFound } from "@/lib/server/http/problem";
import { database } from "./database";

/** The signed-in person on whose behalf something is done, by which request and from where; null for both in seeders and scripts. */
export interface Actor { id: string; name: string; email: string; requestId: string | null; from: Origin | null }

export interface JobAccess { job: Job; roles: Role[] }

/** Roles a person has in a job: those given in the job, and administrator where they administer its company. */
export async function rolesInJob(userId: string, job: Job, transaction?: Transaction): Promise<Role[]> {
  const { JobMember, Membership } = database();
  const [member, membership] = await Promise.all([
    JobMember.findOne({ where: { jobId: job.id, userId }, transaction: transaction ?? null }),
    Membership.findOne({ where: { companyId: job.companyId, userId }, transaction: transaction ?? null }),
  ]);
  const roles = new Set<Role>(member?.roles ?? []);
  if (membership?.roles.includes("administrator")) roles.add("administrator");
  return [...roles];
}

/**
 * The job and the person's roles in it.
 * @throws Problem 404 when they have no role in it; 403 when their roles do not allow the action
 */
export async function jobAccess(
  actor: Actor, jobId: string, action: JobAction, options: { transaction?: Transaction; state?: RevisionState } = {},
): Promise<JobAccess> {
  const job = await database().Job.findByPk(jobId, { transaction: options.transaction ?? null });
  if (!job) throw notFound();
  const roles = await rolesInJob(actor.id, job, options.transaction);
  demand(roles, action, options.state);
  return { job, roles };
}

/** @throws Problem as in jobAccess */
export function demand(roles: readonly Role[], action: JobAction, state?: RevisionState): void {
  if (roles.length === 0) throw notFound();
  if (may(roles, action, state)) return;
  // A person who may not see a revision in this state is not told that there is one.
  if (action === "revision.view" || (action === "sheets.download" && !may(roles, "revision.view", state))) throw notFound();
  throw forbidden(`Your ${roles.length === 1 ? "role" : "roles"} in this job (${roles.join(", ")}) ${roles.length === 1 ? "does" : "do"} not allow this${state ? ` while the revision is ${state}` : ""}.`);
}

/** @throws Problem 404 when the person is not of the company; 403 when their roles do not allow the action */
export async function companyAccess(actor: Actor, companyId: string, action: CompanyAction, transaction?: Transaction): Promise<Role[]> {
  const membership = await database().Membership.findOne({ where: { companyId, userId: actor.id }, transaction: transaction ?? null });
  if (!membership) throw notFound();
  if (!mayInCompany(membership.roles, action)) throw forbidden(`Your roles in this company (${membership.roles.join(", ")}) do not allow this.`);
  return membership.roles;
}
