import { faultCurrent, shown, type FaultSegment, type Step } from "@/lib/calc";
import { equipmentOfNode, nodeKey, type DrawingGraph } from "@/lib/diagram/graph";
import type { SERVICE_SYSTEMS } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { faultNet, IMPEDANCE_TOLERANCE, ownBranch, stretchOf, takeGates, walkFault, type FaultNet, type FaultSource, type FaultWay } from "./faultWalk";
import { circuitRef, equipmentRef, nameOf, numberOf, propertyLabel, textOf, type Reader } from "./outcome";
import { topology } from "./topology";

/** Available fault current at one ac node: bolted, all ungrounded conductors, with every source that can be joined to it at once. */
export interface FaultPoint {
  node: string;
  /** Utility or generator that gives most, with its way here; null where inverters alone reach the node. */
  source: FaultSource | null;
  way: FaultWay | null;
  /** From that source through the conductors, A; null while it is not known. Values missing on the way leave it an upper bound. */
  sourceA: number | null;
  /** Sources that reach the node as well, of which nobody said what they give. */
  unrated: readonly { source: FaultSource; way: FaultWay }[];
  /** Inverters that can be joined to the node at the same time, and the sum of what is stated of them, A. */
  inverters: readonly string[];
  invertersA: number;
}
/** The convention, to be printed beside the figures. */
export const FAULT_CONVENTION = "Point to point, resistance of conductors only; line to line on a single-phase service, where a line-to-neutral fault close to a center-tapped transformer can be higher; motors left out.";

type Context = Pick<CheckContext, "drawing" | "graph" | "edition" | "once">;
interface Currents { at: (node: string) => FaultPoint | null; nodes: readonly string[] }

const BY_WORDS: Readonly<Record<string, { volts: number; phases: 1 | 3 }>> = {
  "120/240 V 1-ph 3-W": { volts: 240, phases: 1 }, "120/208 V 3-ph 4-W": { volts: 208, phases: 3 }, "277/480 V 3-ph 4-W": { volts: 480, phases: 3 }, "240 V 3-ph 3-W": { volts: 240, phases: 3 },
};
const BY_SERVICE: Readonly<Record<(typeof SERVICE_SYSTEMS)[number], { volts: number; phases: 1 | 3 }>> = {
  "120/240 V, 3-wire": { volts: 240, phases: 1 }, "208Y/120 V, 4-wire": { volts: 208, phases: 3 }, "240/120 V, 4-wire delta with high leg": { volts: 240, phases: 3 },
  "480Y/277 V, 4-wire": { volts: 480, phases: 3 }, "120 V, 2-wire": { volts: 120, phases: 1 },
};

/** Line-to-line voltage of the service, V; null where no utility is drawn or its system is not known. */
export function serviceVolts(context: Context): number | null {
  const known = sourcesOf(context).utilities.flatMap((one) => one.volts ?? []);
  return known.length === 0 ? null : Math.max(...known);
}
/** Available fault current stated at a service, A: at the utility or for the site; the larger where both are. Null: nobody said. */
export function statedFaultA({ drawing }: Pick<CheckContext, "drawing">, utility: string): number | null {
  const stated = [numberOf({ drawing }, utility, "availableFaultCurrentA"), drawing.site.availableFaultCurrentA].filter((value): value is number => value !== null && value > 0);
  return stated.length === 0 ? null : Math.max(...stated);
}
function sourcesOf(context: Context): { utilities: readonly FaultSource[]; generators: readonly FaultSource[] } {
  const { drawing, graph } = context;
  const utilities: FaultSource[] = [];
  const generators: FaultSource[] = [];
  for (const id of Object.keys(drawing.equipment).sort()) {
    const { source } = graph.kind(id).capabilities;
    const node = graph.ports(id).find((port) => port.system === "ac")?.id;
    if (node === undefined || (source !== "utility" && source !== "generator")) continue;
    if (source === "utility") {
      const system = BY_WORDS[textOf(context, id, "systemVoltage") ?? ""] ?? (drawing.site.serviceSystem ? BY_SERVICE[drawing.site.serviceSystem] : undefined);
      utilities.push({ id, node: nodeKey(id, node), availableA: statedFaultA(context, id), volts: system?.volts ?? null, phases: system?.phases ?? 1, atService: true });
    } else {
      generators.push({ id, node: nodeKey(id, node), availableA: numberOf(context, id, "faultA"), volts: numberOf(context, id, "outputV"), phases: graph.port(id, node)?.poles.includes("L3") ? 3 : 1, atService: false });
    }
  }
  return { utilities, generators };
}

/** Available fault current at every ac node, worked out once a run for rules and sheets. */
export function faultCurrents(context: Context): Currents {
  return context.once("available fault current", () => build(context));
}

