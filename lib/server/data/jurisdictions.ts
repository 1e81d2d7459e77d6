import "server-only";
import { Op, UniqueConstraintError, type Transaction } from "sequelize";
import type { z } from "zod";
import type { JurisdictionAnswer, JurisdictionDetail, JurisdictionFacts, jurisdictionChange, jurisdictionInput, jurisdictionMake } from "@/lib/api";
import { adoptionInForce } from "@/lib/code/adoption";
import { canonicalJson } from "@/lib/diagram/canonical";
import type { Site } from "@/lib/diagram/schema";
import { may, mayInCompany } from "@/lib/policy";
import { amendmentFaults, wholeAmendment } from "@/lib/rules/engine/amendments";
import type { IssuedJurisdiction } from "@/lib/workflow";
import type { Jurisdiction } from "@/models";
import { Problem, conflict, forbidden, notFound, unprocessable } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { today } from "./licenses";

export const jurisdictionAnswer = (row: Jurisdiction): JurisdictionAnswer => ({
  id: row.id, companyId: row.companyId, name: row.name, edition: adoptionInForce(row.editions, today()).edition, editions: row.editions, ordinance: row.ordinance,
  amendments: row.amendments, signs: row.signs, version: row.version, shared: row.companyId === null,
});

/** Jurisdictions a person may choose from: the shared ones and those of the companies they work or draw for, by name. */
export async function listJurisdictions(actor: Actor): Promise<JurisdictionAnswer[]> {
  const { Job, JobMember, Jurisdiction, Membership } = database();
  const [memberships, jobs] = await Promise.all([
    Membership.findAll({ where: { userId: actor.id }, attributes: ["companyId"] }),
    JobMember.findAll({ where: { userId: actor.id }, attributes: ["id", "roles"], include: [{ model: Job, as: "job", attributes: ["companyId"] }] }),
  ]);
  const companies = new Set([
    ...memberships.map((each) => each.companyId), ...jobs.flatMap((each) => (each.job && may(each.roles, "job.edit") ? [each.job.companyId] : [])),
  ]);
  const rows = await Jurisdiction.findAll({ where: { [Op.or]: [{ companyId: null }, { companyId: [...companies] }] }, order: [["name", "ASC"]] });
  return rows.map(jurisdictionAnswer);
}

/** What is kept of a jurisdiction with a revision on the day of issue. */
export async function issuedJurisdiction(id: string, transaction: Transaction): Promise<IssuedJurisdiction> {
  const { name, version, signs, exportProfile } = await database().Jurisdiction.findByPk(id, { transaction, rejectOnEmpty: true });
  return { id, name, version, signs, fileNameTemplate: exportProfile.fileNameTemplate, bookmarks: exportProfile.bookmarks };
}

/** @throws Problem 422 when the company has no such jurisdiction to choose */
export async function visibleJurisdiction(id: string, companyId: string, transaction: Transaction): Promise<Jurisdiction> {
  const row = await database().Jurisdiction.findOne({ where: { id, [Op.or]: [{ companyId: null }, { companyId }] }, transaction });
  if (!row) throw unprocessable("jurisdiction", "is not known");
  return row;
}

/** Enters a jurisdiction for one company together with a job. @throws Problem 409 when it has one of that name */
export async function makeJurisdiction(
  actor: Actor, companyId: string, { edition, ...facts }: z.output<typeof jurisdictionInput>, transaction: Transaction,
): Promise<Jurisdiction> {
  return enter(actor, companyId, { ...facts, editions: [{ edition, effectiveFrom: null, effectiveTo: null }] }, transaction, "jurisdiction.name");
}

