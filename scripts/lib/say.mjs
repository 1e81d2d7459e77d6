/**
 * What a person sees while a script runs: one line a step, and the time it took.
 * Plain Node only: this runs before anything is installed.
 */

const started = Date.now();

/** @param {number} ms @returns {string} for example "0.8 s" or "2 min 05 s" */
export function duration(ms) {
  if (ms < 60_000) return `${(ms / 1000).toFixed(1)} s`;
  const seconds = Math.round(ms / 1000);
  return `${Math.floor(seconds / 60)} min ${String(seconds % 60).padStart(2, "0")} s`;
}

/** @param {string} line */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/**
 * Runs a step and says how long it took.
 * @template T
 * @param {string} name @param {() => Promise<T>} run @returns {Promise<T>}
 */
export async function step(name, run) {
  const begin = Date.now();
  say(`  ${name} ...`);
  const result = await run();
  say(`  ${name}: ${duration(Date.now() - begin)}`);
  return result;
}

/** Time since the script began. @returns {string} */
export const elapsed = () => duration(Date.now() - started);

/** An end that a person can act on: printed without a stack. */
export class Stop extends Error {
  /** @param {string} message @param {number} code exit code; 2 means "something has to be installed or set first" */
  constructor(message, code = 1) {
    super(message);
    this.code = code;
  }
}
