/**
 * npm start (or npm run dev): everything from a fresh checkout to a running product. Plain Node
 * only, since it runs before anything is installed.
 */
import fs from "node:fs";
import path from "node:path";
import { COMMON_ENV, buildIfNeeded, migrate, seedDemo, startApplication } from "./lib/application.mjs";
import { keptSecret, readDotEnv } from "./lib/environment.mjs";
import { ensurePackages } from "./lib/packages.mjs";
import { identify, isAlive, stop, stopRunning, watchParent } from "./lib/processes.mjs";
import { Stop, elapsed, say, step } from "./lib/say.mjs";
import { startServices } from "./lib/services.mjs";

const root = path.resolve(import.meta.dirname ?? path.dirname(new URL(import.meta.url).pathname), "..");
const dev = process.argv.includes("--dev");
const dataFolder = path.resolve(root, process.env.FERRULE_DATA || ".data");
const runFile = path.join(dataFolder, "run.json");

/** @type {(() => Promise<void>)[]} */
const undo = [];
/** @type {Promise<void> | null} */
let ending = null;

/** Stops everything in the reverse order of its start, once. @param {number} code */
function end(code) {
  ending ??= (async () => {
    await stopRunning();
    for (const each of undo.splice(0).reverse()) await each();
    process.exit(code);
  })();
  return ending;
}

for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) {
  process.on(signal, () => {
    if (!ending) say("\nStopping ...");
    void end(0);
  });
}

watchParent(() => void end(0));

/** Ends what a killed run left behind; says so when one is still running. @returns {Promise<boolean>} true when one is */
async function alreadyRunning() {
  let last;
  try {
    last = JSON.parse(fs.readFileSync(runFile, "utf8"));
  } catch {
    return false;
  }
  if (isAlive(last.main)) {
    say(last.url ? `Ferrule is already running at ${last.url} (process ${last.main.pid}).` : `Ferrule is already being started (process ${last.main.pid}).`);
    return true;
  }
  for (const each of last.processes ?? []) {
    if (isAlive(each.identity)) {
      say(`  Stopping the ${each.name} left by a run that was killed.`);
      await stop(each.identity);
    }
  }
  fs.rmSync(runFile, { force: true });
  return false;
}

/** @param {{ name: string, identity: import("./lib/processes.mjs").Identity }[]} processes @param {object} [more] */
function noteRun(processes, more = {}) {
  const list = processes.map(({ name, identity }) => ({ name, identity }));
  fs.writeFileSync(`${runFile}.draft`, JSON.stringify({ main: identify(process.pid), processes: list, ...more }));
  fs.renameSync(`${runFile}.draft`, runFile);
}

async function printAccounts() {
  const file = path.join(root, "seeders/demoAccounts.ts");
  if (!fs.existsSync(file)) return;
  const { tsImport } = await import("tsx/esm/api");
  const { demoAccounts } = await tsImport(file, import.meta.url);
  const width = Math.max(...demoAccounts.map((/** @type {{ email: string }} */ each) => each.email.length));
  say("  Demo accounts (email, password, role)");
  for (const { email, password, role } of demoAccounts) say(`    ${email.padEnd(width)}  ${password}  ${role}`);
  say("");
}

async function main() {
  const [major = 0, minor = 0] = process.versions.node.split(".").map(Number);
  if (major < 20 || (major === 20 && minor < 12)) throw new Stop(`Node.js 20.12 or newer is needed; this is ${process.versions.node}.`, 2);
  fs.mkdirSync(dataFolder, { recursive: true, mode: 0o755 });
  if (await alreadyRunning()) return false;
  noteRun([]);
  undo.push(async () => fs.rmSync(runFile, { force: true }));
  say(dev ? "Starting Ferrule with hot reload" : "Starting Ferrule");
  await ensurePackages(root);

  const { NODE_ENV: _ignored, ...inherited } = process.env;
  /** @type {NodeJS.ProcessEnv} */
  const given = { ...readDotEnv(root), ...inherited, ...COMMON_ENV };
  for (const [name, value] of Object.entries(given)) if (value === "") delete given[name];
  const services = await step("Starting database, object store and mail", () =>
    startServices({
      root, dataFolder, given,
      onExit: (name) => {
        say(`  The ${name} ended by itself; see ${path.join(dataFolder, "logs")}. Stopping.`);
        void end(1);
      },
    }));
  undo.push(services.stop);
  noteRun(services.processes);
  const wantedPort = Number(given.PORT ?? 3000);
  const env = { ...given, ...services.env, NEXTAUTH_SECRET: given.NEXTAUTH_SECRET ?? keptSecret(dataFolder, "session") };
  const scriptEnv = { ...env, NEXTAUTH_URL: env.NEXTAUTH_URL ?? `http://127.0.0.1:${wantedPort}`, NODE_ENV: dev ? "development" : "production" };
  await migrate(root, scriptEnv);
  // The demo's passwords are printed on the screen, so a database from outside gets it only when asked for.
  const wantsDemo = given.SEED_DEMO ? given.SEED_DEMO === "yes" : services.cluster !== null;
  if (wantsDemo) await seedDemo(root, scriptEnv);
  if (!dev) {
    await buildIfNeeded({
      root, env, distDir: ".next", noteFile: path.join(dataFolder, "build.json"), logFile: path.join(dataFolder, "logs/build.log"),
    });
  }
  /** @type {Awaited<ReturnType<typeof startApplication>> | undefined} */
  let application;
  const note = () => noteRun([...services.processes, ...(application?.processes ?? [])], { url: application?.url, mailUrl: services.mailUrl });
  application = await step("Starting the PDF worker and the web server", () =>
    startApplication({
      root, env, dataFolder, distDir: ".next", dev, host: given.FERRULE_HOST ?? "127.0.0.1", wantedPort,
      onChange: note, onGiveUp: (name) => {
        say(`  The ${name} keeps ending; see ${path.join(dataFolder, "logs")}. Stopping.`);
        void end(1);
      },
    }));
  undo.push(application.stop);
  note();

  say(`\nFerrule is running at ${given.NEXTAUTH_URL ?? application.url} (ready after ${elapsed()})\n`);
  if (wantsDemo) await printAccounts();
  if (services.mailUrl) say(`  Caught mail     ${services.mailUrl}`);
  say(`  Data and logs   ${path.relative(process.cwd(), dataFolder) || "."}`);
  say("  Stop            Ctrl-C");
  return true;
}

try {
  if (!(await main())) process.exit(0);
} catch (error) {
  // A signal in the middle of a step makes that step fail; the signal's own ending is under way.
  if (!ending) {
    if (error instanceof Stop) process.stderr.write(`\n${error.message}\n`);
    else console.error(error);
  }
  await end(error instanceof Stop ? error.code : 1);
}
