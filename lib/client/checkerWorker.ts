import { expose } from "comlink";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import { check } from "@/lib/rules/engine/run";

/** Runs the rules beside the page, so that typing and dragging never wait for them. */
const api = { check: (drawing: Drawing): CheckResult => check(drawing) };
export type CheckerApi = typeof api;
expose(api);
