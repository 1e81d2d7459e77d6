import { standardRatingAtLeastA, type Edition } from "@/lib/code";
import {
  APPLIANCE_CIRCUIT_VA, DRYER_MIN_VA, DWELLING_SERVICE_MIN_RATING_A, FIXED_APPLIANCE_COUNT, FIXED_APPLIANCE_SHARE, LARGEST_MOTOR_SHARE,
  LIGHTING_DEMAND, LIGHTING_VA_PER_FT2, MIN_SMALL_APPLIANCE_CIRCUITS, NEUTRAL_COOKING_SHARE, RANGE_COLUMN_KW, RANGE_DEMAND_KW, RANGE_INCREASE_PER_KW, RANGE_MAX_KW,
} from "@/lib/code/tables/dwelling-load";
import { checkInteger, checkList, checkNumber } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export const VA = { min: 0, max: 1e6, unit: "VA" } as const;
/** Lighting, small-appliance and laundry circuits of a dwelling. */
export interface GeneralLoad {
  readonly floorAreaFt2: number;
  /** At least two in a dwelling. */
  readonly smallApplianceCircuits: number;
  readonly laundryCircuits: number;
}
/** Fixed appliance: nameplate, and whether it takes its current between a line and the neutral. */
export interface Appliance {
  readonly label: string;
  readonly va: number;
  readonly onNeutral?: boolean;
}

export interface StandardLoadInput extends GeneralLoad {
  readonly edition: Edition;
  /** Nameplate of each household range, VA. */
  readonly rangesVa?: readonly number[];
  readonly dryersVa?: readonly number[];
  readonly appliances?: readonly Appliance[];
  readonly heatVa?: number;
  readonly coolingVa?: number;
  /** Largest motor among all loads, VA; a quarter of it is added. */
  readonly largestMotorVa?: number;
  /** Vehicle charging and other loads without a demand factor, VA. */
  readonly otherVa?: number;
  readonly voltageV?: number;
}

export interface DwellingLoadDetail {
  readonly generalVa: number;
  readonly generalDemandVa: number;
  readonly heatOrCoolingVa: number;
  readonly amps: number;
  /** Smallest standard service rating, not below 100 A. */
  readonly serviceRatingA: number;
  /** Neutral load by the standard method, VA; null where the method gives none. */
  readonly neutralVa: number | null;
}

/**
 * Service or feeder load in VA of a one-family dwelling, standard method.
 * @throws QuantityError naming the field. Source: Article 220 part III, Annex D examples; figures marked in the table file.
 */
export function dwellingLoadStandard(input: StandardLoadInput): CalcResult<number, DwellingLoadDetail> {
  const sheet = new Worksheet(input.edition);
  const general = generalLoad(sheet, input);
  const lighting = lightingDemand(sheet, general);
  const ranges = rangeDemand(sheet, checkList("rangesVa", input.rangesVa ?? [], 0, RANGE_DEMAND_KW.length));
  const dryers = checkList("dryersVa", input.dryersVa ?? [], 0, 4).map((va, i) => checkNumber(`dryersVa.${i}`, va, VA)).reduce((sum, va) => sum + sheet.number("Sd", "max(5000 VA, nameplate)", `${shown(va)} VA`, Math.max(DRYER_MIN_VA, va), "VA", "load-dryer"), 0);
  const appliances = applianceLoad(sheet, input.appliances ?? []);
  const heating = checkNumber("heatVa", input.heatVa ?? 0, VA);
  const cooling = checkNumber("coolingVa", input.coolingVa ?? 0, VA);
  const largestMotor = checkNumber("largestMotorVa", input.largestMotorVa ?? 0, VA);
  const heat = sheet.number("Sh", "larger of heating and cooling", `max(${shown(heating)} VA, ${shown(cooling)} VA)`, Math.max(heating, cooling), "VA", "load-heat-or-cooling");
  const motor = sheet.number("Sm", "25 % of the largest motor", `${LARGEST_MOTOR_SHARE} × ${shown(largestMotor)} VA`, LARGEST_MOTOR_SHARE * largestMotor, "VA", "load-motor");
  const other = checkNumber("otherVa", input.otherVa ?? 0, VA);
  const total = sheet.number("S", "sum", "", lighting + ranges + dryers + appliances.demandVa + heat + motor + other, "VA");
  const neutral = sheet.number("Sn", "lighting + 70 % of ranges and dryers + appliances on the neutral", `${shown(lighting)} VA + ${NEUTRAL_COOKING_SHARE} × ${shown(ranges + dryers)} VA + ${shown(appliances.neutralVa)} VA`, lighting + NEUTRAL_COOKING_SHARE * (ranges + dryers) + appliances.neutralVa, "VA", "load-neutral");
  return finishLoad(sheet, input.edition, total, input.voltageV, { generalVa: general, generalDemandVa: lighting, heatOrCoolingVa: heat, neutralVa: neutral });
}

