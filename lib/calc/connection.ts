import type { Edition, Material } from "@/lib/code";
import { CONTINUOUS_FACTOR, SUPPLY_SIDE_MIN_SIZE, TAP_SHARE_10_FT, TAP_SHARE_25_FT } from "@/lib/code/tables/source-constants";
import { checkList, checkNumber, checkOneOf, compareSizes, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

const CURRENT = { min: 0, max: 10000, unit: "A" } as const;

function sum(field: string, values: readonly number[]): number {
  return checkList(field, values, 1, 200).reduce((total, value, index) => total + checkNumber(`${field}.${index}`, value, CURRENT), 0);
}

/**
 * Ampacity in A that a feeder needs on the load side of a source connection, and whether the feeder complies with the
 * device on the load side of the connection where there is one.
 * @throws QuantityError naming the field. Source: 705.12(B)(2)(1) of 2017, 705.12(B)(1) of 2020, 705.12(A)(2) of 2023.
 */
export function feederWithSource(input: {
  readonly edition: Edition; readonly feederOcpdA: number; readonly feederAmpacityA: number; readonly sourceOutputsA: readonly number[];
  /** Device on the load side of the connection, A, or null. */
  readonly loadSideOcpdA?: number | null;
}): CalcResult<number, { readonly complies: boolean; readonly by: "ampacity" | "load-side device" | "none" }> {
  const sheet = new Worksheet(input.edition);
  const device = checkNumber("feederOcpdA", input.feederOcpdA, CURRENT);
  const ampacity = checkNumber("feederAmpacityA", input.feederAmpacityA, CURRENT);
  const source = sum("sourceOutputsA", input.sourceOutputsA);
  const required = sheet.number("A", "feeder device + 1.25 × Σ output current", `${shown(device)} A + ${CONTINUOUS_FACTOR} × ${shown(source)} A`, device + CONTINUOUS_FACTOR * source, "A", "feeder-with-source");
  const loadSide = input.loadSideOcpdA === undefined || input.loadSideOcpdA === null ? null : checkNumber("loadSideOcpdA", input.loadSideOcpdA, CURRENT);
  const by = ampacity >= required - 1e-9 ? "ampacity" : loadSide !== null && loadSide <= ampacity ? "load-side device" : "none";
  sheet.text("result", "ampacity, or load-side device not above it", `${shown(ampacity)} A${loadSide === null ? "" : `, ${shown(loadSide)} A`}`, by, "feeder-with-source");
  return sheet.result(required, "A", { complies: by !== "none", by });
}

/**
 * Smallest ampacity in A of a feeder tap beyond a source connection.
 * 2017 and 2020: the share of 240.21(B) of feeder device plus 125 % of the output currents. From 2023: one third of the
 * feeder device plus the source devices for 25 ft taps, plain 240.21(B) for 10 ft taps. Never below the device at the end.
 * @throws QuantityError naming the field.
 */
export function tapWithSource(input: {
  readonly edition: Edition; readonly tap: "10 ft" | "25 ft"; readonly feederOcpdA: number;
  readonly sourceOutputsA: readonly number[]; readonly sourceOcpdsA: readonly number[]; readonly tapOcpdA: number;
}): CalcResult<number, { readonly baseA: number; readonly shareA: number }> {
  const sheet = new Worksheet(input.edition);
  const tap = checkOneOf("tap", input.tap, ["10 ft", "25 ft"] as const);
  const feeder = checkNumber("feederOcpdA", input.feederOcpdA, CURRENT);
  const end = checkNumber("tapOcpdA", input.tapOcpdA, CURRENT);
  const share = tap === "10 ft" ? TAP_SHARE_10_FT : TAP_SHARE_25_FT;
  const byDevices = input.edition === "2023" || input.edition === "2026";
  const outputs = sum("sourceOutputsA", input.sourceOutputsA);
  const devices = sum("sourceOcpdsA", input.sourceOcpdsA);
  let base: number;
  if (!byDevices) {
    base = sheet.number("B", "feeder device + 1.25 × Σ output current", `${shown(feeder)} A + ${CONTINUOUS_FACTOR} × ${shown(outputs)} A`, feeder + CONTINUOUS_FACTOR * outputs, "A", "tap-with-source");
  } else if (tap === "25 ft") {
    base = sheet.number("B", "feeder device + Σ source devices", `${shown(feeder)} A + ${shown(devices)} A`, feeder + devices, "A", "tap-with-source");
  } else base = sheet.number("B", "feeder device", "", feeder, "A", "tap-conductors");
  const shareA = sheet.number("S", tap === "10 ft" ? "B / 10" : "B / 3", `${shown(base)} A × ${shown(share)}`, base * share, "A", "tap-conductors");
  const value = sheet.number("A", "max(S, device at the end of the tap)", `max(${shown(shareA, 2)} A, ${shown(end)} A)`, Math.max(shareA, end), "A", "tap-conductors");
  return sheet.result(value, "A", { baseA: base, shareA });
}

/**
 * Supply-side connection. 2017: sum of the source devices against the service rating; from 2020: sum of the output
 * currents against the ampacity of the service conductors, and a least conductor size.
 * @returns the sum in A. @throws QuantityError naming the field. Source: 705.12(A) of 2017, 705.11 from 2020.
 */
export function supplySideConnection(input: {
  readonly edition: Edition; readonly serviceRatingA: number; readonly serviceAmpacityA: number;
  readonly sourceOcpdsA: readonly number[]; readonly sourceOutputsA: readonly number[];
  readonly size: ConductorSize; readonly material: Material;
}): CalcResult<number, { readonly complies: boolean; readonly limitA: number; readonly leastSize: ConductorSize | null }> {
  const sheet = new Worksheet(input.edition);
  const size = parseConductorSize(input.size);
  const rating = checkNumber("serviceRatingA", input.serviceRatingA, CURRENT);
  const ampacity = checkNumber("serviceAmpacityA", input.serviceAmpacityA, CURRENT);
  const old = input.edition === "2017";
  const devices = sum("sourceOcpdsA", input.sourceOcpdsA);
  const outputs = sum("sourceOutputsA", input.sourceOutputsA);
  const value = old ? devices : outputs;
  const limitA = old ? rating : ampacity;
  sheet.number("Σ", old ? "sum of the source devices" : "sum of the output currents", "", value, "A", "supply-side");
  const leastSize = old ? null : input.material === "copper" ? SUPPLY_SIDE_MIN_SIZE.copper : SUPPLY_SIDE_MIN_SIZE.aluminum;
  const complies = value <= limitA + 1e-9 && (leastSize === null || compareSizes(size, leastSize) >= 0);
  sheet.text("result", old ? "not above the service rating" : "not above the service conductors, least size", `${shown(value)} A, ${shown(limitA)} A, ${size}`, complies ? "passes" : "fails", "supply-side");
  return sheet.result(value, "A", { complies, limitA, leastSize });
}
