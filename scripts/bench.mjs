/**
 * npm run bench: how long the work takes. tests/bench/*.bench.ts are small loops for the runner; *.measure.ts print
 * medians, shares and ratios of one run; *.served.ts do so through the route handlers, on services of their own.
 * `npm run bench -- rules` runs the files with that word in their name.
 */
import fs from "node:fs";
import path from "node:path";
import { ensurePostgres } from "./lib/cluster.mjs";
import { ensurePackages } from "./lib/packages.mjs";
import { run } from "./lib/processes.mjs";
import { Stop } from "./lib/say.mjs";

const root = path.resolve(path.dirname(new URL(import.meta.url).pathname), "..");
try {
  await ensurePackages(root);
  const words = process.argv.slice(2);
  const files = fs.readdirSync(path.join(root, "tests/bench")).filter((file) => words.length === 0 || words.some((word) => file.includes(word))).sort();
  if (files.length === 0) throw new Stop(`No bench has ${words.join(" or ")} in its name.`);
  const calls = files.filter((file) => file.endsWith(".measure.ts")).map((file) => ["--conditions=react-server", "--import", "tsx", path.join("tests/bench", file)]);
  if (files.some((file) => file.endsWith(".bench.ts"))) calls.unshift([path.join(root, "node_modules/vitest/vitest.mjs"), "bench", "--run", "--project", "unit", ...words]);
  if (files.some((file) => file.endsWith(".served.ts"))) {
    await ensurePostgres(null);
    calls.push([path.join(root, "node_modules/vitest/vitest.mjs"), "run", "--project", "served", ...words]);
  }
  process.exitCode = 0;
  for (const args of calls) {
    const { code } = await run(process.execPath, args, { cwd: root, inherit: true, env: { ...process.env, TZ: "UTC" } });
    if (code !== 0) process.exitCode = code;
  }
} catch (error) {
  console.error(error instanceof Stop ? error.message : error);
  process.exitCode = 1;
}
