import { QuantityError } from "./errors";

/**
 * Units by dimension. The factor turns one unit into the base unit of its dimension; all factors are exact by
 * definition (1 in = 25.4 mm, 1 lbf = 4.4482216152605 N) or exact products of such. Real power (W) and apparent
 * power (VA) are two dimensions on purpose: without a power factor one is not the other.
 */
const LBF_IN_NM = 4.4482216152605 * 0.0254;
const MM2_PER_IN2 = 25.4 * 25.4;
/** A circular mil is the area of a circle of one thousandth of an inch in diameter. */
const MM2_PER_CMIL = (Math.PI / 4) * 0.0254 * 0.0254;

const UNIT_TABLE = {
  A: { dimension: "current", factor: 1 },
  mA: { dimension: "current", factor: 1e-3 },
  kA: { dimension: "current", factor: 1e3 },
  V: { dimension: "voltage", factor: 1 },
  mV: { dimension: "voltage", factor: 1e-3 },
  kV: { dimension: "voltage", factor: 1e3 },
  W: { dimension: "power", factor: 1 },
  kW: { dimension: "power", factor: 1e3 },
  MW: { dimension: "power", factor: 1e6 },
  hp: { dimension: "power", factor: 745.6998715822702 },
  VA: { dimension: "apparent power", factor: 1 },
  kVA: { dimension: "apparent power", factor: 1e3 },
  Ah: { dimension: "charge", factor: 1 },
  Wh: { dimension: "energy", factor: 1 },
  kWh: { dimension: "energy", factor: 1e3 },
  MJ: { dimension: "energy", factor: 1e6 / 3600 },
  "Ω": { dimension: "resistance", factor: 1 },
  "mΩ": { dimension: "resistance", factor: 1e-3 },
  "kΩ": { dimension: "resistance", factor: 1e3 },
  "MΩ": { dimension: "resistance", factor: 1e6 },
  "Ω/kft": { dimension: "resistance per length", factor: 1 },
  "Ω/km": { dimension: "resistance per length", factor: 0.3048 },
  mm: { dimension: "length", factor: 1 },
  m: { dimension: "length", factor: 1000 },
  in: { dimension: "length", factor: 25.4 },
  ft: { dimension: "length", factor: 304.8 },
  "mm²": { dimension: "area", factor: 1 },
  "in²": { dimension: "area", factor: MM2_PER_IN2 },
  cmil: { dimension: "area", factor: MM2_PER_CMIL },
  kcmil: { dimension: "area", factor: MM2_PER_CMIL * 1000 },
  "cm³": { dimension: "volume", factor: 1 },
  "in³": { dimension: "volume", factor: 2.54 * 2.54 * 2.54 },
  "N·m": { dimension: "torque", factor: 1 },
  "lbf·in": { dimension: "torque", factor: LBF_IN_NM },
  "lbf·ft": { dimension: "torque", factor: LBF_IN_NM * 12 },
  "°C": { dimension: "temperature", factor: 1 },
  "°F": { dimension: "temperature", factor: 5 / 9 },
  "%": { dimension: "ratio", factor: 0.01 },
  Hz: { dimension: "frequency", factor: 1 },
  s: { dimension: "time", factor: 1 },
  min: { dimension: "time", factor: 60 },
  h: { dimension: "time", factor: 3600 },
} as const satisfies Record<string, { dimension: string; factor: number }>;

/** A unit symbol as printed. */
export type Unit = keyof typeof UNIT_TABLE;
/** What a unit measures; only units of one dimension convert into each other. */
export type Dimension = (typeof UNIT_TABLE)[Unit]["dimension"];

/** All unit symbols. */
export const UNITS = Object.keys(UNIT_TABLE) as readonly Unit[];

/** The dimension of a unit. */
export function dimensionOf(unit: Unit): Dimension {
  return UNIT_TABLE[unit].dimension;
}

/** True for a known unit symbol. */
export function isUnit(value: unknown): value is Unit {
  return typeof value === "string" && Object.hasOwn(UNIT_TABLE, value);
}

/**
 * Converts a value between two units of one dimension without rounding. Temperatures are points on the scale
 * (75 °F = 23.9 °C); use `convertTemperatureDifference` for a rise.
 * @throws QuantityError naming the field for a value that is not finite, an unknown unit or two dimensions.
 */
export function convert(value: number, from: Unit, to: Unit, field = "value"): number {
  if (typeof value !== "number" || !Number.isFinite(value)) throw new QuantityError(field, "expected a finite number");
  if (!isUnit(from) || !isUnit(to)) throw new QuantityError(field, `unit ${String(isUnit(from) ? to : from)} is not known`, UNITS.join(", "));
  if (dimensionOf(from) !== dimensionOf(to)) {
    throw new QuantityError(field, `${from} measures ${dimensionOf(from)}, ${to} measures ${dimensionOf(to)}`, unitsOf(dimensionOf(to)).join(", "));
  }
  if (from === to) return value;
  if (from === "°F" && to === "°C") return ((value - 32) * 5) / 9;
  if (from === "°C" && to === "°F") return (value * 9) / 5 + 32;
  const result = (value * UNIT_TABLE[from].factor) / UNIT_TABLE[to].factor;
  if (!Number.isFinite(result)) throw new QuantityError(field, "the converted value is not a finite number");
  return result;
}

/** Converts a difference of temperatures: a rise of 60 °F is a rise of 33.3 °C. @throws QuantityError. */
export function convertTemperatureDifference(value: number, from: "°C" | "°F", to: "°C" | "°F", field = "value"): number {
  if (!Number.isFinite(value)) throw new QuantityError(field, "expected a finite number");
  if (from === to) return value;
  return from === "°F" ? (value * 5) / 9 : (value * 9) / 5;
}

/** Units that share a dimension, in the order of the table. */
export function unitsOf(dimension: Dimension): readonly Unit[] {
  return UNITS.filter((unit) => dimensionOf(unit) === dimension);
}

/** Area in in² of a circle of the given diameter. */
export function circleAreaIn2(diameterIn: number): number {
  return (Math.PI / 4) * diameterIn * diameterIn;
}
