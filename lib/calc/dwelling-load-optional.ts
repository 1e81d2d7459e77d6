import { standardRatingAtLeastA, type Edition } from "@/lib/code";
import {
  DWELLING_SERVICE_MIN_RATING_A, EXISTING_FULL_VA, EXISTING_SHARE, MEASURED_FACTOR, OPTIONAL_FULL_VA, OPTIONAL_HEAT_MANY_UNITS, OPTIONAL_HEAT_SHARE_FEW, OPTIONAL_HEAT_SHARE_MANY, OPTIONAL_SHARE, OPTIONAL_SUPPLEMENT_SHARE,
} from "@/lib/code/tables/dwelling-load";
import { checkInteger, checkList, checkNumber } from "@/lib/units";
import { finishLoad, generalLoad, VA, type DwellingLoadDetail, type GeneralLoad } from "./dwelling-load";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export interface OptionalLoadInput extends GeneralLoad {
  readonly edition: Edition;
  /** Nameplates of ranges, ovens, dryers, water heaters, fastened appliances and motors, VA. */
  readonly nameplatesVa: readonly number[];
  readonly coolingVa?: number;
  readonly heatPumpVa?: number;
  /** Electric heat that supplements the heat pump; leave out where the two are locked out from each other. */
  readonly supplementHeatVa?: number;
  readonly spaceHeatVa?: number;
  /** Separately controlled heating units. */
  readonly spaceHeatUnits?: number;
  readonly voltageV?: number;
}

/**
 * Service load in VA of a one-family dwelling, optional method: 10 kVA at 100 %, rest at 40 %, largest heating or cooling.
 * @throws QuantityError naming the field. Source: 220.82, Annex D examples D2(a) and D2(c).
 */
export function dwellingLoadOptional(input: OptionalLoadInput): CalcResult<number, DwellingLoadDetail> {
  const sheet = new Worksheet(input.edition);
  const general = sheet.number("Sg", "general load + nameplates", `${input.nameplatesVa?.length ?? 0} nameplates`, generalLoad(sheet, input) + nameplates(input.nameplatesVa), "VA", "load-optional");
  const demand = sliced(sheet, general, OPTIONAL_FULL_VA, OPTIONAL_SHARE, "load-optional");
  const units = checkInteger("spaceHeatUnits", input.spaceHeatUnits ?? 1, { min: 1, max: 100, unit: "units" });
  const share = units >= OPTIONAL_HEAT_MANY_UNITS ? OPTIONAL_HEAT_SHARE_MANY : OPTIONAL_HEAT_SHARE_FEW;
  const cooling = checkNumber("coolingVa", input.coolingVa ?? 0, VA);
  const pump = checkNumber("heatPumpVa", input.heatPumpVa ?? 0, VA) + OPTIONAL_SUPPLEMENT_SHARE * checkNumber("supplementHeatVa", input.supplementHeatVa ?? 0, VA);
  const heat = share * checkNumber("spaceHeatVa", input.spaceHeatVa ?? 0, VA);
  const largest = sheet.number("Sh", "largest of cooling, heat pump with 65 % supplement, space heat by share", `max(${shown(cooling)}, ${shown(pump)}, ${shown(heat)}) VA`, Math.max(cooling, pump, heat), "VA", "load-optional");
  const total = sheet.number("S", "sum", `${shown(demand)} VA + ${shown(largest)} VA`, demand + largest, "VA", "load-optional");
  return finishLoad(sheet, input.edition, total, input.voltageV, { generalVa: general, generalDemandVa: demand, heatOrCoolingVa: largest, neutralVa: null });
}

/**
 * Load in VA of an existing dwelling with new loads: 8 kVA at 100 %, rest at 40 %, new heating or cooling at 100 %.
 * @throws QuantityError naming the field. Source: 220.83, from memory.
 */
export function dwellingLoadExisting(input: GeneralLoad & {
  readonly edition: Edition; readonly nameplatesVa: readonly number[];
  /** Heating or cooling where new equipment of that kind is added: the larger of the two, VA. */
  readonly heatVa?: number; readonly coolingVa?: number; readonly voltageV?: number;
}): CalcResult<number, DwellingLoadDetail> {
  const sheet = new Worksheet(input.edition);
  const general = sheet.number("Sg", "general load + nameplates, existing and new", `${input.nameplatesVa?.length ?? 0} nameplates`, generalLoad(sheet, input) + nameplates(input.nameplatesVa), "VA", "load-existing");
  const demand = sliced(sheet, general, EXISTING_FULL_VA, EXISTING_SHARE, "load-existing");
  const largest = Math.max(checkNumber("heatVa", input.heatVa ?? 0, VA), checkNumber("coolingVa", input.coolingVa ?? 0, VA));
  const total = sheet.number("S", "demand + larger of heating and cooling", `${shown(demand)} VA + ${shown(largest)} VA`, demand + largest, "VA", "load-existing");
  return finishLoad(sheet, input.edition, total, input.voltageV, { generalVa: general, generalDemandVa: demand, heatOrCoolingVa: largest, neutralVa: null });
}

