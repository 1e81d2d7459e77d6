/**
 * The application on top of its services: migrate, seed, build, PDF worker, web server.
 */
import fs from "node:fs";
import path from "node:path";
import { isBuilt, sourceDigest } from "./digest.mjs";
import { firstFree } from "./ports.mjs";
import { run, startService, stop, waitForHttp } from "./processes.mjs";
import { Stop, say, step } from "./say.mjs";
import { typescript } from "./services.mjs";

const NEXT = "node_modules/next/dist/bin/next";

/** Setting of every process: instants are written in UTC, and nothing calls home. */
export const COMMON_ENV = { TZ: "UTC", NEXT_TELEMETRY_DISABLED: "1", AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true" };

/** @param {string} root @param {NodeJS.ProcessEnv} env @param {string[]} args */
async function migrateScript(root, env, ...args) {
  const { code, output } = await run(process.execPath, typescript("scripts/migrate.ts", ...args), { cwd: root, env });
  if (code !== 0) throw new Stop(`scripts/migrate.ts ${args.join(" ")} failed:\n${output.slice(-6000)}`);
  for (const line of output.split("\n").filter((each) => /^(migrated|seeded) /.test(each))) say(`    ${line}`);
}

/** @param {string} root @param {NodeJS.ProcessEnv} env */
export const migrate = (root, env) => step("Bringing the database up to date", () => migrateScript(root, env, "up"));

/** @param {string} root @param {NodeJS.ProcessEnv} env */
export const seedDemo = (root, env) => step("Putting in the demo, unless it was put in before", () => migrateScript(root, env, "seed", "--once"));

/**
 * Builds when the sources are not those of the last build.
 * @param {{ root: string, env: NodeJS.ProcessEnv, distDir: string, noteFile: string, logFile: string }} options
 */
export async function buildIfNeeded({ root, env, distDir, noteFile, logFile }) {
  const distFolder = path.join(root, distDir);
  if (isBuilt(root, distFolder, noteFile)) return;
  await step("Building the application (a minute or so)", async () => {
    const digest = sourceDigest(root);
    fs.writeFileSync(logFile, "");
    const { code, output } = await run(process.execPath, [NEXT, "build"], {
      cwd: root, logFile, env: { ...env, NODE_ENV: "production", FERRULE_DIST_DIR: distDir },
    });
    if (code !== 0) throw new Stop(`The build failed (whole output in ${logFile}):\n${output.slice(-4000)}`);
    const buildId = fs.readFileSync(path.join(distFolder, "BUILD_ID"), "utf8").trim();
    fs.writeFileSync(noteFile, JSON.stringify({ digest, buildId }));
  });
}

/** Restarts in this time before giving up. */
const RESTART_LIMIT = 5;
const RESTART_WINDOW_MS = 60_000;

/**
 * A process that is started again when it ends by itself.
 * @param {{ name: string, args: string[], root: string, env: NodeJS.ProcessEnv, logFile?: string,
 *   onChange: () => void, onGiveUp: (name: string) => void }} options
 */
function supervise({ name, args, root, env, logFile, onChange, onGiveUp }) {
  /** @type {number[]} */
  const ends = [];
  let stopping = false;
  let gaveUp = false;
  /** @type {ReturnType<typeof startService>} */
  let current;
  const launch = () => {
    current = startService({
      name, command: process.execPath, args, cwd: root, env, logFile,
      onExit: (code, signal) => {
        if (stopping) return;
        const now = Date.now();
        ends.push(now);
        say(`  The ${name} ended by itself (${signal ?? `code ${code}`}).`);
        if (ends.filter((each) => now - each < RESTART_WINDOW_MS).length > RESTART_LIMIT) {
          gaveUp = true;
          onGiveUp(name);
          return;
        }
        launch();
        onChange();
        say(`  The ${name} was started again.`);
      },
    });
  };
  launch();
  return {
    name,
    get identity() {
      return current.identity;
    },
    get gaveUp() {
      return gaveUp;
    },
    stop: async () => {
      stopping = true;
      await stop(current.identity);
    },
  };
}

/**
 * Starts PDF worker and web server.
 * @param {{ root: string, env: NodeJS.ProcessEnv, dataFolder: string, distDir: string, dev?: boolean, host?: string, wantedPort: number,
 *   onChange?: () => void, onGiveUp: (name: string) => void }} options
 */
export async function startApplication({ root, env, dataFolder, distDir, dev = false, host = "127.0.0.1", wantedPort, onChange = () => {}, onGiveUp }) {
  const logs = path.join(dataFolder, "logs");
  const port = await firstFree(wantedPort, host);
  if (port !== wantedPort) say(`  Port ${wantedPort} is busy; port ${port} is used.`);
  const shown = host === "0.0.0.0" || host === "::" ? "127.0.0.1" : host;
  const url = `http://${shown}:${port}`;
  // Sign-in works only on the origin named here, so a setting from outside is a deliberate one.
  const settings = {
    ...env, FERRULE_DIST_DIR: distDir, NEXTAUTH_URL: env.NEXTAUTH_URL ?? url, NODE_ENV: dev ? "development" : "production",
  };
  const worker = supervise({
    name: "PDF worker", args: typescript("scripts/pdfWorker.ts"), root, env: settings, logFile: path.join(logs, "worker.log"), onChange, onGiveUp,
  });
  const server = supervise({
    name: "web server", args: [NEXT, dev ? "dev" : "start", "-p", String(port), "-H", host], root, env: settings,
    logFile: dev ? undefined : path.join(logs, "server.log"), onChange, onGiveUp,
  });
  const stopAll = async () => {
    await server.stop();
    await worker.stop();
  };
  if (!(await waitForHttp(`${url}/icon.svg`, 120_000, () => server.gaveUp))) {
    await stopAll();
    throw new Stop(`The web server does not answer; see ${path.join(logs, "server.log")}.`);
  }
  return { url, port, processes: [worker, server], stop: stopAll };
}
