import { defaultTorqueLbfIn, SCREW_CONNECTORS, smallScrewTorqueLbfIn, socketScrewTorqueLbfIn, type Edition, type ScrewConnector } from "@/lib/code";
import { checkNumber, checkOneOf, convert, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export const TORQUE_UNITS = ["lbf·in", "lbf·ft", "N·m"] as const;

/** Torque in all three units of the trade; the value is in `to`, unrounded. @throws QuantityError naming the field. */
export function convertTorque(input: { readonly edition: Edition; readonly torque: number; readonly from: (typeof TORQUE_UNITS)[number]; readonly to: (typeof TORQUE_UNITS)[number] }): CalcResult<number, { readonly lbfIn: number; readonly lbfFt: number; readonly newtonMeter: number }> {
  const sheet = new Worksheet(input.edition);
  const torque = checkNumber("torque", input.torque, { min: 0, max: 100000, unit: "" });
  const from = checkOneOf("from", input.from, TORQUE_UNITS);
  const to = checkOneOf("to", input.to, TORQUE_UNITS);
  const value = sheet.number("T", `${from} → ${to}`, `${shown(torque)} ${from}`, convert(torque, from, to, "torque"), to);
  return sheet.result(value, to, { lbfIn: convert(torque, from, "lbf·in"), lbfFt: convert(torque, from, "lbf·ft"), newtonMeter: convert(torque, from, "N·m") });
}

/**
 * Default tightening torque in lbf·in where the maker gives none. The value marked on the equipment or in its
 * instructions always comes first.
 * @throws QuantityError or CodeLookupError naming the field. Source: Informative Annex I, Tables I.1 to I.3.
 */
export function defaultTorque(
  input: { readonly edition: Edition } & (
    | { readonly screw: ScrewConnector; readonly size: ConductorSize }
    | { readonly screw: "small slotted"; readonly slotLengthIn: string; readonly wideSlot: boolean }
    | { readonly screw: "socket"; readonly acrossFlatsIn: string }
  ),
): CalcResult<number, { readonly newtonMeter: number }> {
  const sheet = new Worksheet(input.edition);
  checkOneOf("screw", input.screw, [...SCREW_CONNECTORS, "small slotted", "socket"]);
  let torque: number;
  let text: string;
  if (input.screw === "socket") [torque, text] = [socketScrewTorqueLbfIn(input.acrossFlatsIn), `${input.acrossFlatsIn} in across flats`];
  else if (input.screw === "small slotted") [torque, text] = [smallScrewTorqueLbfIn(input.slotLengthIn, input.wideSlot), `slot ${input.slotLengthIn} in, ${input.wideSlot ? "wide" : "narrow"}`];
  else {
    const size = parseConductorSize(input.size);
    [torque, text] = [defaultTorqueLbfIn(size, input.screw), `${size}, ${input.screw}`];
  }
  const value = sheet.number("T", "table, only without a value of the maker", text, torque, "lbf·in", "torque-defaults");
  sheet.cite("torque");
  return sheet.result(value, "lbf·in", { newtonMeter: convert(value, "lbf·in", "N·m") });
}
