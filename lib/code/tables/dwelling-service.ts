/**
 * Single-phase dwelling services and feeders.
 * Source: NFPA 70-2023 Table 310.12(A); 2020 Table 310.12; 2017 310.15(B)(7), 83 % rule without a table.
 * The printed table serves where no correction or adjustment applies; the 83 % rule itself may be used with factors.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const DWELLING_SERVICE_INFO: TableInfo = {
  meaning: "dwelling-83",
  title: "Single-phase dwelling services and feeders",
  values: { "2017": "agreed", "2020": "read", "2023": "read", "2026": "preview" },
};

export const DWELLING_SERVICE_ROWS: readonly { readonly ratingA: number; readonly copper: ConductorSize; readonly aluminum: ConductorSize }[] = [
  { ratingA: 100, copper: "4 AWG", aluminum: "2 AWG" },
  { ratingA: 110, copper: "3 AWG", aluminum: "1 AWG" },
  { ratingA: 125, copper: "2 AWG", aluminum: "1/0 AWG" },
  { ratingA: 150, copper: "1 AWG", aluminum: "2/0 AWG" },
  { ratingA: 175, copper: "1/0 AWG", aluminum: "3/0 AWG" },
  { ratingA: 200, copper: "2/0 AWG", aluminum: "4/0 AWG" },
  { ratingA: 225, copper: "3/0 AWG", aluminum: "250 kcmil" },
  { ratingA: 250, copper: "4/0 AWG", aluminum: "300 kcmil" },
  { ratingA: 300, copper: "250 kcmil", aluminum: "350 kcmil" },
  { ratingA: 350, copper: "350 kcmil", aluminum: "500 kcmil" },
  { ratingA: 400, copper: "400 kcmil", aluminum: "600 kcmil" },
];

export const DWELLING_SERVICE_FACTOR = 0.83;
export const DWELLING_SERVICE_MIN_A = 100;
export const DWELLING_SERVICE_MAX_A = 400;
