import { CodeLookupError, RACEWAY_KINDS, standardRatingAtMostA, type Edition, type Insulation, type Material, type RacewayKind } from "@/lib/code";
import { PARALLEL_MIN_SIZE } from "@/lib/code/tables/source-constants";
import { checkInteger, checkNumber, checkOneOf, compareSizes, CONDUCTOR_SIZES, FieldError, type ConductorSize, type TradeSize } from "@/lib/units";
import { conductorAmpacity, type AmpacityDetail, type RoutePart } from "./ampacity";
import { equipmentGroundingConductor, sufficientSize } from "./equipment-ground";
import type { FillItem } from "./fill-item";
import { motorDevice } from "./motor";
import { largestOvercurrentDevice, smallestOvercurrentDevice } from "./overcurrent-device";
import { NoRacewayError, smallestRaceway } from "./raceway-fill";
import { requiredAmpacity, type CircuitUse, type RequiredAmpacityDetail } from "./required-ampacity";
import { voltageDrop, type VoltageDropInput } from "./voltage-drop";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** A circuit by its quantities, without a drawing. */
export interface CircuitToSize {
  readonly edition: Edition;
  readonly use: CircuitUse;
  readonly material: Material;
  readonly insulation: Insulation;
  readonly wet?: boolean;
  readonly terminalC: 60 | 75 | 90;
  readonly parts: readonly RoutePart[];
  /** Most conductors in parallel a phase; 1 unless given. Each set takes its own raceway. */
  readonly maxSets?: number;
  readonly device?: {
    /** False: no device in the circuit (a string alone on its input). */
    readonly needed?: boolean;
    /** A device that stays as it is, A. */
    readonly ratingA?: number;
    /** Largest device by the nameplate of the equipment, A. */
    readonly nameplateMaxA?: number;
    readonly roundUp?: boolean;
    readonly fuse?: boolean;
  };
  /** Voltage drop to keep, with the current it is worked out for. */
  readonly drop?: Pick<VoltageDropInput, "system" | "voltageV" | "conduit" | "powerFactor" | "method"> & { readonly currentA: number; readonly lengthFt: number; readonly limitPct: number };
  readonly groundMaterial?: Material;
  /** Conduit or tubing of one set. */
  readonly raceway?: { readonly kind: RacewayKind; readonly lengthIn: number; readonly conductorsPerSet: number; readonly others?: readonly FillItem[]; readonly reserve?: readonly FillItem[] };
}

export interface SizedCircuit {
  readonly size: ConductorSize;
  readonly sets: number;
  /** Device in A, or null where the circuit has none. */
  readonly deviceA: number | null;
  readonly groundSize: ConductorSize;
  readonly tradeSize: TradeSize | null;
}
export interface SizeDetail extends SizedCircuit {
  readonly ampacityA: number;
  readonly dropPct: number | null;
  /** Every smaller candidate with the first test it fails. */
  readonly rejected: readonly { readonly size: ConductorSize; readonly sets: number; readonly reason: string }[];
}

interface Candidate {
  readonly size: ConductorSize;
  readonly sets: number;
}
/** What a candidate came to, or the reason why it fails. */
type Verdict =
  | { readonly reason: string }
  | { readonly reason: null; readonly deviceA: number | null; readonly results: readonly CalcResult<unknown, unknown>[]; readonly sized: Omit<SizeDetail, "rejected"> };

/**
 * Smallest conductors, overcurrent device, equipment grounding conductor and raceway that pass all tests together.
 * Fewest sets first, then the smallest size; each smaller candidate carries the first test that it fails.
 * @throws FieldError when nothing in the tables passes; QuantityError or CodeLookupError naming the field for bad input.
 */
