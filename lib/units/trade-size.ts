import { QuantityError } from "./errors";
import { parseNumber } from "./quantity";

/** Raceway trade sizes of NEC Chapter 9 Table 4. A trade size is a name: a 1/2 conduit is not 1/2 in wide anywhere. */
export const TRADE_SIZES = ["3/8", "1/2", "3/4", "1", "1-1/4", "1-1/2", "2", "2-1/2", "3", "3-1/2", "4", "5", "6"] as const;
export type TradeSize = (typeof TRADE_SIZES)[number];

const BY_INCHES = new Map<number, TradeSize>(TRADE_SIZES.map((size) => [parseNumber(size), size]));

/** Reads a trade size: `1-1/4`, `1 1/4"`, `1¼ in`, `1.25`. @throws QuantityError naming the field. */
export function parseTradeSize(value: unknown, field = "tradeSize"): TradeSize {
  const known = TRADE_SIZES.find((size) => size === value);
  if (known !== undefined) return known;
  const allowed = TRADE_SIZES.join(", ");
  if (typeof value !== "string" && typeof value !== "number") {
    throw new QuantityError(field, value === undefined || value === null ? "value is missing" : "expected a trade size", allowed);
  }
  const text = String(value).trim().replace(/\s*(?:"|″|in\.?|inch)$/i, "");
  let inches: number;
  try {
    inches = parseNumber(text, field);
  } catch {
    throw new QuantityError(field, `"${String(value).slice(0, 40)}" is not a trade size`, allowed);
  }
  const found = BY_INCHES.get(inches);
  if (found === undefined) throw new QuantityError(field, `"${String(value).slice(0, 40)}" is not a trade size`, allowed);
  return found;
}

/** The number in the name of a trade size, in inches: what 314.28 multiplies by 6 or 8. */
export function tradeSizeIn(size: TradeSize): number {
  return parseNumber(size, "tradeSize");
}
