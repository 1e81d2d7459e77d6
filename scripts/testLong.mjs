/**
 * npm run test:long: the runs too long for every change (soak, load, large mutation, kill), each a
 * file tests/long/*.test.ts, on a built product of their own. Prints what ran and its figures.
 *
 *   npm run test:long                  all of them
 *   npm run test:long -- kill          those whose path contains "kill"
 */
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { ensurePostgres } from "./lib/cluster.mjs";
import { ensurePackages, ensureTestTools } from "./lib/packages.mjs";
import { run, stopRunning, watchParent } from "./lib/processes.mjs";
import { Stop, duration, elapsed, say } from "./lib/say.mjs";
import { buildForTests, startTestStack, testEnvironment } from "./lib/testStack.mjs";

const root = path.resolve(path.dirname(new URL(import.meta.url).pathname), "..");
const filters = process.argv.slice(2);
const temporary = fs.mkdtempSync(path.join(os.tmpdir(), "ferrule-long-"));
fs.chmodSync(temporary, 0o755);
/** @type {(() => Promise<void> | void)[]} */
const undo = [() => fs.rmSync(temporary, { recursive: true, force: true })];
/** @type {Promise<void> | null} */
let ending = null;

/** @param {number} code @param {string} lastLine */
function end(code, lastLine) {
  ending ??= (async () => {
    await stopRunning();
    for (const each of undo.splice(0).reverse()) await each();
    process.stdout.write(`${lastLine}\n`, () => process.exit(code));
  })();
  return ending;
}
for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) process.on(signal, () => void end(1, "0 passed, 1 failed"));
watchParent(() => void end(1, "0 passed, 1 failed"));

try {
  const folder = path.join(root, "tests/long");
  const files = fs.existsSync(folder)
    ? fs.readdirSync(folder, { recursive: true, encoding: "utf8" })
        .filter((name) => name.endsWith(".test.ts") && (filters.length === 0 || filters.some((filter) => name.includes(filter))))
        .sort()
    : [];
  if (files.length === 0) throw new Stop("There is no such file in tests/long.");
  await ensurePackages(root);
  await ensurePostgres(null);
  await ensureTestTools();
  const env = testEnvironment();
  await buildForTests(root, env, temporary);
  const stack = await startTestStack({ root, env, dataFolder: path.join(temporary, "product") });
  undo.push(stack.stop);
  const report = path.join(temporary, "report.json");
  const { code } = await run(
    process.execPath,
    [path.join(root, "node_modules/vitest/vitest.mjs"), "run", "--project", "long", "--reporter=verbose", "--reporter=json", `--outputFile.json=${report}`,
      ...files.map((name) => `tests/long/${name}`)],
    { cwd: root, inherit: true, env: stack.env },
  );
  const outcome = fs.existsSync(report) ? JSON.parse(fs.readFileSync(report, "utf8")) : null;
  say(`\nRan in ${elapsed()}:`);
  for (const file of outcome?.testResults ?? []) {
    say(`  ${path.relative(root, file.name)}`);
    for (const test of file.assertionResults) say(`    ${test.status.padEnd(7)} ${test.fullName} (${duration(test.duration ?? 0)})`);
  }
  const failed = code === 0 ? 0 : Math.max(1, outcome?.numFailedTests ?? 0);
  await end(failed > 0 ? 1 : 0, `${outcome?.numPassedTests ?? 0} passed, ${failed} failed`);
} catch (error) {
  if (!ending) say(error instanceof Stop ? error.message : String(/** @type {Error} */ (error).stack));
  await end(1, "0 passed, 1 failed");
}
