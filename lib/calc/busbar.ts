import { citeOrNull, type Citation, type Edition } from "@/lib/code";
import { BUSBAR_OPPOSITE_FACTOR, CONTINUOUS_FACTOR } from "@/lib/code/tables/source-constants";
import { checkList, checkNumber } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** Ways in which a busbar with several sources may comply. */
export const BUSBAR_PATHS = ["sum", "opposite ends", "all devices", "center-fed", "feed-through", "power control", "engineered"] as const;
export type BusbarPathName = (typeof BUSBAR_PATHS)[number];

export interface BusbarInput {
  readonly edition: Edition;
  readonly busbarA: number;
  /** Rating of the device that protects the busbar from its primary source, A. */
  readonly mainDeviceA: number;
  /** Continuous output current of every other source that can feed the busbar together with the primary one, A. */
  readonly sourceOutputsA: readonly number[];
  /** Ratings of all devices on the busbar, load and supply, without the one that protects it, A; null where one is not known. */
  readonly branchDevicesA: readonly number[] | null;
  /** Sources stand at the end opposite the primary feed. */
  readonly oppositeEnds: boolean;
  /** Center-fed panelboard of a dwelling with the source at one end only. */
  readonly centerFedDwelling?: boolean;
  /** Busbar with feed-through conductors, which are a second busbar and a feeder of their own. */
  readonly feedThrough?: boolean;
  /** Setting of a listed power control system for this busbar, A. */
  readonly powerControlA?: number | null;
}

export interface BusbarPath {
  readonly name: BusbarPathName;
  /** null: the path is not open here (place, edition or an unknown device). */
  readonly passes: boolean | null;
  readonly sumA: number | null;
  readonly limitA: number | null;
  readonly citation: Citation | null;
}

export interface BusbarDetail {
  readonly paths: readonly BusbarPath[];
  /** 125 % of the source output currents, A. */
  readonly sourceA: number;
  readonly complies: boolean;
  /** True where a path could still pass once an unknown device is known. */
  readonly undecided: boolean;
}

/**
 * All paths of the busbar rule, each with its sum and its limit. The value is the first path that passes, or `none`.
 * Output currents are taken, not breaker ratings. Sources that an interlock keeps off are left out by the caller.
 * @throws QuantityError naming the field. Source: 705.12(B) of the edition.
 */
export function busbarCheck(input: BusbarInput): CalcResult<BusbarPathName | "none", BusbarDetail> {
  const { edition } = input;
  const sheet = new Worksheet(edition);
  const current = { min: 0, max: 10000, unit: "A" } as const;
  const bus = checkNumber("busbarA", input.busbarA, { ...current, aboveMin: true });
  const main = checkNumber("mainDeviceA", input.mainDeviceA, current);
  const outputs = checkList("sourceOutputsA", input.sourceOutputsA, 0, 200).map((a, i) => checkNumber(`sourceOutputsA.${i}`, a, current));
  const branches = input.branchDevicesA === null ? null : checkList("branchDevicesA", input.branchDevicesA, 0, 500).map((a, i) => checkNumber(`branchDevicesA.${i}`, a, current));
  const total = outputs.reduce((a, b) => a + b, 0);
  const source = sheet.number("Is", "1.25 × Σ output current", `${CONTINUOUS_FACTOR} × ${shown(total)} A`, CONTINUOUS_FACTOR * total, "A", "busbar-sum");
  const paths: BusbarPath[] = [];
  const add = (name: BusbarPathName, meaning: string, open: boolean | null, sumA: number | null, limitA: number | null, mainFits = true): void => {
    const citation = citeOrNull(meaning, edition);
    const known = open === true && sumA !== null && limitA !== null && citation !== null;
    const passes = known ? sumA <= limitA + 1e-9 && mainFits : null;
    paths.push({ name, passes, sumA, limitA, citation });
    if (known) sheet.text(name, "sum not above the limit", `${shown(sumA, 2)} A, ${shown(limitA, 2)} A`, passes === true ? "passes" : "fails", meaning);
  };
  const withMain = source + main;
  add("sum", "busbar-sum", true, withMain, bus);
  add("opposite ends", "busbar-opposite-ends", input.oppositeEnds, withMain, BUSBAR_OPPOSITE_FACTOR * bus);
  // The sum of the devices says nothing of a main above the busbar: the device that protects it must fit as well.
  const devices = branches === null ? null : branches.reduce((a, b) => a + b, 0);
  add("all devices", "busbar-all-devices", devices === null ? null : input.feedThrough !== true, devices, bus, main <= bus);
  add("center-fed", "busbar-center-fed", input.centerFedDwelling === true, withMain, BUSBAR_OPPOSITE_FACTOR * bus);
  add("feed-through", "busbar-feed-through", null, null, null);
  const setting = input.powerControlA ?? null;
  add("power control", "power-control", setting === null ? false : true, setting === null ? null : checkNumber("powerControlA", setting, current), bus);
  // A study by an engineer is a person's statement: the path is named with its section and never passes by itself.
  add("engineered", "busbar-engineered", null, null, null);
  const passing = paths.find((path) => path.passes === true);
  const complies = passing !== undefined;
  return sheet.result(passing?.name ?? "none", "", { paths, sourceA: source, complies, undecided: !complies && branches === null && input.feedThrough !== true });
}
