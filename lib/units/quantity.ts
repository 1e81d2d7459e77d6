import { convert, dimensionOf, isUnit, unitsOf, type Unit } from "./convert";
import { QuantityError } from "./errors";

/** A number with its unit. */
export interface Quantity {
  readonly value: number;
  readonly unit: Unit;
}

/** Spellings the trade uses, folded to lower case without blanks, dots, hyphens and degree signs. */
const SPELLINGS: Readonly<Record<string, Unit>> = {
  a: "A", amp: "A", amps: "A", ampere: "A", amperes: "A", ma: "mA", ka: "kA",
  v: "V", volt: "V", volts: "V", vdc: "V", vac: "V", kv: "kV",
  w: "W", watt: "W", watts: "W", kw: "kW", hp: "hp", va: "VA", kva: "kVA",
  ah: "Ah", wh: "Wh", kwh: "kWh", ohm: "Ω", ohms: "Ω", "ω": "Ω", kohm: "kΩ", "kω": "kΩ", megohm: "MΩ", megohms: "MΩ",
  mm: "mm", m: "m", in: "in", inch: "in", inches: "in", '"': "in", "″": "in", "''": "in",
  ft: "ft", foot: "ft", feet: "ft", "'": "ft", "′": "ft",
  mm2: "mm²", "mm²": "mm²", in2: "in²", "in²": "in²", sqin: "in²", cmil: "cmil", kcmil: "kcmil", mcm: "kcmil",
  in3: "in³", "in³": "in³", cuin: "in³", cm3: "cm³", "cm³": "cm³",
  nm: "N·m", lbfin: "lbf·in", inlbf: "lbf·in", lbin: "lbf·in", inlb: "lbf·in", inlbs: "lbf·in",
  lbfft: "lbf·ft", ftlbf: "lbf·ft", lbft: "lbf·ft", ftlb: "lbf·ft", ftlbs: "lbf·ft",
  c: "°C", f: "°F", degc: "°C", degf: "°F", "%": "%", hz: "Hz", s: "s", h: "h",
};
/** Spellings where the case carries the meaning: mΩ is a thousandth, MΩ a million; mA and MA likewise. */
const EXACT_SPELLINGS: Readonly<Record<string, Unit>> = {
  "mΩ": "mΩ", "mohm": "mΩ", "MΩ": "MΩ", "Mohm": "MΩ", mV: "mV", MW: "MW", MJ: "MJ", min: "min",
};
const FRACTIONS: Readonly<Record<string, string>> = { "¼": "1/4", "½": "1/2", "¾": "3/4", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8" };
const NUMBER = /^([+-]?)(?:(\d+)(?:-| )(\d+)\/(\d+)|(\d+)\/(\d+)|(\d{1,3}(?:,\d{3})+(?:\.\d+)?|\d+(?:\.\d*)?|\.\d+)(?:e([+-]?\d+))?)/i;

/**
 * Reads a quantity as the trade writes it: `1-1/4"`, `16 lbf·ft`, `192 lbf-in`, `25 N·m`, `−24 °C`, `75 °F`, `10,400 A`,
 * `5' 6"`. A number without a unit is refused: units are never supplied silently.
 * @throws QuantityError naming the field.
 */
export function parseQuantity(text: unknown, field = "value"): Quantity {
  if (typeof text !== "string") throw new QuantityError(field, text === undefined || text === null ? "value is missing" : "expected text with a unit");
  const clean = tidy(text);
  const feetAndInches = /^([+-]?\d+(?:\.\d+)?) ?(?:'|′|ft) ?(\d.*?) ?(?:"|″|in)$/i.exec(clean);
  if (feetAndInches) {
    const feet = readNumber(feetAndInches[1] ?? "", field).value;
    const inches = readNumber(feetAndInches[2] ?? "", field);
    if (inches.rest === "" && inches.value < 12) return { value: feet < 0 ? feet - inches.value / 12 : feet + inches.value / 12, unit: "ft" };
  }
  const { value, rest } = readNumber(clean, field, text);
  if (rest === "") throw new QuantityError(field, `"${text.slice(0, 40)}" has no unit`);
  const unit = readUnit(rest);
  if (unit === null) throw new QuantityError(field, `unit "${rest.slice(0, 20)}" is not known`);
  return { value, unit };
}

/**
 * Reads a quantity and converts it to the unit asked for.
 * @throws QuantityError naming the field, also when the unit measures something else.
 */
export function parseIn(text: unknown, unit: Unit, field = "value"): number {
  const quantity = parseQuantity(text, field);
  if (dimensionOf(quantity.unit) !== dimensionOf(unit)) {
    throw new QuantityError(field, `${quantity.unit} measures ${dimensionOf(quantity.unit)}, not ${dimensionOf(unit)}`, unitsOf(dimensionOf(unit)).join(", "));
  }
  return convert(quantity.value, quantity.unit, unit, field);
}

/** Reads a bare number or fraction (`1-1/4`, `10,400`, `−24`). @throws QuantityError when anything else follows. */
export function parseNumber(text: unknown, field = "value"): number {
  if (typeof text !== "string") throw new QuantityError(field, text === undefined || text === null ? "value is missing" : "expected text");
  const { value, rest } = readNumber(tidy(text), field, text);
  if (rest !== "") throw new QuantityError(field, `"${text.slice(0, 40)}" is not a plain number`);
  return value;
}

/** A unit by any spelling of the trade, or null. */
export function readUnit(text: string): Unit | null {
  const plain = text.trim().replace(/Ω/g, "Ω");
  if (isUnit(plain)) return plain;
  if (Object.hasOwn(EXACT_SPELLINGS, plain)) return EXACT_SPELLINGS[plain] ?? null;
  const folded = plain.toLowerCase().replace(/[\s.·⋅•*°º-]/g, "");
  return Object.hasOwn(SPELLINGS, folded) ? (SPELLINGS[folded] ?? null) : null;
}

function tidy(text: string): string {
  return text
    .trim()
    .replace(/[−–]/g, "-")
    .replace(/[\u00a0\u2009\u202f]/g, " ")
    .replace(/(\d)?([¼½¾⅛⅜⅝⅞])/g, (_, whole: string | undefined, sign: string) => (whole === undefined ? FRACTIONS[sign] : `${whole}-${FRACTIONS[sign]}`) ?? sign)
    .replace(/\s+/g, " ");
}

function readNumber(clean: string, field: string, shown: string = clean): { value: number; rest: string } {
  const match = NUMBER.exec(clean);
  if (!match) throw new QuantityError(field, `"${shown.slice(0, 40)}" does not start with a number`);
  const [whole, sign, mixedWhole, mixedTop, mixedBottom, top, bottom, decimal, exponent] = match;
  let value: number;
  if (mixedWhole !== undefined) value = Number(mixedWhole) + divide(Number(mixedTop), Number(mixedBottom), field);
  else if (top !== undefined) value = divide(Number(top), Number(bottom), field);
  else value = Number(`${(decimal ?? "").replace(/,/g, "")}${exponent === undefined ? "" : `e${exponent}`}`);
  if (!Number.isFinite(value)) throw new QuantityError(field, `"${shown.slice(0, 40)}" is not a finite number`);
  return { value: sign === "-" && value !== 0 ? -value : value, rest: clean.slice((whole ?? "").length).trim() };
}

/** Only fractions of a rule scale are read: `120/240` is a pair of voltages and `1/0` a conductor, not a half and no number. */
function divide(top: number, bottom: number, field: string): number {
  if (![2, 4, 8, 16, 32, 64].includes(bottom)) {
    throw new QuantityError(field, `"${top}/${bottom}" is not a fraction of a rule scale`, "halves to sixty-fourths");
  }
  return top / bottom;
}