export function sizeCircuit(input: CircuitToSize): CalcResult<string, SizeDetail> {
  const sheet = new Worksheet(input.edition);
  const maxSets = checkInteger("maxSets", input.maxSets ?? 1, { min: 1, max: 12, unit: "sets" });
  const required = requiredAmpacity({ edition: input.edition, use: input.use });
  sheet.include(required);
  const rejected: { size: ConductorSize; sets: number; reason: string }[] = [];
  for (let sets = 1; sets <= maxSets; sets += 1) {
    for (const size of CONDUCTOR_SIZES) {
      if (sets > 1 && compareSizes(size, PARALLEL_MIN_SIZE) < 0) continue;
      const verdict = tryCandidate(input, required.detail, { size, sets });
      if (verdict.reason !== null) {
        rejected.push({ size, sets, reason: verdict.reason });
        continue;
      }
      if (verdict.deviceA !== null) sheet.number("In", "overcurrent device", "", verdict.deviceA, "A", "standard-ratings");
      verdict.results.forEach((result) => sheet.include(result));
      return sheet.result(`${sets > 1 ? `${sets} × ` : ""}${size}`, "", { ...verdict.sized, rejected });
    }
  }
  throw new FieldError("use", `no conductor of the tables passes: ${rejected.at(-1)?.reason ?? "no candidate"}`);
}

/** The tests of one candidate in the order of the trade: terminals, factors, device, drop, raceway. */
function tryCandidate(input: CircuitToSize, required: RequiredAmpacityDetail, { size, sets }: Candidate): Verdict {
  const ampacity = ampacityOf(input, size, sets);
  if (ampacity === null) return { reason: "not in the ampacity table" };
  const { value, detail } = ampacity;
  if (detail.terminalLimitA < required.beforeFactorsA - 1e-9) return { reason: `${shown(detail.terminalLimitA, 1)} A at the terminals, ${shown(required.beforeFactorsA, 2)} A needed` };
  if (value < required.afterFactorsA - 1e-9) return { reason: `${shown(value, 1)} A after factors, ${shown(required.afterFactorsA, 2)} A needed` };
  const deviceA = deviceFor(input, required, size, value);
  if (typeof deviceA === "string") return { reason: deviceA };
  const results: CalcResult<unknown, unknown>[] = [ampacity];
  let dropPct: number | null = null;
  if (input.drop !== undefined) {
    const drop = dropOf(input, input.drop, size, sets);
    if (drop === null) return { reason: "not in the impedance table" };
    if (drop.detail.dropPct > input.drop.limitPct) return { reason: `voltage drop ${shown(drop.detail.dropPct, 2)} %, limit ${shown(input.drop.limitPct)} %` };
    dropPct = drop.detail.dropPct;
    results.push(drop);
  }
  const ground = groundFor(input, required, { size, sets }, deviceA);
  results.push(ground);
  let tradeSize: TradeSize | null = null;
  if (input.raceway !== undefined) {
    const raceway = racewayFor(input, input.raceway, size, ground.value);
    if (raceway === null) return { reason: `no ${input.raceway.kind} of the table holds ${size}` };
    tradeSize = raceway.value;
    results.push(raceway);
  }
  return { reason: null, deviceA, results, sized: { size, sets, deviceA, groundSize: ground.value, tradeSize, ampacityA: value, dropPct } };
}

function groundFor(input: CircuitToSize, required: RequiredAmpacityDetail, { size, sets }: Candidate, deviceA: number | null): CalcResult<ConductorSize, unknown> {
  const ocpdA = deviceA ?? required.beforeFactorsA;
  const pvCircuit = input.use.kind === "pv";
  // A motor device is above the conductor on purpose, so the load alone sets the base there.
  const motorLike = input.use.kind === "motor" || input.use.kind === "hvac";
  let minimumSize: ConductorSize | null = null;
  try {
    if (!pvCircuit) minimumSize = sufficientSize({ ...input, sets, requiredA: Math.max(motorLike ? 0 : ocpdA, required.afterFactorsA) });
  } catch (error) {
    // Beyond the largest size only the round-up of the device is left, and that is no increase.
    if (!(error instanceof CodeLookupError) || error.field !== "requiredA") throw error;
  }
  return equipmentGroundingConductor({ edition: input.edition, ocpdA, material: input.groundMaterial ?? input.material, ungroundedSize: size, ungroundedMaterial: input.material, minimumSize, pvCircuit, sets });
}

