/**
 * Voltage correction factors for crystalline and multicrystalline silicon modules.
 * Source: NFPA 70-2017 Table 690.7(A); 2020 same.
 * Bands of the lowest expected ambient in °C; the factor multiplies the rated open-circuit voltage. 1.00 at 25 °C and above.
 * The table and the coefficient of the module are two lawful methods in 2017 and 2020.
 */
import type { TableInfo } from "../types";

export const VOLTAGE_CORRECTION_INFO: TableInfo = {
  meaning: "pv-voltage-table",
  title: "Voltage correction factors for crystalline silicon modules",
  values: { "2017": "read", "2020": "read", "2023": "agreed", "2026": "preview" },
};

export const VOLTAGE_CORRECTION_ROWS: readonly { readonly minC: number; readonly maxC: number; readonly factor: number }[] = [
  { minC: 20, maxC: 24, factor: 1.02 },
  { minC: 15, maxC: 19, factor: 1.04 },
  { minC: 10, maxC: 14, factor: 1.06 },
  { minC: 5, maxC: 9, factor: 1.08 },
  { minC: 0, maxC: 4, factor: 1.1 },
  { minC: -5, maxC: -1, factor: 1.12 },
  { minC: -10, maxC: -6, factor: 1.14 },
  { minC: -15, maxC: -11, factor: 1.16 },
  { minC: -20, maxC: -16, factor: 1.18 },
  { minC: -25, maxC: -21, factor: 1.2 },
  { minC: -30, maxC: -26, factor: 1.21 },
  { minC: -35, maxC: -31, factor: 1.23 },
  { minC: -40, maxC: -36, factor: 1.25 },
];
