import {
  ambientCorrectionFactor, bundlingFactor, INSULATIONS, insulationRatingC, MATERIALS, rooftopAdderC, smallConductorLimitA, tableAmpacityA,
  type ConductorRatingC, type Edition, type Insulation, type Material,
} from "@/lib/code";
import { NIPPLE_MAX_LENGTH_IN } from "@/lib/code/tables/raceway-fill";
import { LESSER_PART_FT, LESSER_PART_SHARE, PARALLEL_MIN_SIZE } from "@/lib/code/tables/source-constants";
import { WIREWAY_UNADJUSTED_CONDUCTORS } from "@/lib/code/tables/wireway";
import { checkInteger, checkList, checkNumber, checkOneOf, compareSizes, FieldError, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** How a part of the route holds the conductors. `open`: not bundled; the raceway table is still used, on the safe side. */
export const ROUTE_PART_KINDS = ["raceway", "metal wireway", "nonmetallic wireway", "cable", "open"] as const;
export type RoutePartKind = (typeof ROUTE_PART_KINDS)[number];

/** One stretch of a circuit with one ambient and one number of current-carrying conductors. */
export interface RoutePart {
  /** Tag of the raceway, for the working. */
  readonly label?: string;
  readonly kind: RoutePartKind;
  /** Length of this part along the route, in ft. */
  readonly lengthFt: number;
  /**
   * Length of the whole raceway or bundle where this part is only a stretch of it, in ft; left out = this part is all of it.
   * 24 in or less asks for no adjustment.
   */
  readonly racewayLengthFt?: number;
  readonly ambientC: number;
  /** Current-carrying conductors of all circuits at the fullest cross section. */
  readonly currentCarryingCount: number;
  /** Height of the raceway above a roof in sunlight, in in; null or left out = not on a roof. */
  readonly rooftopHeightIn?: number | null;
}

export interface AmpacityInput {
  readonly edition: Edition;
  readonly size: ConductorSize;
  readonly material: Material;
  readonly insulation: Insulation;
  /** Wet location of any part. */
  readonly wet?: boolean;
  /** Rating of a product that differs from its type letters (PV wire of 105 or 125 °C in dry use). */
  readonly conductorRatingC?: ConductorRatingC;
  /** Lowest temperature rating of the terminals at both ends. */
  readonly terminalC: 60 | 75 | 90;
  /** Conductors in parallel a phase. */
  readonly sets?: number;
  readonly parts: readonly RoutePart[];
}

export interface AmpacityPart {
  readonly label: string;
  readonly lengthFt: number;
  /** Ambient with the rooftop adder, °C. */
  readonly ambientC: number;
  readonly correctionFactor: number;
  readonly adjustmentFactor: number;
  /** One conductor, before the terminal limit, A. */
  readonly ampacityA: number;
}

export interface AmpacityDetail {
  /** Ampacity of the insulation column before factors, one conductor. */
  readonly tableA: number;
  readonly conductorRatingC: ConductorRatingC;
  readonly parts: readonly AmpacityPart[];
  /** Index of the part that governs. */
  readonly governingPart: number;
  /** After correction and adjustment, before the terminal limit, all sets, A. */
  readonly correctedA: number;
  /** Ampacity of the terminal column, all sets, A. */
  readonly terminalLimitA: number;
  /** What set the result. */
  readonly governedBy: "correction and adjustment" | "terminal temperature";
  /** Largest device on a small conductor, 240.4(D), or null. */
  readonly smallConductorLimitA: number | null;
  readonly sets: number;
  /** False where conductors below 1/0 AWG are drawn in parallel. */
  readonly parallelAllowed: boolean;
}

/**
 * Ampacity of a circuit conductor in A: table, ambient correction with rooftop adder, adjustment for the number of
 * current-carrying conductors, the part of the route that governs, terminal temperature limit, parallel sets.
 * @throws QuantityError or CodeLookupError naming the field. Source: 310.14 to 310.16, 110.14(C).
 */
export function conductorAmpacity(input: AmpacityInput): CalcResult<number, AmpacityDetail> {
  const { edition } = input;
  const size = parseConductorSize(input.size);
  const material = checkOneOf("material", input.material, MATERIALS);
  const insulation = checkOneOf("insulation", input.insulation, INSULATIONS);
  const terminalC = checkOneOf("terminalC", input.terminalC, [60, 75, 90] as const);
  const sets = checkInteger("sets", input.sets ?? 1, { min: 1, max: 20, unit: "conductors a phase" });
  const ratingC = input.conductorRatingC ?? insulationRatingC(insulation, input.wet ?? false);
  checkList("parts", input.parts, 1, 200);
  const sheet = new Worksheet(edition);

  const tableA = sheet.number("A", `table, ${ratingC} °C column`, `${size} ${material} ${insulation}`, tableAmpacityA(size, material, ratingC), "A", ratingC > 90 ? "pv-wire-ampacity" : "ampacity-table");
  const parts = input.parts.map((part, index) => correctedPart(sheet, input, part, index, tableA, ratingC));
  const governing = governingIndex(parts);
  const corrected = parts[governing]?.ampacityA ?? 0;
  if (parts.some((part) => part.ampacityA < corrected)) {
    sheet.text("part", "the lower part is not longer than 10 ft and 10 % of the rest", `${parts[governing]?.label} governs`, "exception used", "lesser-part");
  }
  // Where the insulation is rated below the terminals it is the insulation that limits the column.
  const columnC = Math.min(terminalC, ratingC) === 60 ? 60 : Math.min(terminalC, ratingC) === 75 ? 75 : 90;
  const terminalA = sheet.number("At", `table, ${columnC} °C terminal column`, `${size} ${material}`, tableAmpacityA(size, material, columnC), "A", "terminal-temperature");
  const perConductor = sheet.number("A'", "min(Ac, At)", `min(${shown(corrected, 2)} A, ${terminalA} A)`, Math.min(corrected, terminalA), "A");
  const total = sets === 1 ? perConductor : sheet.number("ΣA", "n × A'", `${sets} × ${shown(perConductor, 2)} A`, sets * perConductor, "A", "parallel-conductors");
  return sheet.result(total, "A", {
    tableA,
    conductorRatingC: ratingC,
    parts,
    governingPart: governing,
    correctedA: corrected * sets,
    terminalLimitA: terminalA * sets,
    governedBy: corrected < terminalA ? "correction and adjustment" : "terminal temperature",
    smallConductorLimitA: smallConductorLimitA(size, material, edition),
    sets,
    parallelAllowed: sets === 1 || compareSizes(size, PARALLEL_MIN_SIZE) >= 0,
  });
}

function correctedPart(sheet: Worksheet, input: AmpacityInput, part: RoutePart, index: number, tableA: number, ratingC: ConductorRatingC): AmpacityPart {
  const field = `parts.${index}`;
  const label = part.label ?? `part ${index + 1}`;
  checkOneOf(`${field}.kind`, part.kind, ROUTE_PART_KINDS);
  const lengthFt = checkNumber(`${field}.lengthFt`, part.lengthFt, { min: 0, max: 20000, unit: "ft" });
  const outdoorC = checkNumber(`${field}.ambientC`, part.ambientC, { min: -60, max: 120, unit: "°C" });
  const count = checkInteger(`${field}.currentCarryingCount`, part.currentCarryingCount, { min: 1, max: 1000, unit: "conductors" });
  const adder = rooftopAdderC(part.rooftopHeightIn ?? null, input.insulation, input.edition, `${field}.rooftopHeightIn`);
  const ambientC = adder === 0 ? outdoorC : sheet.number("Ta", "ambient + rooftop adder", `${shown(outdoorC)} °C + ${adder} °C`, outdoorC + adder, "°C", "rooftop-adder");
  const correctionFactor = sheet.number("Ft", `${ratingC} °C conductor at Ta`, `${label}: ${shown(ambientC)} °C`, ambientCorrectionFactor(ambientC, ratingC, 30, `${field}.ambientC`), "", ratingC > 90 ? "pv-wire-correction" : "ambient-correction");
  const wholeFt = part.racewayLengthFt === undefined ? lengthFt : checkNumber(`${field}.racewayLengthFt`, part.racewayLengthFt, { min: lengthFt, max: 20000, unit: "ft" });
  const adjustmentFactor = adjustment(sheet, part, label, wholeFt, count);
  const ampacityA = sheet.number("Ac", "A × Ft × Fb", `${tableA} A × ${correctionFactor} × ${adjustmentFactor}`, tableA * correctionFactor * adjustmentFactor, "A");
  return { label, lengthFt, ambientC, correctionFactor, adjustmentFactor, ampacityA };
}

/** Fb of one part: 1 in nipples, in metal wireways to 30 conductors and for open conductors. */
function adjustment(sheet: Worksheet, part: RoutePart, label: string, wholeFt: number, count: number): number {
  if (count <= 3) return 1;
  if (part.kind === "open") return sheet.number("Fb", "conductors not bundled", `${label}: ${count}`, 1, "");
  if (part.kind === "metal wireway" && count <= WIREWAY_UNADJUSTED_CONDUCTORS) {
    return sheet.number("Fb", `metal wireway, not more than ${WIREWAY_UNADJUSTED_CONDUCTORS}`, `${label}: ${count}`, 1, "", "wireway-adjustment");
  }
  // Wireways are raceways too; for cables the limit is the length over which they lie together.
  if (wholeFt * 12 <= NIPPLE_MAX_LENGTH_IN + 1e-9) {
    return sheet.number("Fb", `${NIPPLE_MAX_LENGTH_IN} in or less`, `${label}: ${shown(wholeFt * 12, 1)} in`, 1, "", "bundling-nipple");
  }
  return sheet.number("Fb", "current-carrying conductors", `${label}: ${count}`, bundlingFactor(count), "", "bundling-adjustment");
}

/**
 * Index of the part whose ampacity governs: the highest one whose lower parts together are not longer than 10 ft and
 * 10 % of the length at that ampacity or above; without such parts the lowest.
 */
function governingIndex(parts: readonly AmpacityPart[]): number {
  let best = -1;
  for (let index = 0; index < parts.length; index += 1) {
    const level = parts[index]?.ampacityA ?? 0;
    let lowFt = 0;
    let highFt = 0;
    for (const part of parts) {
      if (part.ampacityA < level) lowFt += part.lengthFt;
      else highFt += part.lengthFt;
    }
    const lowest = !parts.some((part) => part.ampacityA < level);
    if (!lowest && lowFt > Math.min(LESSER_PART_FT, LESSER_PART_SHARE * highFt)) continue;
    if (best < 0 || level > (parts[best]?.ampacityA ?? 0)) best = index;
  }
  if (best < 0) throw new FieldError("parts", "no part governs");
  return best;
}
