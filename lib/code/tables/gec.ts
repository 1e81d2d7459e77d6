/**
 * Grounding electrode conductor for alternating-current systems.
 * Source: NFPA 70-2023 Table 250.66; 2017 text, same.
 * Parallel conductors: the sum of their areas picks the row.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const GEC_INFO: TableInfo = {
  meaning: "gec-table",
  title: "Grounding electrode conductor for alternating-current systems",
  values: { "2017": "read", "2020": "agreed", "2023": "read", "2026": "preview" },
};

export interface SupplyConductorRow {
  /** Largest ungrounded supply conductor of the row as area in kcmil, or null for "above all rows". */
  readonly maxCopper: ConductorSize | "1100 kcmil" | null;
  readonly maxAluminum: ConductorSize | null;
  readonly copper: ConductorSize;
  readonly aluminum: ConductorSize;
}

export const GEC_ROWS: readonly SupplyConductorRow[] = [
  { maxCopper: "2 AWG", maxAluminum: "1/0 AWG", copper: "8 AWG", aluminum: "6 AWG" },
  { maxCopper: "1/0 AWG", maxAluminum: "3/0 AWG", copper: "6 AWG", aluminum: "4 AWG" },
  { maxCopper: "3/0 AWG", maxAluminum: "250 kcmil", copper: "4 AWG", aluminum: "2 AWG" },
  { maxCopper: "350 kcmil", maxAluminum: "500 kcmil", copper: "2 AWG", aluminum: "1/0 AWG" },
  { maxCopper: "600 kcmil", maxAluminum: "900 kcmil", copper: "1/0 AWG", aluminum: "3/0 AWG" },
  { maxCopper: "1100 kcmil", maxAluminum: "1750 kcmil", copper: "2/0 AWG", aluminum: "4/0 AWG" },
  { maxCopper: null, maxAluminum: null, copper: "3/0 AWG", aluminum: "250 kcmil" },
];

/** A sole connection to these electrodes need not be larger, 250.66(A) and (B). */
export const GEC_ELECTRODE_LIMITS = {
  "rod, pipe or plate": { copper: "6 AWG", aluminum: "4 AWG" },
  "concrete-encased": { copper: "4 AWG", aluminum: null },
} as const satisfies Record<string, { copper: ConductorSize; aluminum: ConductorSize | null }>;
