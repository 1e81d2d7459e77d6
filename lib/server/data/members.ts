import "server-only";
import { Op, type Transaction } from "sequelize";
import type { z } from "zod";
import type { PersonAnswer, personInput } from "@/lib/api";
import type { Role } from "@/lib/policy";
import type { JobMember, User } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { jobAccess, type Actor } from "./actor";
import { audit, changes } from "./audit";
import { database, inTransaction } from "./database";
import { createUser, findByEmail } from "./users";

const answer = (row: JobMember): PersonAnswer => ({
  id: row.id, userId: row.userId, name: row.user?.name ?? "", email: row.user?.email ?? "", roles: row.roles,
});
/** The person an entry is about, by the name of that day. */
const who = (row: JobMember) => ({ person: row.user?.name ?? "" });
const byName = (a: PersonAnswer, b: PersonAnswer) => a.name.localeCompare(b.name, "en-US");

/** The account of an address, made with the given name and password where there is none. */
export async function accountFor(input: z.output<typeof personInput>, transaction: Transaction): Promise<User> {
  const known = await findByEmail(input.email, transaction);
  if (known) return known;
  if (!input.name) throw unprocessable("name", "No account has this address yet. Enter the person's name.", "account-needed");
  if (!input.password) throw unprocessable("password", "No account has this address yet. Enter an initial password.", "account-needed");
  return createUser({ email: input.email, name: input.name, password: input.password }, transaction);
}

export async function listMembers(actor: Actor, jobId: string): Promise<PersonAnswer[]> {
  await jobAccess(actor, jobId, "members.view");
  const { JobMember, User } = database();
  const rows = await JobMember.findAll({ where: { jobId }, include: [{ model: User, as: "user" }] });
  return rows.map(answer).sort(byName);
}

/** Puts a person on a job; somebody who is on it already gets the roles added. */
export async function addMember(actor: Actor, jobId: string, input: z.output<typeof personInput>): Promise<PersonAnswer> {
  return inTransaction(async (transaction) => {
    await jobAccess(actor, jobId, "members.manage", { transaction });
    const user = await accountFor(input, transaction);
    const { JobMember } = database();
    const [member, made] = await JobMember.findOrCreate({ where: { jobId, userId: user.id }, defaults: { jobId, userId: user.id, roles: input.roles }, transaction });
    const before = made ? [] : member.roles;
    if (!made) await member.update({ roles: [...new Set<Role>([...member.roles, ...input.roles])] }, { transaction });
    await audit(transaction, actor, { action: "member.add", subject: `users/${user.id}`, jobId, detail: { person: user.name, roles: input.roles, ...changes({ roles: before }, { roles: member.roles }) } });
    return { ...answer(member), name: user.name, email: user.email };
  });
}

/** Replaces the roles of a person on a job. */
export async function changeMember(actor: Actor, jobId: string, memberId: string, roles: Role[]): Promise<PersonAnswer> {
  return inTransaction(async (transaction) => {
    const member = await managedMember(actor, jobId, memberId, transaction);
    if (!roles.includes("administrator")) await keepAdministrator(jobId, member, transaction);
    const before = member.roles;
    await member.update({ roles }, { transaction });
    await audit(transaction, actor, { action: "member.roles", subject: `users/${member.userId}`, jobId, detail: { ...who(member), roles, ...changes({ roles: before }, { roles }) } });
    return answer(member);
  });
}

/** Takes a person off a job. Journal and revisions keep their name. */
export async function removeMember(actor: Actor, jobId: string, memberId: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const member = await managedMember(actor, jobId, memberId, transaction);
    await keepAdministrator(jobId, member, transaction);
    await member.destroy({ transaction });
    await audit(transaction, actor, { action: "member.remove", subject: `users/${member.userId}`, jobId, detail: { ...who(member), ...changes({ roles: member.roles }, { roles: null }) } });
  });
}

async function managedMember(actor: Actor, jobId: string, memberId: string, transaction: Transaction): Promise<JobMember> {
  const { Job, JobMember, User } = database();
  // Two administrators removing each other at once must not leave the job without one.
  await Job.findByPk(jobId, { transaction, lock: transaction.LOCK.UPDATE });
  await jobAccess(actor, jobId, "members.manage", { transaction });
  const member = await JobMember.findOne({ where: { id: memberId, jobId }, include: [{ model: User, as: "user" }], transaction });
  if (!member) throw notFound();
  return member;
}

async function keepAdministrator(jobId: string, member: JobMember, transaction: Transaction): Promise<void> {
  if (!member.roles.includes("administrator")) return;
  const others = await database().JobMember.count({
    where: { jobId, id: { [Op.ne]: member.id }, roles: { [Op.contains]: ["administrator"] } }, transaction,
  });
  if (others === 0) throw conflict("last-administrator", "The job needs an administrator. Give somebody else the role first.");
}
