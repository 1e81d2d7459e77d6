import type { Edition } from "@/lib/code";
import { CodeLookupError } from "@/lib/code";
import {
  CONTINUOUS_FACTOR, GENERATOR_CONDUCTOR_FACTOR, MOTOR_CONDUCTOR_FACTOR, PV_ENGINEERED_FLOOR, PV_ENGINEERED_MIN_KW, PV_IRRADIANCE_FACTOR,
} from "@/lib/code/tables/source-constants";
import { checkInteger, checkList, checkNumber, checkOneOf, QuantityError } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

const CURRENT = { min: 0, max: 10000, unit: "A" } as const;
const SOME_CURRENT = { ...CURRENT, aboveMin: true } as const;

/** What the circuit carries, with the quantities that its own article asks for. */
export type CircuitUse =
  | { readonly kind: "load"; readonly continuousA: number; readonly noncontinuousA: number; readonly branch?: boolean; readonly hundredPercentRated?: boolean }
  | {
      readonly kind: "pv";
      /** Basis of the maximum current. `converter input` needs a device not above the conductor ampacity, from 2020. */
      readonly basis?: "short circuit" | "converter output" | "converter input" | "engineered";
      /** Module short-circuit current, or the rated current of the converter, A. */
      readonly currentA: number;
      readonly parallelStrings?: number;
      /** Share added for a bifacial module, 0.05 = 5 %. */
      readonly bifacialGain?: number;
      /** Basis `engineered`: the stated maximum current and the generating capacity. */
      readonly engineeredA?: number;
      readonly systemKw?: number;
    }
  | { readonly kind: "inverter output"; readonly outputA: number; readonly count?: number }
  | {
      readonly kind: "battery input";
      /** Rated maximum input current of the equipment where stated; otherwise power, efficiency and lowest voltage. */
      readonly ratedA?: number;
      readonly powerW?: number;
      readonly efficiency?: number;
      readonly lowestV?: number;
    }
  | { readonly kind: "storage"; readonly nameplateA: number; readonly ocpdA: number }
  | { readonly kind: "generator"; readonly nameplateA: number; readonly overloadPrevented?: boolean; readonly setOcpdA?: number | null }
  | { readonly kind: "motor"; readonly largestA: number; readonly otherMotorsA?: number; readonly otherLoadA?: number }
  | { readonly kind: "hvac"; readonly minimumCircuitA: number };

export interface RequiredAmpacityDetail {
  /** Maximum or circuit current without any margin, A. */
  readonly maximumA: number;
  /** Ampacity asked for at the terminal column before correction and adjustment, A. */
  readonly beforeFactorsA: number;
  /** Ampacity asked for after correction and adjustment, A. */
  readonly afterFactorsA: number;
  /** Smallest overcurrent device that carries the current, A; null where the article sizes the device otherwise. */
  readonly minimumOcpdA: number | null;
}
type Required = CalcResult<number, RequiredAmpacityDetail>;

/**
 * Ampacity in A that a circuit asks of its conductors, before and after correction and adjustment.
 * @throws QuantityError naming the field. Source: 210.19, 215.2, 690.8, 705.28, 706.30, 445.13, 430.22, 440.35.
 */
export function requiredAmpacity(input: { readonly edition: Edition; readonly use: CircuitUse }): Required {
  const sheet = new Worksheet(input.edition);
  const use = input.use;
  checkOneOf("use.kind", use?.kind, ["load", "pv", "inverter output", "battery input", "storage", "generator", "motor", "hvac"]);
  switch (use.kind) {
    case "load": return loadRequirement(sheet, use);
    case "pv": return pvRequirement(sheet, use, input.edition);
    case "inverter output": return inverterRequirement(sheet, use);
    case "battery input": return batteryRequirement(sheet, use);
    case "storage": return storageRequirement(sheet, use);
    case "generator": return generatorRequirement(sheet, use);
    case "motor": return motorRequirement(sheet, use);
    case "hvac": {
      const minimum = sheet.number("A", "nameplate minimum circuit ampacity", "", checkNumber("use.minimumCircuitA", use.minimumCircuitA, SOME_CURRENT), "A", "hvac-nameplate");
      return finish(sheet, minimum, minimum, minimum, null);
    }
  }
}

function loadRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "load" }>): Required {
  const continuous = checkNumber("use.continuousA", use.continuousA, CURRENT);
  const other = checkNumber("use.noncontinuousA", use.noncontinuousA, CURRENT);
  const k = use.hundredPercentRated === true ? 1 : CONTINUOUS_FACTOR;
  const before = sheet.number("A", "k × Ic + In", `${k} × ${shown(continuous)} A + ${shown(other)} A`, k * continuous + other, "A", use.branch === true ? "branch-circuit-continuous" : "feeder-continuous");
  return finish(sheet, continuous + other, before, continuous + other, before);
}

function pvRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "pv" }>, edition: Edition): Required {
  const basis = checkOneOf("use.basis", use.basis ?? "short circuit", ["short circuit", "converter output", "converter input", "engineered"]);
  const current = checkNumber("use.currentA", use.currentA, { min: 0, max: 2000, unit: "A", aboveMin: true });
  const strings = checkInteger("use.parallelStrings", use.parallelStrings ?? 1, { min: 1, max: 500, unit: "strings" });
  const gain = checkNumber("use.bifacialGain", use.bifacialGain ?? 0, { min: 0, max: 0.5, unit: "as a share" });
  let maximum: number;
  if (basis === "converter output" || basis === "converter input") {
    if (basis === "converter input" && edition === "2017") throw new CodeLookupError("use.basis", "the 2017 edition does not know the converter input basis", "2020 and later");
    maximum = sheet.number("Imax", "n × rated current of the converter", `${strings} × ${shown(current)} A`, strings * current, "A", basis === "converter output" ? "pv-converter-output" : "pv-converter-input");
  } else {
    const sum = strings * current * (1 + gain);
    maximum = sheet.number("Imax", "1.25 × n × Isc × (1 + g)", `${PV_IRRADIANCE_FACTOR} × ${strings} × ${shown(current)} A × (1 + ${shown(gain)})`, PV_IRRADIANCE_FACTOR * sum, "A", "pv-maximum-current");
    if (basis === "engineered") maximum = engineered(sheet, use, maximum);
  }
  const before = sheet.number("A1", "1.25 × Imax, before correction and adjustment", `${CONTINUOUS_FACTOR} × ${shown(maximum)} A`, CONTINUOUS_FACTOR * maximum, "A", "pv-conductor-125");
  sheet.number("A2", "Imax, after correction and adjustment", "", maximum, "A", "pv-conductor-corrected");
  sheet.cite("pv-ocpd");
  return finish(sheet, maximum, before, maximum, before);
}

function engineered(sheet: Worksheet, use: Extract<CircuitUse, { kind: "pv" }>, ordinaryA: number): number {
  checkNumber("use.systemKw", use.systemKw, { min: PV_ENGINEERED_MIN_KW, max: 1e6, unit: "kW" });
  const stated = checkNumber("use.engineeredA", use.engineeredA, SOME_CURRENT);
  return sheet.number("Imax", "max(stated, 0.70 × ordinary)", `max(${shown(stated)} A, ${PV_ENGINEERED_FLOOR} × ${shown(ordinaryA)} A)`, Math.max(stated, PV_ENGINEERED_FLOOR * ordinaryA), "A", "pv-maximum-current");
}

function inverterRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "inverter output" }>): Required {
  const each = checkNumber("use.outputA", use.outputA, SOME_CURRENT);
  const count = checkInteger("use.count", use.count ?? 1, { min: 1, max: 1000, unit: "inverters" });
  const maximum = sheet.number("Imax", "n × rated continuous output", `${count} × ${shown(each)} A`, count * each, "A", "inverter-output-current");
  const before = sheet.number("A", "1.25 × Imax", `${CONTINUOUS_FACTOR} × ${shown(maximum)} A`, CONTINUOUS_FACTOR * maximum, "A", "source-conductor-125");
  return finish(sheet, maximum, before, maximum, before);
}

function batteryRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "battery input" }>): Required {
  let maximum: number;
  if (use.ratedA !== undefined) maximum = sheet.number("Imax", "rated maximum input current", "", checkNumber("use.ratedA", use.ratedA, SOME_CURRENT), "A", "ess-current");
  else {
    if (use.powerW === undefined) throw new QuantityError("use.powerW", "value is missing: give the rated current, or power, efficiency and lowest voltage");
    const power = checkNumber("use.powerW", use.powerW, { min: 0, max: 1e7, unit: "W", aboveMin: true });
    const efficiency = checkNumber("use.efficiency", use.efficiency, { min: 0.5, max: 1, unit: "as a share" });
    const volts = checkNumber("use.lowestV", use.lowestV, { min: 5, max: 1500, unit: "V" });
    maximum = sheet.number("Imax", "P / (η × Vmin)", `${shown(power)} W / (${shown(efficiency)} × ${shown(volts)} V)`, power / (efficiency * volts), "A", "ess-current");
  }
  const before = sheet.number("A", "1.25 × Imax", `${CONTINUOUS_FACTOR} × ${shown(maximum)} A`, CONTINUOUS_FACTOR * maximum, "A", "ess-ocpd");
  return finish(sheet, maximum, before, maximum, before);
}

function storageRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "storage" }>): Required {
  const nameplate = checkNumber("use.nameplateA", use.nameplateA, SOME_CURRENT);
  const device = checkNumber("use.ocpdA", use.ocpdA, SOME_CURRENT);
  const before = sheet.number("A", "max(nameplate current, device)", `max(${shown(nameplate)} A, ${shown(device)} A)`, Math.max(nameplate, device), "A", "ess-conductor");
  const minimum = sheet.number("In", "1.25 × nameplate current", `${CONTINUOUS_FACTOR} × ${shown(nameplate)} A`, CONTINUOUS_FACTOR * nameplate, "A", "ess-ocpd");
  return finish(sheet, nameplate, before, nameplate, minimum);
}

function generatorRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "generator" }>): Required {
  const nameplate = checkNumber("use.nameplateA", use.nameplateA, SOME_CURRENT);
  if (use.setOcpdA !== undefined && use.setOcpdA !== null) {
    // The breaker on the set is the first distribution device: beyond it the conductors follow that breaker.
    const device = checkNumber("use.setOcpdA", use.setOcpdA, SOME_CURRENT);
    const before = sheet.number("A", "rating of the device on the set", "", device, "A", "generator-conductor");
    return finish(sheet, nameplate, before, nameplate, null);
  }
  const k = use.overloadPrevented === true ? 1 : GENERATOR_CONDUCTOR_FACTOR;
  const before = sheet.number("A", "k × nameplate current", `${k} × ${shown(nameplate)} A`, k * nameplate, "A", "generator-conductor");
  return finish(sheet, nameplate, before, before, null);
}

function motorRequirement(sheet: Worksheet, use: Extract<CircuitUse, { kind: "motor" }>): Required {
  const largest = checkNumber("use.largestA", use.largestA, SOME_CURRENT);
  const others = checkNumber("use.otherMotorsA", use.otherMotorsA ?? 0, CURRENT);
  const load = checkNumber("use.otherLoadA", use.otherLoadA ?? 0, CURRENT);
  const several = others > 0 || load > 0;
  const before = sheet.number("A", several ? "1.25 × largest + others + load" : "1.25 × full-load current", `${MOTOR_CONDUCTOR_FACTOR} × ${shown(largest)} A${several ? ` + ${shown(others)} A + ${shown(load)} A` : ""}`, MOTOR_CONDUCTOR_FACTOR * largest + others + load, "A", several ? "motor-several" : "motor-conductor");
  return finish(sheet, largest + others + load, before, before, null);
}

function finish(sheet: Worksheet, maximumA: number, beforeFactorsA: number, afterFactorsA: number, minimumOcpdA: number | null): Required {
  return sheet.result(beforeFactorsA, "A", { maximumA, beforeFactorsA, afterFactorsA, minimumOcpdA });
}

/** Sum of currents in A of a list, each checked: for several sources on one conductor. */
export function sumCurrentsA(field: string, values: readonly number[]): number {
  return checkList(field, values, 0, 500).reduce((sum, value, index) => sum + checkNumber(`${field}.${index}`, value, CURRENT), 0);
}
