import { randomUUID } from "node:crypto";
import { encode } from "next-auth/jwt";
import type { CredentialsConfig } from "next-auth/providers/credentials";
import type { Role } from "@/lib/policy";
import { database } from "@/lib/server/data/database";
import { seedCompany, seedPerson } from "@/lib/server/data/seeding";
import { authOptions } from "@/lib/server/auth/options";
import { request } from "./server";

export interface Person { id: string; email: string; name: string; password: string; cookie: string }

const PASSWORD = "a password of the tests";

/**
 * Signs in as the sign-in page does: the provider checks address and password, the callback makes the token, and the
 * token is sealed with the server's secret.
 * @returns the session cookie, or null when it was refused
 */
export async function signIn(email: string, password = PASSWORD): Promise<{ id: string; cookie: string } | null> {
  const options = authOptions();
  const provider = options.providers[0] as unknown as { options: CredentialsConfig };
  const user = await provider.options.authorize({ email, password }, {} as never);
  if (!user) return null;
  const token = await options.callbacks?.jwt?.({ token: { sub: user.id }, user, account: null, trigger: "signIn" } as never);
  const value = await encode({ token: token ?? {}, secret: options.secret ?? "" });
  return { id: user.id, cookie: `next-auth.session-token=${value}` };
}

async function signedIn(email: string, name: string): Promise<Person> {
  const session = await signIn(email);
  if (!session) throw new Error(`${email} could not sign in`);
  return { ...session, email, name, password: PASSWORD };
}

/** First company with its administrator, through the set-up page's route. */
export async function firstAdministrator(): Promise<Person & { companyId: string }> {
  const email = "first@example.test";
  const made = await request("POST", "/api/setup", { body: { companyName: "Northlight Works", name: "First Administrator", email, password: PASSWORD } });
  if (made.status !== 201) throw new Error(`set-up answered ${made.status}`);
  const person = await signedIn(email, "First Administrator");
  const me = await request("GET", "/api/me", { as: person });
  return { ...person, companyId: me.body.companies[0].id };
}

/** Somebody on a job, with an account made on the way. */
export async function onJob(administrator: Person, jobId: string, roles: Role[], name = `Person ${roles.join(" ")}`): Promise<Person> {
  const email = `${randomUUID()}@example.test`;
  const made = await request("POST", `/api/jobs/${jobId}/members`, { as: administrator, body: { email, name, password: PASSWORD, roles } });
  if (made.status !== 201) throw new Error(`adding ${email} answered ${made.status}: ${JSON.stringify(made.body)}`);
  return signedIn(email, name);
}

/** Somebody of the company who is on no job. */
export async function inCompany(administrator: Person, companyId: string, roles: Role[]): Promise<Person> {
  const email = `${randomUUID()}@example.test`;
  const made = await request("POST", `/api/companies/${companyId}/people`, { as: administrator, body: { email, name: "Of the company", password: PASSWORD, roles } });
  if (made.status !== 201) throw new Error(`adding ${email} answered ${made.status}`);
  return signedIn(email, "Of the company");
}

/**
 * Somebody with every role of a company of their own, and of a job in it: the twin who must see nothing of the first one. The company is
 * made as seeders make one, since the set-up page takes the first alone.
 */
export async function ofAnotherCompany(): Promise<Person & { companyId: string; jobId: string }> {
  const companyId = await seedCompany("Southlight Works");
  const email = `${randomUUID()}@example.test`;
  await seedPerson({ email, name: "Twin", password: PASSWORD, companyId, roles: ["administrator", "designer", "licensee", "installer"] });
  const person = { ...(await signedIn(email, "Twin")), companyId };
  const jobId = await newJob(person, { name: "Twin barn" });
  await database().JobMember.update({ roles: ["administrator", "designer", "licensee", "installer", "permit clerk"] }, { where: { jobId, userId: person.id } });
  return { ...person, jobId };
}

export const site = {
  edition: "2023", occupancy: "accessory building", recordLowC: -24, designHighC: 33, elevationM: 310, temperatureSource: "designer's entry",
  utilityName: "Orrin Rural Electric", availableFaultCurrentA: 10400,
};

export function jobBody(companyId: string, change: Record<string, unknown> = {}) {
  return {
    companyId, number: `T-${randomUUID().slice(0, 8)}`, name: "Test barn", addressLines: "1 Field Way\nNettlecombe", parcel: "", owner: "", scope: "", permitNumber: "",
    preparer: "", contractor: "", jurisdiction: { name: `County ${randomUUID().slice(0, 8)}`, edition: "2023" }, site, ...change,
  };
}

/** A new job; who makes it becomes its administrator and designer. */
export async function newJob(administrator: Person & { companyId: string }, change: Record<string, unknown> = {}): Promise<string> {
  const made = await request("POST", "/api/jobs", { as: administrator, body: jobBody(administrator.companyId, change) });
  if (made.status !== 201) throw new Error(`making a job answered ${made.status}: ${JSON.stringify(made.body)}`);
  return made.body.id;
}
