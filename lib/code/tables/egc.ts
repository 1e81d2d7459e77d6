/**
 * Minimum size of wire-type equipment grounding conductors.
 * Source: NFPA 70-2023 Table 250.122; 2017 text, same but aluminum 1200 kcmil at 5000 and 6000 A.
 * ocpdA: rating or setting not exceeding. First row whose ocpdA is not below the device.
 * The aluminum entries of 5000 and 6000 A are given as printed in 2023; the 2017 figure, 1200 kcmil, is no size of Table 8.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const EGC_INFO: TableInfo = {
  meaning: "egc-table",
  title: "Minimum size of equipment grounding conductors",
  values: { "2017": "read", "2020": "agreed", "2023": "read", "2026": "preview" },
};

export const EGC_ROWS: readonly { readonly ocpdA: number; readonly copper: ConductorSize; readonly aluminum: ConductorSize }[] = [
  { ocpdA: 15, copper: "14 AWG", aluminum: "12 AWG" },
  { ocpdA: 20, copper: "12 AWG", aluminum: "10 AWG" },
  { ocpdA: 60, copper: "10 AWG", aluminum: "8 AWG" },
  { ocpdA: 100, copper: "8 AWG", aluminum: "6 AWG" },
  { ocpdA: 200, copper: "6 AWG", aluminum: "4 AWG" },
  { ocpdA: 300, copper: "4 AWG", aluminum: "2 AWG" },
  { ocpdA: 400, copper: "3 AWG", aluminum: "1 AWG" },
  { ocpdA: 500, copper: "2 AWG", aluminum: "1/0 AWG" },
  { ocpdA: 600, copper: "1 AWG", aluminum: "2/0 AWG" },
  { ocpdA: 800, copper: "1/0 AWG", aluminum: "3/0 AWG" },
  { ocpdA: 1000, copper: "2/0 AWG", aluminum: "4/0 AWG" },
  { ocpdA: 1200, copper: "3/0 AWG", aluminum: "250 kcmil" },
  { ocpdA: 1600, copper: "4/0 AWG", aluminum: "350 kcmil" },
  { ocpdA: 2000, copper: "250 kcmil", aluminum: "400 kcmil" },
  { ocpdA: 2500, copper: "350 kcmil", aluminum: "600 kcmil" },
  { ocpdA: 3000, copper: "400 kcmil", aluminum: "600 kcmil" },
  { ocpdA: 4000, copper: "500 kcmil", aluminum: "750 kcmil" },
  { ocpdA: 5000, copper: "700 kcmil", aluminum: "1250 kcmil" },
  { ocpdA: 6000, copper: "800 kcmil", aluminum: "1250 kcmil" },
];
