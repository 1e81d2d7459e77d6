import { requiredAmpacity, type CircuitUse, type CalcResult, type RequiredAmpacityDetail } from "@/lib/calc";
import type { Circuit } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { equipmentRef, isTrue, nameOf, numberOf, propertyLabel, Reader } from "./outcome";
import { motorCircuit, supplies, topology, type Side } from "./topology";

/** What a circuit carries, with the equipment it follows from. */
export interface Carried {
  kind: "pv" | "inverter output" | "load" | "storage" | "generator" | "motor";
  required: CalcResult<number, RequiredAmpacityDetail>;
  from: readonly string[];
}

/**
 * Current of a circuit worked out from what hangs at its ends: PV from the strings, inverter output from the inverters,
 * storage from batteries or the inverter, loads from the loads or the designer's statement. Null where nothing tells.
 */
export function carriedBy(context: CheckContext, id: string, reader: Reader): Carried | null {
  // Many rules ask for the same circuit; what was missing is asked for again by each of them.
  let known = cache.get(context.graph);
  if (!known) { known = new Map(); cache.set(context.graph, known); }
  let answer = known.get(id);
  if (!answer) {
    const own = new Reader(context);
    answer = { carried: workOut(context, id, own), missing: own.missing };
    known.set(id, answer);
  }
  for (const { ref, field, label } of answer.missing) reader.ask(ref, field, label);
  return answer.carried;
}
const cache = new WeakMap<CheckContext["graph"], Map<string, { carried: Carried | null; missing: Reader["missing"] }>>();
function workOut(context: CheckContext, id: string, reader: Reader): Carried | null {
  const circuit = context.drawing.circuits[id] as Circuit;
  const { side } = topology(context.graph);
  const sides = [side(id, "from"), side(id, "to")] as const;
  if (circuit.system === "pv-dc") return pvCurrent(context, sides, reader);
  if (circuit.system === "battery-dc") return storageCurrent(context, sides, reader);
  if (circuit.system !== "ac") return null;
  if (motorCircuit(context.graph, id)) return null;
  const generator = sides.find((one) => one.generators.length > 0 && one.utilities.length + one.converters.length + one.loads.length === 0);
  if (generator) return generatorCurrent(context, id, generator, reader);
  return larger(inverterCurrent(context, sides, reader), loadCurrent(context, id, circuit, sides, reader));
}

function larger(a: Carried | null, b: Carried | null): Carried | null {
  if (!a || !b) return a ?? b;
  return b.required.value > a.required.value ? b : a;
}
const carried = (context: CheckContext, kind: Carried["kind"], use: CircuitUse, from: readonly string[]): Carried =>
  ({ kind, required: requiredAmpacity({ edition: context.edition, use }), from });

/** Strings of the side that holds the array. Behind module-level converters the module's own current says nothing. */
function pvCurrent(context: CheckContext, sides: readonly Side[], reader: Reader): Carried | null {
  const strings = sides.find((one) => one.strings.length > 0 && one.converters.length === 0)?.strings ?? [];
  if (strings.length === 0 || strings.some((id) => isTrue(context, id, "converters"))) return null;
  const each = strings.map((id) => {
    const isc = reader.number(id, "shortCircuitA");
    return isc === null ? null : isc * (1 + (numberOf(context, id, "bifacialGainPercent") ?? 0) / 100);
  });
  const known = each.filter((value): value is number => value !== null);
  const first = known[0];
  if (first === undefined || known.length < each.length) return null;
  const equal = known.every((value) => Math.abs(value - first) < 1e-9);
  const gain = (numberOf(context, strings[0] ?? "", "bifacialGainPercent") ?? 0) / 100;
  return carried(context, "pv", equal
    ? { kind: "pv", currentA: first / (1 + gain), bifacialGain: gain, parallelStrings: known.length }
    : { kind: "pv", currentA: known.reduce((a, b) => a + b, 0), parallelStrings: 1 }, strings);
}

/** Inverters whose output leaves through the circuit: toward the utility, or their only way out where no other source stands with them. */
function inverterCurrent(context: CheckContext, sides: readonly [Side, Side], reader: Reader): Carried | null {
  for (const [own, other] of [sides, [sides[1], sides[0]] as const]) {
    const alone = own.utilities.length + own.generators.length === 0;
    const receives = other.utilities.length > 0 || (alone && other.loads.length + other.buses.length > 0);
    if (own.converters.length === 0 || own.utilities.length > 0 || !receives) continue;
    const outputs = own.converters.map((id) => outputA(context, id, reader));
    const known = outputs.filter((value): value is number => value !== null);
    if (known.length < outputs.length) return null;
    const first = known[0] ?? 0;
    const equal = known.every((value) => value === first);
    return carried(context, "inverter output", equal
      ? { kind: "inverter output", outputA: first, count: known.length }
      : { kind: "inverter output", outputA: known.reduce((a, b) => a + b, 0) }, own.converters);
  }
  return null;
}
/** Continuous ac output of an inverter, A: its property, or what is marked at the ac port. */
export function outputA(context: CheckContext, inverter: string, reader: Reader): number | null {
  const marked = numberOf(context, inverter, "continuousA") ?? context.graph.port(inverter, "ac")?.data.continuousA ?? null;
  return marked ?? reader.number(inverter, "continuousA");
}

