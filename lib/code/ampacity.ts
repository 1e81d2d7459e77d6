import { checkInteger, checkNumber, checkOneOf, parseConductorSize, type ConductorSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import type { ConductorRatingC } from "./insulation";
import { AMPACITY_ROWS } from "./tables/ampacity";
import { ADJUSTMENT_ROWS, CORRECTION_BASE_30C, CORRECTION_BASE_40C, CORRECTION_PV_WIRE } from "./tables/correction";
import { DWELLING_SERVICE_ROWS } from "./tables/dwelling-service";
import { PV_WIRE_AMPACITY_ROWS } from "./tables/pv-wire-ampacity";
import { ROOFTOP_ADDER_C, ROOFTOP_EXEMPT_INSULATION, ROOFTOP_HEIGHT_IN } from "./tables/wireway";
import { EDITIONS, MATERIALS, type Edition, type Material } from "./types";

const AMPACITY_BY_SIZE = new Map(AMPACITY_ROWS.map((row) => [row.size, row]));
const PV_AMPACITY_BY_SIZE = new Map(PV_WIRE_AMPACITY_ROWS.map((row) => [row.size, row]));
const COLUMNS: readonly ConductorRatingC[] = [60, 75, 90, 105, 125];

/**
 * Ampacity in A before correction and adjustment, by temperature column in °C: Table 310.16 for 60, 75, 90 °C and
 * the PV wire table for 105 and 125 °C.
 * @throws CodeLookupError where the table holds no value; QuantityError for an unknown size, metal or column.
 */
export function tableAmpacityA(size: ConductorSize, material: Material, columnC: ConductorRatingC): number {
  const key = parseConductorSize(size);
  checkOneOf("material", material, MATERIALS);
  checkOneOf("columnC", columnC, COLUMNS);
  let value: number | null | undefined;
  if (columnC === 105 || columnC === 125) value = material === "copper" ? PV_AMPACITY_BY_SIZE.get(key)?.[columnC] : undefined;
  else {
    const row = AMPACITY_BY_SIZE.get(key);
    const cells = material === "copper" ? row?.copper : row?.aluminum;
    value = cells?.[columnC === 60 ? 0 : columnC === 75 ? 1 : 2];
  }
  if (value === undefined || value === null) throw new CodeLookupError("size", `no ampacity of ${material} ${key} at ${columnC} °C in the table`);
  return value;
}

/**
 * Ambient correction factor, no unit. An ambient between two whole degrees takes the hotter band.
 * @param baseC 30 for Table 310.16, 40 for the tables of that base.
 * @throws CodeLookupError where the conductor may not be used at that ambient.
 */
export function ambientCorrectionFactor(ambientC: number, ratingC: ConductorRatingC, baseC: 30 | 40 = 30, field = "ambientC"): number {
  checkNumber(field, ambientC, { min: -60, max: 150, unit: "°C" });
  checkOneOf("ratingC", ratingC, COLUMNS);
  let factor: number | null | undefined;
  if (ratingC === 105 || ratingC === 125) factor = CORRECTION_PV_WIRE.find((band) => ambientC <= band.maxC)?.factors[ratingC];
  else factor = (baseC === 40 ? CORRECTION_BASE_40C : CORRECTION_BASE_30C).find((band) => ambientC <= band.maxC)?.factors[ratingC];
  if (factor === undefined || factor === null) {
    throw new CodeLookupError(field, `a ${ratingC} °C conductor may not be used at ${ambientC} °C`, `below ${ratingC} °C`);
  }
  return factor;
}

/** Adjustment factor for a number of current-carrying conductors, no unit: 1 for up to three. @throws QuantityError. */
export function bundlingFactor(currentCarryingCount: number, field = "currentCarryingCount"): number {
  checkInteger(field, currentCarryingCount, { min: 1, max: 1000, unit: "conductors" });
  const row = ADJUSTMENT_ROWS.find((item) => item.max === null || currentCarryingCount <= item.max);
  return (row?.percent ?? 100) / 100;
}

/**
 * Degrees in °C added to the outdoor ambient of a raceway or cable in sunlight above a roof: 33 below the height of the
 * edition, otherwise 0. XHHW-2 is exempt.
 * @param heightIn from the roof to the bottom of the raceway, in inches; null = not on a roof.
 */
export function rooftopAdderC(heightIn: number | null, insulation: string, edition: Edition, field = "rooftopHeightIn"): number {
  checkOneOf("edition", edition, EDITIONS);
  if (heightIn === null || insulation === ROOFTOP_EXEMPT_INSULATION) return 0;
  checkNumber(field, heightIn, { min: 0, max: 1200, unit: "in" });
  return heightIn < ROOFTOP_HEIGHT_IN[edition] ? ROOFTOP_ADDER_C : 0;
}

/**
 * Smallest conductor of a dwelling service or feeder of 100 to 400 A by the table.
 * @throws CodeLookupError for a rating that the table does not hold.
 */
export function dwellingServiceSize(ratingA: number, material: Material): ConductorSize {
  checkOneOf("material", material, MATERIALS);
  const row = DWELLING_SERVICE_ROWS.find((item) => item.ratingA === ratingA);
  if (row === undefined) {
    throw new CodeLookupError("ratingA", `no row for ${ratingA} A`, DWELLING_SERVICE_ROWS.map((item) => item.ratingA).join(", "));
  }
  return material === "copper" ? row.copper : row.aluminum;
}
