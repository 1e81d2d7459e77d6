/**
 * Metal and nonmetallic wireways, pull boxes and rooftop raceways.
 * Source: NFPA 70-2017 and 2023 376.22, 376.56, 310.15(B); NFPA 70-2017 314.28(A)(1); 314.28(A)(2) and 378.22 from memory.
 */
import type { Confirmation, Edition, TableInfo } from "../types";

export const WIREWAY_INFO: TableInfo = {
  meaning: "wireway-fill",
  title: "Wireway fill and adjustment",
  values: { "2017": "read", "2020": "agreed", "2023": "read", "2026": "preview" },
};

/** Share of the interior area for conductors at any cross section. */
export const WIREWAY_FILL = 0.2;
/** Share with splices and taps. */
export const WIREWAY_SPLICE_FILL = 0.75;
/** Adjustment factors apply in a metal wireway only above this number of current-carrying conductors. */
export const WIREWAY_UNADJUSTED_CONDUCTORS = 30;
/** Straight pull: box length as a multiple of the largest trade size. */
export const PULL_BOX_STRAIGHT = 8;
/** Angle or U pull, and the distance between raceways of the same conductors. */
export const PULL_BOX_ANGLE = 6;

/** Added to the outdoor ambient of a raceway or cable lying close above a roof in sunlight, °C. */
export const ROOFTOP_ADDER_C = 33;

/** Height above the roof, to the bottom of the raceway, below which the adder applies. */
export const ROOFTOP_HEIGHT_IN: Readonly<Record<Edition, number>> = { "2017": 0.875, "2020": 0.875, "2023": 0.75, "2026": 0.75 };

/** XHHW-2 is exempt: text of 2017 and 2023; 2020 stands between two editions that agree. */
export const ROOFTOP_EXEMPT_INSULATION = "XHHW-2";
export const ROOFTOP_EXEMPTION: Readonly<Record<Edition, Confirmation>> = { "2017": "read", "2020": "agreed", "2023": "read", "2026": "preview" };

/** Adders by height of editions before 2017 (Table 310.15(B)(3)(c) of 2014), from memory: for old drawings only. */
export const ROOFTOP_ADDER_2014: readonly { readonly throughIn: number; readonly adderC: number }[] = [
  { throughIn: 0.5, adderC: 33 },
  { throughIn: 3.5, adderC: 22 },
  { throughIn: 12, adderC: 17 },
  { throughIn: 36, adderC: 14 },
];
