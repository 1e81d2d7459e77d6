/**
 * Standard ratings of overcurrent devices and limits of small conductors.
 * Source: NFPA 70 240.4(B), 240.4(C), 240.4(D), Table 240.6(A); texts of 2017 and 2023, table of 2020.
 * Unit: ampere. The 10 A rating entered the table in 2023; before it was an additional fuse rating.
 */
import type { ConductorSize } from "@/lib/units";
import type { Edition, TableInfo } from "../types";

export const STANDARD_RATINGS_INFO: TableInfo = {
  meaning: "standard-ratings",
  title: "Standard ratings of fuses and circuit breakers",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

export const SMALL_CONDUCTOR_INFO: TableInfo = {
  meaning: "small-conductor",
  title: "Overcurrent protection of small conductors",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

const RATINGS_TO_2020: readonly number[] = [
  15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 90, 100,
  110, 125, 150, 175, 200, 225, 250, 300, 350, 400, 450, 500, 600,
  700, 800, 1000, 1200, 1600, 2000, 2500, 3000, 4000, 5000, 6000,
];
const RATINGS_FROM_2023: readonly number[] = [10, ...RATINGS_TO_2020];

export const STANDARD_RATINGS: Readonly<Record<Edition, readonly number[]>> = {
  "2017": RATINGS_TO_2020,
  "2020": RATINGS_TO_2020,
  "2023": RATINGS_FROM_2023,
  "2026": RATINGS_FROM_2023,
};

/** Further standard ratings, for fuses only. */
export const ADDITIONAL_FUSE_RATINGS: Readonly<Record<Edition, readonly number[]>> = {
  "2017": [1, 3, 6, 10, 601],
  "2020": [1, 3, 6, 10, 601],
  "2023": [1, 3, 6, 601],
  "2026": [1, 3, 6, 601],
};

export interface SmallConductorRow {
  readonly size: ConductorSize;
  readonly materials: readonly ("copper" | "aluminum" | "copper-clad aluminum")[];
  readonly maxOcpdA: number;
  /** Limit of the continuous load where the section sets one below the device. */
  readonly maxContinuousA: number | null;
  readonly from: Edition;
}

export const SMALL_CONDUCTOR_ROWS: readonly SmallConductorRow[] = [
  { size: "18 AWG", materials: ["copper"], maxOcpdA: 7, maxContinuousA: 5.6, from: "2017" },
  { size: "16 AWG", materials: ["copper"], maxOcpdA: 10, maxContinuousA: 8, from: "2017" },
  { size: "14 AWG", materials: ["copper-clad aluminum"], maxOcpdA: 10, maxContinuousA: 8, from: "2023" },
  { size: "14 AWG", materials: ["copper"], maxOcpdA: 15, maxContinuousA: null, from: "2017" },
  { size: "12 AWG", materials: ["aluminum", "copper-clad aluminum"], maxOcpdA: 15, maxContinuousA: null, from: "2017" },
  { size: "12 AWG", materials: ["copper"], maxOcpdA: 20, maxContinuousA: null, from: "2017" },
  { size: "10 AWG", materials: ["aluminum", "copper-clad aluminum"], maxOcpdA: 25, maxContinuousA: null, from: "2017" },
  { size: "10 AWG", materials: ["copper"], maxOcpdA: 30, maxContinuousA: null, from: "2017" },
];

/** 240.4(B) lets a device round up to the next standard rating up to this rating; above it 240.4(C) does not. */
export const NEXT_SIZE_UP_LIMIT_A = 800;
