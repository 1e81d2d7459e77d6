/**
 * npm test: every check, from a fresh checkout to `N passed, N failed`. Plain Node only, since it
 * runs before anything is installed. Everything it starts is stopped at the end, on failure and on
 * a signal too.
 *
 *   npm test                                    all steps
 *   npm test -- --only unit,api                 some steps
 *   npm test -- --only e2e tests/e2e/a.spec.ts  what follows goes to the step's test runner
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
const LIMIT_MS = 30 * 60_000;
const bin = (/** @type {string} */ file) => path.join(root, "node_modules", file);

const argv = process.argv.slice(2);
const onlyAt = argv.indexOf("--only");
const only = onlyAt >= 0 ? (argv[onlyAt + 1] ?? "").split(",") : null;
const passOn = onlyAt >= 0 ? argv.filter((_, index) => index !== onlyAt && index !== onlyAt + 1) : argv;

/** @typedef {{ passed: number, failed: number, skipped?: number }} Count */
/** @type {{ name: string, count: Count, ms: number }[]} */
const results = [];
/** @type {(() => Promise<void> | void)[]} */
const undo = [];
const started = Date.now();
const left = () => Math.max(1000, LIMIT_MS - (Date.now() - started));

const env = testEnvironment();
const temporary = fs.mkdtempSync(path.join(os.tmpdir(), "ferrule-test-"));
// The database's account has to get through.
fs.chmodSync(temporary, 0o755);
undo.push(() => fs.rmSync(temporary, { recursive: true, force: true }));

/**
 * A check that is passed or failed as a whole.
 * @param {string} command @param {string[][]} calls arguments of Node, one list a call @returns {Promise<Count>}
 */
async function whole(...calls) {
  for (const args of calls) {
    const { code, output, timedOut } = await run(process.execPath, args, { cwd: root, env, timeoutMs: left() });
    if (code !== 0) {
      say(output.slice(-12_000));
      if (timedOut) say("  The time was up.");
      return { passed: 0, failed: 1 };
    }
  }
  return { passed: 1, failed: 0 };
}

/** @param {string} file @returns {Record<string, any> | null} */
function readReport(file) {
  try {
    return JSON.parse(fs.readFileSync(file, "utf8"));
  } catch {
    return null;
  }
}

/** @param {string} project @returns {Promise<Count>} */
async function vitest(project) {
  const file = path.join(temporary, `${project}.json`);
  const args = [bin("vitest/vitest.mjs"), "run", "--project", project, "--reporter=dot", "--reporter=json", `--outputFile.json=${file}`, ...passOn];
  const { code, output } = await run(process.execPath, args, { cwd: root, env, timeoutMs: left() });
  const report = readReport(file);
  const failed = report?.numFailedTests ?? 0;
  if (code !== 0 || !report) say(output.slice(-20_000));
  // A file that cannot be loaded, an error outside a test or no test at all fails the run without a failed test.
  return { passed: report?.numPassedTests ?? 0, failed: code !== 0 ? Math.max(failed, 1) : failed, skipped: report?.numPendingTests ?? 0 };
}

/** @returns {Promise<Count>} */
async function build() {
  await buildForTests(root, env, temporary);
  return { passed: 1, failed: 0 };
}

/** @returns {Promise<Count>} */
async function endToEnd() {
  await build();
  const stack = await startTestStack({ root, env, dataFolder: path.join(temporary, "e2e") });
  undo.push(stack.stop);
  const file = path.join(temporary, "e2e.json");
  const { code } = await run(process.execPath, [bin("@playwright/test/cli.js"), "test", "--reporter=line,json", ...passOn], {
    cwd: root, inherit: true, timeoutMs: left(), env: { ...stack.env, PLAYWRIGHT_JSON_OUTPUT_FILE: file },
  });
  const stats = readReport(file)?.stats;
  const failed = (stats?.unexpected ?? 0) + (stats?.flaky ?? 0);
  if (code !== 0) {
    for (const log of ["server.log", "worker.log"]) {
      const text = fs.readFileSync(path.join(stack.logs, log), "utf8");
      if (text.trim()) say(`--- end of ${log}\n${text.slice(-3000)}`);
    }
  }
  return { passed: stats?.expected ?? 0, failed: code !== 0 ? Math.max(failed, 1) : failed, skipped: stats?.skipped ?? 0 };
}