/**
 * Load in A from a recorded maximum demand of the existing installation: 125 % of it plus the new load.
 * @throws QuantityError naming the field. Source: 220.87, from memory.
 */
export function existingLoadMeasured(input: { readonly edition: Edition; readonly maximumDemandA: number; readonly newLoadA: number; readonly serviceRatingA: number }): CalcResult<number, { readonly fits: boolean }> {
  const sheet = new Worksheet(input.edition);
  const range = { min: 0, max: 10000, unit: "A" } as const;
  const measured = checkNumber("maximumDemandA", input.maximumDemandA, range);
  const added = checkNumber("newLoadA", input.newLoadA, range);
  const rating = checkNumber("serviceRatingA", input.serviceRatingA, { ...range, aboveMin: true });
  const value = sheet.number("I", "1.25 × maximum demand + new load", `${MEASURED_FACTOR} × ${shown(measured)} A + ${shown(added)} A`, MEASURED_FACTOR * measured + added, "A", "load-measured");
  return sheet.result(value, "A", { fits: value <= rating });
}

/** One row of a line-by-line sum: current on line A, neutral and line B, A. */
export interface LineLoad {
  readonly label: string;
  readonly lineA: number;
  readonly neutral: number;
  readonly lineB: number;
  /** Largest motor current of this row on each conductor, where it holds one. */
  readonly motorA?: readonly [number, number, number];
}

/**
 * Currents in A on both lines and the neutral of a single-phase service, row by row, with 25 % of the largest motor on
 * each. The value is the larger line.
 * @throws QuantityError naming the field. Source: layout of Annex D example D1(b).
 */
export function lineCurrents(input: { readonly edition: Edition; readonly rows: readonly LineLoad[] }): CalcResult<number, { readonly lineA: number; readonly neutral: number; readonly lineB: number; readonly serviceRatingA: number }> {
  const sheet = new Worksheet(input.edition);
  const range = { min: 0, max: 10000, unit: "A" } as const;
  const sum: [number, number, number] = [0, 0, 0];
  const motor: [number, number, number] = [0, 0, 0];
  checkList("rows", input.rows, 1, 200).forEach((row, index) => {
    const cells = [checkNumber(`rows.${index}.lineA`, row.lineA, range), checkNumber(`rows.${index}.neutral`, row.neutral, range), checkNumber(`rows.${index}.lineB`, row.lineB, range)] as const;
    ([0, 1, 2] as const).forEach((k) => {
      sum[k] += cells[k];
      motor[k] = Math.max(motor[k], checkNumber(`rows.${index}.motorA.${k}`, row.motorA?.[k] ?? 0, range));
    });
  });
  const [lineA, neutral, lineB] = ([0, 1, 2] as const).map((k) => sheet.number(k === 1 ? "N" : k === 0 ? "A" : "B", "sum + 25 % of the largest motor", `${shown(sum[k])} A + 0.25 × ${shown(motor[k])} A`, sum[k] + 0.25 * motor[k], "A", "load-motor")) as [number, number, number];
  const value = Math.max(lineA, lineB);
  const rating = sheet.number("In", "standard rating, not below 100 A", `${shown(value, 1)} A`, Math.max(DWELLING_SERVICE_MIN_RATING_A, standardRatingAtLeastA(value, input.edition)), "A", "load-service-minimum");
  return sheet.result(value, "A", { lineA, neutral, lineB, serviceRatingA: rating });
}

function nameplates(values: readonly number[]): number {
  return checkList("nameplatesVa", values, 0, 100).reduce((sum, va, index) => sum + checkNumber(`nameplatesVa.${index}`, va, VA), 0);
}

function sliced(sheet: Worksheet, generalVa: number, fullVa: number, share: number, meaning: string): number {
  const demand = Math.min(generalVa, fullVa) + share * Math.max(0, generalVa - fullVa);
  return sheet.number("Sg'", `${shown(fullVa)} VA at 100 %, rest at ${shown(share * 100)} %`, `${shown(generalVa)} VA`, demand, "VA", meaning);
}