/** Lighting at 3 VA/ft² with small-appliance and laundry circuits, before demand. */
export function generalLoad(sheet: Worksheet, input: GeneralLoad): number {
  const area = checkNumber("floorAreaFt2", input.floorAreaFt2, { min: 0, max: 100000, unit: "ft²", aboveMin: true });
  const small = checkInteger("smallApplianceCircuits", input.smallApplianceCircuits, { min: MIN_SMALL_APPLIANCE_CIRCUITS, max: 20, unit: "circuits" });
  const laundry = checkInteger("laundryCircuits", input.laundryCircuits, { min: 0, max: 5, unit: "circuits" });
  const lighting = sheet.number("Sl", "3 VA/ft² × area", `${LIGHTING_VA_PER_FT2} × ${shown(area)} ft²`, LIGHTING_VA_PER_FT2 * area, "VA", "load-lighting");
  return sheet.number("Sg", "Sl + 1500 VA × circuits", `${shown(lighting)} VA + ${APPLIANCE_CIRCUIT_VA} VA × ${small + laundry}`, lighting + APPLIANCE_CIRCUIT_VA * (small + laundry), "VA", "load-small-appliance");
}

/** Closes a load calculation: current and smallest standard service rating. */
export function finishLoad(sheet: Worksheet, edition: Edition, totalVa: number, voltageV: number | undefined, parts: Omit<DwellingLoadDetail, "amps" | "serviceRatingA">): CalcResult<number, DwellingLoadDetail> {
  const volts = checkNumber("voltageV", voltageV ?? 240, { min: 100, max: 600, unit: "V" });
  const amps = sheet.number("I", "S / V", `${shown(totalVa)} VA / ${shown(volts)} V`, totalVa / volts, "A");
  const rating = sheet.number("In", "standard rating, not below 100 A", `${shown(amps, 1)} A`, Math.max(DWELLING_SERVICE_MIN_RATING_A, standardRatingAtLeastA(amps, edition)), "A", "load-service-minimum");
  return sheet.result(totalVa, "VA", { ...parts, amps, serviceRatingA: rating });
}

function lightingDemand(sheet: Worksheet, generalVa: number): number {
  let below = 0;
  let demand = 0;
  for (const slice of LIGHTING_DEMAND) {
    demand += slice.share * Math.max(0, Math.min(generalVa, slice.toVa) - below);
    below = slice.toVa;
  }
  return sheet.number("Sl'", "3000 VA at 100 %, to 120,000 VA at 35 %, rest at 25 %", `${shown(generalVa)} VA`, demand, "VA", "load-lighting-demand");
}

/** Column C of the cooking table for one to five ranges; 5 % more for each kW above 12 of the average. */
function rangeDemand(sheet: Worksheet, rangesVa: readonly number[]): number {
  if (rangesVa.length === 0) return 0;
  const kw = rangesVa.map((va, i) => checkNumber(`rangesVa.${i}`, va, { min: 1750, max: RANGE_MAX_KW * 1000, unit: "VA" }) / 1000);
  // Ranges below 12 kW enter the average as 12 kW.
  const average = kw.reduce((sum, value) => sum + Math.max(RANGE_COLUMN_KW, value), 0) / kw.length;
  const steps = Math.round(average - RANGE_COLUMN_KW);
  const base = (RANGE_DEMAND_KW[kw.length - 1] ?? 0) * 1000;
  return sheet.number("Sr", "cooking table, 5 % more for each kW above 12", `${kw.map((value) => shown(value)).join(" + ")} kW`, base * (1 + RANGE_INCREASE_PER_KW * steps), "VA", "load-range");
}

function applianceLoad(sheet: Worksheet, appliances: readonly Appliance[]): { demandVa: number; neutralVa: number } {
  const list = checkList("appliances", appliances, 0, 100);
  const share = list.length >= FIXED_APPLIANCE_COUNT ? FIXED_APPLIANCE_SHARE : 1;
  let total = 0;
  let neutral = 0;
  list.forEach((item, index) => {
    const va = checkNumber(`appliances.${index}.va`, item.va, VA);
    total += va;
    if (item.onNeutral === true) neutral += va;
  });
  const demandVa = list.length === 0 ? 0 : sheet.number("Sa", "share × Σ fixed appliances, 75 % from four", `${share} × ${shown(total)} VA`, share * total, "VA", "load-appliances");
  return { demandVa, neutralVa: share * neutral };
}
