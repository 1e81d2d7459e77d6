import type { Rule } from "@/lib/rules/engine/types";
import { alCuTermination } from "./al-cu-termination";
import { dcRatedDevice } from "./dc-rated-device";
import { dwelling83Misused } from "./dwelling-83-misused";
import { evLoadContinuous } from "./ev-load-continuous";
import { hvacMcaMocp } from "./hvac-mca-mocp";
import { motorBranch } from "./motor-branch";
import { ocpdBelow125 } from "./ocpd-below-125";
import { roundupNotAllowed } from "./roundup-not-allowed";
import { sourceEndUnprotected } from "./source-end-unprotected";
import { tapRule } from "./tap-rule";
import { transformerSecondaryConductor } from "./transformer-secondary-conductor";

/** Rules of this room beside those that the index of all names one by one. */
export const conductorRules: readonly Rule[] = [
  ocpdBelow125, sourceEndUnprotected, dcRatedDevice, tapRule, transformerSecondaryConductor, roundupNotAllowed, dwelling83Misused, motorBranch, hvacMcaMocp,
  evLoadContinuous, alCuTermination,
];
