import type { Unit } from "./convert";
import { QuantityError } from "./errors";

const SCALES: readonly number[] = [1, 10, 100, 1e3, 1e4, 1e5, 1e6];

/** Rounds half away from zero to a number of decimals; only for showing, never inside a calculation. */
export function roundForShow(value: number, decimals: number): number {
  if (!Number.isFinite(value)) throw new QuantityError("value", "expected a finite number");
  const scale = SCALES[decimals] ?? 10 ** decimals;
  // The relative nudge lets 2.675 round to 2.68 although its nearest double lies just below.
  const scaled = Math.abs(value) * scale;
  // From 2^53 on a double holds no fraction that could be rounded.
  const result = scaled < Number.MAX_SAFE_INTEGER ? Math.round(scaled * (1 + Number.EPSILON * 4)) / scale : Math.abs(value);
  return value < 0 && result !== 0 ? -result : result;
}

/**
 * A number as printed on a sheet: thousands with a comma, a real minus sign, no trailing zeros unless asked for.
 * `decimals` is the most that are shown.
 */
export function formatNumber(value: number, decimals = 2, keepZeros = false): string {
  const rounded = roundForShow(value, decimals);
  const size = Math.abs(rounded);
  // The usual case without grouping; below 1e-6 a number prints with an exponent and goes the long way.
  if (!keepZeros && size < 1000 && (size >= 1e-6 || size === 0)) return rounded < 0 ? `−${size}` : `${size}`;
  const text = keepZeros ? size.toFixed(decimals) : String(size);
  if (text.includes("e")) return rounded < 0 ? `−${text}` : text;
  const [whole = "0", fraction] = text.split(".");
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, ",") : whole;
  return `${rounded < 0 ? "−" : ""}${grouped}${fraction === undefined ? "" : `.${fraction}`}`;
}

/** A quantity as printed: `31.7 A`, `−24 °C`, `28.4 %`. */
export function formatQuantity(value: number, unit: Unit, decimals = 2): string {
  return `${formatNumber(value, decimals)} ${unit}`;
}

/** A length in inches as the trade writes it, to the nearest sixteenth: `1-1/4"`. Exact sixteenths only, otherwise decimals. */
export function formatInches(valueIn: number): string {
  if (!Number.isFinite(valueIn) || valueIn < 0) throw new QuantityError("valueIn", "expected a length of 0 or more", "0 and above");
  const sixteenths = valueIn * 16;
  if (Math.abs(sixteenths - Math.round(sixteenths)) > 1e-9) return `${formatNumber(valueIn, 3)}"`;
  let top = Math.round(sixteenths) % 16;
  let bottom = 16;
  while (top !== 0 && top % 2 === 0) {
    top /= 2;
    bottom /= 2;
  }
  const whole = Math.floor(Math.round(sixteenths) / 16);
  if (top === 0) return `${whole}"`;
  return whole === 0 ? `${top}/${bottom}"` : `${whole}-${top}/${bottom}"`;
}
