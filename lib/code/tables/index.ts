/** Every table with its own account of how sure its values are, for the page that lists them and for the tests. */
import type { TableInfo } from "../types";
import { AC_IMPEDANCE_INFO } from "./ac-impedance";
import { AMPACITY_INFO } from "./ampacity";
import { BENDING_SPACE_INFO } from "./bending-space";
import { BONDING_JUMPER_INFO } from "./bonding-jumper";
import { BOX_VOLUME_INFO } from "./box-volume";
import { BURIAL_INFO } from "./burial-depth";
import { COMPACT_DIMENSIONS_INFO } from "./compact-dimensions";
import { CONDUCTOR_DIMENSIONS_INFO } from "./conductor-dimensions";
import { CONDUCTOR_PROPERTIES_INFO } from "./conductor-properties";
import { ADJUSTMENT_INFO, CORRECTION_INFO, PV_CORRECTION_INFO } from "./correction";
import { DWELLING_SERVICE_INFO } from "./dwelling-service";
import { EGC_INFO } from "./egc";
import { GEC_INFO } from "./gec";
import { SMALL_CONDUCTOR_INFO, STANDARD_RATINGS_INFO } from "./overcurrent";
import { MOTOR_CURRENT_INFO } from "./motor-current";
import { VOLTAGE_CORRECTION_INFO } from "./pv-voltage";
import { PV_WIRE_AMPACITY_INFO } from "./pv-wire-ampacity";
import { RACEWAY_DIMENSIONS_INFO } from "./raceway-dimensions";
import { FILL_INFO } from "./raceway-fill";
import { TORQUE_INFO } from "./torque";
import { WIREWAY_INFO } from "./wireway";
import { WORKING_SPACE_INFO } from "./working-space";

export const TABLES: readonly TableInfo[] = [
  AMPACITY_INFO, CORRECTION_INFO, ADJUSTMENT_INFO, PV_CORRECTION_INFO, PV_WIRE_AMPACITY_INFO, STANDARD_RATINGS_INFO,
  SMALL_CONDUCTOR_INFO, EGC_INFO, GEC_INFO, BONDING_JUMPER_INFO, DWELLING_SERVICE_INFO, FILL_INFO, RACEWAY_DIMENSIONS_INFO,
  CONDUCTOR_DIMENSIONS_INFO, COMPACT_DIMENSIONS_INFO, CONDUCTOR_PROPERTIES_INFO, AC_IMPEDANCE_INFO, VOLTAGE_CORRECTION_INFO,
  WIREWAY_INFO, BENDING_SPACE_INFO, BOX_VOLUME_INFO, BURIAL_INFO, WORKING_SPACE_INFO, TORQUE_INFO, MOTOR_CURRENT_INFO,
];
