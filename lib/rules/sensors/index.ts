import type { Rule } from "@/lib/rules/engine/types";
import { ctInPowerRaceway } from "./ct-in-power-raceway";
import { ctLegMissing } from "./ct-leg-missing";
import { ctRating, ctSpliceLength } from "./ratings";
import { sensorStatementRules } from "./statements";

/** Rules of this room beside those that the index of all names one by one. */
export const sensorRules: readonly Rule[] = [ctLegMissing, ctInPowerRaceway, ctRating, ctSpliceLength, ...sensorStatementRules];
