import "server-only";
import type { z } from "zod";
import type { LicenseAnswer, PersonLicense, licenseInput } from "@/lib/api";
import { licenseExpiry, type LicenseExpiry } from "@/lib/workflow";
import type { License } from "@/models";
import { unprocessable } from "@/lib/server/http/problem";
import { getBytes, putOnce } from "@/lib/server/storage";
import type { Actor } from "./actor";
import { audit, changes } from "./audit";
import { database, inTransaction } from "./database";
import { readPngSize } from "./png";

/**
 * Today as a calendar date, UTC. A license that ends today is in force today. West of Greenwich a day ends here before it ends there: nothing
 * is sealed after a last day, at the price of its evening.
 */
export const today = () => new Date().toISOString().slice(0, 10);

function answer(license: License): LicenseAnswer {
  return {
    state: license.state, number: license.number, title: license.title, expiresOn: license.expiresOn,
    sealGraphic: license.sealWidthPx && license.sealHeightPx ? { widthPx: license.sealWidthPx, heightPx: license.sealHeightPx } : null,
    expired: license.expiresOn < today(), expiry: licenseExpiry(license.expiresOn, today()),
  };
}

export const licenseOf = (userId: string) => database().License.findOne({ where: { userId } });

/** Licenses of people, by account. */
export async function licensesOf(userIds: readonly string[]): Promise<Map<string, PersonLicense>> {
  const rows = await database().License.findAll({ where: { userId: [...userIds] } });
  return new Map(rows.map(({ userId, state, number, title, expiresOn }) => [userId, { state, number, title, expiresOn, expiry: licenseExpiry(expiresOn, today()) }]));
}

/** What has to be said about the end of a person's license, or null. */
export async function licenseWarning(userId: string): Promise<LicenseExpiry | null> {
  const license = await licenseOf(userId);
  const expiry = license && licenseExpiry(license.expiresOn, today());
  return expiry && expiry.words !== null ? expiry : null;
}

/** The person's license, or null before it is entered. */
export async function getLicense(actor: Actor): Promise<LicenseAnswer | null> {
  const license = await licenseOf(actor.id);
  return license && answer(license);
}

/** Enters or changes the person's license. Sealed revisions keep the facts of their day. */
export async function putLicense(actor: Actor, facts: z.output<typeof licenseInput>): Promise<LicenseAnswer> {
  return inTransaction(async (transaction) => {
    const { License } = database();
    const [license, made] = await License.findOrCreate({ where: { userId: actor.id }, defaults: { userId: actor.id, ...facts }, transaction });
    const before = made ? null : { state: license.state, number: license.number, title: license.title, expiresOn: license.expiresOn };
    await license.update(facts, { transaction });
    await audit(transaction, actor, { action: "license.put", subject: `licenses/${license.id}`, detail: { number: facts.number, ...changes(before, facts) } });
    return answer(license);
  });
}

/**
 * Takes the seal graphic, judged by its bytes and not by its name.
 * @throws Problem 422 when it is no usable PNG or the license is not entered yet
 */
export async function putSealGraphic(actor: Actor, bytes: Buffer): Promise<LicenseAnswer> {
  const size = readPngSize(bytes);
  if (!(await licenseOf(actor.id))) throw unprocessable("sealGraphic", "enter the license first");
  const file = await putOnce("seal-graphics", bytes, "image/png");
  return inTransaction(async (transaction) => {
    const license = await database().License.findOne({ where: { userId: actor.id }, transaction, lock: transaction.LOCK.UPDATE });
    if (!license) throw unprocessable("sealGraphic", "enter the license first");
    await license.update({ sealObjectKey: file.key, sealWidthPx: size.widthPx, sealHeightPx: size.heightPx }, { transaction });
    await audit(transaction, actor, { action: "license.seal-graphic", subject: `licenses/${license.id}`, detail: { digest: file.digest } });
    return answer(license);
  });
}

/** Bytes of the person's own seal graphic (PNG), or null. */
export async function sealGraphic(actor: Actor): Promise<Buffer | null> {
  const license = await licenseOf(actor.id);
  return license?.sealObjectKey ? getBytes(license.sealObjectKey) : null;
}
