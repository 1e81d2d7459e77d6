/**
 * Dimensions of conduit and tubing.
 * Source: NFPA 70-2017 Chapter 9 Table 4.
 * Internal diameter in inches, total internal area in in². Permitted areas are computed from the total area: the printed
 * percent columns are rounded and give other counts in a few cells. EMT and IMC trade sizes 5 and 6 (2023) are not here: not confirmed.
 * HDPE (353) shares the rows of PVC schedule 40.
 */
import type { TradeSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const RACEWAY_DIMENSIONS_INFO: TableInfo = {
  meaning: "raceway-dimensions",
  title: "Dimensions of conduit and tubing",
  values: { "2017": "read", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

export interface RacewayDimensionRow {
  readonly tradeSize: TradeSize;
  readonly metricDesignator: number;
  readonly internalDiameterIn: number;
  readonly totalAreaIn2: number;
}

/** Circular raceways of the table by the abbreviation of their article. */
/** Rows as printed. */
export const RACEWAY_TABLES = [
  "EMT", "ENT", "FMC", "IMC", "LFNC-A", "LFNC-B", "LFNC-C", "LFMC", "RMC", "PVC 80", "PVC 40", "PVC A", "PVC EB",
] as const;
export type RacewayTable = (typeof RACEWAY_TABLES)[number];

/** Raceways as drawn: HDPE has the rows of PVC 40; LFNC of an unstated type takes the smallest of the three types. */
export const RACEWAY_KINDS = [...RACEWAY_TABLES, "HDPE", "LFNC"] as const;
export type RacewayKind = (typeof RACEWAY_KINDS)[number];

export const RACEWAY_ARTICLES: Readonly<Record<RacewayKind, string>> = {
  HDPE: "353",
  LFNC: "356",
  "EMT": "358",
  "ENT": "362",
  "FMC": "348",
  "IMC": "342",
  "LFNC-A": "356",
  "LFNC-B": "356",
  "LFNC-C": "356",
  "LFMC": "350",
  "RMC": "344",
  "PVC 80": "352",
  "PVC 40": "352",
  "PVC A": "352",
  "PVC EB": "352",
};

export const RACEWAY_DIMENSIONS: Readonly<Record<RacewayTable, readonly RacewayDimensionRow[]>> = {
  "EMT": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.622, totalAreaIn2: 0.304 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.824, totalAreaIn2: 0.533 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.049, totalAreaIn2: 0.864 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.38, totalAreaIn2: 1.496 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.61, totalAreaIn2: 2.036 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.067, totalAreaIn2: 3.356 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.731, totalAreaIn2: 5.858 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.356, totalAreaIn2: 8.846 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.834, totalAreaIn2: 11.545 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.334, totalAreaIn2: 14.753 },
  ],
  "ENT": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.602, totalAreaIn2: 0.285 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.804, totalAreaIn2: 0.508 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.029, totalAreaIn2: 0.832 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.36, totalAreaIn2: 1.453 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.59, totalAreaIn2: 1.986 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.047, totalAreaIn2: 3.291 },
  ],
  "FMC": [
    { tradeSize: "3/8", metricDesignator: 12, internalDiameterIn: 0.384, totalAreaIn2: 0.116 },
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.635, totalAreaIn2: 0.317 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.824, totalAreaIn2: 0.533 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.02, totalAreaIn2: 0.817 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.275, totalAreaIn2: 1.277 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.538, totalAreaIn2: 1.858 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.04, totalAreaIn2: 3.269 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.5, totalAreaIn2: 4.909 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3, totalAreaIn2: 7.069 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.5, totalAreaIn2: 9.621 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4, totalAreaIn2: 12.566 },
  ],
  "IMC": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.66, totalAreaIn2: 0.342 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.864, totalAreaIn2: 0.586 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.105, totalAreaIn2: 0.959 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.448, totalAreaIn2: 1.647 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.683, totalAreaIn2: 2.225 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.15, totalAreaIn2: 3.63 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.557, totalAreaIn2: 5.135 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.176, totalAreaIn2: 7.922 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.671, totalAreaIn2: 10.584 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.166, totalAreaIn2: 13.631 },
  ],
  "LFNC-A": [
    { tradeSize: "3/8", metricDesignator: 12, internalDiameterIn: 0.495, totalAreaIn2: 0.192 },
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.63, totalAreaIn2: 0.312 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.825, totalAreaIn2: 0.535 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.043, totalAreaIn2: 0.854 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.383, totalAreaIn2: 1.502 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.603, totalAreaIn2: 2.018 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.063, totalAreaIn2: 3.343 },
  ],
  "LFNC-B": [
    { tradeSize: "3/8", metricDesignator: 12, internalDiameterIn: 0.494, totalAreaIn2: 0.192 },
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.632, totalAreaIn2: 0.314 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.83, totalAreaIn2: 0.541 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.054, totalAreaIn2: 0.873 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.395, totalAreaIn2: 1.528 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.588, totalAreaIn2: 1.981 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.033, totalAreaIn2: 3.246 },
  ],
  "LFNC-C": [
    { tradeSize: "3/8", metricDesignator: 12, internalDiameterIn: 0.485, totalAreaIn2: 0.185 },
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.62, totalAreaIn2: 0.302 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.815, totalAreaIn2: 0.522 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.03, totalAreaIn2: 0.833 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.37, totalAreaIn2: 1.474 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.585, totalAreaIn2: 1.973 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.045, totalAreaIn2: 3.285 },
  ],
  "LFMC": [
    { tradeSize: "3/8", metricDesignator: 12, internalDiameterIn: 0.494, totalAreaIn2: 0.192 },
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.632, totalAreaIn2: 0.314 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.83, totalAreaIn2: 0.541 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.054, totalAreaIn2: 0.873 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.395, totalAreaIn2: 1.528 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.588, totalAreaIn2: 1.981 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.033, totalAreaIn2: 3.246 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.493, totalAreaIn2: 4.881 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.085, totalAreaIn2: 7.475 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.52, totalAreaIn2: 9.731 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.02, totalAreaIn2: 12.692 },
  ],
  "RMC": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.632, totalAreaIn2: 0.314 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.836, totalAreaIn2: 0.549 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.063, totalAreaIn2: 0.887 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.394, totalAreaIn2: 1.526 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.624, totalAreaIn2: 2.071 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.083, totalAreaIn2: 3.408 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.489, totalAreaIn2: 4.866 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.09, totalAreaIn2: 7.499 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.57, totalAreaIn2: 10.01 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.05, totalAreaIn2: 12.882 },
    { tradeSize: "5", metricDesignator: 129, internalDiameterIn: 5.073, totalAreaIn2: 20.212 },
    { tradeSize: "6", metricDesignator: 155, internalDiameterIn: 6.093, totalAreaIn2: 29.158 },
  ],
  "PVC 80": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.526, totalAreaIn2: 0.217 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.722, totalAreaIn2: 0.409 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 0.936, totalAreaIn2: 0.688 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.255, totalAreaIn2: 1.237 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.476, totalAreaIn2: 1.711 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 1.913, totalAreaIn2: 2.874 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.29, totalAreaIn2: 4.119 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 2.864, totalAreaIn2: 6.442 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.326, totalAreaIn2: 8.688 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 3.786, totalAreaIn2: 11.258 },
    { tradeSize: "5", metricDesignator: 129, internalDiameterIn: 4.768, totalAreaIn2: 17.855 },
    { tradeSize: "6", metricDesignator: 155, internalDiameterIn: 5.709, totalAreaIn2: 25.598 },
  ],
  "PVC 40": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.602, totalAreaIn2: 0.285 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.804, totalAreaIn2: 0.508 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.029, totalAreaIn2: 0.832 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.36, totalAreaIn2: 1.453 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.59, totalAreaIn2: 1.986 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.047, totalAreaIn2: 3.291 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.445, totalAreaIn2: 4.695 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.042, totalAreaIn2: 7.268 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.521, totalAreaIn2: 9.737 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 3.998, totalAreaIn2: 12.554 },
    { tradeSize: "5", metricDesignator: 129, internalDiameterIn: 5.016, totalAreaIn2: 19.761 },
    { tradeSize: "6", metricDesignator: 155, internalDiameterIn: 6.031, totalAreaIn2: 28.567 },
  ],
  "PVC A": [
    { tradeSize: "1/2", metricDesignator: 16, internalDiameterIn: 0.7, totalAreaIn2: 0.385 },
    { tradeSize: "3/4", metricDesignator: 21, internalDiameterIn: 0.91, totalAreaIn2: 0.65 },
    { tradeSize: "1", metricDesignator: 27, internalDiameterIn: 1.175, totalAreaIn2: 1.084 },
    { tradeSize: "1-1/4", metricDesignator: 35, internalDiameterIn: 1.5, totalAreaIn2: 1.767 },
    { tradeSize: "1-1/2", metricDesignator: 41, internalDiameterIn: 1.72, totalAreaIn2: 2.324 },
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.155, totalAreaIn2: 3.647 },
    { tradeSize: "2-1/2", metricDesignator: 63, internalDiameterIn: 2.635, totalAreaIn2: 5.453 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.23, totalAreaIn2: 8.194 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.69, totalAreaIn2: 10.694 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.18, totalAreaIn2: 13.723 },
  ],
  "PVC EB": [
    { tradeSize: "2", metricDesignator: 53, internalDiameterIn: 2.221, totalAreaIn2: 3.874 },
    { tradeSize: "3", metricDesignator: 78, internalDiameterIn: 3.33, totalAreaIn2: 8.709 },
    { tradeSize: "3-1/2", metricDesignator: 91, internalDiameterIn: 3.804, totalAreaIn2: 11.365 },
    { tradeSize: "4", metricDesignator: 103, internalDiameterIn: 4.289, totalAreaIn2: 14.448 },
    { tradeSize: "5", metricDesignator: 129, internalDiameterIn: 5.316, totalAreaIn2: 22.195 },
    { tradeSize: "6", metricDesignator: 155, internalDiameterIn: 6.336, totalAreaIn2: 31.53 },
  ],
};
