/**
 * Ambient temperature correction and adjustment for more than three current-carrying conductors.
 * Source: NFPA 70-2023 Tables 310.15(B)(1)(1), 310.15(B)(1)(2), 310.15(C)(1); 2020 Tables 310.15(B)(1), (B)(2), (C)(1); 2017 Tables 310.15(B)(2)(a), (B)(2)(b), (B)(3)(a).
 * Bands are whole degrees; a temperature between two bands takes the hotter one. null = not permitted at this temperature.
 * Rows for 105 °C and 125 °C conductors of PV circuits: NFPA 70-2020 Table 690.31(A)(a).
 */
import type { TableInfo } from "../types";

/** Highest ambient of the band in °C and the factors by conductor temperature rating. */
export interface CorrectionBand<Rating extends number> {
  readonly maxC: number;
  readonly factors: Readonly<Record<Rating, number | null>>;
}

export const CORRECTION_INFO: TableInfo = {
  meaning: "ambient-correction",
  title: "Ambient temperature correction factors",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

export const ADJUSTMENT_INFO: TableInfo = {
  meaning: "bundling-adjustment",
  title: "Adjustment factors for more than three current-carrying conductors",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

export const PV_CORRECTION_INFO: TableInfo = {
  meaning: "pv-wire-correction",
  title: "Correction factors for 105 °C and 125 °C conductors of PV circuits",
  values: { "2017": "unconfirmed", "2020": "read", "2023": "unconfirmed", "2026": "preview" },
};

export const CORRECTION_BASE_30C: readonly CorrectionBand<60 | 75 | 90>[] = [
  { maxC: 10, factors: { 60: 1.29, 75: 1.2, 90: 1.15 } },
  { maxC: 15, factors: { 60: 1.22, 75: 1.15, 90: 1.12 } },
  { maxC: 20, factors: { 60: 1.15, 75: 1.11, 90: 1.08 } },
  { maxC: 25, factors: { 60: 1.08, 75: 1.05, 90: 1.04 } },
  { maxC: 30, factors: { 60: 1, 75: 1, 90: 1 } },
  { maxC: 35, factors: { 60: 0.91, 75: 0.94, 90: 0.96 } },
  { maxC: 40, factors: { 60: 0.82, 75: 0.88, 90: 0.91 } },
  { maxC: 45, factors: { 60: 0.71, 75: 0.82, 90: 0.87 } },
  { maxC: 50, factors: { 60: 0.58, 75: 0.75, 90: 0.82 } },
  { maxC: 55, factors: { 60: 0.41, 75: 0.67, 90: 0.76 } },
  { maxC: 60, factors: { 60: null, 75: 0.58, 90: 0.71 } },
  { maxC: 65, factors: { 60: null, 75: 0.47, 90: 0.65 } },
  { maxC: 70, factors: { 60: null, 75: 0.33, 90: 0.58 } },
  { maxC: 75, factors: { 60: null, 75: null, 90: 0.5 } },
  { maxC: 80, factors: { 60: null, 75: null, 90: 0.41 } },
  { maxC: 85, factors: { 60: null, 75: null, 90: 0.29 } },
];

export const CORRECTION_BASE_40C: readonly CorrectionBand<60 | 75 | 90>[] = [
  { maxC: 10, factors: { 60: 1.58, 75: 1.36, 90: 1.26 } },
  { maxC: 15, factors: { 60: 1.5, 75: 1.31, 90: 1.22 } },
  { maxC: 20, factors: { 60: 1.41, 75: 1.25, 90: 1.18 } },
  { maxC: 25, factors: { 60: 1.32, 75: 1.2, 90: 1.14 } },
  { maxC: 30, factors: { 60: 1.22, 75: 1.13, 90: 1.1 } },
  { maxC: 35, factors: { 60: 1.12, 75: 1.07, 90: 1.05 } },
  { maxC: 40, factors: { 60: 1, 75: 1, 90: 1 } },
  { maxC: 45, factors: { 60: 0.87, 75: 0.93, 90: 0.95 } },
  { maxC: 50, factors: { 60: 0.71, 75: 0.85, 90: 0.89 } },
  { maxC: 55, factors: { 60: 0.5, 75: 0.76, 90: 0.84 } },
  { maxC: 60, factors: { 60: null, 75: 0.65, 90: 0.77 } },
  { maxC: 65, factors: { 60: null, 75: 0.53, 90: 0.71 } },
  { maxC: 70, factors: { 60: null, 75: 0.38, 90: 0.63 } },
  { maxC: 75, factors: { 60: null, 75: null, 90: 0.55 } },
  { maxC: 80, factors: { 60: null, 75: null, 90: 0.45 } },
];

export const CORRECTION_PV_WIRE: readonly CorrectionBand<105 | 125>[] = [
  { maxC: 30, factors: { 105: 1, 125: 1 } },
  { maxC: 35, factors: { 105: 0.97, 125: 0.97 } },
  { maxC: 40, factors: { 105: 0.93, 125: 0.95 } },
  { maxC: 45, factors: { 105: 0.89, 125: 0.92 } },
  { maxC: 50, factors: { 105: 0.86, 125: 0.89 } },
  { maxC: 55, factors: { 105: 0.82, 125: 0.86 } },
  { maxC: 60, factors: { 105: 0.77, 125: 0.83 } },
  { maxC: 65, factors: { 105: 0.73, 125: 0.79 } },
  { maxC: 70, factors: { 105: 0.68, 125: 0.76 } },
  { maxC: 75, factors: { 105: 0.63, 125: 0.73 } },
  { maxC: 80, factors: { 105: 0.58, 125: 0.69 } },
  { maxC: 85, factors: { 105: 0.52, 125: 0.65 } },
  { maxC: 90, factors: { 105: 0.45, 125: 0.61 } },
  { maxC: 95, factors: { 105: 0.37, 125: 0.56 } },
  { maxC: 100, factors: { 105: 0.26, 125: 0.51 } },
  { maxC: 105, factors: { 105: null, 125: 0.46 } },
  { maxC: 110, factors: { 105: null, 125: 0.4 } },
  { maxC: 115, factors: { 105: null, 125: 0.32 } },
  { maxC: 120, factors: { 105: null, 125: 0.23 } },
];

/** Percent of the ampacity by number of current-carrying conductors; `max` null = no upper end. */
export const ADJUSTMENT_ROWS: readonly { readonly min: number; readonly max: number | null; readonly percent: number }[] = [
  { min: 1, max: 3, percent: 100 },
  { min: 4, max: 6, percent: 80 },
  { min: 7, max: 9, percent: 70 },
  { min: 10, max: 20, percent: 50 },
  { min: 21, max: 30, percent: 45 },
  { min: 31, max: 40, percent: 40 },
  { min: 41, max: null, percent: 35 },
];
