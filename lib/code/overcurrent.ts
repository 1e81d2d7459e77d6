import { checkNumber, checkOneOf, type ConductorSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import { ADDITIONAL_FUSE_RATINGS, SMALL_CONDUCTOR_ROWS, STANDARD_RATINGS } from "./tables/overcurrent";
import { SINGLE_PHASE_MOTOR_ROWS } from "./tables/motor-current";
import { EDITIONS, type Edition, type Material } from "./types";

/**
 * Full-load current in A of a single-phase motor by horsepower at 115, 208 or 230 V (120 and 240 V systems).
 * Null where the table holds no row. Source: Table 430.248.
 */
export function motorTableCurrentA(horsepower: number, volts: number): number | null {
  const row = SINGLE_PHASE_MOTOR_ROWS.find((item) => Math.abs(item.horsepower - horsepower) < 0.01);
  if (!row) return null;
  if (volts >= 110 && volts <= 120) return row.a115;
  if (volts >= 220 && volts <= 240) return row.a230;
  return volts === 208 ? row.a230 * 1.1 : null;
}

const RANGE = { min: 0, max: 100000, unit: "A" } as const;

/** Standard ratings of an edition in A, smallest first; with the additional fuse ratings where asked. */
export function standardRatingsA(edition: Edition, fuse = false): readonly number[] {
  checkOneOf("edition", edition, EDITIONS);
  if (!fuse) return STANDARD_RATINGS[edition];
  return [...STANDARD_RATINGS[edition], ...ADDITIONAL_FUSE_RATINGS[edition]].sort((a, b) => a - b);
}

/** True when a rating in A is a standard rating of the edition. */
export function isStandardRatingA(ratingA: number, edition: Edition, fuse = false): boolean {
  return standardRatingsA(edition, fuse).includes(checkNumber("ratingA", ratingA, RANGE));
}

/**
 * Smallest standard rating in A that is not below the current.
 * @throws CodeLookupError above the last standard rating.
 */
export function standardRatingAtLeastA(currentA: number, edition: Edition, fuse = false, field = "currentA"): number {
  checkNumber(field, currentA, RANGE);
  // 1.25 x 32 must find 40 even where binary arithmetic leaves 40.000000000000004.
  const found = standardRatingsA(edition, fuse).find((rating) => rating >= currentA - 1e-9);
  if (found === undefined) throw new CodeLookupError(field, `${currentA} A is above the last standard rating`, "up to 6000 A");
  return found;
}

/** Largest standard rating in A that is not above the current, or null below the first. */
export function standardRatingAtMostA(currentA: number, edition: Edition, fuse = false): number | null {
  checkNumber("currentA", currentA, RANGE);
  return standardRatingsA(edition, fuse).findLast((rating) => rating <= currentA + 1e-9) ?? null;
}

/** Largest overcurrent device in A on a small conductor, 240.4(D), or null where the section sets none. */
export function smallConductorLimitA(size: ConductorSize, material: Material, edition: Edition): number | null {
  checkOneOf("edition", edition, EDITIONS);
  const row = SMALL_CONDUCTOR_ROWS.find((item) => item.size === size && item.materials.includes(material) && item.from <= edition);
  return row?.maxOcpdA ?? null;
}
