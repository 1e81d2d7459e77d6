import type { Property, PropertyValue } from "@/lib/equipment/define";
import { formatNumber, isUnit, parseIn, parseNumber, QuantityError } from "@/lib/units";

export type FieldAnswer = { readonly ok: true; readonly value: PropertyValue } | { readonly ok: false; readonly reason: string };

const YES = new Set(["yes", "y", "true", "1"]);
const NO = new Set(["no", "n", "false", "0"]);

/**
 * Reads a number as people write it into a field that names its unit: bare, or with any unit of the same quantity
 * (10 kA in a field of A). Empty means not known.
 */
export function readNumber(text: string, unit: string, low: number, high: number, integer = false): FieldAnswer {
  if (text.trim() === "") return { ok: true, value: null };
  let value: number;
  try {
    const bare = /^[+\-−–]?[\d\s.,/¼½¾⅛⅜⅝⅞-]+(e[+-]?\d+)?$/i.test(text.trim());
    value = bare || !isUnit(unit) ? parseNumber(text) : parseIn(text, unit);
  } catch (error) {
    if (error instanceof QuantityError) return { ok: false, reason: error.message.replace(/^value: /, "") };
    throw error;
  }
  if (integer && !Number.isInteger(value)) return { ok: false, reason: "write a whole number" };
  if (value < low || value > high) return { ok: false, reason: `write ${formatNumber(low, 3)} to ${formatNumber(high, 3)}${unit ? ` ${unit}` : ""}` };
  return { ok: true, value };
}

/** Reads the text of a field by its property's description. Empty is `null`: not known. */
export function readProperty(text: string, property: Property): FieldAnswer {
  const trimmed = text.trim();
  if (trimmed === "") return { ok: true, value: null };
  switch (property.type) {
    case "number": return readNumber(text, property.unit, property.min, property.max, property.integer);
    case "flag": return YES.has(trimmed.toLowerCase()) ? { ok: true, value: true } : NO.has(trimmed.toLowerCase()) ? { ok: true, value: false } : { ok: false, reason: "write yes or no" };
    case "choice": {
      const option = property.options.find((each) => each.toLowerCase() === trimmed.toLowerCase());
      return option === undefined ? { ok: false, reason: `choose ${property.options.join(", ")}` } : { ok: true, value: option };
    }
    case "text": return trimmed.length > property.maxLength ? { ok: false, reason: `at most ${property.maxLength} characters` } : { ok: true, value: trimmed };
  }
}

/** A value as its field shows it; not known is empty. */
export function showValue(value: PropertyValue | undefined): string {
  if (value === null || value === undefined) return "";
  if (typeof value === "boolean") return value ? "yes" : "no";
  return typeof value === "number" ? formatNumber(value, 4) : value;
}
