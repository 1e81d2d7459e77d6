import type { Rule } from "@/lib/rules/engine/types";
import { transferEquipmentRules } from "./equipment";
import { generatorRules } from "./generator";

/** Rules of this room beside those that the index of all names one by one. */
export const transferRules: readonly Rule[] = [...generatorRules, ...transferEquipmentRules];
