import { stretchLoopOhm, type FaultSegment } from "@/lib/calc";
import { hasAcImpedance, MATERIAL_BY_SYMBOL } from "@/lib/code";
import { equipmentOfNode, type ConductionEdge, type DrawingGraph } from "@/lib/diagram/graph";
import type { Section } from "@/lib/diagram/schema";
import { holds } from "@/lib/states";
import { isConductorSize } from "@/lib/units";
import { topology } from "./topology";

/*
 * The way of a fault current from one source to every ac node, walked once: each node keeps the way of least impedance for
 * every set of throws and interlocked switches that leads to it. Two switches that an interlock keeps apart, or two throws of
 * one transfer switch, are never taken together. Where conductors form a loop, the better way counts alone.
 */

type SizedStretch = Extract<FaultSegment, { size: unknown }>;
export interface FaultSource {
  id: string;
  node: string;
  /** What it gives at its own terminals, or as stated at the service, A; null where nobody said. */
  availableA: number | null;
  /** Line-to-line voltage; null where it is not known: then no conductor weakens the current. */
  volts: number | null;
  phases: 1 | 3;
  /** True where the current is stated at the service: the conductors ahead of the first device do not weaken it again. */
  atService: boolean;
}
/** A way to a node. `loopOhm` counts the source; it is that of the voltage at the node. */
export interface FaultWay {
  node: string;
  loopOhm: number;
  volts: number | null;
  phases: 1 | 3;
  /** Two of three phases alone: the fault is line to line. */
  twoOfThree: boolean;
  counted: boolean;
  before: FaultWay | null;
  edge: ConductionEdge | null;
  /** Position taken at every throw and interlock, by its id. */
  taken: ReadonlyMap<string, string>;
}
const OPEN: readonly (readonly [string, string])[] = [];
const NOTHING: ReadonlyMap<string, string> = new Map();
const wayKey = (taken: ReadonlyMap<string, string>): string => (taken.size === 0 ? "" : [...taken].sort(([a], [b]) => (a < b ? -1 : 1)).map((each) => each.join("=")).join(";"));
/** Transformers weaken less than their plate says: makers may miss the impedance by a tenth. Common practice, no published source. */
export const IMPEDANCE_TOLERANCE = 0.9;

const STEEL = new Set<string | null>(["EMT", "IMC", "RMC", "FMC", "LFMC"]);
/** Conductors of a section as a stretch of a fault path; null where size, metal or length is not known. */
export function stretchOf(graph: DrawingGraph, { ungrounded, lengthFt, parallelSets, route }: Section): SizedStretch | null {
  if (!ungrounded || !isConductorSize(ungrounded.size) || ungrounded.metal === null || lengthFt === null) return null;
  const material = MATERIAL_BY_SYMBOL[ungrounded.metal];
  // A size that the table leaves out is taken for no length at all: the current is never taken too small.
  if (!hasAcImpedance(ungrounded.size, material)) return { label: "", lengthFt: 0, size: "1/0 AWG", material, conduit: "pvc" };
  const steel = route.length > 0 && route.every((step) => {
    const raceway = graph.drawing.raceways[step.raceway];
    return raceway !== undefined && (raceway.type === null ? raceway.metal === true : STEEL.has(raceway.type) && raceway.metal !== false);
  });
  return { label: "", lengthFt, sets: parallelSets, size: ungrounded.size, material, conduit: steel ? "steel" : "pvc" };
}
/** Ω of one conductor of 1,000 ft, looked up once for a size, metal and conduit. */
const perThousandFt = new Map<string, number>();
function oneWayOhm(part: SizedStretch): number {
  const key = `${part.size} ${part.material} ${part.conduit}`;
  let ohm = perThousandFt.get(key);
  if (ohm === undefined) { ohm = stretchLoopOhm({ ...part, lengthFt: 1000, sets: 1 }, 3, true); perThousandFt.set(key, ohm); }
  return (ohm * part.lengthFt) / 1000 / (part.sets ?? 1);
}

/** Gate that an edge passes, as id and position: a throw, or a switch of an interlock that holds. */
export function gatesOf(graph: DrawingGraph): (edge: ConductionEdge) => readonly (readonly [string, string])[] {
  const locks = new Map<string, (readonly [string, string])[]>();
  for (const [id, interlock] of Object.entries(graph.drawing.interlocks)) {
    if (holds(interlock)) for (const one of Object.keys(interlock.switches)) locks.set(one, [...(locks.get(one) ?? []), [id, one]]);
  }
  return (edge) => edge.by === "throw" ? [[edge.id, edge.position ?? ""]] : edge.by === "switch" ? locks.get(edge.id) ?? OPEN : OPEN;
}
/** What has been taken with the gates of one more edge, or null where these shut each other out. */
export function takeGates(taken: ReadonlyMap<string, string>, gates: readonly (readonly [string, string])[]): ReadonlyMap<string, string> | null {
  if (gates.length === 0) return taken;
  if (gates.some(([id, position]) => (taken.get(id) ?? position) !== position)) return null;
  return new Map([...taken, ...gates]);
}

/** Nodes between a generator and the switch that joins it to the rest: no utility current flows there while nothing is in parallel. */
export function ownBranch(graph: DrawingGraph, start: string): readonly string[] {
  const chain = [start];
  let closed = 0;
  let arrived: ConductionEdge | null = null;
  for (let node = start; chain.length < 200;) {
    const onward = graph.edgesAt(node).filter((edge) => edge !== arrived && edge.by !== "converter");
    const [edge] = onward;
    if (!edge || onward.length > 1) break;
    if (edge.by === "switch" || edge.by === "throw") closed = chain.length;
    node = edge.a === node ? edge.b : edge.a;
    if (node.endsWith("/bus")) break;
    arrived = edge;
    chain.push(node);
  }
  return chain.slice(0, closed);
}

