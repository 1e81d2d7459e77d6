import type { Rule } from "@/lib/rules/engine/types";
import { alCuTermination } from "./al-cu-termination";
import { circuitConductorsTogether } from "./circuit-conductors-together";
import { commonTripMultipole } from "./common-trip-multipole";
import { dcRatedDevice } from "./dc-rated-device";
import { dwelling83Misused } from "./dwelling-83-misused";
import { evLoadContinuous } from "./ev-load-continuous";
import { hvacMcaMocp } from "./hvac-mca-mocp";
import { insulationVoltageClass } from "./insulation-voltage-class";
import { motorBranch } from "./motor-branch";
import { neutralTooSmall } from "./neutral-too-small";
import { ocpdBelow125 } from "./ocpd-below-125";
import { ocpdNonstandard } from "./ocpd-nonstandard";
import { parallelTooSmall } from "./parallel-too-small";
import { parallelUnlike } from "./parallel-unlike";
import { roundupNotAllowed } from "./roundup-not-allowed";
import { slashRatedBreaker } from "./slash-rated-breaker";
import { sourceEndUnprotected } from "./source-end-unprotected";
import { tapRule } from "./tap-rule";
import { transformerSecondaryConductor } from "./transformer-secondary-conductor";
import { voltageDropAdvice } from "./voltage-drop-advice";

/** Rules of this room beside those that the index of all names one by one. */
export const conductorRules: readonly Rule[] = [
  ocpdBelow125, sourceEndUnprotected, dcRatedDevice, tapRule, transformerSecondaryConductor, roundupNotAllowed, dwelling83Misused, motorBranch, hvacMcaMocp,
  evLoadContinuous, commonTripMultipole, neutralTooSmall, circuitConductorsTogether, parallelTooSmall, parallelUnlike, insulationVoltageClass, alCuTermination,
  slashRatedBreaker, voltageDropAdvice, ocpdNonstandard,
];
