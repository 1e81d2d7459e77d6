/**
 * Conductor properties and dc resistance at 75 °C.
 * Source: NFPA 70-2017 Chapter 9 Table 8.
 * Resistance in Ω per 1000 ft, diameter in inches, area of the bare conductor in in², area of metal in circular mils.
 * Sizes of 8 AWG and smaller have a solid and a stranded row; larger sizes are stranded.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const CONDUCTOR_PROPERTIES_INFO: TableInfo = {
  meaning: "conductor-properties",
  title: "Conductor properties",
  values: { "2017": "read", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

export interface ConductorPropertiesRow {
  readonly size: ConductorSize;
  readonly circularMils: number;
  readonly strands: number;
  readonly overallDiameterIn: number;
  readonly overallAreaIn2: number;
  /** dc resistance at 75 °C, Ω per 1000 ft. */
  readonly copperUncoated: number;
  readonly copperCoated: number;
  readonly aluminum: number;
}

export const CONDUCTOR_PROPERTIES: readonly ConductorPropertiesRow[] = [
  { size: "18 AWG", circularMils: 1620, strands: 1, overallDiameterIn: 0.04, overallAreaIn2: 0.001, copperUncoated: 7.77, copperCoated: 8.08, aluminum: 12.8 },
  { size: "18 AWG", circularMils: 1620, strands: 7, overallDiameterIn: 0.046, overallAreaIn2: 0.002, copperUncoated: 7.95, copperCoated: 8.45, aluminum: 13.1 },
  { size: "16 AWG", circularMils: 2580, strands: 1, overallDiameterIn: 0.051, overallAreaIn2: 0.002, copperUncoated: 4.89, copperCoated: 5.08, aluminum: 8.05 },
  { size: "16 AWG", circularMils: 2580, strands: 7, overallDiameterIn: 0.058, overallAreaIn2: 0.003, copperUncoated: 4.99, copperCoated: 5.29, aluminum: 8.21 },
  { size: "14 AWG", circularMils: 4110, strands: 1, overallDiameterIn: 0.064, overallAreaIn2: 0.003, copperUncoated: 3.07, copperCoated: 3.19, aluminum: 5.06 },
  { size: "14 AWG", circularMils: 4110, strands: 7, overallDiameterIn: 0.073, overallAreaIn2: 0.004, copperUncoated: 3.14, copperCoated: 3.26, aluminum: 5.17 },
  { size: "12 AWG", circularMils: 6530, strands: 1, overallDiameterIn: 0.081, overallAreaIn2: 0.005, copperUncoated: 1.93, copperCoated: 2.01, aluminum: 3.18 },
  { size: "12 AWG", circularMils: 6530, strands: 7, overallDiameterIn: 0.092, overallAreaIn2: 0.006, copperUncoated: 1.98, copperCoated: 2.05, aluminum: 3.25 },
  { size: "10 AWG", circularMils: 10380, strands: 1, overallDiameterIn: 0.102, overallAreaIn2: 0.008, copperUncoated: 1.21, copperCoated: 1.26, aluminum: 2 },
  { size: "10 AWG", circularMils: 10380, strands: 7, overallDiameterIn: 0.116, overallAreaIn2: 0.011, copperUncoated: 1.24, copperCoated: 1.29, aluminum: 2.04 },
  { size: "8 AWG", circularMils: 16510, strands: 1, overallDiameterIn: 0.128, overallAreaIn2: 0.013, copperUncoated: 0.764, copperCoated: 0.786, aluminum: 1.26 },
  { size: "8 AWG", circularMils: 16510, strands: 7, overallDiameterIn: 0.146, overallAreaIn2: 0.017, copperUncoated: 0.778, copperCoated: 0.809, aluminum: 1.28 },
  { size: "6 AWG", circularMils: 26240, strands: 7, overallDiameterIn: 0.184, overallAreaIn2: 0.027, copperUncoated: 0.491, copperCoated: 0.51, aluminum: 0.808 },
  { size: "4 AWG", circularMils: 41740, strands: 7, overallDiameterIn: 0.232, overallAreaIn2: 0.042, copperUncoated: 0.308, copperCoated: 0.321, aluminum: 0.508 },
  { size: "3 AWG", circularMils: 52620, strands: 7, overallDiameterIn: 0.26, overallAreaIn2: 0.053, copperUncoated: 0.245, copperCoated: 0.254, aluminum: 0.403 },
  { size: "2 AWG", circularMils: 66360, strands: 7, overallDiameterIn: 0.292, overallAreaIn2: 0.067, copperUncoated: 0.194, copperCoated: 0.201, aluminum: 0.319 },
  { size: "1 AWG", circularMils: 83690, strands: 19, overallDiameterIn: 0.332, overallAreaIn2: 0.087, copperUncoated: 0.154, copperCoated: 0.16, aluminum: 0.253 },
  { size: "1/0 AWG", circularMils: 105600, strands: 19, overallDiameterIn: 0.372, overallAreaIn2: 0.109, copperUncoated: 0.122, copperCoated: 0.127, aluminum: 0.201 },
  { size: "2/0 AWG", circularMils: 133100, strands: 19, overallDiameterIn: 0.418, overallAreaIn2: 0.137, copperUncoated: 0.0967, copperCoated: 0.101, aluminum: 0.159 },
  { size: "3/0 AWG", circularMils: 167800, strands: 19, overallDiameterIn: 0.47, overallAreaIn2: 0.173, copperUncoated: 0.0766, copperCoated: 0.0797, aluminum: 0.126 },
  { size: "4/0 AWG", circularMils: 211600, strands: 19, overallDiameterIn: 0.528, overallAreaIn2: 0.219, copperUncoated: 0.0608, copperCoated: 0.0626, aluminum: 0.1 },
  { size: "250 kcmil", circularMils: 250000, strands: 37, overallDiameterIn: 0.575, overallAreaIn2: 0.26, copperUncoated: 0.0515, copperCoated: 0.0535, aluminum: 0.0847 },
  { size: "300 kcmil", circularMils: 300000, strands: 37, overallDiameterIn: 0.63, overallAreaIn2: 0.312, copperUncoated: 0.0429, copperCoated: 0.0446, aluminum: 0.0707 },
  { size: "350 kcmil", circularMils: 350000, strands: 37, overallDiameterIn: 0.681, overallAreaIn2: 0.364, copperUncoated: 0.0367, copperCoated: 0.0382, aluminum: 0.0605 },
  { size: "400 kcmil", circularMils: 400000, strands: 37, overallDiameterIn: 0.728, overallAreaIn2: 0.416, copperUncoated: 0.0321, copperCoated: 0.0331, aluminum: 0.0529 },
  { size: "500 kcmil", circularMils: 500000, strands: 37, overallDiameterIn: 0.813, overallAreaIn2: 0.519, copperUncoated: 0.0258, copperCoated: 0.0265, aluminum: 0.0424 },
  { size: "600 kcmil", circularMils: 600000, strands: 61, overallDiameterIn: 0.893, overallAreaIn2: 0.626, copperUncoated: 0.0214, copperCoated: 0.0223, aluminum: 0.0353 },
  { size: "700 kcmil", circularMils: 700000, strands: 61, overallDiameterIn: 0.964, overallAreaIn2: 0.73, copperUncoated: 0.0184, copperCoated: 0.0189, aluminum: 0.0303 },
  { size: "750 kcmil", circularMils: 750000, strands: 61, overallDiameterIn: 0.998, overallAreaIn2: 0.782, copperUncoated: 0.0171, copperCoated: 0.0176, aluminum: 0.0282 },
  { size: "800 kcmil", circularMils: 800000, strands: 61, overallDiameterIn: 1.03, overallAreaIn2: 0.834, copperUncoated: 0.0161, copperCoated: 0.0166, aluminum: 0.0265 },
  { size: "900 kcmil", circularMils: 900000, strands: 61, overallDiameterIn: 1.094, overallAreaIn2: 0.94, copperUncoated: 0.0143, copperCoated: 0.0147, aluminum: 0.0235 },
  { size: "1000 kcmil", circularMils: 1000000, strands: 61, overallDiameterIn: 1.152, overallAreaIn2: 1.042, copperUncoated: 0.0129, copperCoated: 0.0132, aluminum: 0.0212 },
  { size: "1250 kcmil", circularMils: 1250000, strands: 91, overallDiameterIn: 1.289, overallAreaIn2: 1.305, copperUncoated: 0.0103, copperCoated: 0.0106, aluminum: 0.0169 },
  { size: "1500 kcmil", circularMils: 1500000, strands: 91, overallDiameterIn: 1.412, overallAreaIn2: 1.566, copperUncoated: 0.00858, copperCoated: 0.00883, aluminum: 0.0141 },
  { size: "1750 kcmil", circularMils: 1750000, strands: 127, overallDiameterIn: 1.526, overallAreaIn2: 1.829, copperUncoated: 0.00735, copperCoated: 0.00756, aluminum: 0.0121 },
  { size: "2000 kcmil", circularMils: 2000000, strands: 127, overallDiameterIn: 1.632, overallAreaIn2: 2.092, copperUncoated: 0.00643, copperCoated: 0.00662, aluminum: 0.0106 },
];
