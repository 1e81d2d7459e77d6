import { burialCoverIn, essLimitKwh, ESS_LOCATIONS, workingSpaceDepthFt, type BurialLocation, type BurialMethod, type Edition, type EssLocation } from "@/lib/code";
import { ESS_SCOPE_KWH, ESS_SPACING_FT, ESS_UNIT_LIMIT_KWH } from "@/lib/code/tables/ess-limits";
import { EXISTING_DWELLING_HEADROOM_A, WORKING_SPACE_MIN_HEIGHT_FT, WORKING_SPACE_MIN_WIDTH_IN } from "@/lib/code/tables/working-space";
import { checkList, checkNumber, checkOneOf } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/**
 * Clear working space: depth in ft from the live parts or the front of the enclosure, never behind it; width in in and
 * height in ft.
 * @throws QuantityError or CodeLookupError naming the field. Source: 110.26(A).
 */
export function workingSpace(input: {
  readonly edition: Edition; readonly voltageToGroundV: number; readonly condition: 1 | 2 | 3; readonly equipmentWidthIn?: number; readonly equipmentHeightFt?: number;
  /** Panel in an existing dwelling, A: headroom may stay lower up to 200 A. */
  readonly existingDwellingPanelA?: number;
}): CalcResult<number, { readonly widthIn: number; readonly heightFt: number; readonly headroomExcepted: boolean }> {
  const sheet = new Worksheet(input.edition);
  const tableFt = workingSpaceDepthFt(input.voltageToGroundV, input.condition);
  const depth = sheet.number("d", "table by voltage to ground and condition", `${shown(input.voltageToGroundV)} V, condition ${input.condition}`, tableFt, "ft", "working-space");
  const width = checkNumber("equipmentWidthIn", input.equipmentWidthIn ?? 0, { min: 0, max: 600, unit: "in" });
  const widthIn = sheet.number("w", "max(30 in, equipment)", `max(${WORKING_SPACE_MIN_WIDTH_IN} in, ${shown(width)} in)`, Math.max(WORKING_SPACE_MIN_WIDTH_IN, width), "in", "working-space-width");
  const height = checkNumber("equipmentHeightFt", input.equipmentHeightFt ?? 0, { min: 0, max: 50, unit: "ft" });
  const heightFt = sheet.number("h", "max(6.5 ft, equipment)", `max(${WORKING_SPACE_MIN_HEIGHT_FT} ft, ${shown(height)} ft)`, Math.max(WORKING_SPACE_MIN_HEIGHT_FT, height), "ft", "working-space-height");
  const panel = input.existingDwellingPanelA === undefined ? null : checkNumber("existingDwellingPanelA", input.existingDwellingPanelA, { min: 0, max: 6000, unit: "A", aboveMin: true });
  return sheet.result(depth, "ft", { widthIn, heightFt, headroomExcepted: panel !== null && panel <= EXISTING_DWELLING_HEADROOM_A });
}

/** Minimum cover in in of an underground cable or raceway. @throws QuantityError naming the field. Source: Table 300.5. */
export function burialDepth(input: { readonly edition: Edition; readonly location: BurialLocation; readonly method: BurialMethod; readonly inRaceway?: boolean }): CalcResult<number, { readonly measuredTo: string }> {
  const sheet = new Worksheet(input.edition);
  const value = sheet.number("c", "table by place and wiring method", `${input.location}, ${input.method}`, burialCoverIn(input.location, input.method, input.inRaceway), "in", "burial-depth");
  return sheet.result(value, "in", { measuredTo: "top of cable or raceway to finished grade" });
}

export interface StorageUnit {
  readonly label: string;
  readonly energyKwh: number;
  readonly location: EssLocation;
}

/**
 * Storage energy in kWh by location against the limits of one- and two-family dwellings. The value is the total.
 * Which book governs is decided locally; `perDwellingKwh` sets the total that some jurisdictions ask for.
 * @throws QuantityError naming the field. Source: IRC 2021 R328 and NFPA 855, secondary sources.
 */
export function storageLimits(input: { readonly edition: Edition; readonly units: readonly StorageUnit[]; readonly perDwellingKwh?: number | null }): CalcResult<
  number,
  { readonly byLocation: readonly { readonly location: EssLocation; readonly energyKwh: number; readonly limitKwh: number; readonly within: boolean }[]; readonly unitsOverLimit: readonly string[]; readonly within: boolean; readonly spacingFt: number }
> {
  const sheet = new Worksheet(input.edition);
  const sums = new Map<EssLocation, number>();
  const over: string[] = [];
  checkList("units", input.units, 1, 100).forEach((unit, index) => {
    const energy = checkNumber(`units.${index}.energyKwh`, unit.energyKwh, { min: 0, max: 10000, unit: "kWh", aboveMin: true });
    const location = checkOneOf(`units.${index}.location`, unit.location, ESS_LOCATIONS);
    if (energy <= ESS_SCOPE_KWH) return;
    if (energy > ESS_UNIT_LIMIT_KWH) over.push(unit.label);
    sums.set(location, (sums.get(location) ?? 0) + energy);
  });
  const byLocation = [...sums].map(([location, energyKwh]) => {
    const limitKwh = essLimitKwh(location);
    sheet.number("E", "sum at this place against its limit", `${location}: limit ${limitKwh} kWh`, energyKwh, "kWh", "ess-limits");
    return { location, energyKwh, limitKwh, within: energyKwh <= limitKwh };
  });
  const total = sheet.number("ΣE", "sum of all places", "", byLocation.reduce((sum, item) => sum + item.energyKwh, 0), "kWh", "ess-limits-855");
  const cap = input.perDwellingKwh === undefined || input.perDwellingKwh === null ? Infinity : checkNumber("perDwellingKwh", input.perDwellingKwh, { min: 0, max: 10000, unit: "kWh" });
  return sheet.result(total, "kWh", { byLocation, unitsOverLimit: over, within: over.length === 0 && total <= cap && byLocation.every((item) => item.within), spacingFt: ESS_SPACING_FT });
}
