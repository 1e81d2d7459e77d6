import type { Rule } from "@/lib/rules/engine/types";
import { alCuTermination } from "./al-cu-termination";
import { dcRatedDevice } from "./dc-rated-device";
import { ocpdBelow125 } from "./ocpd-below-125";
import { sourceEndUnprotected } from "./source-end-unprotected";
import { tapRule } from "./tap-rule";

/** Rules of this room beside those that the index of all names one by one. */
export const conductorRules: readonly Rule[] = [ocpdBelow125, sourceEndUnprotected, dcRatedDevice, tapRule, alCuTermination];
