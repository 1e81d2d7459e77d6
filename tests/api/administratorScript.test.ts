import { spawnSync } from "node:child_process";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { signIn } from "./support/people";
import { request } from "./support/server";

const root = path.resolve(import.meta.dirname, "../..");
/** Runs the script as npm does, with the database as its only setting. */
function run(args: string[], input = "") {
  const { status, stdout, stderr } = spawnSync(process.execPath, ["--conditions=react-server", "--import", "tsx", "scripts/administrator.ts", ...args], {
    cwd: root, encoding: "utf8", input, env: { PATH: process.env["PATH"], DATABASE_URL: process.env["DATABASE_URL"], NODE_ENV: "test", TZ: "UTC" },
  });
  return { status, stdout, stderr };
}
const args = (company: string, email: string, ...more: string[]) => ["--company", company, "--name", "Somebody", "--email", email, ...more];

describe("the administrator's command", () => {
  it("makes a company whose administrator signs in with the printed password, and closes the set-up page", async () => {
    const made = run(args("By command", "command@example.test"));
    expect([made.status, made.stderr]).toEqual([0, ""]);
    const password = /shown this once: (\S+)/.exec(made.stdout)?.[1] ?? "";
    const session = await signIn("command@example.test", password);
    const me = await request("GET", "/api/me", { as: session });
    expect(me.body.companies).toMatchObject([{ name: "By command", roles: ["administrator", "designer"] }]);
    expect((await request("GET", "/api/setup")).body).toEqual({ needed: false });
    const companyId = me.body.companies[0].id;
    expect((await request("GET", `/api/companies/${companyId}/library`, { as: session })).body.entries.length).toBeGreaterThan(0);
    expect((await request("GET", `/api/companies/${companyId}/audit?action=company.create`, { as: session })).body.records).toHaveLength(1);
  });

  it("takes a password from the standard input and prints none", async () => {
    const made = run(args("From a pipe", "pipe@example.test", "--password-stdin"), "a password of the pipe\n");
    expect(made.status).toBe(0);
    expect(made.stdout).not.toContain("assword");
    expect(await signIn("pipe@example.test", "a password of the pipe")).not.toBeNull();
  });

  it("refuses what is missing, too short or there already, and writes nothing", async () => {
    const { Company, User } = database();
    const before = [await Company.count(), await User.count()];
    for (const [given, input, words] of [
      [[], "", "--company is missing"], [args("Short", "short@example.test", "--password-stdin"), "short\n", "The password needs at least 10 characters"],
      [args("No address", "nobody"), "", "--email is no mail address"], [args("BY COMMAND", "other@example.test"), "", "There is a company of this name"],
      [args("Another", "PIPE@example.test"), "", "This address has an account"], [["--unknown"], "", "--unknown"],
    ] as [string[], string, string][]) {
      const refused = run(given, input);
      expect([refused.status, refused.stdout]).toEqual([1, ""]);
      expect(refused.stderr).toContain(words);
    }
    expect([await Company.count(), await User.count()]).toEqual(before);
  });
});
