import { checkOneOf } from "@/lib/units";
import { CodeLookupError } from "./errors";
import type { DimensionGroup } from "./tables/conductor-dimensions";

/** Conductor temperature ratings that a table has a column for. */
export type ConductorRatingC = 60 | 75 | 90 | 105 | 125;

interface InsulationEntry {
  readonly dryC: ConductorRatingC;
  /** null: not for wet locations. */
  readonly wetC: ConductorRatingC | null;
  /** Row set of Chapter 9 Table 5 with and without outer covering; null: not in the table. */
  readonly covered: DimensionGroup | null;
  readonly uncovered: DimensionGroup | null;
  readonly compact: "rhwUse" | "thw" | "thhn" | "xhhw" | null;
}

/** Types of building wire by their letters. Source: heading of NFPA 70-2023 Table 310.16, Chapter 9 Tables 5 and 5A. */
const INSULATION_TABLE = {
  TW: { dryC: 60, wetC: 60, covered: "THW", uncovered: "THW", compact: null },
  UF: { dryC: 60, wetC: 60, covered: null, uncovered: null, compact: null },
  THW: { dryC: 75, wetC: 75, covered: "THW", uncovered: "THW", compact: "thw" },
  THHW: { dryC: 90, wetC: 75, covered: "THW", uncovered: "THW", compact: "thw" },
  "THW-2": { dryC: 90, wetC: 90, covered: "THW", uncovered: "THW", compact: "thw" },
  THWN: { dryC: 75, wetC: 75, covered: "THHN", uncovered: "THHN", compact: "thhn" },
  THHN: { dryC: 90, wetC: null, covered: "THHN", uncovered: "THHN", compact: "thhn" },
  "THWN-2": { dryC: 90, wetC: 90, covered: "THHN", uncovered: "THHN", compact: "thhn" },
  RHW: { dryC: 75, wetC: 75, covered: "RHW-covered", uncovered: "RHW-uncovered", compact: "rhwUse" },
  RHH: { dryC: 90, wetC: null, covered: "RHW-covered", uncovered: "RHW-uncovered", compact: "rhwUse" },
  "RHW-2": { dryC: 90, wetC: 90, covered: "RHW-covered", uncovered: "RHW-uncovered", compact: "rhwUse" },
  USE: { dryC: 75, wetC: 75, covered: "RHW-uncovered", uncovered: "RHW-uncovered", compact: "rhwUse" },
  "USE-2": { dryC: 90, wetC: 90, covered: "RHW-uncovered", uncovered: "RHW-uncovered", compact: "rhwUse" },
  XHH: { dryC: 90, wetC: null, covered: "XHHW", uncovered: "XHHW", compact: "xhhw" },
  XHHW: { dryC: 90, wetC: 75, covered: "XHHW", uncovered: "XHHW", compact: "xhhw" },
  "XHHW-2": { dryC: 90, wetC: 90, covered: "XHHW", uncovered: "XHHW", compact: "xhhw" },
  "PV wire": { dryC: 90, wetC: 90, covered: null, uncovered: null, compact: null },
} as const satisfies Record<string, InsulationEntry>;

export type Insulation = keyof typeof INSULATION_TABLE;
/** All insulation types known to the tables. */
export const INSULATIONS = Object.keys(INSULATION_TABLE) as readonly Insulation[];

/** True for an insulation type of the tables. */
export function isInsulation(value: unknown): value is Insulation {
  return typeof value === "string" && Object.hasOwn(INSULATION_TABLE, value);
}

/**
 * Temperature rating of an insulation in °C in a dry or wet location. PV wire of 105 °C or 125 °C in dry use states its own rating.
 * @throws CodeLookupError when the type is not for wet locations.
 */
export function insulationRatingC(insulation: Insulation, wet: boolean, field = "insulation"): ConductorRatingC {
  const entry: InsulationEntry = INSULATION_TABLE[checkOneOf(field, insulation, INSULATIONS)];
  const ratingC = wet ? entry.wetC : entry.dryC;
  if (ratingC === null) throw new CodeLookupError(field, `${insulation} is not for wet locations`, "a type with W, such as THWN-2");
  return ratingC;
}

/** Row set of Table 5 for an insulation, or null where the table holds none (PV wire, UF). */
export function dimensionGroup(insulation: Insulation, covered: boolean): DimensionGroup | null {
  const entry: InsulationEntry = INSULATION_TABLE[insulation];
  return covered ? entry.covered : entry.uncovered;
}

/** Column of Table 5A for an insulation, or null where the table holds none. */
export function compactColumn(insulation: Insulation): "rhwUse" | "thw" | "thhn" | "xhhw" | null {
  const entry: InsulationEntry = INSULATION_TABLE[insulation];
  return entry.compact;
}
