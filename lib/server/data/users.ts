import "server-only";
import { hash, verify } from "@node-rs/argon2";
import { QueryTypes, UniqueConstraintError, type Transaction } from "sequelize";
import type { MeAnswer, SetupInput } from "@/lib/api";
import { mayInCompany, type Role } from "@/lib/policy";
import type { User } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { failureAllowance } from "@/lib/server/http/rateLimit";
import type { Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { addStarterSet } from "./libraryStarter";
import { licenseWarning } from "./licenses";

/** Tries with a wrong password before a pause, and the pause in seconds. */
const TRIES = 8;
const PAUSE_S = 300;

/** The person of a session, without what only this room may know. */
export interface SessionPerson { id: string; name: string; email: string; sessionVersion: number }
const person = ({ id, name, email, sessionVersion }: User): SessionPerson => ({ id, name, email, sessionVersion });

export const hashPassword = (password: string) => hash(password);

let decoy: Promise<string> | undefined;

/** User with this address, whatever its letter case. */
export function findByEmail(email: string, transaction?: Transaction): Promise<User | null> {
  const { sequelize, User } = database();
  return User.findOne({ where: sequelize.where(sequelize.fn("lower", sequelize.col("email")), email.toLowerCase()), transaction: transaction ?? null });
}

/**
 * Checks an address and a password.
 * @returns null when either is wrong, after the same time in both cases
 * @throws Problem 429 after too many failures for this address
 */
export async function verifyCredentials(email: string, password: string): Promise<SessionPerson | null> {
  const failed = failureAllowance(`sign-in:${email.toLowerCase()}`, TRIES, PAUSE_S);
  const user = await findByEmail(email);
  decoy ??= hash("no account has this password");
  const right = await verify(user?.passwordHash ?? (await decoy), password);
  if (!user || !right || !user.active) {
    failed();
    return null;
  }
  return person(user);
}

/**
 * Asks for the password again before something that cannot be taken back.
 * @throws Problem 422 naming `field` when it is wrong, 429 after too many failures
 */
export async function reauthenticate(actor: Actor, password: string, field: string): Promise<void> {
  const failed = failureAllowance(`password:${actor.id}`, TRIES, PAUSE_S);
  const user = await database().User.findByPk(actor.id);
  if (!user || !(await verify(user.passwordHash, password))) {
    failed();
    throw unprocessable(field, "is not your password", "wrong-password");
  }
}

/** The person of a session, or null when the account is closed or its sessions were ended. */
export async function sessionPerson(id: string, sessionVersion: number): Promise<SessionPerson | null> {
  const user = await database().User.findByPk(id);
  return user && user.active && user.sessionVersion === sessionVersion ? person(user) : null;
}

/** Makes an account. @throws Problem 409 when the address has one */
export async function createUser(facts: { email: string; name: string; password: string }, transaction: Transaction): Promise<User> {
  try {
    return await database().User.create(
      { email: facts.email.toLowerCase(), name: facts.name, passwordHash: await hashPassword(facts.password) }, { transaction },
    );
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw conflict("address-taken", "This address has an account.", { field: "email" });
    throw error;
  }
}

/** True until the first account is made. */
export async function isEmpty(): Promise<boolean> {
  return (await database().User.count()) === 0;
}

/**
 * First company and its administrator, on an installation without accounts.
 * @throws Problem 404 once there is an account
 */
export async function setUp(input: SetupInput, request: Pick<Actor, "requestId" | "from">): Promise<void> {
  const { sequelize, User } = database();
  await inTransaction(async (transaction) => {
    // Two first visitors at once must not both become administrator.
    await sequelize.query("select pg_advisory_xact_lock(7103401)", { type: QueryTypes.SELECT, transaction });
    if ((await User.count({ transaction })) > 0) throw notFound();
    await makeCompany(input, request, transaction);
  });
}

/**
 * A company with its administrator, for whoever runs the installation; no request leads here.
 * @throws Problem 409 when there is a company of this name or an account with this address
 */
export async function addCompany(input: SetupInput): Promise<void> {
  const { sequelize, Company } = database();
  await inTransaction(async (transaction) => {
    await sequelize.query("select pg_advisory_xact_lock(7103401)", { type: QueryTypes.SELECT, transaction });
    const same = sequelize.where(sequelize.fn("lower", sequelize.col("name")), input.companyName.toLowerCase());
    if ((await Company.count({ where: same, transaction })) > 0) throw conflict("company-there", "There is a company of this name. Its administrators add people on the People page.");
    await makeCompany(input, { requestId: null, from: null }, transaction);
  });
}

async function makeCompany(input: SetupInput, request: Pick<Actor, "requestId" | "from">, transaction: Transaction): Promise<void> {
  const { Company, Membership } = database();
  const user = await createUser(input, transaction);
  const company = await Company.create({ name: input.companyName }, { transaction });
  await Membership.create({ companyId: company.id, userId: user.id, roles: ["administrator", "designer"] }, { transaction });
  await addStarterSet(company.id, transaction);
  await audit(transaction, { ...person(user), ...request }, { action: "company.create", subject: `companies/${company.id}`, companyId: company.id });
}

/** Changes the password and ends all sessions of the person. */
export async function changePassword(actor: Actor, current: string, next: string): Promise<void> {
  await reauthenticate(actor, current, "current");
  await inTransaction(async (transaction) => {
    const user = await database().User.findByPk(actor.id, { transaction, lock: transaction.LOCK.UPDATE });
    if (!user) throw notFound();
    await user.update({ passwordHash: await hashPassword(next), sessionVersion: user.sessionVersion + 1 }, { transaction });
    await audit(transaction, actor, { action: "password.change", subject: `users/${user.id}` });
  });
}

/** What a person's pages need to know about them. */
export async function whoAmI(actor: Actor): Promise<MeAnswer> {
  const { Membership, Company, JobMember } = database();
  const [memberships, jobRoles, warning] = await Promise.all([
    Membership.findAll({ where: { userId: actor.id }, include: [{ model: Company, as: "company" }], order: [["createdAt", "ASC"]] }),
    JobMember.findAll({ where: { userId: actor.id }, attributes: ["roles"] }),
    licenseWarning(actor.id),
  ]);
  const roles = new Set<Role>(jobRoles.flatMap((each) => each.roles));
  return {
    id: actor.id, name: actor.name, email: actor.email,
    companies: memberships.map((each) => ({
      id: each.companyId, name: each.company?.name ?? "", roles: each.roles,
      may: { people: mayInCompany(each.roles, "company.people"), createJobs: mayInCompany(each.roles, "jobs.create"), settings: mayInCompany(each.roles, "company.settings"), records: mayInCompany(each.roles, "audit.view") },
    })),
    office: memberships.some((each) => each.roles.some((role) => role !== "permit clerk")) || [...roles].some((role) => role !== "permit clerk"),
    counter: roles.has("permit clerk"), licenseWarning: warning,
  };
}
