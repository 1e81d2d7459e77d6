/**
 * Grounded conductor, main and system bonding jumper, supply-side bonding jumper.
 * Source: NFPA 70-2023 Table 250.102(C)(1); 2017 text, same.
 * Above the last row the jumper takes 12.5 % of the area of the largest ungrounded supply conductors.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const BONDING_JUMPER_INFO: TableInfo = {
  meaning: "bonding-jumper-table",
  title: "Grounded conductor, main and system bonding jumper, supply-side bonding jumper",
  values: { "2017": "read", "2020": "agreed", "2023": "read", "2026": "preview" },
};

export interface BondingJumperRow {
  /** Largest ungrounded supply conductor of the row as area in kcmil, or null for "above all rows". */
  readonly maxCopper: ConductorSize | "1100 kcmil" | null;
  readonly maxAluminum: ConductorSize | null;
  readonly copper: ConductorSize;
  readonly aluminum: ConductorSize;
}

export const BONDING_JUMPER_ROWS: readonly BondingJumperRow[] = [
  { maxCopper: "2 AWG", maxAluminum: "1/0 AWG", copper: "8 AWG", aluminum: "6 AWG" },
  { maxCopper: "1/0 AWG", maxAluminum: "3/0 AWG", copper: "6 AWG", aluminum: "4 AWG" },
  { maxCopper: "3/0 AWG", maxAluminum: "250 kcmil", copper: "4 AWG", aluminum: "2 AWG" },
  { maxCopper: "350 kcmil", maxAluminum: "500 kcmil", copper: "2 AWG", aluminum: "1/0 AWG" },
  { maxCopper: "600 kcmil", maxAluminum: "900 kcmil", copper: "1/0 AWG", aluminum: "3/0 AWG" },
  { maxCopper: "1100 kcmil", maxAluminum: "1750 kcmil", copper: "2/0 AWG", aluminum: "4/0 AWG" },
];

/** Share of the supply conductor area above the last row. */
export const BONDING_JUMPER_SHARE_ABOVE_TABLE = 0.125;
