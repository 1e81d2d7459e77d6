/**
 * The whole product for a test run: built, on a database made by the migrations and seeded with the
 * demo, everything temporary. Shared by `npm test` and `npm run test:long`.
 */
import fs from "node:fs";
import path from "node:path";
import { COMMON_ENV, buildIfNeeded, migrate, seedDemo, startApplication } from "./application.mjs";
import { freePort } from "./ports.mjs";
import { say } from "./say.mjs";
import { startServices } from "./services.mjs";

/** Test builds have a folder of their own: a build that is being served is not overwritten. */
const DIST_DIR = ".next-test";

/** Settings for tests: those of the person's own services must not reach them. @returns {NodeJS.ProcessEnv} */
export function testEnvironment() {
  const env = { ...process.env, ...COMMON_ENV, CI: "1", FORCE_COLOR: "0" };
  for (const name of ["NODE_ENV", "NO_COLOR", "DATABASE_URL", "S3_BUCKET", "S3_ENDPOINT", "S3_REGION", "S3_ACCESS_KEY_ID",
    "S3_SECRET_ACCESS_KEY", "SMTP_URL", "MAIL_FROM", "NEXTAUTH_URL", "NEXTAUTH_SECRET"]) {
    delete env[name];
  }
  return env;
}

/** @param {string} root @param {NodeJS.ProcessEnv} env @param {string} logFolder */
export async function buildForTests(root, env, logFolder) {
  fs.mkdirSync(path.join(root, ".data"), { recursive: true, mode: 0o755 });
  await buildIfNeeded({
    root, env, distDir: DIST_DIR, noteFile: path.join(root, ".data/test-build.json"), logFile: path.join(logFolder, "build.log"),
  });
}

/**
 * @param {{ root: string, env: NodeJS.ProcessEnv, dataFolder: string }} options
 * @returns {Promise<{ env: NodeJS.ProcessEnv, logs: string, stop: () => Promise<void> }>} `env` tells tests where everything is:
 *   FERRULE_BASE_URL, FERRULE_MAIL_URL, FERRULE_LOGS, and FERRULE_STATE_FILE with the processes' numbers
 */
export async function startTestStack({ root, env, dataFolder }) {
  /** @type {(() => Promise<void>)[]} */
  const undo = [];
  const stop = async () => {
    for (const each of undo.splice(0).reverse()) await each();
  };
  try {
    const services = await startServices({
      root, dataFolder, given: env, temporary: true, onExit: (name) => say(`  The ${name} ended by itself.`),
    });
    undo.push(services.stop);
    const settings = { ...env, ...services.env, NEXTAUTH_SECRET: "a secret of the browser tests alone" };
    const wantedPort = await freePort();
    const scriptEnv = { ...settings, NEXTAUTH_URL: `http://127.0.0.1:${wantedPort}`, NODE_ENV: "production" };
    await migrate(root, scriptEnv);
    await seedDemo(root, scriptEnv);
    const stateFile = path.join(dataFolder, "state.json");
    /** @type {Awaited<ReturnType<typeof startApplication>> | undefined} */
    let application;
    // Tests that kill the server find its process here, also after its restart.
    const note = () => {
      const processes = Object.fromEntries((application?.processes ?? []).map((each) => [each.name, each.identity.pid]));
      fs.writeFileSync(`${stateFile}.draft`, JSON.stringify({ url: application?.url, mailUrl: services.mailUrl, processes }));
      fs.renameSync(`${stateFile}.draft`, stateFile);
    };
    application = await startApplication({
      root, env: settings, dataFolder, distDir: DIST_DIR, wantedPort, onChange: note, onGiveUp: (name) => say(`  The ${name} keeps ending.`),
    });
    undo.push(application.stop);
    note();
    const logs = path.join(dataFolder, "logs");
    return {
      logs, stop,
      env: {
        ...settings, NEXTAUTH_URL: application.url, FERRULE_BASE_URL: application.url, FERRULE_MAIL_URL: services.mailUrl ?? "",
        FERRULE_STATE_FILE: stateFile, FERRULE_LOGS: logs,
      },
    };
  } catch (error) {
    await stop();
    throw error;
  }
}