const rooms = ["app", "components", "lib", "models", "migrations", "seeders", "scripts"];
/** In the order in which a fault is found soonest. @type {[string, () => Promise<Count>][]} */
const steps = [
  ["types", () => whole([bin("next/dist/bin/next"), "typegen"], [bin("typescript/bin/tsc"), "--noEmit", "-p", "."])],
  ["lint", () => whole([bin("eslint/bin/eslint.js"), ".", "--max-warnings=0"])],
  ["boundaries", () => whole([bin("dependency-cruiser/bin/dependency-cruise.mjs"), "--config", ".dependency-cruiser.mjs", "--output-type", "err-long",
    ...rooms.filter((each) => fs.existsSync(path.join(root, each)))])],
  ["parity", () => whole(["--import", "tsx", "scripts/parity.ts"])],
  ["unit", () => vitest("unit")],
  ["api", () => vitest("api")],
  ["build", build],
  ["e2e", endToEnd],
];

/** @type {Promise<never> | null} */
let ending = null;

/** @param {number} [extraFailures] @param {string} [why] */
function end(extraFailures = 0, why = "") {
  ending ??= (async () => {
    await stopRunning();
    for (const each of undo.splice(0).reverse()) {
      await Promise.resolve(each()).catch((/** @type {Error} */ error) => say(`  While stopping: ${error.message}`));
    }
    if (why) say(why);
    say(`\nTime: ${elapsed()}`);
    for (const { name, count, ms } of results) {
      const skipped = count.skipped ? `, ${count.skipped} skipped` : "";
      say(`  ${name.padEnd(11)} ${String(count.passed).padStart(6)} passed, ${count.failed} failed${skipped}  (${duration(ms)})`);
    }
    const passed = results.reduce((sum, each) => sum + each.count.passed, 0);
    const failed = results.reduce((sum, each) => sum + each.count.failed, 0) + extraFailures;
    process.stdout.write(`${passed} passed, ${failed} failed\n`, () => process.exit(failed > 0 || passed === 0 ? 1 : 0));
    return new Promise(() => {});
  })();
  return ending;
}

for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) {
  process.on(signal, () => void end(1, `\nStopped by ${signal}.`));
}
watchParent(() => void end(1, "\nnpm is gone."));

try {
  const unknown = (only ?? []).filter((name) => !steps.some(([step]) => step === name));
  if (unknown.length > 0) throw new Stop(`No step is named ${unknown.join(", ")}. There are: ${steps.map(([name]) => name).join(", ")}.`);
  await ensurePackages(root);
  const wanted = steps.filter(([name]) => !only || only.includes(name));
  if (wanted.some(([name]) => name === "api" || name === "e2e")) await ensurePostgres(null);
  if (wanted.some(([name]) => name !== "types" && name !== "lint" && name !== "boundaries" && name !== "parity" && name !== "build")) await ensureTestTools();
  for (const [name, check] of wanted) {
    say(`\n== ${name}`);
    const begin = Date.now();
    let count;
    try {
      count = await check();
    } catch (error) {
      // A step stopped by a signal fails because of it; what was found so far is told.
      if (ending) break;
      say(error instanceof Stop ? error.message : String(/** @type {Error} */ (error).stack));
      count = { passed: 0, failed: 1 };
    }
    if (ending) break;
    results.push({ name, count, ms: Date.now() - begin });
    say(`== ${name}: ${count.passed} passed, ${count.failed} failed (${duration(Date.now() - begin)})`);
  }
  await end();
} catch (error) {
  await end(1, error instanceof Stop ? error.message : String(/** @type {Error} */ (error).stack));
}
