import { acImpedance, CONDUIT_MATERIALS, MATERIALS, type ConduitMaterial, type Edition, type Material } from "@/lib/code";
import { checkInteger, checkList, checkNumber, checkOneOf, parseConductorSize, QuantityError, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** A stretch of conductors by size, or by the published constant C (reciprocal of the impedance per foot). */
export type FaultSegment = {
  readonly label: string;
  readonly lengthFt: number;
  readonly sets?: number;
  /** Inverters and other sources that add their current at the end of this stretch, A. */
  readonly contributionA?: number;
} & (
  | { readonly size: ConductorSize; readonly material: Material; readonly conduit: ConduitMaterial; readonly neutralSize?: ConductorSize }
  | { readonly constantC: number; readonly neutralConstantC?: number }
);

export interface FaultCurrentInput {
  readonly edition: Edition;
  readonly phases: 1 | 3;
  readonly lineToLineV: number;
  readonly source:
    | { readonly kind: "stated"; readonly availableA: number }
    | {
        readonly kind: "transformer";
        readonly kva: number;
        readonly impedancePct: number;
        /** Multiplier on the impedance for its manufacturing tolerance: 0.9 is common practice. */
        readonly impedanceTolerance?: number;
      };
  /**
   * `arithmetic`: impedances added as numbers; `vector`: resistance and reactance apart, asks for X/R of the source.
   * The arithmetic sum gives the smaller current: state it where it is printed.
   */
  readonly method: "arithmetic" | "vector";
  readonly sourceXOverR?: number;
  /** Arithmetic method: leave the reactance of the conductors out. */
  readonly resistanceOnly?: boolean;
  /**
   * Line-to-neutral fault: multiplier on the first current and where it enters. 1.5 at a center-tapped single-phase
   * transformer and 1 at a wye source are common practice, no published source. Worked out by numbers, not vectors.
   */
  readonly lineToNeutral?: { readonly multiplier: number; readonly enters: "before the first stretch" | "after the first stretch" };
  readonly segments: readonly FaultSegment[];
}

export interface FaultNode {
  readonly label: string;
  /** Bolted fault of all ungrounded conductors from the source alone, A: line to line of a single-phase, three-phase of a three-phase system. */
  readonly boltedA: number;
  /** Between two lines, A. */
  readonly lineToLineA: number;
  readonly lineToNeutralA: number | null;
  /** With all contributions up to this point, A. */
  readonly totalA: number;
}

export interface FaultCurrentDetail {
  readonly sourceA: number;
  readonly fullLoadA: number | null;
  readonly nodes: readonly FaultNode[];
  /** The convention, to be printed beside the figures. */
  readonly convention: string;
}

/**
 * Available fault current in A at the end of a chain of conductors, point to point, with each point on the way.
 * @throws QuantityError or CodeLookupError naming the field. Source: point-to-point method, common practice; 110.9, 110.24.
 */
export function faultCurrent(input: FaultCurrentInput): CalcResult<number, FaultCurrentDetail> {
  const sheet = new Worksheet(input.edition);
  const phases = checkOneOf("phases", input.phases, [1, 3] as const);
  const volts = checkNumber("lineToLineV", input.lineToLineV, { min: 0, max: 1000, unit: "V", aboveMin: true });
  const method = checkOneOf("method", input.method, ["arithmetic", "vector"] as const);
  if (method === "vector" && input.sourceXOverR === undefined) throw new QuantityError("sourceXOverR", "value is missing: the vector method needs it", "0 to 50");
  const xOverR = method === "vector" ? checkNumber("sourceXOverR", input.sourceXOverR, { min: 0, max: 50, unit: "" }) : 0;
  const source = sourceCurrent(sheet, input, volts, phases);
  // One loop impedance in ohms: both conductors of a single-phase fault, one phase of a three-phase one.
  const loopV = phases === 3 ? volts / Math.sqrt(3) : volts;
  const z = loopV / source.availableA;
  let r = method === "vector" ? z / Math.sqrt(1 + xOverR * xOverR) : z;
  let x = method === "vector" ? r * xOverR : 0;
  let neutral = input.lineToNeutral === undefined ? null : startNeutral(sheet, input, source.availableA);
  let contribution = 0;
  const nodes = checkList("segments", input.segments, 0, 100).map((segment, index): FaultNode => {
    const part = segmentImpedance(input, segment, index, phases);
    r += part.r;
    x += part.x;
    const total = Math.hypot(r, x);
    const boltedA = sheet.number("If", method === "vector" ? "V / √(ΣR² + ΣX²)" : "V / ΣZ", `${segment.label}: ${shown(loopV, 1)} V / ${shown(total, 6)} Ω`, loopV / total, "A", "available-fault-current");
    neutral = neutral === null ? null : nextNeutral(sheet, input, segment, part.neutralOhm, neutral, phases === 3 ? volts / Math.sqrt(3) : volts / 2, index);
    contribution += checkNumber(`segments.${index}.contributionA`, segment.contributionA ?? 0, { min: 0, max: 200000, unit: "A" });
    const totalA = contribution === 0 ? boltedA : sheet.number("ΣI", "If + Σ contributions", `${shown(boltedA, 1)} A + ${shown(contribution)} A`, boltedA + contribution, "A", "interrupting-rating");
    const lineToLineA = phases === 3 ? (boltedA * Math.sqrt(3)) / 2 : boltedA;
    return { label: segment.label, boltedA, lineToLineA, lineToNeutralA: neutral, totalA };
  });
  const last = nodes[nodes.length - 1];
  const convention = [
    method === "vector" ? `vector sum, X/R of the source ${shown(xOverR)}` : `arithmetic sum${input.resistanceOnly === true ? ", resistance of conductors only" : ""}`,
    phases === 3 ? "three-phase bolted fault" : "line-to-line bolted fault, length counted twice",
    ...(input.lineToNeutral === undefined ? [] : [`line-to-neutral multiplier ${input.lineToNeutral.multiplier} ${input.lineToNeutral.enters}`]),
  ].join("; ");
  return sheet.result(last?.totalA ?? source.availableA, "A", { sourceA: source.availableA, fullLoadA: source.fullLoadA, nodes, convention });
}

/**
 * Short-circuit current in A of a dc bus: sum of the sources, each weakened by its leads where these are given.
 * @throws QuantityError naming the field. Source: common practice, no published source.
 */
export function dcFaultCurrent(input: {
  readonly edition: Edition; readonly voltageV: number;
  readonly sources: readonly { readonly label: string; readonly shortCircuitA: number; readonly leadOhm?: number }[];
}): CalcResult<number, { readonly perSourceA: readonly number[] }> {
  const sheet = new Worksheet(input.edition);
  const volts = checkNumber("voltageV", input.voltageV, { min: 0, max: 1500, unit: "V", aboveMin: true });
  const perSourceA = checkList("sources", input.sources, 1, 200).map((source, index) => {
    const isc = checkNumber(`sources.${index}.shortCircuitA`, source.shortCircuitA, { min: 0, max: 200000, unit: "A", aboveMin: true });
    const lead = checkNumber(`sources.${index}.leadOhm`, source.leadOhm ?? 0, { min: 0, max: 100, unit: "Ω" });
    return sheet.number("Isc", "V / (V / Isc + R)", `${source.label}: ${shown(isc)} A, ${shown(lead, 6)} Ω`, volts / (volts / isc + lead), "A");
  });
  const total = sheet.number("ΣIsc", "sum", perSourceA.map((a) => `${shown(a, 1)} A`).join(" + "), perSourceA.reduce((a, b) => a + b, 0), "A", "interrupting-rating");
  return sheet.result(total, "A", { perSourceA });
}

function sourceCurrent(sheet: Worksheet, input: FaultCurrentInput, volts: number, phases: 1 | 3): { availableA: number; fullLoadA: number | null } {
  const source = input.source;
  checkOneOf("source.kind", source?.kind, ["stated", "transformer"]);
  if (source.kind === "stated") {
    return { availableA: sheet.number("I0", "stated by the utility", "", checkNumber("source.availableA", source.availableA, { min: 0, max: 200000, unit: "A", aboveMin: true }), "A", "available-fault-current"), fullLoadA: null };
  }
  const kva = checkNumber("source.kva", source.kva, { min: 0, max: 10000, unit: "kVA", aboveMin: true });
  const pct = checkNumber("source.impedancePct", source.impedancePct, { min: 0, max: 20, unit: "%", aboveMin: true });
  const tolerance = checkNumber("source.impedanceTolerance", source.impedanceTolerance ?? 1, { min: 0.5, max: 1, unit: "" });
  const k = phases === 3 ? Math.sqrt(3) : 1;
  const fullLoadA = sheet.number("Ifl", phases === 3 ? "kVA × 1000 / (√3 × V)" : "kVA × 1000 / V", `${shown(kva)} kVA, ${shown(volts)} V`, (kva * 1000) / (k * volts), "A");
  const availableA = sheet.number("I0", "Ifl × 100 / (t × %Z), infinite primary", `${shown(fullLoadA, 2)} A × 100 / (${tolerance} × ${pct})`, (fullLoadA * 100) / (tolerance * pct), "A", "available-fault-current");
  return { availableA, fullLoadA };
}

function startNeutral(sheet: Worksheet, input: FaultCurrentInput, availableA: number): number {
  if (input.lineToNeutral === undefined) throw new QuantityError("lineToNeutral", "value is missing");
  const multiplier = checkNumber("lineToNeutral.multiplier", input.lineToNeutral.multiplier, { min: 1, max: 2, unit: "" });
  checkOneOf("lineToNeutral.enters", input.lineToNeutral.enters, ["before the first stretch", "after the first stretch"]);
  if (input.lineToNeutral.enters !== "before the first stretch") return availableA;
  return sheet.number("I0n", "k × I0", `${multiplier} × ${shown(availableA, 1)} A`, multiplier * availableA, "A");
}

function nextNeutral(sheet: Worksheet, input: FaultCurrentInput, segment: FaultSegment, ohm: number, previousA: number, neutralV: number, index: number): number {
  const f = (previousA * ohm) / neutralV;
  const late = index === 0 && input.lineToNeutral?.enters === "after the first stretch" ? input.lineToNeutral.multiplier : 1;
  return sheet.number("Ifn", late === 1 ? "I × 1 / (1 + f)" : "k × I × 1 / (1 + f)", `${segment.label}: ${shown(previousA, 1)} A, f = ${shown(f)}`, (late * previousA) / (1 + f), "A");
}

/**
 * Ω that a stretch of conductors adds to the loop of a bolted fault by the arithmetic method: both conductors of a single-phase fault,
 * one of a three-phase one. @throws QuantityError or CodeLookupError as `faultCurrent` does.
 */
export function stretchLoopOhm(segment: FaultSegment, phases: 1 | 3, resistanceOnly = false): number {
  return segmentImpedance({ method: "arithmetic", resistanceOnly }, segment, 0, phases).r;
}

function segmentImpedance(input: Pick<FaultCurrentInput, "method" | "resistanceOnly">, segment: FaultSegment, index: number, phases: 1 | 3): { r: number; x: number; neutralOhm: number } {
  const field = `segments.${index}`;
  const feet = checkNumber(`${field}.lengthFt`, segment.lengthFt, { min: 0, max: 20000, unit: "ft" });
  const sets = checkInteger(`${field}.sets`, segment.sets ?? 1, { min: 1, max: 20, unit: "conductors a phase" });
  const loop = phases === 3 ? 1 : 2;
  if ("constantC" in segment) {
    const c = checkNumber(`${field}.constantC`, segment.constantC, { min: 1, max: 1e6, unit: "" });
    if (input.method === "vector") throw new QuantityError(`${field}.constantC`, "a constant has no angle; the vector method needs size and conduit");
    const cn = checkNumber(`${field}.neutralConstantC`, segment.neutralConstantC ?? c, { min: 1, max: 1e6, unit: "" });
    return { r: (loop * feet) / (c * sets), x: 0, neutralOhm: (2 * feet) / (cn * sets) };
  }
  const material = checkOneOf(`${field}.material`, segment.material, MATERIALS);
  const conduit = checkOneOf(`${field}.conduit`, segment.conduit, CONDUIT_MATERIALS);
  const phase = acImpedance(parseConductorSize(segment.size, `${field}.size`), material, conduit);
  const neutral = segment.neutralSize === undefined ? phase : acImpedance(parseConductorSize(segment.neutralSize, `${field}.neutralSize`), material, conduit);
  const scale = feet / (1000 * sets);
  const magnitude = (z: typeof phase): number => (input.resistanceOnly === true ? z.resistanceOhmPerKft : Math.hypot(z.resistanceOhmPerKft, z.reactanceOhmPerKft));
  const neutralOhm = (magnitude(phase) + magnitude(neutral)) * scale;
  if (input.method === "vector") return { r: loop * phase.resistanceOhmPerKft * scale, x: loop * phase.reactanceOhmPerKft * scale, neutralOhm };
  return { r: loop * magnitude(phase) * scale, x: 0, neutralOhm };
}