function build(context: Context): Currents {
  const { graph, drawing } = context;
  const { utilities, generators } = sourcesOf(context);
  // A set that may run beside the utility adds to it; every other one is an alternative.
  const beside = generators.filter((one) => drawing.equipment[one.id]?.props.listedParallelWithUtility === true);
  const branches = new Map(generators.filter((one) => !beside.includes(one)).map((one) => [one.id, ownBranch(graph, one.node)]));
  const net = faultNet(graph);
  const walks = [...utilities, ...generators].map((source) => ({
    source, ways: walkFault(net, source, new Set([...branches].filter(([id]) => id !== source.id).flatMap(([, nodes]) => nodes))),
  }));
  const inverters = inverterReach(context, net.gates);
  const points = new Map<string, FaultPoint | null>();
  interface Reached { source: FaultSource; way: FaultWay; amperes: number | null }
  const bestWay = (node: string, { source, ways }: (typeof walks)[number]): Reached | null => {
    let best: Reached | null = null;
    for (const way of ways.get(node) ?? []) {
      const amperes = amperesOf(source, way);
      if (!best || (amperes ?? Infinity) > (best.amperes ?? Infinity)) best = { source, way, amperes };
    }
    return best;
  };

  const at = (node: string): FaultPoint | null => {
    const known = points.get(node);
    if (known !== undefined) return known;
    const reached: Reached[] = [];
    for (const walk of walks) { const best = bestWay(node, walk); if (best) reached.push(best); }
    const unrated = reached.filter((one) => one.amperes === null);
    let point: FaultPoint | null = null;
    for (const { source, way, amperes } of reached) {
      const added = beside.length === 0 ? 0 : reached.reduce((sum, one) => sum + (one.source !== source && beside.includes(one.source) ? one.amperes ?? 0 : 0), 0);
      const joined = inverters(node, way.taken);
      const one: FaultPoint = { node, source, way, sourceA: amperes === null ? null : amperes + added, unrated, inverters: joined.ids, invertersA: joined.amperes };
      if (!point || mostFirst(one, point) < 0) point = one;
    }
    const alone = point ? null : inverters(node, new Map());
    if (alone && alone.ids.length > 0) point = { node, source: null, way: null, sourceA: 0, unrated, inverters: alone.ids, invertersA: alone.amperes };
    points.set(node, point);
    return point;
  };
  return { at, nodes: [...new Set(walks.flatMap((one) => [...one.ways.keys()]))].sort() };
}
/** What is known to be most comes first. */
const mostFirst = (a: FaultPoint, b: FaultPoint): number => (b.sourceA ?? -1) + b.invertersA - (a.sourceA ?? -1) - a.invertersA;
function amperesOf(source: FaultSource, way: FaultWay): number | null {
  if (source.availableA === null || source.availableA === 0) return null;
  if (way.volts === null) return source.volts === null && !transformers(way) ? source.availableA : null;
  const bolted = (way.phases === 3 ? way.volts / Math.sqrt(3) : way.volts) / way.loopOhm;
  return way.phases === 3 && way.twoOfThree ? (bolted * Math.sqrt(3)) / 2 : bolted;
}
const transformers = (way: FaultWay): boolean => pathOf(way).some((one) => one.edge?.by === "converter");
/** A way from the source on. */
function pathOf(way: FaultWay): readonly FaultWay[] {
  const path: FaultWay[] = [];
  for (let at: FaultWay | null = way; at; at = at.before) path.unshift(at);
  return path;
}

