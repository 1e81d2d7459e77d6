import type { AmpacityDetail, CalcResult } from "@/lib/calc";
import type { CheckContext, Outcome } from "@/lib/rules/engine/types";
import { columnAmpacityA, correctedAmpacity, deviceRatingA, terminalsOf, wireOf, type SectionOf, type Wire } from "./conductors";
import { carriedBy, type Carried } from "./currents";
import { Reader } from "./outcome";
import { largestDevice } from "./protection";
import { motorCircuit, topology } from "./topology";

/** One section whose conductors fall short after correction and adjustment. */
export interface Shortfall {
  section: SectionOf;
  wire: Wire;
  ampacity: CalcResult<number, AmpacityDetail>;
  /** What is not carried or not protected. */
  against: { kind: "load"; carried: Carried } | { kind: "device"; device: string; ratingA: number };
  /** Without the factor for the number of conductors the section would pass. */
  byBundling: boolean;
}
export interface Derating { outcome: Outcome | null; shortfalls: readonly Shortfall[]; judged: boolean }

const cache = new WeakMap<CheckContext["graph"], Map<string, Derating>>();

/** Judges a circuit after correction and adjustment. What the terminal column alone refuses is left to the rules for it. */
export function deratingOf(context: CheckContext, circuit: string): Derating {
  const known = cache.get(context.graph) ?? new Map<string, Derating>();
  cache.set(context.graph, known);
  let derating = known.get(circuit);
  if (!derating) { derating = judge(context, circuit); known.set(circuit, derating); }
  return derating;
}

function judge(context: CheckContext, circuit: string): Derating {
  const reader = new Reader(context);
  const carried = carriedBy(context, circuit, reader);
  const devices = motorCircuit(context.graph, circuit) ? [] : [...new Set(topology(context.graph).protectors(circuit).map((one) => one.device))]
    .flatMap((device) => { const ratingA = deviceRatingA(context, device); return ratingA === null ? [] : [{ device, ratingA }]; });
  if (!carried && devices.length === 0) return { outcome: reader.complete ? null : reader.outcome(), shortfalls: [], judged: false };
  const largest = devices.length > 0 ? Math.max(...devices.map((one) => one.ratingA)) : null;
  const shortfalls = context.graph.sections(circuit).flatMap((section): readonly Shortfall[] => {
    const wire = wireOf(context, circuit, section, reader);
    if (!wire) return [];
    // The marking of the terminals is asked for by the rules of the terminal column; here the table column is the cap.
    const terminals = terminalsOf(context, circuit, largest, 90);
    return failing(context, circuit, section, wire, terminals.lowest, carried, devices, reader);
  });
  return { outcome: reader.complete ? null : reader.outcome(), shortfalls, judged: true };
}

function failing(context: CheckContext, circuit: string, section: SectionOf, wire: Wire, column: 60 | 75 | 90, carried: Carried | null, devices: readonly { device: string; ratingA: number }[], reader: Reader): readonly Shortfall[] {
  const ampacity = correctedAmpacity(context, circuit, section, wire, column, reader);
  if (!ampacity) return [];
  const terminalA = columnAmpacityA(wire, column);
  const list: Omit<Shortfall, "byBundling">[] = [];
  if (carried) {
    const { maximumA } = carried.required.detail;
    const elsewhere = carried.kind !== "storage" && carried.kind !== "generator" && terminalA < maximumA;
    if (ampacity.value < maximumA - 1e-9 && !elsewhere) list.push({ section, wire, ampacity, against: { kind: "load", carried } });
  }
  const permitted = (amperes: number): number => largestDevice(context, circuit, wire, amperes).value + 1e-9;
  for (const { device, ratingA } of devices) {
    if (ratingA > permitted(ampacity.value) && ratingA <= permitted(terminalA)) list.push({ section, wire, ampacity, against: { kind: "device", device, ratingA } });
  }
  if (list.length === 0) return [];
  const alone = correctedAmpacity(context, circuit, section, wire, column, reader, false);
  return list.map((one) => ({
    ...one,
    byBundling: alone !== null && (one.against.kind === "load" ? alone.value >= one.against.carried.required.detail.maximumA - 1e-9 : one.against.ratingA <= permitted(alone.value)),
  }));
}
