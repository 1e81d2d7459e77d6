import "server-only";
import { Op, QueryTypes, type Transaction } from "sequelize";
import type { z } from "zod";
import type { CompanyPerson, personChange, personInput } from "@/lib/api";
import { mayInCompany, type Role } from "@/lib/policy";
import type { Membership } from "@/models";
import { conflict, notFound } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { audit, changes } from "./audit";
import { database, inTransaction } from "./database";
import { licensesOf } from "./licenses";
import { accountFor } from "./members";

const answer = (row: Membership): CompanyPerson => ({
  id: row.id, userId: row.userId, name: row.user?.name ?? "", email: row.user?.email ?? "", roles: row.roles, active: row.user?.active ?? false,
});
/** The person an entry is about, by the name of that day. */
const who = (row: Membership) => ({ person: row.user?.name ?? "" });

/** Everybody of a company by name; with their licenses for whoever manages them. */
export async function listPeople(actor: Actor, companyId: string): Promise<CompanyPerson[]> {
  const roles = await companyAccess(actor, companyId, "company.view");
  const { Membership, User } = database();
  const rows = await Membership.findAll({ where: { companyId }, include: [{ model: User, as: "user" }] });
  const people = rows.map(answer).sort((a, b) => a.name.localeCompare(b.name, "en-US"));
  if (!mayInCompany(roles, "company.people")) return people;
  const licenses = await licensesOf(people.map((each) => each.userId));
  return people.map((each) => ({ ...each, license: licenses.get(each.userId) ?? null }));
}

/** Takes a person into a company; somebody who is in it gets the roles added. */
export async function addPerson(actor: Actor, companyId: string, input: z.output<typeof personInput>): Promise<CompanyPerson> {
  return inTransaction(async (transaction) => {
    await companyAccess(actor, companyId, "company.people", transaction);
    const user = await accountFor(input, transaction);
    const { Membership } = database();
    const [membership, made] = await Membership.findOrCreate({
      where: { companyId, userId: user.id }, defaults: { companyId, userId: user.id, roles: input.roles }, transaction,
    });
    const before = made ? [] : membership.roles;
    if (!made) await membership.update({ roles: [...new Set<Role>([...membership.roles, ...input.roles])] }, { transaction });
    await audit(transaction, actor, { action: "person.add", subject: `users/${user.id}`, companyId, detail: { person: user.name, roles: input.roles, ...changes({ roles: before }, { roles: membership.roles }) } });
    return { ...answer(membership), name: user.name, email: user.email, active: user.active };
  });
}

/** Replaces the roles of a person in a company, and closes or opens their account. */
export async function changePerson(actor: Actor, companyId: string, membershipId: string, change: z.output<typeof personChange>): Promise<CompanyPerson> {
  return inTransaction(async (transaction) => {
    const membership = await managedPerson(actor, companyId, membershipId, transaction);
    const { roles } = change;
    if (roles !== undefined) {
      if (!roles.includes("administrator")) await keepAdministrator(companyId, membership, transaction);
      const before = membership.roles;
      await membership.update({ roles }, { transaction });
      await audit(transaction, actor, { action: "person.roles", subject: `users/${membership.userId}`, companyId, detail: { ...who(membership), roles, ...changes({ roles: before }, { roles }) } });
    }
    if (change.active !== undefined) await setActive(actor, membership, change.active, transaction);
    return answer(membership);
  });
}

/**
 * Closes an account or opens it again. Closing ends its sessions.
 * @throws Problem 409 for the person's own, for the last administrator's, and for one that works elsewhere too
 */
async function setActive(actor: Actor, membership: Membership, active: boolean, transaction: Transaction): Promise<void> {
  const { companyId, user } = membership;
  if (!user || user.active === active) return;
  if (!active && user.id === actor.id) throw conflict("own-account", "Nobody closes their own account. Ask another administrator.");
  if (!active) await keepAdministrator(companyId, membership, transaction);
  const elsewhere = await database().sequelize.query(
    `select 1 from memberships where user_id = :userId and company_id <> :companyId
     union all select 1 from job_members m join jobs j on j.id = m.job_id where m.user_id = :userId and j.company_id <> :companyId limit 1`,
    { replacements: { userId: user.id, companyId }, type: QueryTypes.SELECT, transaction },
  );
  // An account belongs to its person. One company may not lock it for the others.
  if (elsewhere.length > 0) throw conflict("account-elsewhere", "This account is also used outside of your company. Take the person out of the company and off its jobs instead.");
  await user.update({ active, ...(active ? {} : { sessionVersion: user.sessionVersion + 1 }) }, { transaction });
  await audit(transaction, actor, { action: "person.active", subject: `users/${user.id}`, companyId, detail: { ...who(membership), ...changes({ active: !active }, { active }), active } });
}

/** Takes a person out of a company; their places on jobs stay until they are taken off them. */
export async function removePerson(actor: Actor, companyId: string, membershipId: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const membership = await managedPerson(actor, companyId, membershipId, transaction);
    await keepAdministrator(companyId, membership, transaction);
    await membership.destroy({ transaction });
    await audit(transaction, actor, { action: "person.remove", subject: `users/${membership.userId}`, companyId, detail: { ...who(membership), ...changes({ roles: membership.roles }, { roles: null }) } });
  });
}

async function managedPerson(actor: Actor, companyId: string, membershipId: string, transaction: Transaction): Promise<Membership> {
  const { Company, Membership, User } = database();
  // Two administrators removing each other at once must not leave the company without one.
  await Company.findByPk(companyId, { transaction, lock: transaction.LOCK.UPDATE });
  await companyAccess(actor, companyId, "company.people", transaction);
  const membership = await Membership.findOne({ where: { id: membershipId, companyId }, include: [{ model: User, as: "user" }], transaction });
  if (!membership) throw notFound();
  return membership;
}

/** @throws Problem 409 when nobody else administers the company with an open account */
async function keepAdministrator(companyId: string, membership: Membership, transaction: Transaction): Promise<void> {
  if (!membership.roles.includes("administrator")) return;
  const { Membership, User } = database();
  const others = await Membership.count({
    where: { companyId, id: { [Op.ne]: membership.id }, roles: { [Op.contains]: ["administrator"] } },
    include: [{ model: User, as: "user", where: { active: true }, required: true }], transaction,
  });
  if (others === 0) throw conflict("last-administrator", "The company needs an administrator. Give somebody else the role first.");
}