async function enter(
  actor: Actor, companyId: string, facts: Partial<JurisdictionFacts> & Pick<JurisdictionFacts, "name" | "editions">, transaction: Transaction, nameField: string, detail: Record<string, unknown> = {},
): Promise<Jurisdiction> {
  await companyAccess(actor, companyId, "jurisdictions.edit", transaction);
  const amendments = checkedAmendments(facts.amendments ?? {}, {});
  return named(nameField, async () => {
    const row = await database().Jurisdiction.create({ ...facts, amendments, companyId, updatedBy: actor.id }, { transaction });
    await audit(transaction, actor, { action: "jurisdiction.create", subject: `jurisdictions/${row.id}`, companyId, detail: { name: row.name, ...detail } });
    return row;
  });
}

async function named<Answer>(field: string, work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw conflict("jurisdiction-taken", "There is a jurisdiction of this name; choose it from the list.", { field });
    throw error;
  }
}

/** A jurisdiction of a company's own, entered anew or copied. @throws Problem 422 naming the amendment that no rule knows */
export async function createJurisdiction(actor: Actor, input: z.output<typeof jurisdictionMake>): Promise<JurisdictionDetail> {
  const { id } = await inTransaction(async (transaction) => {
    if (!("copyOf" in input)) {
      const { companyId, ...facts } = input;
      return enter(actor, companyId, facts, transaction, "name");
    }
    await companyAccess(actor, input.companyId, "jurisdictions.edit", transaction);
    const from = await readable(actor, input.copyOf, transaction);
    const { name, ordinance, editions, signs, amendments, requirements, exportProfile, contacts, notes } = from;
    return named("name", async () => {
      const row = await database().Jurisdiction.create(
        { name: input.name ?? name, ordinance, editions, signs, amendments, requirements, exportProfile, contacts, notes, companyId: input.companyId, updatedBy: actor.id }, { transaction },
      );
      await audit(transaction, actor, { action: "jurisdiction.create", subject: `jurisdictions/${row.id}`, companyId: input.companyId, detail: { name: row.name, copyOf: from.id } });
      return row;
    });
  });
  return getJurisdiction(actor, id);
}

/** A shared jurisdiction, or one of the person's company. @throws Problem 404 */
async function readable(actor: Actor, id: string, transaction?: Transaction, lock = false): Promise<Jurisdiction> {
  const { Jurisdiction } = database();
  const row = await Jurisdiction.findByPk(id, { transaction: transaction ?? null, ...(lock && transaction ? { lock: transaction.LOCK.UPDATE } : {}) });
  if (!row) throw notFound();
  if (row.companyId !== null) await companyAccess(actor, row.companyId, "jurisdictions.view", transaction);
  return row;
}

/** @throws Problem as in `readable`; 403 for a shared one and for roles that may not */
async function changeable(actor: Actor, id: string, transaction: Transaction): Promise<{ row: Jurisdiction; companyId: string }> {
  const row = await readable(actor, id, transaction, true);
  if (row.companyId === null) throw forbidden("This jurisdiction is shared and only to read. Copy it to your company and change the copy.");
  await companyAccess(actor, row.companyId, "jurisdictions.edit", transaction);
  return { row, companyId: row.companyId };
}

/** Everything that is known of a jurisdiction, and what the person may do with it. */
export async function getJurisdiction(actor: Actor, id: string): Promise<JurisdictionDetail> {
  const { Company, Job, Membership, User } = database();
  const row = await readable(actor, id);
  const memberships = await Membership.findAll({ where: { userId: actor.id }, include: [{ model: Company, as: "company", attributes: ["id", "name"] }] });
  const editing = memberships.filter((each) => mayInCompany(each.roles, "jurisdictions.edit"));
  const [jobs, changer] = await Promise.all([
    Job.count({ where: { jurisdictionId: id, companyId: memberships.map((each) => each.companyId) } }),
    row.updatedBy ? User.findByPk(row.updatedBy, { attributes: ["name"] }) : null,
  ]);
  return {
    ...jurisdictionAnswer(row), requirements: row.requirements, exportProfile: row.exportProfile, contacts: row.contacts, notes: row.notes,
    changedAt: row.updatedAt.toISOString(), changedBy: changer?.name ?? null, jobs,
    may: {
      edit: editing.some((each) => each.companyId === row.companyId),
      copyTo: row.companyId === null ? editing.flatMap((each) => (each.company ? [{ id: each.company.id, name: each.company.name }] : [])) : [],
    },
  };
}

