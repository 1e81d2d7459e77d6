import { pvVoltageFactor, type Edition } from "@/lib/code";
import { checkInteger, checkNumber, QuantityError } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** Temperature coefficient in percent of the rated value per °C, or in volt per °C of one module. Negative for silicon. */
export type VoltageCoefficient = { readonly pctPerC: number } | { readonly voltPerC: number };

export interface StringVoltageInput {
  readonly edition: Edition;
  readonly modulesInSeries: number;
  readonly vocV: number;
  readonly vmpV?: number;
  /** Coefficient of Voc, or `table` for the factors of Table 690.7(A) (crystalline silicon only). */
  readonly vocCoefficient: VoltageCoefficient | "table";
  readonly vmpCoefficient?: VoltageCoefficient;
  /** Lowest expected ambient, °C. */
  readonly lowestC: number;
  /** Highest cell temperature: 2 % design ambient plus the rise of the mounting, °C. */
  readonly highestCellC?: number;
  /** Limit to show the largest number of modules for, V. */
  readonly limitV?: number;
}

export interface StringVoltageDetail {
  readonly coldVocPerModuleV: number;
  readonly hotVmpV: number | null;
  readonly coldVmpV: number | null;
  /** Modules in series that stay within `limitV`, or null. */
  readonly largestModuleCount: number | null;
}

const STC_C = 25;

/**
 * Highest open-circuit voltage of a string in V at the lowest ambient, with hot and cold operating voltage.
 * @throws QuantityError or CodeLookupError naming the field. Source: 690.7(A).
 */
export function stringVoltage(input: StringVoltageInput): CalcResult<number, StringVoltageDetail> {
  const sheet = new Worksheet(input.edition);
  const n = checkInteger("modulesInSeries", input.modulesInSeries, { min: 1, max: 200, unit: "modules" });
  const voc = checkNumber("vocV", input.vocV, { min: 0, max: 1500, unit: "V", aboveMin: true });
  const lowest = checkNumber("lowestC", input.lowestC, { min: -60, max: 60, unit: "°C" });
  const perModule = input.vocCoefficient === "table"
    ? sheet.number("Vcold", "Voc × factor of the table", `${shown(voc)} V × ${pvVoltageFactor(lowest)} (${shown(lowest)} °C)`, voc * pvVoltageFactor(lowest), "V", "pv-voltage-table")
    : corrected(sheet, "Vcold", "vocCoefficient", voc, input.vocCoefficient, lowest, "pv-voltage");
  const cold = sheet.number("Vmax", "n × Vcold", `${n} × ${shown(perModule)} V`, n * perModule, "V", "pv-voltage");
  let hotVmp: number | null = null;
  let coldVmp: number | null = null;
  if (input.vmpV !== undefined) {
    const vmp = checkNumber("vmpV", input.vmpV, { min: 0, max: 1500, unit: "V", aboveMin: true });
    if (input.vmpCoefficient === undefined) throw new QuantityError("vmpCoefficient", "value is missing", "percent or volt per °C");
    coldVmp = sheet.number("Vmp,cold", "n × Vmp at the lowest ambient", `${n} modules`, n * corrected(sheet, "Vmp", "vmpCoefficient", vmp, input.vmpCoefficient, lowest), "V");
    if (input.highestCellC !== undefined) {
      const cell = checkNumber("highestCellC", input.highestCellC, { min: 0, max: 120, unit: "°C" });
      hotVmp = sheet.number("Vmp,hot", "n × Vmp at the highest cell temperature", `${n} modules`, n * corrected(sheet, "Vmp", "vmpCoefficient", vmp, input.vmpCoefficient, cell), "V");
    }
  }
  let largest: number | null = null;
  if (input.limitV !== undefined) {
    const limit = checkNumber("limitV", input.limitV, { min: 0, max: 3000, unit: "V", aboveMin: true });
    largest = sheet.number("nmax", "limit / Vcold, rounded down", `${shown(limit)} V / ${shown(perModule)} V`, Math.floor(limit / perModule + 1e-9), "modules");
  }
  return sheet.result(cold, "V", { coldVocPerModuleV: perModule, hotVmpV: hotVmp, coldVmpV: coldVmp, largestModuleCount: largest });
}

function corrected(sheet: Worksheet, symbol: string, field: string, rated: number, coefficient: VoltageCoefficient, temperatureC: number, meaning?: string): number {
  const difference = temperatureC - STC_C;
  if ("pctPerC" in coefficient) {
    const beta = checkNumber(`${field}.pctPerC`, coefficient.pctPerC, { min: -2, max: 0, unit: "%/°C" });
    return sheet.number(symbol, "V × (1 + β × (T − 25))", `${shown(rated)} V × (1 + ${shown(beta)} % × ${shown(difference)} °C)`, Math.max(0, rated * (1 + (beta / 100) * difference)), "V", meaning);
  }
  const beta = checkNumber(`${field}.voltPerC`, coefficient.voltPerC, { min: -5, max: 0, unit: "V/°C" });
  return sheet.number(symbol, "V + β × (T − 25)", `${shown(rated)} V + ${shown(beta)} V/°C × ${shown(difference)} °C`, Math.max(0, rated + beta * difference), "V", meaning);
}
