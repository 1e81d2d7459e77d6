/**
 * Ampacities of 105 °C and 125 °C conductors of PV circuits, 30 °C ambient, not more than three in raceway.
 * Source: NFPA 70-2020 Table 690.31(A)(b), one source and memory; not in this form in 2017; 2023 not seen.
 * Unit: ampere, copper. Terminations still limit the circuit to their own temperature.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const PV_WIRE_AMPACITY_INFO: TableInfo = {
  meaning: "pv-wire-ampacity",
  title: "Ampacities of 105 °C and 125 °C conductors of PV circuits",
  values: { "2017": "unconfirmed", "2020": "agreed", "2023": "unconfirmed", "2026": "preview" },
};

export const PV_WIRE_AMPACITY_ROWS: readonly { readonly size: ConductorSize; readonly 105: number; readonly 125: number }[] = [
  { size: "18 AWG", 105: 15, 125: 16 },
  { size: "16 AWG", 105: 19, 125: 20 },
  { size: "14 AWG", 105: 29, 125: 31 },
  { size: "12 AWG", 105: 36, 125: 39 },
  { size: "10 AWG", 105: 46, 125: 50 },
  { size: "8 AWG", 105: 64, 125: 69 },
  { size: "6 AWG", 105: 81, 125: 87 },
  { size: "4 AWG", 105: 109, 125: 118 },
  { size: "3 AWG", 105: 129, 125: 139 },
  { size: "2 AWG", 105: 143, 125: 154 },
  { size: "1 AWG", 105: 168, 125: 181 },
  { size: "1/0 AWG", 105: 193, 125: 208 },
  { size: "2/0 AWG", 105: 229, 125: 247 },
  { size: "3/0 AWG", 105: 263, 125: 284 },
  { size: "4/0 AWG", 105: 301, 125: 325 },
];

/** Least number of strands of flexible fine-stranded cable of moving arrays, 2020 Table 690.31(C)(4). */
export const FINE_STRAND_ROWS: readonly { readonly from: ConductorSize; readonly to: ConductorSize; readonly strands: number }[] = [
  { from: "18 AWG", to: "18 AWG", strands: 17 },
  { from: "16 AWG", to: "10 AWG", strands: 19 },
  { from: "8 AWG", to: "4 AWG", strands: 49 },
  { from: "2 AWG", to: "2 AWG", strands: 130 },
  { from: "1 AWG", to: "1000 kcmil", strands: 259 },
];
