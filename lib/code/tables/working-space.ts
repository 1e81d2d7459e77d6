/**
 * Working space about electrical equipment, 1000 V nominal or less.
 * Source: NFPA 70-2023 Table 110.26(A)(1), 110.26(A)(2), (A)(3), (E); 2017 and 2020 same.
 * Depth in feet by voltage to ground and condition. 1: nothing live or grounded opposite; 2: grounded parts opposite
 * (concrete, brick and tile count as grounded); 3: live parts on both sides.
 */
import type { TableInfo } from "../types";

export const WORKING_SPACE_INFO: TableInfo = {
  meaning: "working-space",
  title: "Working spaces",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

export const WORKING_SPACE_ROWS: readonly { readonly maxV: number; readonly depthFt: Readonly<Record<1 | 2 | 3, number>> }[] = [
  { maxV: 150, depthFt: { 1: 3, 2: 3, 3: 3 } },
  { maxV: 600, depthFt: { 1: 3, 2: 3.5, 3: 4 } },
  { maxV: 1000, depthFt: { 1: 3, 2: 4, 3: 5 } },
];

export const WORKING_SPACE_MIN_WIDTH_IN = 30;
export const WORKING_SPACE_MIN_HEIGHT_FT = 6.5;
export const WORKING_SPACE_OTHER_EQUIPMENT_IN = 6;
/** Panels of existing dwellings up to this rating may have less headroom. */
export const EXISTING_DWELLING_HEADROOM_A = 200;
export const DEDICATED_SPACE_ABOVE_FT = 6;
export const LOW_VOLTAGE_RELIEF_DC_V = 60;
export const LOW_VOLTAGE_RELIEF_AC_V = 30;
