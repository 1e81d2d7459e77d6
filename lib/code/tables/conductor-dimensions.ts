/**
 * Dimensions of insulated conductors, concentric stranding.
 * Source: NFPA 70-2017 Chapter 9 Table 5.
 * Approximate diameter in inches, approximate area in in² with insulation. Compact stranding: Table 5A.
 * PV wire is not in this table: the outside diameter of the product is asked for (note 10).
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const CONDUCTOR_DIMENSIONS_INFO: TableInfo = {
  meaning: "conductor-dimensions",
  title: "Dimensions of insulated conductors",
  values: { "2017": "read", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

/** Size, diameter in in, area in in². */
export type ConductorDimensionRow = readonly [ConductorSize, number, number];

/** Row sets of the table; RHW-covered and RHW-uncovered are the types with and without outer covering. */
export type DimensionGroup = "THHN" | "XHHW" | "RHW-covered" | "RHW-uncovered" | "THW";

export const CONDUCTOR_DIMENSIONS: Readonly<Record<DimensionGroup, readonly ConductorDimensionRow[]>> = {
  "THHN": [
    ["14 AWG", 0.111, 0.0097], ["12 AWG", 0.13, 0.0133], ["10 AWG", 0.164, 0.0211],
    ["8 AWG", 0.216, 0.0366], ["6 AWG", 0.254, 0.0507], ["4 AWG", 0.324, 0.0824],
    ["3 AWG", 0.352, 0.0973], ["2 AWG", 0.384, 0.1158], ["1 AWG", 0.446, 0.1562],
    ["1/0 AWG", 0.486, 0.1855], ["2/0 AWG", 0.532, 0.2223], ["3/0 AWG", 0.584, 0.2679],
    ["4/0 AWG", 0.642, 0.3237], ["250 kcmil", 0.711, 0.397], ["300 kcmil", 0.766, 0.4608],
    ["350 kcmil", 0.817, 0.5242], ["400 kcmil", 0.864, 0.5863], ["500 kcmil", 0.949, 0.7073],
    ["600 kcmil", 1.051, 0.8676], ["700 kcmil", 1.122, 0.9887], ["750 kcmil", 1.156, 1.0496],
    ["800 kcmil", 1.188, 1.1085], ["900 kcmil", 1.252, 1.2311], ["1000 kcmil", 1.31, 1.3478],
  ],
  "XHHW": [
    ["14 AWG", 0.133, 0.0139], ["12 AWG", 0.152, 0.0181], ["10 AWG", 0.176, 0.0243],
    ["8 AWG", 0.236, 0.0437], ["6 AWG", 0.274, 0.059], ["4 AWG", 0.322, 0.0814],
    ["3 AWG", 0.35, 0.0962], ["2 AWG", 0.382, 0.1146], ["1 AWG", 0.442, 0.1534],
    ["1/0 AWG", 0.482, 0.1825], ["2/0 AWG", 0.528, 0.219], ["3/0 AWG", 0.58, 0.2642],
    ["4/0 AWG", 0.638, 0.3197], ["250 kcmil", 0.705, 0.3904], ["300 kcmil", 0.76, 0.4536],
    ["350 kcmil", 0.811, 0.5166], ["400 kcmil", 0.858, 0.5782], ["500 kcmil", 0.943, 0.6984],
    ["600 kcmil", 1.053, 0.8709], ["700 kcmil", 1.124, 0.9923], ["750 kcmil", 1.158, 1.0532],
    ["800 kcmil", 1.19, 1.1122], ["900 kcmil", 1.254, 1.2351], ["1000 kcmil", 1.312, 1.3519],
    ["1250 kcmil", 1.479, 1.718], ["1500 kcmil", 1.602, 2.0156], ["1750 kcmil", 1.716, 2.3127],
    ["2000 kcmil", 1.822, 2.6073],
  ],
  "RHW-covered": [
    ["14 AWG", 0.193, 0.0293], ["12 AWG", 0.212, 0.0353], ["10 AWG", 0.236, 0.0437],
    ["8 AWG", 0.326, 0.0835], ["6 AWG", 0.364, 0.1041], ["4 AWG", 0.412, 0.1333],
    ["3 AWG", 0.44, 0.1521], ["2 AWG", 0.472, 0.175], ["1 AWG", 0.582, 0.266],
    ["1/0 AWG", 0.622, 0.3039], ["2/0 AWG", 0.668, 0.3505], ["3/0 AWG", 0.72, 0.4072],
    ["4/0 AWG", 0.778, 0.4754], ["250 kcmil", 0.895, 0.6291], ["300 kcmil", 0.95, 0.7088],
    ["350 kcmil", 1.001, 0.787], ["400 kcmil", 1.048, 0.8626], ["500 kcmil", 1.133, 1.0082],
    ["600 kcmil", 1.243, 1.2135], ["700 kcmil", 1.314, 1.3561], ["750 kcmil", 1.348, 1.4272],
    ["800 kcmil", 1.38, 1.4957], ["900 kcmil", 1.444, 1.6377], ["1000 kcmil", 1.502, 1.7719],
    ["1250 kcmil", 1.729, 2.3479], ["1500 kcmil", 1.852, 2.6938], ["1750 kcmil", 1.966, 3.0357],
    ["2000 kcmil", 2.072, 3.3719],
  ],
  "RHW-uncovered": [
    ["14 AWG", 0.163, 0.0209], ["12 AWG", 0.182, 0.026], ["10 AWG", 0.206, 0.0333],
    ["8 AWG", 0.266, 0.0556], ["6 AWG", 0.304, 0.0726], ["4 AWG", 0.352, 0.0973],
    ["3 AWG", 0.38, 0.1134], ["2 AWG", 0.412, 0.1333], ["1 AWG", 0.492, 0.1901],
    ["1/0 AWG", 0.532, 0.2223], ["2/0 AWG", 0.578, 0.2624], ["3/0 AWG", 0.63, 0.3117],
    ["4/0 AWG", 0.688, 0.3718], ["250 kcmil", 0.765, 0.4596], ["300 kcmil", 0.82, 0.5281],
    ["350 kcmil", 0.871, 0.5958], ["400 kcmil", 0.918, 0.6619], ["500 kcmil", 1.003, 0.7901],
    ["600 kcmil", 1.113, 0.9729], ["700 kcmil", 1.184, 1.101], ["750 kcmil", 1.218, 1.1652],
    ["800 kcmil", 1.25, 1.2272], ["900 kcmil", 1.314, 1.3561], ["1000 kcmil", 1.372, 1.4784],
    ["1250 kcmil", 1.539, 1.8602], ["1500 kcmil", 1.662, 2.1695], ["1750 kcmil", 1.776, 2.4773],
    ["2000 kcmil", 1.882, 2.7818],
  ],
  "THW": [
    ["14 AWG", 0.133, 0.0139], ["12 AWG", 0.152, 0.0181], ["10 AWG", 0.176, 0.0243],
    ["8 AWG", 0.236, 0.0437], ["6 AWG", 0.304, 0.0726], ["4 AWG", 0.352, 0.0973],
    ["3 AWG", 0.38, 0.1134], ["2 AWG", 0.412, 0.1333], ["1 AWG", 0.492, 0.1901],
    ["1/0 AWG", 0.532, 0.2223], ["2/0 AWG", 0.578, 0.2624], ["3/0 AWG", 0.63, 0.3117],
    ["4/0 AWG", 0.688, 0.3718], ["250 kcmil", 0.765, 0.4596], ["300 kcmil", 0.82, 0.5281],
    ["350 kcmil", 0.871, 0.5958], ["400 kcmil", 0.918, 0.6619], ["500 kcmil", 1.003, 0.7901],
    ["600 kcmil", 1.113, 0.9729], ["700 kcmil", 1.184, 1.101], ["750 kcmil", 1.218, 1.1652],
    ["800 kcmil", 1.25, 1.2272], ["900 kcmil", 1.314, 1.3561], ["1000 kcmil", 1.372, 1.4784],
    ["1250 kcmil", 1.539, 1.8602], ["1500 kcmil", 1.662, 2.1695], ["1750 kcmil", 1.776, 2.4773],
    ["2000 kcmil", 1.882, 2.7818],
  ],
};