/** Inverters that can be joined to a node, by blocks of what no throw, interlock or transformer parts. */
function inverterReach(context: Context, gates: FaultNet["gates"]): (node: string, taken: ReadonlyMap<string, string>) => { ids: readonly string[]; amperes: number } {
  const { graph, drawing } = context;
  const up = new Map<string, string>();
  const root = (node: string): string => {
    let at = node;
    for (let next = up.get(at); next !== undefined; next = up.get(at)) { const over = up.get(next); if (over !== undefined) up.set(at, over); at = next; }
    return at;
  };
  const between: { a: string; b: string; gates: ReturnType<typeof gates>; ratio: number }[] = [];
  for (const edge of graph.edges) {
    const parting = gates(edge);
    if (edge.by === "converter") {
      if (!graph.kind(edge.id).capabilities.transformer) continue;
      const [p, s] = [numberOf(context, edge.id, "primaryV"), numberOf(context, edge.id, "secondaryV")];
      between.push({ a: edge.a, b: edge.b, gates: [], ratio: p !== null && s !== null && s > 0 ? p / s : 1 });
    } else if (parting.length > 0) between.push({ a: edge.a, b: edge.b, gates: parting, ratio: 1 });
    else { const [a, b] = [root(edge.a), root(edge.b)]; if (a !== b) up.set(a, b); }
  }
  const own = new Map<string, { ids: string[]; amperes: number }>();
  for (const id of Object.keys(drawing.equipment).sort()) {
    if (!graph.kind(id).capabilities.converter || !graph.port(id, "ac")) continue;
    const block = root(nodeKey(id, "ac"));
    const held = own.get(block) ?? { ids: [], amperes: 0 };
    own.set(block, held);
    held.ids.push(id);
    held.amperes += numberOf(context, id, "faultA") ?? 0;
  }
  const ways = new Map<string, { to: string; gates: ReturnType<typeof gates>; factor: number }[]>();
  for (const { a, b, gates: parting, ratio } of between) {
    // Current grows toward the side of the lower voltage: a is the primary of a transformer.
    for (const [from, to, factor] of [[a, b, 1 / ratio], [b, a, ratio]] as const) ways.set(root(from), [...(ways.get(root(from)) ?? []), { to: root(to), gates: parting, factor }]);
  }
  const answers = new Map<string, { ids: readonly string[]; amperes: number }>();
  return (node, taken) => {
    const block = root(node);
    const key = taken.size === 0 ? block : `${block} ${[...taken].sort(([a], [b]) => (a < b ? -1 : 1)).join(";")}`;
    let answer = answers.get(key);
    if (!answer) {
      const seen = new Set([block]);
      const queue = [{ block, taken, factor: 1 }];
      const ids: string[] = [];
      let amperes = 0;
      for (let next = queue.shift(); next; next = queue.shift()) {
        const held = own.get(next.block);
        if (held) { ids.push(...held.ids); amperes += held.amperes * next.factor; }
        for (const way of ways.get(next.block) ?? []) {
          const after = seen.has(way.to) ? null : takeGates(next.taken, way.gates);
          if (after === null) continue;
          seen.add(way.to);
          queue.push({ block: way.to, taken: after, factor: next.factor * way.factor });
        }
      }
      answer = { ids, amperes };
      answers.set(key, answer);
    }
    return answer;
  };
}

/** Overcurrent device that a point's current passes last before it, the equipment's own left out. Null: none. */
export function deviceAhead(graph: DrawingGraph, point: FaultPoint, own: string): string | null {
  const { ratingField } = topology(graph);
  for (let at = point.way; at; at = at.before) if (at.edge?.by === "switch" && at.edge.id !== own && ratingField(at.edge.id) !== null) return at.edge.id;
  return null;
}
/** Asks for what sources give of which nobody said it: without it there is no figure. */
export function askSources(context: CheckContext, point: FaultPoint, reader: Reader): void {
  for (const { source: { id, atService, availableA }, way } of point.unrated) {
    const key = atService ? "availableFaultCurrentA" : "faultA";
    if (availableA === null) reader.ask(equipmentRef(id), `props.${key}`, propertyLabel(context, id, key));
    else for (const { edge } of pathOf(way)) if (edge?.by === "converter") for (const name of ["primaryV", "secondaryV"]) reader.number(edge.id, name);
  }
}
/** Asks for what would weaken the current on its way and is not known: until then the figure is an upper bound. */
export function askWay(context: CheckContext, point: FaultPoint, reader: Reader): void {
  if (!point.way || !point.source) return;
  if (point.source.volts === null && point.source.atService) reader.text(point.source.id, "systemVoltage");
  else if (point.source.volts === null) reader.number(point.source.id, "outputV");
  for (const { edge, before } of pathOf(point.way)) {
    if (edge?.by === "converter") for (const name of ["ratedKVA", "impedancePercent"]) reader.number(edge.id, name);
    if (edge?.by !== "circuit" || !before?.counted || context.drawing.circuits[edge.id]?.wiring === "factory") continue;
    const name = nameOf(context, circuitRef(edge.id));
    for (const section of context.graph.sections(edge.id)) {
      if (section.lengthFt === null) reader.ask(circuitRef(edge.id), `sections.${section.id}.lengthFt`, `length of ${name}`);
      const field = `sections.${section.id}.ungrounded`;
      if (!section.ungrounded) reader.ask(circuitRef(edge.id), field, `size of the conductors of ${name}`);
      else for (const key of ["size", "metal"] as const) if (section.ungrounded[key] === null) reader.ask(circuitRef(edge.id), `${field}.${key}`, `${key} of the conductors of ${name}`);
    }
  }
}
/** How a rating stands to the current at a node. `less` is what the equipment gives itself, A. */
export function compareFault(context: CheckContext, point: FaultPoint, ratingKA: number, reader: Reader, less = 0): "holds" | "fails" | "asked" {
  const ratingA = ratingKA * 1000 + 1e-6;
  const totalA = (point.sourceA ?? 0) + point.invertersA - less;
  if (totalA > ratingA) {
    // What is not known yet can only lower the figure of the source.
    askWay(context, point, reader);
    return reader.complete ? "fails" : "asked";
  }
  askSources(context, point, reader);
  for (const id of point.inverters) reader.number(id, "faultA");
  return reader.complete ? "holds" : "asked";
}

