import type { Rule } from "./engine/types";
import { duplicateTag } from "./completeness/duplicate-tag";
import { racewayNotRouted } from "./completeness/raceway-not-routed";
import { ratingUnknown } from "./completeness/rating-unknown";
import { continuousLoad125 } from "./conductors/continuous-load-125";
import { deratedAmpacity } from "./conductors/derated-ampacity";
import { ocpdAboveConductor } from "./conductors/ocpd-above-conductor";
import { ocpdAboveNameplate } from "./conductors/ocpd-above-nameplate";
import { smallConductorCap } from "./conductors/small-conductor-cap";
import { terminalTempColumn } from "./conductors/terminal-temp-column";
import { dcInterrupting } from "./fault-current/dc-interrupting";
import { egcUndersized } from "./grounding/egc-undersized";
import { neutralBondCount } from "./grounding/neutral-bond-count";
import { busbarNoMethod } from "./interconnection/busbar-no-method";
import { parallelFirmware } from "./parallel/parallel-firmware";
import { parallelLeadLength } from "./parallel/parallel-lead-length";
import { parallelRole } from "./parallel/parallel-role";
import { stringCurrent } from "./pv/string-current";
import { stringOverBuildingCap } from "./pv/string-over-building-cap";
import { stringOverInverter } from "./pv/string-over-inverter";
import { bundlingCount } from "./raceways/bundling-count";
import { class2WithPower } from "./raceways/class2-with-power";
import { conduitOverfill, nippleOverfill, wirewayOverfill } from "./raceways/fill";
import { pvWithOtherSystems } from "./raceways/pv-with-other-systems";
import { ctWrongSide } from "./sensors/ct-wrong-side";
import { sourcesNotInterlocked } from "./transfer/sources-not-interlocked";

import { conductorRules } from "./conductors";
import { terminalRules } from "./terminals";
import { racewayRules } from "./raceways";
import { groundingRules } from "./grounding";
import { pvRules } from "./pv";
import { interconnectionRules } from "./interconnection";
import { storageRules } from "./storage";
import { disconnectRules } from "./disconnects";
import { transferRules } from "./transfer";
import { faultCurrentRules } from "./fault-current";
import { sensorRules } from "./sensors";
import { parallelRules } from "./parallel";
import { labelRules } from "./labels";
import { completenessRules } from "./completeness";

/** Printed on every sealed sheet and part of the drawing digest. Raised whenever a rule may answer otherwise. */
export const RULE_SET_VERSION = "2026-2";

/** Every rule, in the order in which findings of one severity are listed: what kills first. */
export const rules: readonly Rule[] = [
  neutralBondCount, sourcesNotInterlocked, pvWithOtherSystems, busbarNoMethod,
  ocpdAboveConductor, deratedAmpacity, continuousLoad125, terminalTempColumn, smallConductorCap, ocpdAboveNameplate,
  stringOverInverter, stringOverBuildingCap, stringCurrent, class2WithPower, dcInterrupting, egcUndersized,
  conduitOverfill, nippleOverfill, wirewayOverfill, bundlingCount, ctWrongSide, parallelRole, parallelFirmware, parallelLeadLength,
  ratingUnknown, duplicateTag, racewayNotRouted,
  ...conductorRules, ...terminalRules, ...racewayRules, ...groundingRules, ...pvRules, ...interconnectionRules, ...storageRules,
  ...disconnectRules, ...transferRules, ...faultCurrentRules, ...sensorRules, ...parallelRules, ...labelRules, ...completenessRules,
];
