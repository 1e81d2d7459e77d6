import { wrap, type Remote } from "comlink";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { CheckerApi } from "./checkerWorker";

/** Edits closer together than this are checked once. */
export const CHECK_DELAY_MS = 30;

export interface Checker {
  /** Asks for a check of this drawing; only the latest one asked for is answered. */
  request: (drawing: Drawing) => void;
  stop: () => void;
}

/** Checks run after the first one while nothing is asked for: the engine compiles them, so that the first edit is answered as fast as the rest. */
const WARM_UPS = 4;

/** Starts the checker's worker. `onResult` is called with the result and the drawing it belongs to. */
export function startChecker(onResult: (result: CheckResult, drawing: Drawing) => void, onError: (reason: string) => void): Checker {
  const worker = new Worker(new URL("./checkerWorker.ts", import.meta.url), { type: "module" });
  const remote: Remote<CheckerApi> = wrap<CheckerApi>(worker);
  worker.addEventListener("error", (event) => onError(event.message || "the checker could not be started"));
  let timer: ReturnType<typeof setTimeout> | null = null;
  let wanted: Drawing | null = null;
  let running = false;
  let warm = 0;
  const run = async (): Promise<void> => {
    if (running || !wanted) return;
    const drawing = wanted;
    wanted = null;
    running = true;
    try {
      const result = await remote.check(drawing);
      // A newer drawing waits: its own result follows at once, this one would flicker.
      if (!wanted) onResult(result, drawing);
      for (; warm < WARM_UPS && !wanted; warm++) await remote.check(drawing);
    } catch (error) {
      onError(error instanceof Error ? error.message : String(error));
    }
    running = false;
    if (wanted) void run();
  };
  return {
    request: (drawing) => {
      wanted = drawing;
      if (timer) clearTimeout(timer);
      timer = setTimeout(() => void run(), CHECK_DELAY_MS);
    },
    stop: () => {
      if (timer) clearTimeout(timer);
      wanted = null;
      worker.terminate();
    },
  };
}
