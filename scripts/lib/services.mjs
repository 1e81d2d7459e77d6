/**
 * The services below the application: database, object store, mail. Each is local unless its
 * settings name a real one.
 */
import crypto from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { startCluster } from "./cluster.mjs";
import { keptSecret } from "./environment.mjs";
import { sleep, startService, stop } from "./processes.mjs";
import { Stop } from "./say.mjs";

/**
 * Arguments with which Node runs a TypeScript file of the server side. The condition makes the
 * `server-only` marker harmless, as it is in the server bundle.
 * @param {string} file @param {...string} args
 */
export const typescript = (file, ...args) => ["--conditions=react-server", "--import", "tsx", file, ...args];

/**
 * @typedef {object} Services
 * @property {Record<string, string>} env settings that lead to the services
 * @property {import("./cluster.mjs").Cluster | null} cluster null when the database is not local
 * @property {string | null} mailUrl page with the caught mail
 * @property {{ name: string, identity: import("./processes.mjs").Identity }[]} processes
 * @property {() => Promise<void>} stop
 */

/**
 * @param {{ root: string, dataFolder: string, given: NodeJS.ProcessEnv, temporary?: boolean,
 *   onExit?: (name: string) => void }} options `given` are settings from outside; `temporary` is for tests
 * @returns {Promise<Services>}
 */
export async function startServices({ root, dataFolder, given, temporary = false, onExit }) {
  fs.mkdirSync(path.join(dataFolder, "logs"), { recursive: true, mode: 0o755 });
  /** @type {Record<string, string>} */
  const env = {};
  /** @type {(() => Promise<void>)[]} */
  const undo = [];
  /** @type {Services["processes"]} */
  const processes = [];
  const stopAll = async () => {
    for (const each of undo.splice(0).reverse()) await each();
  };

  try {
    let cluster = null;
    if (!given.DATABASE_URL) {
      const password = temporary ? crypto.randomBytes(18).toString("base64url") : keptSecret(dataFolder, "database");
      const started = await startCluster({ folder: path.join(dataFolder, "postgres"), password, temporary });
      cluster = started;
      undo.push(() => started.stop());
      env.DATABASE_URL = await started.ensureDatabase("ferrule");
    }

    const localStore = !given.S3_BUCKET;
    const localMail = !given.SMTP_URL;
    if (localStore) {
      Object.assign(env, {
        S3_REGION: "us-east-1",
        S3_BUCKET: "ferrule",
        S3_ACCESS_KEY_ID: "local",
        S3_SECRET_ACCESS_KEY: keptSecret(dataFolder, "object-store"),
        S3_FORCE_PATH_STYLE: "yes",
      });
    }
    let mailUrl = null;
    if (localStore || localMail) {
      const file = path.join(dataFolder, "services.json");
      fs.rmSync(file, { force: true });
      let ended = false;
      let stopping = false;
      const logFile = path.join(dataFolder, "logs/services.log");
      const service = startService({
        name: "local services",
        command: process.execPath,
        args: typescript("scripts/fakes/serve.ts"),
        cwd: root,
        logFile,
        env: {
          ...given, ...env, TZ: "UTC",
          FERRULE_DATA: dataFolder,
          FERRULE_SERVICES_FILE: file,
          FERRULE_LOCAL_STORE: localStore ? "yes" : "no",
          FERRULE_LOCAL_MAIL: localMail ? "yes" : "no",
        },
        onExit: () => {
          ended = true;
          if (!stopping) onExit?.("local services");
        },
      });
      undo.push(() => {
        stopping = true;
        return stop(service.identity);
      });
      processes.push(service);
      const until = Date.now() + 60_000;
      while (!fs.existsSync(file)) {
        if (ended || Date.now() > until) throw new Stop(`The local object store and mail did not start; see ${logFile}.`);
        await sleep(50);
      }
      const addresses = JSON.parse(fs.readFileSync(file, "utf8"));
      if (localStore) env.S3_ENDPOINT = addresses.store;
      if (localMail) env.SMTP_URL = addresses.smtp;
      mailUrl = addresses.mailWeb ?? null;
    }
    return { env, cluster, mailUrl, processes, stop: stopAll };
  } catch (error) {
    await stopAll();
    throw error;
  }
}
