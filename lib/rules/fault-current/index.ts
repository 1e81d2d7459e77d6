import type { Rule } from "@/lib/rules/engine/types";
import { interruptingLow } from "./interrupting-low";
import { sccrLow } from "./sccr-low";

/** Rules of this room beside those that the index of all names one by one. */
export const faultCurrentRules: readonly Rule[] = [interruptingLow, sccrLow];