/**
 * Changes a jurisdiction. Jobs that use it stay as they are until somebody takes the change over.
 * @throws Problem 409 `stale-version` when somebody changed it since; 422 naming the amendment that is wrong
 */
export async function changeJurisdiction(actor: Actor, id: string, { version, ...change }: z.output<typeof jurisdictionChange>): Promise<JurisdictionDetail> {
  await inTransaction(async (transaction) => {
    const { row, companyId } = await changeable(actor, id, transaction);
    if (row.version !== version) throw conflict("stale-version", "Somebody changed this jurisdiction in the meantime. Load it again and make your change on top of theirs.", { version: row.version });
    const facts = { ...change, ...(change.amendments ? { amendments: checkedAmendments(change.amendments, row.amendments) } : {}) };
    const fields = Object.entries(facts).filter(([field, value]) => value !== undefined && canonicalJson(value) !== canonicalJson(row.get(field))).map(([field]) => field);
    if (fields.length === 0) return;
    const detail = { version: version + 1, fields, ...(facts.amendments ? { amendments: amendmentDetail(row.amendments, facts.amendments) } : {}) };
    await named("name", () => row.update({ ...facts, version: version + 1, updatedBy: actor.id }, { transaction }));
    await audit(transaction, actor, { action: "jurisdiction.edit", subject: `jurisdictions/${id}`, companyId, detail });
  });
  return getJurisdiction(actor, id);
}

/** @throws Problem 409 `jurisdiction-used` while a job uses it */
export async function deleteJurisdiction(actor: Actor, id: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const { row, companyId } = await changeable(actor, id, transaction);
    const jobs = await database().Job.count({ where: { jurisdictionId: id }, transaction });
    if (jobs > 0) throw conflict("jurisdiction-used", `${jobs} ${jobs === 1 ? "job uses" : "jobs use"} this jurisdiction. Choose another one there first.`, { jobs });
    await audit(transaction, actor, { action: "jurisdiction.delete", subject: `jurisdictions/${id}`, companyId, detail: { name: row.name } });
    await row.destroy({ transaction });
  });
}

/** Amendments with limits named. Those that stay as they were are not asked again: a rule may have gone since. */
function checkedAmendments(wanted: Site["amendments"], before: Site["amendments"]): Site["amendments"] {
  const same = (id: string) => before[id] !== undefined && canonicalJson(before[id]) === canonicalJson(wanted[id]);
  const errors = Object.entries(wanted).filter(([id]) => !same(id)).flatMap(([id, amendment]) =>
    amendmentFaults(amendment).map(({ field, message }) => ({ field: `amendments.${id}.${field}`, detail: message })));
  const [first] = errors;
  if (first) throw new Problem(422, "amendment", "Something in the request is wrong", `${first.field}: ${first.detail}`, { field: first.field, errors: errors.slice(0, 20) });
  return Object.fromEntries(Object.entries(wanted).map(([id, amendment]) => [id, same(id) ? amendment : wholeAmendment(amendment)]));
}

function amendmentDetail(before: Site["amendments"], after: Site["amendments"]) {
  const ids = [...new Set([...Object.keys(before), ...Object.keys(after)])];
  return {
    added: ids.filter((id) => !before[id]).map((id) => after[id]?.rule), removed: ids.filter((id) => !after[id]).map((id) => before[id]?.rule),
    changed: ids.filter((id) => before[id] && after[id] && canonicalJson(before[id]) !== canonicalJson(after[id])).map((id) => after[id]?.rule),
  };
}