function racewayFor(input: CircuitToSize, raceway: NonNullable<CircuitToSize["raceway"]>, size: ConductorSize, groundSize: ConductorSize): CalcResult<TradeSize, unknown> | null {
  const { kind, lengthIn, conductorsPerSet, others = [], reserve } = raceway;
  checkOneOf("raceway.kind", kind, RACEWAY_KINDS);
  checkNumber("raceway.lengthIn", lengthIn, { min: 0, max: 240000, unit: "in", aboveMin: true });
  const count = checkInteger("raceway.conductorsPerSet", conductorsPerSet, { min: 1, max: 100, unit: "conductors" });
  try {
    return smallestRaceway({ edition: input.edition, kind, lengthIn, items: [{ count, size, insulation: input.insulation }, { count: 1, size: groundSize, insulation: input.insulation }, ...others], reserve });
  } catch (error) {
    // Neither a raceway too small for the size nor a size without dimensions is a fault of the input: more sets may do.
    if (error instanceof NoRacewayError || (error instanceof CodeLookupError && error.field.endsWith(".size"))) return null;
    throw error;
  }
}

/** The device in A, null where none is needed, or the reason why none fits. */
function deviceFor(input: CircuitToSize, required: RequiredAmpacityDetail, size: ConductorSize, ampacityA: number): number | null | string {
  const { edition, use, device = {} } = input;
  if (device.needed === false) return null;
  const stated = device.ratingA === undefined ? null : checkNumber("device.ratingA", device.ratingA, { min: 0, max: 6000, unit: "A", aboveMin: true });
  if (use.kind === "motor") {
    const largest = motorDevice({ edition, fullLoadA: use.largestA }).value + (use.otherMotorsA ?? 0) + (use.otherLoadA ?? 0);
    const rating = stated ?? standardRatingAtMostA(largest, edition) ?? largest;
    return rating > largest ? `device ${shown(rating)} A above ${shown(largest, 1)} A for the motor` : rating;
  }
  if (use.kind === "hvac") {
    const largest = checkNumber("device.nameplateMaxA", device.nameplateMaxA, { min: 0, max: 4000, unit: "A", aboveMin: true });
    const rating = stated ?? standardRatingAtMostA(largest, edition) ?? largest;
    return rating > largest ? `device ${shown(rating)} A above ${shown(largest)} A by the nameplate` : rating;
  }
  const least = required.minimumOcpdA ?? (use.kind === "generator" ? (use.setOcpdA ?? required.maximumA) : required.maximumA);
  const rating = stated ?? (use.kind === "storage" ? use.ocpdA : smallestOvercurrentDevice({ edition, requiredA: least, fuse: device.fuse }).value);
  if (rating < least - 1e-9) return `device ${shown(rating)} A below ${shown(least, 2)} A`;
  const largest = largestOvercurrentDevice({ edition, ampacityA, size, material: input.material, roundUp: (device.roundUp ?? true) && use.kind !== "storage", nameplateMaxA: device.nameplateMaxA, fuse: device.fuse });
  return rating > largest.value + 1e-9 ? `device ${shown(rating)} A above ${shown(largest.value, 1)} A (${largest.detail.governedBy})` : rating;
}

function ampacityOf(input: CircuitToSize, size: ConductorSize, sets: number): CalcResult<number, AmpacityDetail> | null {
  const { edition, material, insulation, wet, terminalC, parts } = input;
  return unlessNotInTable(() => conductorAmpacity({ edition, size, material, insulation, wet, terminalC, parts, sets }));
}

function dropOf(input: CircuitToSize, drop: NonNullable<CircuitToSize["drop"]>, size: ConductorSize, sets: number): ReturnType<typeof voltageDrop> | null {
  checkNumber("drop.limitPct", drop.limitPct, { min: 0, max: 100, unit: "%", aboveMin: true });
  return unlessNotInTable(() => voltageDrop({ edition: input.edition, size, sets, material: input.material, ...drop }));
}

/** null where a table does not hold the size; every other fault of the input stands. */
function unlessNotInTable<T>(run: () => T): T | null {
  try {
    return run();
  } catch (error) {
    if (error instanceof CodeLookupError && error.field === "size") return null;
    throw error;
  }
}
