import "server-only";
import { randomUUID } from "node:crypto";
import type { Drawing as DrawingDocument, Edition, Site } from "@/lib/diagram/schema";
import { checkDocument } from "@/lib/diagram/check";
import type { Role } from "@/lib/policy";
import { putOnce } from "@/lib/server/storage";
import type { Actor } from "./actor";
import { database, inTransaction } from "./database";
import { addStarterSet } from "./libraryStarter";
import { readPngSize } from "./png";
import { findByEmail, hashPassword } from "./users";

/*
 * For seeders alone: each puts its rows in where they are missing and leaves what is there. No request leads here.
 */

/** A company by name, with the library's starter set. */
export async function seedCompany(name: string): Promise<string> {
  const [company] = await database().Company.findOrCreate({ where: { name }, defaults: { name } });
  await inTransaction((transaction) => addStarterSet(company.id, transaction));
  return company.id;
}

/** An account, and its place in a company where `roles` are given. */
export async function seedPerson(facts: { email: string; name: string; password: string; companyId: string; roles: Role[] }): Promise<Actor> {
  const { Membership, User } = database();
  const user = (await findByEmail(facts.email)) ?? (await User.create({ email: facts.email, name: facts.name, passwordHash: await hashPassword(facts.password) }));
  if (facts.roles.length > 0) {
    await Membership.findOrCreate({
      where: { companyId: facts.companyId, userId: user.id }, defaults: { companyId: facts.companyId, userId: user.id, roles: facts.roles },
    });
  }
  return { id: user.id, name: user.name, email: user.email, requestId: null, from: null };
}

/** A jurisdiction that every company knows. */
export async function seedJurisdiction(facts: { name: string; edition: Edition; ordinance: string; amendments: Site["amendments"] }): Promise<string> {
  const { edition, ...rest } = facts;
  const editions = [{ edition, effectiveFrom: null, effectiveTo: null }];
  const [row] = await database().Jurisdiction.findOrCreate({ where: { companyId: null, name: facts.name }, defaults: { ...rest, editions, companyId: null } });
  return row.id;
}

/** A license with its seal graphic. */
export async function seedLicense(userId: string, facts: { state: string; number: string; title: string; expiresOn: string; sealGraphic: Buffer }): Promise<void> {
  const { License } = database();
  if (await License.findOne({ where: { userId } })) return;
  const { sealGraphic, ...entry } = facts;
  const size = readPngSize(sealGraphic);
  const file = await putOnce("seal-graphics", sealGraphic, "image/png");
  await License.create({ userId, ...entry, sealObjectKey: file.key, sealWidthPx: size.widthPx, sealHeightPx: size.heightPx });
}

/**
 * A job with a finished drawing, as sequence 1 of its journal would leave it.
 * @throws Error when the drawing is not whole
 */
export async function seedJob(facts: {
  companyId: string; jurisdictionId: string; number: string; name: string; drawing: DrawingDocument; author: Actor; members: readonly { userId: string; roles: Role[] }[];
}): Promise<string> {
  const { Drawing, Job, JobMember } = database();
  const there = await Job.findOne({ where: { companyId: facts.companyId, number: facts.number } });
  if (there) return there.id;
  const faults = checkDocument(facts.drawing);
  if (faults.length > 0) throw new Error(`the drawing of ${facts.number} is not whole: ${faults.slice(0, 3).map((each) => `${each.path} ${each.message}`).join("; ")}`);
  return inTransaction(async (transaction) => {
    const job = await Job.create(
      { id: randomUUID(), companyId: facts.companyId, number: facts.number, name: facts.name, jurisdictionId: facts.jurisdictionId, createdBy: facts.author.id }, { transaction },
    );
    await Drawing.create({ jobId: job.id, document: facts.drawing, checkedSequence: null, checkedRuleSet: null, checkCounts: null, updatedBy: facts.author.id }, { transaction });
    await JobMember.bulkCreate(facts.members.map((each) => ({ jobId: job.id, userId: each.userId, roles: each.roles })), { transaction });
    return job.id;
  });
}