function storageCurrent(context: CheckContext, sides: readonly Side[], reader: Reader): Carried | null {
  const battery = sides.find((one) => one.batteries.length > 0 && one.converters.length === 0);
  const inverter = sides.find((one) => one.converters.length > 0 && one.batteries.length === 0);
  const sum = (ids: readonly string[], key: string): number | null =>
    ids.reduce<number | null>((total, id) => { const value = reader.number(id, key); return total === null || value === null ? null : total + value; }, 0);
  const currents = [battery && sum(battery.batteries, "continuousA"), inverter && sum(inverter.converters, "batteryA")]
    .filter((value): value is number => typeof value === "number" && value > 0);
  if (currents.length === 0) return null;
  // What both ends can pass at most: the pack behind one circuit, or the inverter that draws from all packs.
  const amperes = Math.min(...currents);
  return carried(context, "storage", { kind: "battery input", ratedA: amperes }, [...(battery?.batteries ?? []), ...(inverter?.converters ?? [])]);
}

function generatorCurrent(context: CheckContext, id: string, side: Side, reader: Reader): Carried | null {
  const rated = side.generators.reduce<number | null>((total, generator) => { const value = reader.number(generator, "ratedA"); return total === null || value === null ? null : total + value; }, 0);
  if (rated === null || rated === 0) return null;
  return carried(context, "generator", { kind: "generator", nameplateA: rated, overloadPrevented: topology(context.graph).protectors(id).length > 0 }, side.generators);
}

/** Loads beyond the circuit, seen from the side that supplies them. Where none is drawn and none stated, nothing is claimed. */
function loadCurrent(context: CheckContext, id: string, circuit: Circuit, sides: readonly Side[], reader: Reader): Carried | null {
  if (circuit.load) {
    const { continuousA, otherA } = circuit.load;
    return continuousA + otherA > 0 ? carried(context, "load", { kind: "load", continuousA, noncontinuousA: otherA, branch: sides.some((one) => one.buses.length === 0 && supplies(one) === 0) }, []) : null;
  }
  const away = sides.find((one) => supplies(one) === 0) ?? sides.find((one) => one.utilities.length === 0);
  const supplied = sides.some((one) => one !== away && supplies(one) > 0);
  if (!away || !supplied || away.loads.length === 0) return null;
  // A feeder with sources beyond carries what they leave over; its load is the designer's to state.
  if (supplies(away) > 0) return null;
  let continuousA = 0;
  let noncontinuousA = 0;
  for (const load of away.loads) {
    const amperes = loadA(context, load);
    const single = away.loads.length === 1;
    if (amperes === null) {
      reader.ask(equipmentRef(load), "props.currentA", `current of ${nameOf(context, equipmentRef(load))}`);
      continue;
    }
    const { continuous } = context.drawing.equipment[load]?.props ?? {};
    if (typeof continuous !== "boolean" && single) reader.ask(equipmentRef(load), "props.continuous", propertyLabel(context, load, "continuous"));
    if (continuous === false) noncontinuousA += amperes;
    else continuousA += amperes;
  }
  if (continuousA + noncontinuousA === 0) return null;
  return carried(context, "load", { kind: "load", continuousA, noncontinuousA, branch: away.buses.length === 0, hundredPercentRated: hundredPercent(context, id) }, away.loads);
}
function hundredPercent(context: CheckContext, id: string): boolean {
  const devices = topology(context.graph).protectors(id);
  return devices.length > 0 && devices.every(({ device }) => isTrue(context, device, "listedHundredPercent"));
}
/** Current of a load, A: stated, or its power at its voltage. */
export function loadA(context: CheckContext, load: string): number | null {
  const stated = numberOf(context, load, "currentA");
  if (stated !== null) return stated;
  const power = numberOf(context, load, "powerKW");
  return power === null ? null : (power * 1000) / (numberOf(context, load, "phaseV") ?? 240);
}
export const carriedName = (context: CheckContext, ids: readonly string[]): string => ids.map((id) => nameOf(context, equipmentRef(id))).join(", ");
