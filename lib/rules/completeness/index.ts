import type { Rule } from "@/lib/rules/engine/types";
import { drawnRules } from "./drawn";
import { placeRules } from "./place";
import { completenessStatements } from "./statements";

/** Rules of this room beside those that the index of all names one by one. */
export const completenessRules: readonly Rule[] = [...placeRules, ...drawnRules, ...completenessStatements];
