import { spawnSync } from "node:child_process";
import { mkdtempSync, chmodSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { startServices, typescript } from "@/scripts/lib/services.mjs";

/**
 * A cluster, object store and mail catcher of this run's own; the database is made by the
 * migrations alone, from empty, and each test file gets a copy (ownDatabase.ts).
 */
export default async function setup(): Promise<() => Promise<void>> {
  const root = path.resolve(import.meta.dirname, "../../..");
  const dataFolder = mkdtempSync(path.join(tmpdir(), "ferrule-api-"));
  // The database's account has to get through.
  chmodSync(dataFolder, 0o755);
  const given = { ...process.env };
  for (const name of ["DATABASE_URL", "S3_BUCKET", "S3_ENDPOINT", "SMTP_URL"]) delete given[name];
  const services = await startServices({ root, dataFolder, given, temporary: true });
  const close = async () => {
    await services.stop();
    rmSync(dataFolder, { recursive: true, force: true });
  };
  const env = {
    ...services.env,
    NEXTAUTH_URL: "http://127.0.0.1:3000",
    NEXTAUTH_SECRET: "a secret of the tests, long enough to pass",
    FERRULE_TEST_MAIL_URL: services.mailUrl ?? "",
    FERRULE_TEST_TEMPLATE: services.env["DATABASE_URL"] ?? "",
  };
  const migrated = spawnSync(process.execPath, typescript("scripts/migrate.ts", "up"), {
    cwd: root, encoding: "utf8", env: { ...given, ...env, NODE_ENV: "test", TZ: "UTC" },
  });
  if (migrated.status !== 0) {
    await close();
    throw new Error(`The migrations failed:\n${migrated.stdout}${migrated.stderr}`);
  }
  Object.assign(process.env, env);
  return close;
}
