import { standardRatingAtLeastA, type Edition } from "@/lib/code";
import { checkInteger, checkNumber } from "@/lib/units";
import { requiredAmpacity } from "./required-ampacity";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export interface StringCurrentInput {
  readonly edition: Edition;
  readonly iscA: number;
  readonly impA?: number;
  readonly bifacialGain?: number;
  /** Strings in parallel on one input. */
  readonly parallelStrings: number;
  /** Current that the equipment can feed back into a string, A; 0 where none. */
  readonly backfeedA?: number;
  /** Series fuse rating of the module, A. */
  readonly moduleFuseA: number;
  /** Ampacity of the string conductors, A: they too must stand the current of the other strings. */
  readonly conductorAmpacityA?: number;
}

export interface StringCurrentDetail {
  /** Maximum current of one string, A. */
  readonly stringMaximumA: number;
  /** Maximum current of the input with all strings, A. */
  readonly inputMaximumA: number;
  /** Short-circuit and operating current of the input without factors, A. */
  readonly inputIscA: number;
  readonly inputImpA: number | null;
  /** Current that the other strings and the equipment can drive into a faulted string, A. */
  readonly reverseA: number;
  readonly stringFuseNeeded: boolean;
  /** Smallest standard string fuse, A, or null where none is needed. */
  readonly stringFuseA: number | null;
  /** False where the smallest fuse is above the series fuse rating of the module. */
  readonly fuseWithinModule: boolean | null;
}

/**
 * Maximum current of a PV input in A, and whether its strings need fuses.
 * @throws QuantityError naming the field. Source: 690.8(A), 690.8(B), 690.9(A), 690.9(B).
 */
export function stringCurrent(input: StringCurrentInput): CalcResult<number, StringCurrentDetail> {
  const sheet = new Worksheet(input.edition);
  const strings = checkInteger("parallelStrings", input.parallelStrings, { min: 1, max: 500, unit: "strings" });
  const isc = checkNumber("iscA", input.iscA, { min: 0, max: 100, unit: "A", aboveMin: true });
  const moduleFuse = checkNumber("moduleFuseA", input.moduleFuseA, { min: 0, max: 200, unit: "A", aboveMin: true });
  const backfeed = checkNumber("backfeedA", input.backfeedA ?? 0, { min: 0, max: 10000, unit: "A" });
  const one = requiredAmpacity({ edition: input.edition, use: { kind: "pv", currentA: isc, bifacialGain: input.bifacialGain } });
  sheet.include(one);
  const stringMaximum = one.detail.maximumA;
  const inputMaximum = sheet.number("Imax", "n × Imax of one string", `${strings} × ${shown(stringMaximum)} A`, strings * stringMaximum, "A", "pv-maximum-current");
  const reverse = sheet.number("Irev", "(n − 1) × Imax + backfeed", `${strings - 1} × ${shown(stringMaximum)} A + ${shown(backfeed)} A`, (strings - 1) * stringMaximum + backfeed, "A", "pv-ocpd-needed");
  const ampacity = input.conductorAmpacityA === undefined ? moduleFuse : checkNumber("conductorAmpacityA", input.conductorAmpacityA, { min: 0, max: 2000, unit: "A", aboveMin: true });
  const needed = reverse > Math.min(moduleFuse, ampacity);
  sheet.text("fuse", "Irev above the series fuse rating or the conductor", `${shown(reverse)} A, ${shown(moduleFuse)} A, ${shown(ampacity)} A`, needed ? "needed" : "not needed", "pv-ocpd-needed");
  const fuse = needed ? sheet.number("In", "standard rating not below 1.25 × Imax", `1.25 × ${shown(stringMaximum)} A`, standardRatingAtLeastA(one.value, input.edition, true), "A", "pv-ocpd") : null;
  const imp = input.impA === undefined ? null : checkNumber("impA", input.impA, { min: 0, max: 100, unit: "A", aboveMin: true });
  return sheet.result(inputMaximum, "A", {
    stringMaximumA: stringMaximum, inputMaximumA: inputMaximum, inputIscA: strings * isc, inputImpA: imp === null ? null : strings * imp,
    reverseA: reverse, stringFuseNeeded: needed, stringFuseA: fuse, fuseWithinModule: fuse === null ? null : fuse <= moduleFuse,
  });
}
