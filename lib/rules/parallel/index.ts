import type { Rule } from "@/lib/rules/engine/types";
import { parallelEqualRules } from "./equal";
import { parallelBatteryCommon } from "./parallel-battery-common";
import { parallelChain } from "./parallel-chain";
import { parallelCommonOutput } from "./parallel-common-output";

/** Rules of this room beside those that the index of all names one by one. */
export const parallelRules: readonly Rule[] = [parallelChain, parallelBatteryCommon, ...parallelEqualRules, parallelCommonOutput];
