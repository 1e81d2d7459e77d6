/**
 * Box fill volume allowance per conductor.
 * Source: NFPA 70-2023 Table 314.16(B)(1); 2017 Table 314.16(B), same.
 * Unit: in³. Conductors of 4 AWG and larger: 314.28 instead.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const BOX_VOLUME_INFO: TableInfo = {
  meaning: "box-volume",
  title: "Volume allowance per conductor",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

export const BOX_VOLUME_ROWS: readonly { readonly size: ConductorSize; readonly volumeIn3: number }[] = [
  { size: "18 AWG", volumeIn3: 1.5 },
  { size: "16 AWG", volumeIn3: 1.75 },
  { size: "14 AWG", volumeIn3: 2 },
  { size: "12 AWG", volumeIn3: 2.25 },
  { size: "10 AWG", volumeIn3: 2.5 },
  { size: "8 AWG", volumeIn3: 3 },
  { size: "6 AWG", volumeIn3: 5 },
];