/** Circuits on the way that weaken the current, from the source on. */
export const circuitsTo = (point: FaultPoint): readonly string[] =>
  point.way === null ? [] : pathOf(point.way).flatMap(({ edge, before }) => (edge?.by === "circuit" && before?.counted ? [edge.id] : []));

/** Worked lines from the source to the node. */
export function faultSteps(context: Context, point: FaultPoint): readonly Step[] {
  const { source, way } = point;
  const steps: Step[] = [];
  if (source && way && source.availableA !== null && source.volts !== null && point.sourceA !== null) {
    let [volts, phases, availableA] = [source.volts, source.phases, source.availableA];
    let segments: FaultSegment[] = [];
    const flush = (): void => {
      const done = faultCurrent({ edition: context.edition, phases, lineToLineV: volts, source: { kind: "stated", availableA }, method: "arithmetic", resistanceOnly: true, segments });
      steps.push(...done.steps);
      segments = [];
    };
    for (const at of pathOf(way)) {
      const { edge, before } = at;
      if (edge?.by === "circuit" && before?.counted && context.drawing.circuits[edge.id]?.wiring === "field") {
        segments.push(...context.graph.sections(edge.id).flatMap((section) => { const part = stretchOf(context.graph, section); return part ? [{ ...part, label: nameOf(context, circuitRef(edge.id)) }] : []; }));
      } else if (edge?.by === "converter" && at.volts !== null) {
        flush();
        const loopV = at.phases === 3 ? at.volts / Math.sqrt(3) : at.volts;
        [volts, phases, availableA] = [at.volts, at.phases, loopV / at.loopOhm];
        steps.push({ symbol: "Is", expression: `V / (Z primary × (Vs/Vp)² + ${IMPEDANCE_TOLERANCE} × Z transformer)`, substituted: `${nameOf(context, equipmentRef(edge.id))}: ${shown(loopV, 1)} V / ${shown(at.loopOhm, 6)} Ω`, result: availableA, unit: "A" });
      }
    }
    flush();
    if (way.twoOfThree && way.phases === 3) steps.push({ symbol: "Ill", expression: "If × √3 / 2", substituted: "two of three phases", result: point.sourceA, unit: "A" });
  }
  if (point.inverters.length > 0) {
    const each = point.inverters.map((id) => `${nameOf(context, equipmentRef(id))} ${shown(numberOf(context, id, "faultA") ?? 0)} A`).join(" + ");
    steps.push({ symbol: "ΣI", expression: "If + Σ inverters", substituted: `${shown(point.sourceA ?? 0, 0)} A + ${each}`, result: (point.sourceA ?? 0) + point.invertersA, unit: "A" });
  }
  return steps;
}

/** One row of the table on the sheet. */
export interface FaultRow { equipment: string; node: string; point: FaultPoint; ratingKA: number | null; ratingField: "interruptingKA" | "shortCircuitKA" }
/** Buses and devices that the current reaches, with their ratings, in id order: the rows of a fault-current table. */
export function faultRows(context: Context): readonly FaultRow[] {
  return context.once("fault current rows", () => {
    const { at } = faultCurrents(context);
    return Object.keys(context.drawing.equipment).sort().flatMap((equipment): FaultRow[] => {
      const { properties } = context.graph.kind(equipment);
      const ratingField = Object.hasOwn(properties, "interruptingKA") ? "interruptingKA" : Object.hasOwn(properties, "shortCircuitKA") ? "shortCircuitKA" : null;
      if (ratingField === null) return [];
      let worst: FaultPoint | null = null;
      for (const port of context.graph.ports(equipment)) {
        const point = port.system === "ac" ? at(nodeKey(equipment, port.id)) : null;
        if (point && (!worst || mostFirst(point, worst) < 0)) worst = point;
      }
      return worst ? [{ equipment, node: worst.node, point: worst, ratingKA: numberOf(context, equipment, ratingField), ratingField }] : [];
    });
  });
}
export const totalA = (point: FaultPoint): number => (point.sourceA ?? 0) + point.invertersA;
export const equipmentAt = (point: FaultPoint): string => equipmentOfNode(point.node);
