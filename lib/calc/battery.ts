import type { Edition } from "@/lib/code";
import { checkNumber } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/**
 * Run time in h of a battery on a steady load. Common practice, no published source.
 * @throws QuantityError naming the field.
 */
export function batteryRunTime(input: {
  readonly edition: Edition; readonly energyKwh: number;
  /** Share of the energy that is used, 0.8 = 80 %. */
  readonly usableShare: number;
  /** Efficiency from battery to load. */
  readonly efficiency: number;
  readonly loadW: number;
}): CalcResult<number, { readonly usableKwh: number }> {
  const sheet = new Worksheet(input.edition);
  const energy = checkNumber("energyKwh", input.energyKwh, { min: 0, max: 1e5, unit: "kWh", aboveMin: true });
  const share = checkNumber("usableShare", input.usableShare, { min: 0, max: 1, unit: "as a share", aboveMin: true });
  const efficiency = checkNumber("efficiency", input.efficiency, { min: 0.5, max: 1, unit: "as a share" });
  const load = checkNumber("loadW", input.loadW, { min: 0, max: 1e7, unit: "W", aboveMin: true });
  const usable = sheet.number("Eu", "E × share × η", `${shown(energy)} kWh × ${shown(share)} × ${shown(efficiency)}`, energy * share * efficiency, "kWh");
  const hours = sheet.number("t", "Eu × 1000 / P", `${shown(usable)} kWh × 1000 / ${shown(load)} W`, (usable * 1000) / load, "h");
  return sheet.result(hours, "h", { usableKwh: usable });
}

/**
 * Charge current in A at the battery for a power taken from the source, and the time to take in a given energy.
 * Common practice, no published source.
 * @throws QuantityError naming the field.
 */
export function chargeCurrent(input: {
  readonly edition: Edition; readonly powerW: number; readonly efficiency: number; readonly batteryV: number;
  /** Largest charge current of the battery, A. */
  readonly limitA?: number;
  readonly energyKwh?: number;
}): CalcResult<number, { readonly withinLimit: boolean | null; readonly hours: number | null }> {
  const sheet = new Worksheet(input.edition);
  const power = checkNumber("powerW", input.powerW, { min: 0, max: 1e7, unit: "W", aboveMin: true });
  const efficiency = checkNumber("efficiency", input.efficiency, { min: 0.5, max: 1, unit: "as a share" });
  const volts = checkNumber("batteryV", input.batteryV, { min: 5, max: 1500, unit: "V" });
  const current = sheet.number("I", "P × η / V", `${shown(power)} W × ${shown(efficiency)} / ${shown(volts)} V`, (power * efficiency) / volts, "A");
  const limit = input.limitA === undefined ? null : checkNumber("limitA", input.limitA, { min: 0, max: 10000, unit: "A", aboveMin: true });
  const energy = input.energyKwh === undefined ? null : checkNumber("energyKwh", input.energyKwh, { min: 0, max: 1e5, unit: "kWh" });
  const hours = energy === null ? null : sheet.number("t", "E × 1000 / (P × η)", `${shown(energy)} kWh`, (energy * 1000) / (power * efficiency), "h");
  return sheet.result(current, "A", { withinLimit: limit === null ? null : current <= limit, hours });
}
