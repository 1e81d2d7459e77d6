/**
 * Percent of cross section of conduit and tubing for conductors and cables.
 * Source: NFPA 70-2017 Chapter 9 Table 1 and notes 3, 4, 7, 8, 9, 10; notes of 2020 and 2023 agree.
 * The 0.8 rule of note 7 serves equal conductors only; mixed conductors are added and compared.
 */
import type { TableInfo } from "../types";

export const FILL_INFO: TableInfo = {
  meaning: "fill-table",
  title: "Percent of cross section of conduit and tubing for conductors and cables",
  values: { "2017": "read", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

/** Share of the total area by number of conductors or cables. */
export const FILL_ONE = 0.53;
export const FILL_TWO = 0.31;
export const FILL_OVER_TWO = 0.4;
/** Nipple between boxes, note 4: its length limit and share; no ampacity adjustment inside. */
export const NIPPLE_MAX_LENGTH_IN = 24;
export const FILL_NIPPLE = 0.6;
/** Note 7: a quotient of equal conductors may be rounded up from this fraction. */
export const ROUND_UP_FROM = 0.8;
/** Informational note to note 1: three conductors may wedge when the raceway is this many conductor diameters wide. */
export const JAM_RATIO_MIN = 2.8;
export const JAM_RATIO_MAX = 3.2;
