import "server-only";
import { UniqueConstraintError, type Transaction } from "sequelize";
import { nextJobNumber } from "@/lib/workflow/jobNumber";
import { conflict } from "@/lib/server/http/problem";
import type { Company } from "@/models";
import { companyAccess, type Actor } from "./actor";
import { database } from "./database";
import { today } from "./licenses";

async function nextOf(company: Company, transaction: Transaction | null): Promise<string> {
  const jobs = await database().Job.findAll({ where: { companyId: company.id }, attributes: ["number"], raw: true, transaction });
  return nextJobNumber(company.jobNumberScheme, jobs.map((each) => each.number), today());
}

/** What the next job may be called by the company's scheme. Nothing is reserved; the number is taken when the job is made. */
export async function suggestedNumber(actor: Actor, companyId: string): Promise<{ number: string; scheme: string }> {
  await companyAccess(actor, companyId, "jobs.create");
  const company = await database().Company.findByPk(companyId, { rejectOnEmpty: true });
  return { number: await nextOf(company, null), scheme: company.jobNumberScheme };
}

/**
 * Company and number of a job that is being made: the number that is wanted, or else the next of the scheme. The company's row
 * stays locked until the job is there, so that two people who make one at once get two numbers, and a refused job leaves no gap.
 */
export async function takeNumber(companyId: string, wanted: string | undefined, transaction: Transaction): Promise<{ company: Company; number: string }> {
  const company = await database().Company.findByPk(companyId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE, rejectOnEmpty: true });
  return { company, number: wanted ?? await nextOf(company, transaction) };
}

/** The database's refusal of a number twice, as an answer that names the field; anything else as it is. */
export const numberTaken = (error: unknown): unknown =>
  error instanceof UniqueConstraintError ? conflict("number-taken", "Another job of the company has this number.", { field: "number" }) : error;
