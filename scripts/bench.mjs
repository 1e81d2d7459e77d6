/**
 * npm run bench: how long the core's work takes, from tests/bench/*.bench.ts. What follows `--`
 * goes to the runner.
 */
import path from "node:path";
import { ensurePackages } from "./lib/packages.mjs";
import { run } from "./lib/processes.mjs";
import { Stop } from "./lib/say.mjs";

const root = path.resolve(path.dirname(new URL(import.meta.url).pathname), "..");
try {
  await ensurePackages(root);
  const args = [path.join(root, "node_modules/vitest/vitest.mjs"), "bench", "--run", "--project", "unit", ...process.argv.slice(2)];
  const { code } = await run(process.execPath, args, { cwd: root, inherit: true });
  process.exitCode = code;
} catch (error) {
  console.error(error instanceof Stop ? error.message : error);
  process.exitCode = 1;
}
