/**
 * Alternating-current resistance and reactance of 600 V cables, 60 Hz, 75 °C, three single conductors in conduit.
 * Source: NFPA 70-2017 Chapter 9 Table 9.
 * Ω to neutral per 1000 ft. pvc, aluminum and steel name the conduit, not the conductor.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const AC_IMPEDANCE_INFO: TableInfo = {
  meaning: "ac-impedance",
  title: "AC resistance and reactance of 600 V cables",
  values: { "2017": "read", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

/** Resistance in PVC, aluminum and steel conduit. */
export type ByConduit = readonly [number | null, number | null, number | null];

export interface AcImpedanceRow {
  readonly size: ConductorSize;
  readonly reactancePvcAluminum: number;
  readonly reactanceSteel: number;
  readonly copper: ByConduit;
  readonly aluminum: ByConduit;
  /** Effective impedance at a power factor of 0.85 as printed. */
  readonly copperZ085: ByConduit;
  readonly aluminumZ085: ByConduit;
}

export const AC_IMPEDANCE_ROWS: readonly AcImpedanceRow[] = [
  {
    size: "14 AWG", reactancePvcAluminum: 0.058, reactanceSteel: 0.073,
    copper: [3.1, 3.1, 3.1], aluminum: [null, null, null], copperZ085: [2.7, 2.7, 2.7], aluminumZ085: [null, null, null],
  },
  {
    size: "12 AWG", reactancePvcAluminum: 0.054, reactanceSteel: 0.068,
    copper: [2, 2, 2], aluminum: [3.2, 3.2, 3.2], copperZ085: [1.7, 1.7, 1.7], aluminumZ085: [2.8, 2.8, 2.8],
  },
  {
    size: "10 AWG", reactancePvcAluminum: 0.05, reactanceSteel: 0.063,
    copper: [1.2, 1.2, 1.2], aluminum: [2, 2, 2], copperZ085: [1.1, 1.1, 1.1], aluminumZ085: [1.8, 1.8, 1.8],
  },
  {
    size: "8 AWG", reactancePvcAluminum: 0.052, reactanceSteel: 0.065,
    copper: [0.78, 0.78, 0.78], aluminum: [1.3, 1.3, 1.3], copperZ085: [0.69, 0.69, 0.7], aluminumZ085: [1.1, 1.1, 1.1],
  },
  {
    size: "6 AWG", reactancePvcAluminum: 0.051, reactanceSteel: 0.064,
    copper: [0.49, 0.49, 0.49], aluminum: [0.81, 0.81, 0.81], copperZ085: [0.44, 0.45, 0.45], aluminumZ085: [0.71, 0.72, 0.72],
  },
  {
    size: "4 AWG", reactancePvcAluminum: 0.048, reactanceSteel: 0.06,
    copper: [0.31, 0.31, 0.31], aluminum: [0.51, 0.51, 0.51], copperZ085: [0.29, 0.29, 0.3], aluminumZ085: [0.46, 0.46, 0.46],
  },
  {
    size: "3 AWG", reactancePvcAluminum: 0.047, reactanceSteel: 0.059,
    copper: [0.25, 0.25, 0.25], aluminum: [0.4, 0.41, 0.4], copperZ085: [0.23, 0.24, 0.24], aluminumZ085: [0.37, 0.37, 0.37],
  },
  {
    size: "2 AWG", reactancePvcAluminum: 0.045, reactanceSteel: 0.057,
    copper: [0.19, 0.2, 0.2], aluminum: [0.32, 0.32, 0.32], copperZ085: [0.19, 0.19, 0.2], aluminumZ085: [0.3, 0.3, 0.3],
  },
  {
    size: "1 AWG", reactancePvcAluminum: 0.046, reactanceSteel: 0.057,
    copper: [0.15, 0.16, 0.16], aluminum: [0.25, 0.26, 0.25], copperZ085: [0.16, 0.16, 0.16], aluminumZ085: [0.24, 0.24, 0.25],
  },
  {
    size: "1/0 AWG", reactancePvcAluminum: 0.044, reactanceSteel: 0.055,
    copper: [0.12, 0.13, 0.12], aluminum: [0.2, 0.21, 0.2], copperZ085: [0.13, 0.13, 0.13], aluminumZ085: [0.19, 0.2, 0.2],
  },
  {
    size: "2/0 AWG", reactancePvcAluminum: 0.043, reactanceSteel: 0.054,
    copper: [0.1, 0.1, 0.1], aluminum: [0.16, 0.16, 0.16], copperZ085: [0.11, 0.11, 0.11], aluminumZ085: [0.16, 0.16, 0.16],
  },
  {
    size: "3/0 AWG", reactancePvcAluminum: 0.042, reactanceSteel: 0.052,
    copper: [0.077, 0.082, 0.079], aluminum: [0.13, 0.13, 0.13], copperZ085: [0.088, 0.092, 0.094], aluminumZ085: [0.13, 0.13, 0.14],
  },
  {
    size: "4/0 AWG", reactancePvcAluminum: 0.041, reactanceSteel: 0.051,
    copper: [0.062, 0.067, 0.063], aluminum: [0.1, 0.11, 0.1], copperZ085: [0.074, 0.078, 0.08], aluminumZ085: [0.11, 0.11, 0.11],
  },
  {
    size: "250 kcmil", reactancePvcAluminum: 0.041, reactanceSteel: 0.052,
    copper: [0.052, 0.057, 0.054], aluminum: [0.085, 0.09, 0.086], copperZ085: [0.066, 0.07, 0.073], aluminumZ085: [0.094, 0.098, 0.1],
  },
  {
    size: "300 kcmil", reactancePvcAluminum: 0.041, reactanceSteel: 0.051,
    copper: [0.044, 0.049, 0.045], aluminum: [0.071, 0.076, 0.072], copperZ085: [0.059, 0.063, 0.065], aluminumZ085: [0.082, 0.086, 0.088],
  },
  {
    size: "350 kcmil", reactancePvcAluminum: 0.04, reactanceSteel: 0.05,
    copper: [0.038, 0.043, 0.039], aluminum: [0.061, 0.066, 0.063], copperZ085: [0.053, 0.058, 0.06], aluminumZ085: [0.073, 0.077, 0.08],
  },
  {
    size: "400 kcmil", reactancePvcAluminum: 0.04, reactanceSteel: 0.049,
    copper: [0.033, 0.038, 0.035], aluminum: [0.054, 0.059, 0.055], copperZ085: [0.049, 0.053, 0.056], aluminumZ085: [0.066, 0.071, 0.073],
  },
  {
    size: "500 kcmil", reactancePvcAluminum: 0.039, reactanceSteel: 0.048,
    copper: [0.027, 0.032, 0.029], aluminum: [0.043, 0.048, 0.045], copperZ085: [0.043, 0.048, 0.05], aluminumZ085: [0.057, 0.061, 0.064],
  },
  {
    size: "600 kcmil", reactancePvcAluminum: 0.039, reactanceSteel: 0.048,
    copper: [0.023, 0.028, 0.025], aluminum: [0.036, 0.041, 0.038], copperZ085: [0.04, 0.044, 0.047], aluminumZ085: [0.051, 0.055, 0.058],
  },
  {
    size: "750 kcmil", reactancePvcAluminum: 0.038, reactanceSteel: 0.048,
    copper: [0.019, 0.024, 0.021], aluminum: [0.029, 0.034, 0.031], copperZ085: [0.036, 0.04, 0.043], aluminumZ085: [0.045, 0.049, 0.052],
  },
  {
    size: "1000 kcmil", reactancePvcAluminum: 0.037, reactanceSteel: 0.046,
    copper: [0.015, 0.019, 0.018], aluminum: [0.023, 0.027, 0.025], copperZ085: [0.032, 0.036, 0.04], aluminumZ085: [0.039, 0.042, 0.046],
  },
];
