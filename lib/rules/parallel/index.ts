import type { Rule } from "@/lib/rules/engine/types";

/** Rules of this room beside those that the index of all names one by one. */
export const parallelRules: readonly Rule[] = [];
