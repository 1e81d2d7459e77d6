import { z } from "zod";
import { CONDUCTOR_CALCULATIONS } from "./conductors";
import type { CalculationEntry } from "./define";
import { PLACE_CALCULATIONS } from "./places";
import { SOURCE_CALCULATIONS } from "./sources";

export type { CalculationEntry } from "./define";

/** Every calculation by name: what the command line lists and runs. */
export const CALCULATIONS: readonly CalculationEntry[] = [...CONDUCTOR_CALCULATIONS, ...SOURCE_CALCULATIONS, ...PLACE_CALCULATIONS];

/** JSON schemas of input and output of one calculation. */
export function jsonSchemas(entry: CalculationEntry): { readonly input: unknown; readonly output: unknown } {
  return { input: z.toJSONSchema(entry.input, { io: "input" }), output: z.toJSONSchema(entry.output) };
}