interface Ohms { one: number; three: number; two: boolean }
/** What all walks over one drawing share. */
export interface FaultNet { graph: DrawingGraph; gates: ReturnType<typeof gatesOf>; ohmOf: (circuit: string) => Ohms; counts: (equipment: string) => boolean }
export function faultNet(graph: DrawingGraph): FaultNet {
  const { ratingField } = topology(graph);
  const ohms = new Map<string, Ohms>();
  const ohmOf = (id: string): Ohms => {
    let known = ohms.get(id);
    if (!known) {
      let [three, two] = [0, false];
      for (const section of Object.values(graph.drawing.circuits[id]?.sections ?? {})) {
        const part = stretchOf(graph, section);
        if (part) three += oneWayOhm(part);
        if (section.ungrounded !== null && section.ungrounded.count < 3) two = true;
      }
      known = { one: three * 2, three, two };
      ohms.set(id, known);
    }
    return known;
  };
  return { graph, gates: gatesOf(graph), ohmOf, counts: (id) => ratingField(id) !== null || graph.drawing.equipment[id]?.props.serviceEquipment === true };
}

/** Ways from a source to every ac node that it can reach. `closed` nodes are not entered. */
export function walkFault(net: FaultNet, source: FaultSource, closed: ReadonlySet<string>): ReadonlyMap<string, readonly FaultWay[]> {
  const { graph, gates } = net;
  const ways = new Map<string, FaultWay[]>();
  const loopV = source.volts === null ? null : source.phases === 3 ? source.volts / Math.sqrt(3) : source.volts;
  const start: FaultWay = {
    node: source.node, loopOhm: loopV === null || source.availableA === null || source.availableA === 0 ? 0 : loopV / source.availableA, volts: source.volts, phases: source.phases,
    twoOfThree: false, counted: !source.atService, before: null, edge: null, taken: NOTHING,
  };
  const queue: FaultWay[] = [start];
  const keep = (way: FaultWay): boolean => {
    const own = ways.get(way.node);
    if (!own) { ways.set(way.node, [way]); return true; }
    const key = wayKey(way.taken);
    // Most nodes are reached by one way.
    const at = own.findIndex((one) => wayKey(one.taken) === key);
    const known = own[at];
    if (known && known.loopOhm <= way.loopOhm + 1e-12) return false;
    own[known ? at : own.length] = way;
    return true;
  };
  keep(start);
  for (let next = 0; next < queue.length; next += 1) {
    const way = queue[next] as FaultWay;
    if (ways.get(way.node)?.includes(way) !== true) continue;
    for (const edge of graph.edgesAt(way.node)) {
      if (edge === way.edge) continue;
      const node = edge.a === way.node ? edge.b : edge.a;
      if (closed.has(node)) continue;
      const taken = takeGates(way.taken, gates(edge));
      if (taken === null) continue;
      const onward = step(net, way, edge, node, taken);
      if (onward && keep(onward)) queue.push(onward);
    }
  }
  return ways;
}

function step({ graph, ohmOf, counts }: FaultNet, way: FaultWay, edge: ConductionEdge, node: string, taken: ReadonlyMap<string, string>): FaultWay | null {
  const next: FaultWay = { node, loopOhm: way.loopOhm, volts: way.volts, phases: way.phases, twoOfThree: way.twoOfThree, counted: way.counted, before: way, edge, taken };
  if (edge.by === "converter") return graph.kind(edge.id).capabilities.transformer ? throughTransformer(graph, way, edge, next) : null;
  if (edge.by === "circuit") {
    const circuit = graph.drawing.circuits[edge.id];
    if (!circuit || circuit.system !== "ac") return null;
    if (circuit.wiring === "factory") return next;
    const { one, three, two } = ohmOf(edge.id);
    if (way.counted && way.phases === 3 && two) next.twoOfThree = true;
    if (way.counted) next.loopOhm += way.phases === 3 ? three : one;
    return next;
  }
  if (edge.by === "switch" && !next.counted) next.counted = counts(edge.id);
  if (node.endsWith("/bus")) next.counted = true;
  return next;
}

/** Impedance carried over to the other winding, with that of the transformer. What its plate does not say weakens nothing. */
function throughTransformer(graph: DrawingGraph, way: FaultWay, edge: ConductionEdge, next: FaultWay): FaultWay {
  const props = graph.drawing.equipment[edge.id]?.props;
  const number = (key: string): number | null => { const value = props?.[key]; return typeof value === "number" ? value : null; };
  const up = equipmentOfNode(way.node) === edge.id && way.node.endsWith("/primary");
  const [fromV, toV] = up ? [number("primaryV"), number("secondaryV")] : [number("secondaryV"), number("primaryV")];
  next.counted = true;
  // Without both voltages nothing can be said beyond it.
  if (toV === null || fromV === null || fromV === 0) return { ...next, volts: null };
  const phases: 1 | 3 = up ? (["2-wire", "3-wire, 120/240 V"].includes(String(props?.secondary)) ? 1 : way.phases) : way.phases;
  // Two lines of a three-phase supply hold two of its impedances.
  const supply = way.phases === 3 && phases === 1 ? way.loopOhm * 2 : way.loopOhm;
  const ratio = (toV / fromV) ** 2;
  const [kva, percent] = [number("ratedKVA"), number("impedancePercent")];
  const own = kva === null || percent === null ? 0 : (toV * toV * percent * IMPEDANCE_TOLERANCE) / (kva * 100_000);
  return { ...next, loopOhm: supply * ratio + own, volts: toV, phases, twoOfThree: false };
}
