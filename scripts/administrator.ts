/**
 * npm run administrator -- --company NAME --name NAME --email ADDRESS [--password-stdin]
 *
 * Makes a company with its administrator, without the set-up page; for whoever runs the installation. Needs DATABASE_URL, from the
 * shell or .env, and a database that is up to date. The password is read from the first line of the standard input with
 * --password-stdin, so that it stands in no list of processes; else one is made and printed once.
 */
import { randomBytes } from "node:crypto";
import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import { setupInput } from "@/lib/api/people";
import { closeDatabase } from "@/lib/server/data/database";
import { addCompany } from "@/lib/server/data/users";
import { Problem } from "@/lib/server/http/problem";

const USAGE = "npm run administrator -- --company NAME --name NAME --email ADDRESS [--password-stdin]";
const NAMES: Record<string, string> = { companyName: "--company", name: "--name", email: "--email", password: "The password" };

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: { company: { type: "string" }, name: { type: "string" }, email: { type: "string" }, "password-stdin": { type: "boolean", default: false } },
  });
  const given = values["password-stdin"] ? readFileSync(0, "utf8").split(/\r?\n/)[0] ?? "" : null;
  const password = given ?? randomBytes(15).toString("base64url");
  const parsed = setupInput.safeParse({ companyName: values.company ?? "", name: values.name ?? "", email: values.email ?? "", password });
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => `${NAMES[String(issue.path[0])] ?? String(issue.path[0])} ${issue.message}.`);
    throw new Error(`${faults.join("\n")}\n${USAGE}`);
  }
  const file = path.resolve(import.meta.dirname, "../.env");
  // Settings of the shell win over those of the file.
  if (existsSync(file)) process.loadEnvFile(file);
  await addCompany(parsed.data);
  console.log(`${parsed.data.companyName} is there. ${parsed.data.email} signs in as its administrator.`);
  if (given === null) console.log(`Password, shown this once: ${password}\nChange it on the account page after the first sign-in.`);
}

try {
  await main();
} catch (error) {
  console.error(error instanceof Problem ? error.detail : (error as Error).message);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
