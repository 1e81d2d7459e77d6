import "server-only";
import { Op, UniqueConstraintError, type Transaction } from "sequelize";
import type { z } from "zod";
import type { JurisdictionAnswer, jurisdictionInput } from "@/lib/api";
import type { Jurisdiction } from "@/models";
import { conflict, unprocessable } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database } from "./database";

export const jurisdictionAnswer = (row: Jurisdiction): JurisdictionAnswer => ({
  id: row.id, name: row.name, edition: row.edition, ordinance: row.ordinance, amendments: row.amendments, shared: row.companyId === null,
});

/** Jurisdictions a person may choose from: the shared ones and those of their companies, by name. */
export async function listJurisdictions(actor: Actor): Promise<JurisdictionAnswer[]> {
  const { Job, JobMember, Jurisdiction, Membership } = database();
  const [memberships, jobs] = await Promise.all([
    Membership.findAll({ where: { userId: actor.id }, attributes: ["companyId"] }),
    JobMember.findAll({ where: { userId: actor.id }, attributes: ["id"], include: [{ model: Job, as: "job", attributes: ["companyId"] }] }),
  ]);
  const companies = new Set([...memberships.map((each) => each.companyId), ...jobs.flatMap((each) => (each.job ? [each.job.companyId] : []))]);
  const rows = await Jurisdiction.findAll({ where: { [Op.or]: [{ companyId: null }, { companyId: [...companies] }] }, order: [["name", "ASC"]] });
  return rows.map(jurisdictionAnswer);
}

/** @throws Problem 422 when the company has no such jurisdiction to choose */
export async function visibleJurisdiction(id: string, companyId: string, transaction: Transaction): Promise<Jurisdiction> {
  const row = await database().Jurisdiction.findOne({ where: { id, [Op.or]: [{ companyId: null }, { companyId }] }, transaction });
  if (!row) throw unprocessable("jurisdiction", "is not known");
  return row;
}

/** Enters a jurisdiction for one company. @throws Problem 409 when it has one of that name */
export async function makeJurisdiction(
  actor: Actor, companyId: string, facts: z.output<typeof jurisdictionInput>, transaction: Transaction,
): Promise<Jurisdiction> {
  await companyAccess(actor, companyId, "jurisdictions.edit", transaction);
  try {
    const row = await database().Jurisdiction.create({ ...facts, companyId, amendments: {} }, { transaction });
    await audit(transaction, actor, { action: "jurisdiction.create", subject: `jurisdictions/${row.id}`, companyId });
    return row;
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw conflict("jurisdiction-taken", "There is a jurisdiction of this name; choose it from the list.", { field: "jurisdiction.name" });
    throw error;
  }
}
