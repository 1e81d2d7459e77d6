import { isStandardRatingA, MATERIALS, smallConductorLimitA, standardRatingAtLeastA, standardRatingAtMostA, type Edition, type Material } from "@/lib/code";
import { NEXT_SIZE_UP_LIMIT_A } from "@/lib/code/tables/overcurrent";
import { DWELLING_SERVICE_FACTOR, DWELLING_SERVICE_MAX_A, DWELLING_SERVICE_MIN_A } from "@/lib/code/tables/dwelling-service";
import { checkNumber, checkOneOf, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

const CURRENT = { min: 0, max: 100000, unit: "A", aboveMin: true } as const;

export interface LargestDeviceInput {
  readonly edition: Edition;
  /** Ampacity of the circuit conductors, all sets, A. */
  readonly ampacityA: number;
  readonly size: ConductorSize;
  readonly material: Material;
  /** False for taps, transformer secondaries, branch circuits with several receptacles and conductors leaving storage. Default true. */
  readonly roundUp?: boolean;
  /** False for motor, air-conditioning and other circuits of 240.4(E) and (G). Default true. */
  readonly smallConductorLimit?: boolean;
  /** Dwelling service or feeder that carries the whole load of the dwelling: 83 % rule. */
  readonly dwelling83?: boolean;
  /** Largest device by the nameplate of the equipment, A, or null. */
  readonly nameplateMaxA?: number | null;
  readonly fuse?: boolean;
}

export interface LargestDeviceDetail {
  readonly byConductorA: number;
  readonly smallConductorLimitA: number | null;
  readonly nameplateMaxA: number | null;
  readonly governedBy: "conductor" | "next size up" | "small conductor" | "nameplate" | "83 % rule";
  /** The largest standard rating within the value, or null where none is. */
  readonly standardA: number | null;
}

/**
 * Largest overcurrent device in A that the conductors and the equipment permit.
 * @throws QuantityError or CodeLookupError naming the field. Source: 240.4(B), (C), (D), 240.6(A), 110.3(B), 310.12.
 */
export function largestOvercurrentDevice(input: LargestDeviceInput): CalcResult<number, LargestDeviceDetail> {
  const { edition } = input;
  const sheet = new Worksheet(edition);
  const ampacity = checkNumber("ampacityA", input.ampacityA, CURRENT);
  const size = parseConductorSize(input.size);
  const material = checkOneOf("material", input.material, MATERIALS);
  let governedBy: LargestDeviceDetail["governedBy"] = "conductor";
  let byConductor = ampacity;
  if (input.dwelling83 === true && ampacity / DWELLING_SERVICE_FACTOR >= DWELLING_SERVICE_MIN_A) {
    const rating = Math.min(ampacity / DWELLING_SERVICE_FACTOR, Math.max(ampacity, DWELLING_SERVICE_MAX_A));
    byConductor = sheet.number("In", "A / 0.83, to 400 A", `${shown(ampacity, 2)} A / ${DWELLING_SERVICE_FACTOR}`, rating, "A", "dwelling-83");
    governedBy = "83 % rule";
  } else if ((input.roundUp ?? true) && !isStandardRatingA(ampacity, edition, input.fuse) && ampacity < NEXT_SIZE_UP_LIMIT_A) {
    byConductor = sheet.number("In", "next standard rating, to 800 A", `above ${shown(ampacity, 2)} A`, standardRatingAtLeastA(ampacity, edition, input.fuse), "A", "next-size-up");
    governedBy = "next size up";
  } else {
    sheet.number("In", "not above the ampacity", `${shown(ampacity, 2)} A`, ampacity, "A", ampacity > NEXT_SIZE_UP_LIMIT_A ? "above-800" : "conductor-protection");
  }
  let value = byConductor;
  const small = (input.smallConductorLimit ?? true) ? smallConductorLimitA(size, material, edition) : null;
  if (small !== null) {
    sheet.number("In", "limit of small conductors", `${size} ${material}`, small, "A", "small-conductor");
    if (small < value) [value, governedBy] = [small, "small conductor"];
  }
  const nameplate = input.nameplateMaxA === undefined || input.nameplateMaxA === null ? null : checkNumber("nameplateMaxA", input.nameplateMaxA, CURRENT);
  if (nameplate !== null) {
    sheet.number("In", "largest device by the nameplate", "", nameplate, "A", "nameplate");
    if (nameplate < value) [value, governedBy] = [nameplate, "nameplate"];
  }
  const standard = standardRatingAtMostA(value, edition, input.fuse);
  sheet.number("Inmax", "smallest of the limits", "", value, "A");
  return sheet.result(value, "A", { byConductorA: byConductor, smallConductorLimitA: small, nameplateMaxA: nameplate, governedBy, standardA: standard });
}

/**
 * Smallest standard overcurrent device in A for a current that already holds its margin (125 % where asked).
 * @throws QuantityError or CodeLookupError naming the field. Source: Table 240.6(A).
 */
export function smallestOvercurrentDevice(input: { readonly edition: Edition; readonly requiredA: number; readonly fuse?: boolean }): CalcResult<number, { readonly isStandard: boolean }> {
  const sheet = new Worksheet(input.edition);
  const required = checkNumber("requiredA", input.requiredA, CURRENT);
  const rating = sheet.number("In", "standard rating not below", `${shown(required, 2)} A`, standardRatingAtLeastA(required, input.edition, input.fuse, "requiredA"), "A", "standard-ratings");
  return sheet.result(rating, "A", { isStandard: isStandardRatingA(required, input.edition, input.fuse) });
}
