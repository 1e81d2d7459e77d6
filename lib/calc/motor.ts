import { standardRatingAtLeastA, standardRatingAtMostA, type Edition } from "@/lib/code";
import { MOTOR_OCPD_FACTOR } from "@/lib/code/tables/source-constants";
import { checkNumber, checkOneOf, FieldError } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export const MOTOR_DEVICES = ["inverse time breaker", "dual element fuse", "nontime delay fuse"] as const;

/**
 * Largest branch-circuit device of a single motor in A: share of the full-load current, next standard rating permitted.
 * The device protects against short circuit; the overload protection of the motor is another device.
 * @throws QuantityError naming the field. Source: 430.52 and its table, long-standing figures.
 */
export function motorDevice(input: { readonly edition: Edition; readonly fullLoadA: number; readonly device?: (typeof MOTOR_DEVICES)[number] }): CalcResult<number, { readonly limitA: number }> {
  const sheet = new Worksheet(input.edition);
  const flc = checkNumber("fullLoadA", input.fullLoadA, { min: 0, max: 2000, unit: "A", aboveMin: true });
  const device = checkOneOf("device", input.device ?? "inverse time breaker", MOTOR_DEVICES);
  const factor = MOTOR_OCPD_FACTOR[device];
  const limit = sheet.number("I", "share × full-load current", `${factor} × ${shown(flc)} A`, factor * flc, "A", "motor-ocpd");
  const value = sheet.number("In", "next standard rating permitted", `${shown(limit)} A`, standardRatingAtLeastA(limit, input.edition, device !== "inverse time breaker", "fullLoadA"), "A", "standard-ratings");
  return sheet.result(value, "A", { limitA: limit });
}

/**
 * Largest device in A of air-conditioning equipment: the standard rating not above the marked maximum.
 * @throws QuantityError naming the field; FieldError when the marking is below the first standard rating. Source: 440.4(B).
 */
export function hvacDevice(input: { readonly edition: Edition; readonly minimumCircuitA: number; readonly maximumDeviceA: number }): CalcResult<number, { readonly minimumCircuitA: number }> {
  const sheet = new Worksheet(input.edition);
  const minimum = checkNumber("minimumCircuitA", input.minimumCircuitA, { min: 0, max: 2000, unit: "A", aboveMin: true });
  const maximum = checkNumber("maximumDeviceA", input.maximumDeviceA, { min: 0, max: 4000, unit: "A", aboveMin: true });
  const standard = standardRatingAtMostA(maximum, input.edition);
  if (standard === null) throw new FieldError("maximumDeviceA", `${maximum} A is below the first standard rating`);
  const value = sheet.number("In", "standard rating not above the marked maximum", `${shown(maximum)} A`, standard, "A", "hvac-nameplate");
  return sheet.result(value, "A", { minimumCircuitA: minimum });
}
