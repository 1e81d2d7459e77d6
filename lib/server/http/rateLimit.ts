import "server-only";
import { tooMany } from "./problem";

interface Window { until: number; count: number }
const holder = globalThis as typeof globalThis & { ferruleRates?: Map<string, Window> };
const windows = (holder.ferruleRates ??= new Map());
const MOST_WINDOWS = 20_000;

function current(key: string, seconds: number, now: number): Window {
  let window = windows.get(key);
  if (!window || window.until <= now) {
    if (windows.size >= MOST_WINDOWS) for (const [each, { until }] of windows) if (until <= now) windows.delete(each);
    window = { until: now + seconds * 1000, count: 0 };
    windows.set(key, window);
  }
  return window;
}

/**
 * Counts one use of `key` in a window of this process.
 * @throws Problem 429 when it was used more than `most` times within `seconds`
 */
export function takeAllowance(key: string, most: number, seconds: number, now = Date.now()): void {
  const window = current(key, seconds, now);
  if (window.count >= most) throw tooMany((window.until - now) / 1000);
  window.count += 1;
}

/**
 * For passwords: failures alone are counted, so that a person who knows theirs is never kept out by their own success.
 * @returns a function to call after a failure
 * @throws Problem 429 after too many failures
 */
export function failureAllowance(key: string, most: number, seconds: number, now = Date.now()): () => void {
  const window = current(key, seconds, now);
  if (window.count >= most) throw tooMany((window.until - now) / 1000);
  return () => {
    current(key, seconds, Date.now()).count += 1;
  };
}
