/**
 * Minimum wire-bending space at terminals and width of wiring gutters.
 * Source: NFPA 70-2023 Table 312.6(A); 2020 same in transcription; 2017 not compared.
 * Inches, for one to five wires a terminal; null = not specified. The compact aluminum column serves terminals only;
 * for gutters and wireways (376.23(A)) the other column is used.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const BENDING_SPACE_INFO: TableInfo = {
  meaning: "bending-space",
  title: "Minimum wire-bending space at terminals",
  values: { "2017": "unconfirmed", "2020": "read", "2023": "read", "2026": "preview" },
};

export interface BendingSpaceRow {
  readonly from: ConductorSize;
  readonly to: ConductorSize;
  /** Compact-stranded AA-8000 aluminum of this row, smallest and largest, or null. */
  readonly compactAluminum: readonly [ConductorSize, ConductorSize] | null;
  readonly spaceIn: readonly [number | null, number | null, number | null, number | null, number | null];
}

export const BENDING_SPACE_ROWS: readonly BendingSpaceRow[] = [
  { from: "14 AWG", to: "10 AWG", compactAluminum: ["12 AWG", "8 AWG"], spaceIn: [null, null, null, null, null] },
  { from: "8 AWG", to: "6 AWG", compactAluminum: ["6 AWG", "4 AWG"], spaceIn: [1.5, null, null, null, null] },
  { from: "4 AWG", to: "3 AWG", compactAluminum: ["2 AWG", "1 AWG"], spaceIn: [2, null, null, null, null] },
  { from: "2 AWG", to: "2 AWG", compactAluminum: ["1/0 AWG", "1/0 AWG"], spaceIn: [2.5, null, null, null, null] },
  { from: "1 AWG", to: "1 AWG", compactAluminum: ["2/0 AWG", "2/0 AWG"], spaceIn: [3, null, null, null, null] },
  { from: "1/0 AWG", to: "2/0 AWG", compactAluminum: ["3/0 AWG", "4/0 AWG"], spaceIn: [3.5, 5, 7, null, null] },
  { from: "3/0 AWG", to: "4/0 AWG", compactAluminum: ["250 kcmil", "300 kcmil"], spaceIn: [4, 6, 8, null, null] },
  { from: "250 kcmil", to: "250 kcmil", compactAluminum: ["350 kcmil", "350 kcmil"], spaceIn: [4.5, 6, 8, 10, null] },
  { from: "300 kcmil", to: "350 kcmil", compactAluminum: ["400 kcmil", "500 kcmil"], spaceIn: [5, 8, 10, 12, null] },
  { from: "400 kcmil", to: "500 kcmil", compactAluminum: ["600 kcmil", "750 kcmil"], spaceIn: [6, 8, 10, 12, 14] },
  { from: "600 kcmil", to: "700 kcmil", compactAluminum: ["800 kcmil", "1000 kcmil"], spaceIn: [8, 10, 12, 14, 16] },
  { from: "750 kcmil", to: "900 kcmil", compactAluminum: null, spaceIn: [8, 12, 14, 16, 18] },
  { from: "1000 kcmil", to: "1250 kcmil", compactAluminum: null, spaceIn: [10, null, null, null, null] },
  { from: "1500 kcmil", to: "2000 kcmil", compactAluminum: null, spaceIn: [12, null, null, null, null] },
];
