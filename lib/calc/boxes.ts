import { bendingSpaceIn, boxVolumeIn3, type Edition } from "@/lib/code";
import { PULL_BOX_ANGLE, PULL_BOX_STRAIGHT } from "@/lib/code/tables/wireway";
import { checkInteger, checkList, checkNumber, checkOneOf, compareSizes, parseConductorSize, parseTradeSize, QuantityError, tradeSizeIn, type ConductorSize, type TradeSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

const COUNT = { min: 0, max: 500, unit: "" } as const;

export interface BoxFillInput {
  readonly edition: Edition;
  /** Conductors that end, are spliced in or pass through the box, by size; a loop of twice the free length counts twice. */
  readonly conductors: readonly { readonly size: ConductorSize; readonly count: number }[];
  /** Equipment grounding conductors: one allowance of the largest up to four, a quarter each above from 2020 on. */
  readonly groundCount?: number;
  readonly largestGround?: ConductorSize;
  /** Internal clamps present: one allowance of the largest conductor. */
  readonly internalClamps?: boolean;
  /** Kinds of support fittings present, one allowance each. */
  readonly supportFittings?: number;
  /** Yokes with the largest conductor connected to each: two allowances a yoke. */
  readonly deviceYokes?: readonly ConductorSize[];
  readonly boxVolumeIn3?: number;
}

/**
 * Volume in in³ that the contents of a box need.
 * @throws QuantityError or CodeLookupError naming the field (4 AWG and larger: 314.28). Source: 314.16(B).
 */
export function boxFill(input: BoxFillInput): CalcResult<number, { readonly fits: boolean | null }> {
  const sheet = new Worksheet(input.edition);
  let total = 0;
  let largest: ConductorSize | null = null;
  checkList("conductors", input.conductors, 1, 100).forEach((item, index) => {
    const size = parseConductorSize(item.size, `conductors.${index}.size`);
    const count = checkInteger(`conductors.${index}.count`, item.count, COUNT);
    if (count > 0 && (largest === null || compareSizes(size, largest) > 0)) largest = size;
    total += sheet.number("v", "n × allowance", `${count} × ${boxVolumeIn3(size)} in³ (${size})`, count * boxVolumeIn3(size), "in³", "box-volume");
  });
  const ofLargest = largest === null ? 0 : boxVolumeIn3(largest);
  const grounds = checkInteger("groundCount", input.groundCount ?? 0, COUNT);
  if (grounds > 0) {
    const each = boxVolumeIn3(parseConductorSize(input.largestGround, "largestGround"));
    // Until 2017 all equipment grounding conductors together took one allowance.
    const share = input.edition === "2017" ? 1 : 1 + Math.max(0, grounds - 4) / 4;
    total += sheet.number("vg", "grounding conductors", `${shown(share)} × ${each} in³`, share * each, "in³", "box-fill");
  }
  if (input.internalClamps === true) total += sheet.number("vc", "clamps, one allowance of the largest", `${ofLargest} in³`, ofLargest, "in³", "box-fill");
  const fittings = checkInteger("supportFittings", input.supportFittings ?? 0, COUNT);
  if (fittings > 0) total += sheet.number("vf", "support fittings, one allowance each", `${fittings} × ${ofLargest} in³`, fittings * ofLargest, "in³", "box-fill");
  checkList("deviceYokes", input.deviceYokes ?? [], 0, 20).forEach((size, index) => {
    const each = boxVolumeIn3(parseConductorSize(size, `deviceYokes.${index}`));
    total += sheet.number("vd", "device, two allowances", `2 × ${each} in³`, 2 * each, "in³", "box-fill");
  });
  const box = input.boxVolumeIn3 === undefined ? null : checkNumber("boxVolumeIn3", input.boxVolumeIn3, { min: 0, max: 1e6, unit: "in³", aboveMin: true });
  sheet.number("V", "sum", "", total, "in³", "box-fill");
  return sheet.result(total, "in³", { fits: box === null ? null : total <= box });
}

/**
 * Least distance in in of a pull or junction box, or between the entries of a wireway used as one, for conductors of
 * 4 AWG and larger: straight pull 8 times, angle or U pull 6 times the largest trade size plus the others of that row.
 * @throws QuantityError naming the field. Source: 314.28(A), 376.23(B).
 */
export function pullBox(input: {
  readonly edition: Edition; readonly pull: "straight" | "angle or U"; readonly largestTradeSize: TradeSize;
  /** Other raceways entering the same wall in the same row; angle or U pulls only. */
  readonly otherTradeSizes?: readonly TradeSize[];
}): CalcResult<number, { readonly betweenEntriesIn: number }> {
  const sheet = new Worksheet(input.edition);
  const pull = checkOneOf("pull", input.pull, ["straight", "angle or U"] as const);
  const largest = tradeSizeIn(parseTradeSize(input.largestTradeSize, "largestTradeSize"));
  const between = PULL_BOX_ANGLE * largest;
  if (pull === "straight") {
    const value = sheet.number("L", "8 × largest trade size", `${PULL_BOX_STRAIGHT} × ${shown(largest)} in`, PULL_BOX_STRAIGHT * largest, "in", "pull-box-straight");
    return sheet.result(value, "in", { betweenEntriesIn: 0 });
  }
  const others = checkList("otherTradeSizes", input.otherTradeSizes ?? [], 0, 50).map((size, index) => tradeSizeIn(parseTradeSize(size, `otherTradeSizes.${index}`)));
  const sum = others.reduce((a, b) => a + b, 0);
  const value = sheet.number("L", "6 × largest + others of the row", `${PULL_BOX_ANGLE} × ${shown(largest)} in + ${shown(sum)} in`, between + sum, "in", "pull-box-angle");
  sheet.number("D", "between entries of the same conductors", `${PULL_BOX_ANGLE} × ${shown(largest)} in`, between, "in", "pull-box-angle");
  return sheet.result(value, "in", { betweenEntriesIn: between });
}

/**
 * Least wire-bending space in in: at a terminal, or the depth of a wireway or gutter where conductors are deflected.
 * 0 where the table asks for none (10 AWG and smaller).
 * @throws QuantityError or CodeLookupError naming the field. Source: Table 312.6(A), 376.23(A).
 */
export function wireBendingSpace(input: {
  readonly edition: Edition; readonly size: ConductorSize; readonly place: "terminal" | "wireway"; readonly wiresPerTerminal?: number; readonly compactAluminum?: boolean;
}): CalcResult<number, { readonly specified: boolean }> {
  const sheet = new Worksheet(input.edition);
  const place = checkOneOf("place", input.place, ["terminal", "wireway"] as const);
  const size = parseConductorSize(input.size);
  if (place === "wireway" && (input.wiresPerTerminal ?? 1) !== 1) throw new QuantityError("wiresPerTerminal", "a wireway takes the column of one wire", "1");
  const wires = checkInteger("wiresPerTerminal", input.wiresPerTerminal ?? 1, { min: 1, max: 5, unit: "wires" });
  // The compact-aluminum column is for terminal space only; a wireway takes the ordinary rows.
  const space = bendingSpaceIn(size, wires, place === "terminal" && input.compactAluminum === true);
  const value = sheet.number("s", space === null ? "not specified for this size" : "table, wires per terminal", `${size}, ${wires}`, space ?? 0, "in", place === "terminal" ? "bending-space" : "wireway-deflected");
  return sheet.result(value, "in", { specified: space !== null });
}
