import { QuantityError } from "./errors";

export interface NumberRange {
  readonly min: number;
  readonly max: number;
  /** Unit shown in the refusal. */
  readonly unit: string;
  /** True where the minimum itself is not accepted (a length of 0 ft is no length). */
  readonly aboveMin?: boolean;
}

/** Text of a range as it stands in an error: `0 to 2000 V`. */
export function rangeText(range: NumberRange): string {
  const low = range.aboveMin ? `above ${range.min}` : `${range.min}`;
  return `${low} to ${range.max}${range.unit === "" ? "" : ` ${range.unit}`}`;
}

/**
 * A finite number inside its range.
 * @throws QuantityError naming the field when the value is missing, no number, NaN, infinite or out of range.
 */
export function checkNumber(field: string, value: unknown, range: NumberRange): number {
  if (value === undefined || value === null) throw new QuantityError(field, "value is missing", rangeText(range));
  if (typeof value !== "number" || !Number.isFinite(value)) {
    throw new QuantityError(field, `expected a finite number, got ${describe(value)}`, rangeText(range));
  }
  if (value < range.min || value > range.max || (range.aboveMin === true && value === range.min)) {
    throw new QuantityError(field, `${value} is out of range`, rangeText(range));
  }
  return value;
}

/** A whole number inside its range. @throws QuantityError naming the field. */
export function checkInteger(field: string, value: unknown, range: NumberRange): number {
  const n = checkNumber(field, value, range);
  if (!Number.isInteger(n)) throw new QuantityError(field, `expected a whole number, got ${n}`, rangeText(range));
  return n;
}

/** One of a fixed list of words. @throws QuantityError naming the field and the list. */
export function checkOneOf<T extends string | number>(field: string, value: unknown, allowed: readonly T[]): T {
  const index = (allowed as readonly unknown[]).indexOf(value);
  const found = allowed[index];
  if (found === undefined) {
    const reason = value === undefined || value === null ? "value is missing" : `${describe(value)} is not known`;
    throw new QuantityError(field, reason, allowed.join(", "));
  }
  return found;
}

/** A list with at least `minLength` entries. @throws QuantityError naming the field. */
export function checkList<T>(field: string, value: readonly T[] | undefined | null, minLength = 1, maxLength = 1000): readonly T[] {
  if (!Array.isArray(value)) throw new QuantityError(field, "expected a list", `${minLength} to ${maxLength} entries`);
  if (value.length < minLength || value.length > maxLength) {
    throw new QuantityError(field, `list has ${value.length} entries`, `${minLength} to ${maxLength} entries`);
  }
  return value;
}

/** Result of arithmetic that must be finite: guards against overflow of inputs that were each in range. */
export function finiteResult(field: string, value: number): number {
  if (!Number.isFinite(value)) throw new QuantityError(field, "the result is not a finite number");
  return value;
}

function describe(value: unknown): string {
  if (typeof value === "string") return `"${value.slice(0, 40)}"`;
  if (typeof value === "number" || typeof value === "boolean") return String(value);
  return Array.isArray(value) ? "a list" : typeof value;
}
