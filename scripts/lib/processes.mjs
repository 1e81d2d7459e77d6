/**
 * Starting, watching and stopping the processes of one run.
 * Each service is a process group of its own, so that Ctrl-C reaches this script alone and the
 * services are stopped in order; and a process is known by its number and its start time, because
 * numbers are used again.
 */
import { spawn, spawnSync } from "node:child_process";
import fs from "node:fs";

/** @typedef {{ pid: number, startedAt: string }} Identity */

/** @param {number} ms */
export const sleep = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/**
 * Start time of a process as its system tells it, or null when there is none.
 * @param {number} pid @returns {string | null}
 */
export function startTime(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, "utf8");
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    if (fields[0] === "Z") return null;
    return fields[19] ?? null;
  } catch {
    if (fs.existsSync("/proc/self/stat")) return null;
    // Systems without /proc.
    const answer = spawnSync("ps", ["-o", "lstart=", "-p", String(pid)], { encoding: "utf8" });
    return answer.status === 0 && answer.stdout.trim() ? answer.stdout.trim() : null;
  }
}

/** @param {number} pid @returns {Identity | null} */
export function identify(pid) {
  const startedAt = startTime(pid);
  return startedAt === null ? null : { pid, startedAt };
}

/** @param {Identity | null | undefined} identity @returns {boolean} */
export function isAlive(identity) {
  return Boolean(identity) && startTime(identity.pid) === identity.startedAt;
}

/** @param {number} pid @param {NodeJS.Signals} signal */
function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    try {
      process.kill(pid, signal);
    } catch {
      // Already gone.
    }
  }
}

/**
 * Stops a process and its group: asks, waits, then forces.
 * @param {Identity | null | undefined} identity @param {number} [patienceMs]
 */
export async function stop(identity, patienceMs = 8000) {
  if (!identity || !isAlive(identity)) return;
  signalGroup(identity.pid, "SIGTERM");
  const until = Date.now() + patienceMs;
  while (Date.now() < until) {
    if (!isAlive(identity)) return;
    await sleep(50);
  }
  signalGroup(identity.pid, "SIGKILL");
  for (let i = 0; i < 40 && isAlive(identity); i += 1) await sleep(50);
}

/**
 * A long-running process whose output goes to a file (or to this terminal).
 * @param {{ name: string, command: string, args: string[], env: NodeJS.ProcessEnv, cwd: string, logFile?: string,
 *   onExit?: (code: number | null, signal: string | null) => void }} options
 * @returns {{ name: string, identity: Identity, child: import("node:child_process").ChildProcess }}
 */
export function startService({ name, command, args, env, cwd, logFile, onExit }) {
  const out = logFile ? fs.openSync(logFile, "a") : "inherit";
  const child = spawn(command, args, { cwd, env, detached: true, stdio: ["ignore", out, out] });
  if (typeof out === "number") fs.closeSync(out);
  child.on("error", (error) => process.stderr.write(`${name}: ${error.message}\n`));
  child.on("exit", (code, signal) => onExit?.(code, signal));
  if (!child.pid) throw new Error(`${name} did not start.`);
  return { name, identity: identify(child.pid) ?? { pid: child.pid, startedAt: "gone" }, child };
}

/** Commands running now, so that a signal can end them too. @type {Set<import("node:child_process").ChildProcess>} */
const running = new Set();

/**
 * Runs a command to its end.
 * @param {string} command @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, logFile?: string, inherit?: boolean, timeoutMs?: number }} [options]
 * @returns {Promise<{ code: number, output: string, timedOut: boolean }>} output holds both streams unless inherited
 */
export function run(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd: options.cwd,
      env: options.env ?? process.env,
      detached: true,
      stdio: options.inherit ? ["ignore", "inherit", "inherit"] : ["ignore", "pipe", "pipe"],
    });
    running.add(child);
    let output = "";
    let timedOut = false;
    const log = options.logFile ? fs.createWriteStream(options.logFile, { flags: "a" }) : null;
    /** @param {Buffer} chunk */
    const collect = (chunk) => {
      output += chunk.toString();
      if (output.length > 4_000_000) output = output.slice(-2_000_000);
      log?.write(chunk);
    };
    child.stdout?.on("data", collect);
    child.stderr?.on("data", collect);
    const timer = options.timeoutMs
      ? setTimeout(() => {
          timedOut = true;
          if (child.pid) signalGroup(child.pid, "SIGKILL");
        }, options.timeoutMs)
      : null;
    child.once("error", (error) => {
      running.delete(child);
      if (timer) clearTimeout(timer);
      log?.end();
      reject(error);
    });
    child.once("close", (code) => {
      running.delete(child);
      if (timer) clearTimeout(timer);
      log?.end();
      resolve({ code: code ?? 1, output, timedOut });
    });
  });
}

/** Ends every command started by `run` that has not ended. */
export async function stopRunning() {
  await Promise.all(
    [...running].map(async (child) => {
      if (child.pid) await stop(identify(child.pid), 3000);
    }),
  );
}

/**
 * Waits until a web server answers anything at all.
 * @param {string} url @param {number} timeoutMs @param {() => boolean} [gaveUp] true when waiting is of no use any more
 */
export async function waitForHttp(url, timeoutMs, gaveUp = () => false) {
  const until = Date.now() + timeoutMs;
  while (Date.now() < until) {
    if (gaveUp()) return false;
    try {
      await fetch(url, { redirect: "manual", signal: AbortSignal.timeout(20_000) });
      return true;
    } catch {
      await sleep(150);
    }
  }
  return false;
}

/**
 * Calls back when npm, which started this script, is gone: a signal that ends npm alone is not
 * passed on to its script.
 * @param {() => void} whenGone
 */
export function watchParent(whenGone) {
  if (!process.env.npm_lifecycle_event) return;
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) whenGone();
  }, 500).unref();
}
