import type { Rule } from "@/lib/rules/engine/types";
import { interruptingLow } from "./interrupting-low";
import { faultRatingRules } from "./ratings";
import { sccrLow } from "./sccr-low";
import { seriesRating } from "./series-rating";

/** Rules of this room beside those that the index of all names one by one. */
export const faultCurrentRules: readonly Rule[] = [interruptingLow, sccrLow, seriesRating, ...faultRatingRules];
