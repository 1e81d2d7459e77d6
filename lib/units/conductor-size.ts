import { QuantityError } from "./errors";

/** Numbered sizes of the American Wire Gauge, from the smallest that the tables hold to the largest. */
const AWG_SIZES = ["18", "16", "14", "12", "10", "8", "6", "4", "3", "2", "1", "1/0", "2/0", "3/0", "4/0"] as const;
const KCMIL_SIZES = [
  "250", "300", "350", "400", "500", "600", "700", "750", "800", "900", "1000", "1250", "1500", "1750", "2000",
] as const;

/** A conductor size in its one canonical spelling: `10 AWG`, `1/0 AWG`, `250 kcmil`. */
export type ConductorSize = `${(typeof AWG_SIZES)[number]} AWG` | `${(typeof KCMIL_SIZES)[number]} kcmil`;

/** All conductor sizes of the tables, smallest first. */
export const CONDUCTOR_SIZES: readonly ConductorSize[] = [
  ...AWG_SIZES.map((s): ConductorSize => `${s} AWG`),
  ...KCMIL_SIZES.map((s): ConductorSize => `${s} kcmil`),
];

/** Areas in circular mils, NEC Chapter 9 Table 8 (sizes in kcmil are their own area). */
const AWG_CIRCULAR_MILS: Record<(typeof AWG_SIZES)[number], number> = {
  "18": 1620, "16": 2580, "14": 4110, "12": 6530, "10": 10380, "8": 16510, "6": 26240, "4": 41740, "3": 52620,
  "2": 66360, "1": 83690, "1/0": 105600, "2/0": 133100, "3/0": 167800, "4/0": 211600,
};

const ORDER = new Map<string, number>(CONDUCTOR_SIZES.map((size, index) => [size, index]));
const CIRCULAR_MILS = new Map<string, number>([
  ...AWG_SIZES.map((s): [string, number] => [`${s} AWG`, AWG_CIRCULAR_MILS[s]]),
  ...KCMIL_SIZES.map((s): [string, number] => [`${s} kcmil`, Number(s) * 1000]),
]);

/** True for a size in its canonical spelling. */
export function isConductorSize(value: unknown): value is ConductorSize {
  return typeof value === "string" && ORDER.has(value);
}

/**
 * Reads a conductor size as the trade writes it: `#8`, `8`, `8 AWG`, `1/0`, `0000`, `250`, `250 kcmil`, `250 MCM`.
 * A bare number up to 18 is a gauge and from 250 up is kcmil, as the tables print them; the two ranges do not meet.
 * @throws QuantityError naming the field when the size is not in the tables.
 */
export function parseConductorSize(value: unknown, field = "size"): ConductorSize {
  if (isConductorSize(value)) return value;
  const allowed = "18 AWG to 4/0 AWG, 250 kcmil to 2000 kcmil";
  if (typeof value !== "string" && typeof value !== "number") {
    throw new QuantityError(field, value === undefined || value === null ? "value is missing" : "expected a conductor size", allowed);
  }
  const text = String(value).trim().replace(/^(?:#|no\.?\s*)\s*/i, "").replace(/\s+/g, " ");
  const match = /^([0-9/]+)\s*(awg|kcmil|mcm)?$/i.exec(text);
  const digits = match?.[1] ?? "";
  const unit = (match?.[2] ?? "").toLowerCase();
  const gauge = /^0{1,4}$/.test(digits) ? `${digits.length}/0` : digits;
  const candidates = unit === "" ? [`${gauge} AWG`, `${gauge} kcmil`] : [unit === "awg" ? `${gauge} AWG` : `${gauge} kcmil`];
  const found = candidates.find(isConductorSize);
  if (found === undefined) throw new QuantityError(field, `"${String(value).slice(0, 40)}" is not a conductor size of the tables`, allowed);
  return found;
}

/** Position in the order of sizes, 0 = smallest. */
export function sizeIndex(size: ConductorSize, field = "size"): number {
  const index = ORDER.get(size);
  return index ?? sizeIndex(parseConductorSize(size, field), field);
}

/** Negative when `a` is smaller than `b`, 0 when equal, positive when larger: for sorting. */
export function compareSizes(a: ConductorSize, b: ConductorSize): number {
  return sizeIndex(a) - sizeIndex(b);
}

/** Area in circular mils (1 cmil = area of a circle of 0.001 in diameter), NEC Chapter 9 Table 8. */
export function circularMils(size: ConductorSize, field = "size"): number {
  return CIRCULAR_MILS.get(parseConductorSize(size, field)) ?? 0;
}

/**
 * Smallest size with at least the given area.
 * @throws QuantityError when the area is above the largest size.
 */
export function sizeForCircularMils(areaCmil: number, field = "areaCmil"): ConductorSize {
  if (!Number.isFinite(areaCmil) || areaCmil <= 0) throw new QuantityError(field, "expected an area above 0", "up to 2000000 cmil");
  // A proportional area that should meet a size exactly must not be lost to the last binary digit.
  const found = CONDUCTOR_SIZES.find((size) => circularMils(size) >= areaCmil * (1 - 1e-12));
  if (found === undefined) throw new QuantityError(field, `${areaCmil} cmil is above the largest size`, "up to 2000000 cmil");
  return found;
}

/** The next larger size, or null at the end of the table. */
export function nextLargerSize(size: ConductorSize): ConductorSize | null {
  return CONDUCTOR_SIZES[sizeIndex(size) + 1] ?? null;
}
