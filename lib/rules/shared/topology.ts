import { equipmentOfNode, nodeKey, type ConductionEdge, type DrawingGraph, type End } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import { reacher, type Side } from "./reach";

export type { Side };

/** Where a walk along a run of conductors ended. */
export interface RunEnd {
  stop: "device" | "bus" | "source" | "converter" | "load" | "open" | "junction";
  /** Overcurrent device that ended the run, and its terminal away from the circuit. */
  device: string | null;
  farNode: string | null;
  node: string;
  /** Circuits and equipment passed on the way, the start left out. */
  circuits: readonly string[];
  equipment: readonly string[];
}
/** A device that protects a circuit against a source beyond it. */
export interface Protector { device: string; end: End; circuits: readonly string[]; equipment: readonly string[] }

/** Topology read once from a drawing and kept for all rules. */
export interface Topology {
  side: (circuit: string, end: End) => Side;
  /** From a node onward, without one edge. */
  beyond: (node: string, without: ConductionEdge | null) => Side;
  runs: (circuit: string, end: End) => readonly RunEnd[];
  runsFrom: (node: string) => readonly RunEnd[];
  protectors: (circuit: string) => readonly Protector[];
  /** Overcurrent device by its rating's property name; null where the equipment is none. */
  ratingField: (equipment: string) => "ratingA" | "fuseA" | null;
}

const cache = new WeakMap<DrawingGraph, Topology>();

/** Topology of a drawing. */
export function topology(graph: DrawingGraph): Topology {
  let known = cache.get(graph);
  if (!known) { known = build(graph); cache.set(graph, known); }
  return known;
}

const far = (edge: ConductionEdge, node: string): string => (edge.a === node ? edge.b : edge.a);
const endNode = (circuit: Circuit, end: End): string => nodeKey(circuit[end].equipment, circuit[end].port);

function build(graph: DrawingGraph): Topology {
  const beyond = reacher(graph);
  const runCache = new Map<string, readonly RunEnd[]>();
  const protectorCache = new Map<string, readonly Protector[]>();
  const edgeOfCircuit = new Map(graph.edges.filter((edge) => edge.by === "circuit").map((edge) => [edge.id, edge]));

  const ratingField = (id: string): "ratingA" | "fuseA" | null =>
    graph.kind(id).capabilities.overcurrent ? "ratingA" : graph.drawing.equipment[id]?.props.fused === true ? "fuseA" : null;

  const circuit = (id: string): Circuit => graph.drawing.circuits[id] as Circuit;
  const runs = (id: string, end: End): readonly RunEnd[] => {
    const key = `${id} ${end}`;
    let ends = runCache.get(key);
    if (!ends) { ends = follow(graph, ratingField, endNode(circuit(id), end), edgeOfCircuit.get(id) ?? null, [], [], 0); runCache.set(key, ends); }
    return ends;
  };
  const protectors = (id: string): readonly Protector[] => {
    let list = protectorCache.get(id);
    if (!list) {
      list = (["from", "to"] as const).flatMap((end) => {
        // A source without a device of its own is protected by the device at the other end of its conductors.
        const opposite = runs(id, end === "from" ? "to" : "from").some((run) => run.stop === "source");
        return runs(id, end).flatMap((run): Protector[] => {
          if (!run.device || run.farNode === null) return [];
          const edge = graph.edgesAt(run.farNode).find((one) => one.id === run.device && one.by === "switch") ?? null;
          const side = beyond(run.farNode, edge);
          const supplied = side.utilities.length + side.generators.length + side.batteries.length + side.converters.length + side.strings.length > 0;
          return supplied || opposite ? [{ device: run.device, end, circuits: run.circuits, equipment: run.equipment }] : [];
        });
      });
      protectorCache.set(id, list);
    }
    return list;
  };
  const from = new Map<string, readonly RunEnd[]>();
  const runsFrom = (node: string): readonly RunEnd[] => {
    let ends = from.get(node);
    if (!ends) { ends = follow(graph, ratingField, node, null, [], [], 0); from.set(node, ends); }
    return ends;
  };
  const sides = new Map<string, Side>();
  const side = (id: string, end: End): Side => {
    const key = `${id} ${end}`;
    let one = sides.get(key);
    if (!one) { one = beyond(endNode(circuit(id), end), edgeOfCircuit.get(id) ?? null); sides.set(key, one); }
    return one;
  };
  return { beyond, runs, protectors, ratingField, side, runsFrom };
}

/** Follows conductors through equipment that only passes them on, to the first device, bus, source, converter or load. */
function follow(graph: DrawingGraph, ratingField: (id: string) => string | null, node: string, arrived: ConductionEdge | null, circuits: readonly string[], equipment: readonly string[], depth: number): readonly RunEnd[] {
  const id = equipmentOfNode(node);
  const end = (stop: RunEnd["stop"]): readonly RunEnd[] => [{ stop, device: null, farNode: null, node, circuits, equipment }];
  const { source, converter, load, bus } = graph.kind(id).capabilities;
  if (depth > 200) return end("junction");
  if (depth > 0 || arrived) {
    if (source) return end("source");
    if (converter) return end("converter");
    if (load) return end("load");
    if (bus && node.endsWith("/bus")) return end("bus");
  }
  const onward = graph.edgesAt(node).filter((edge) => edge !== arrived && edge.by !== "converter" && !(edge.by === "throw" && arrived?.by === "throw" && edge.id === arrived.id));
  const device = onward.find((edge) => edge.by === "switch" && edge.id === id);
  if (device && ratingField(id) !== null) return [{ stop: "device", device: id, farNode: far(device, node), node, circuits, equipment }];
  const throws = onward.filter((edge) => edge.by === "throw");
  if (onward.length === 0) return end("open");
  if (onward.length > 1 && throws.length !== onward.length) return end("junction");
  return onward.flatMap((edge) => follow(graph, ratingField, far(edge, node), edge,
    edge.by === "circuit" ? [...circuits, edge.id] : circuits, edge.by === "circuit" ? equipment : [...equipment, edge.id], depth + 1));
}

/** Loads of a side that follow their own articles on overcurrent protection: motors and air conditioning. */
export function motorLoads(graph: DrawingGraph, side: Side): readonly string[] {
  return side.loads.filter((id) => ["motor", "air conditioning or refrigeration"].includes(String(graph.drawing.equipment[id]?.props.use)));
}
/** True for a circuit that ends in motors or air conditioning alone, so that Table 240.4(G) sends it to their articles. */
export function motorCircuit(graph: DrawingGraph, circuit: string): boolean {
  let known = motorCache.get(graph);
  if (!known) { known = new Map(); motorCache.set(graph, known); }
  let answer = known.get(circuit);
  if (answer === undefined) {
    const { side } = topology(graph);
    answer = (["from", "to"] as const).some((end) => {
      const one = side(circuit, end);
      // Asked first, since the supplied side of a branch may hold every other load of the site.
      if (supplies(one) > 0) return false;
      const motors = motorLoads(graph, one).length;
      return motors > 0 && motors === one.loads.length;
    });
    known.set(circuit, answer);
  }
  return answer;
}
const motorCache = new WeakMap<DrawingGraph, Map<string, boolean>>();
/** Number of sources and converters on a side. */
export const supplies = (side: Side): number => side.utilities.length + side.generators.length + side.converters.length + side.batteries.length + side.strings.length;

const powerCache = new WeakMap<DrawingGraph, readonly string[]>();
/** Field circuits of the power systems, in id order. */
export function powerCircuits(graph: DrawingGraph): readonly string[] {
  let known = powerCache.get(graph);
  if (!known) { known = listPowerCircuits(graph); powerCache.set(graph, known); }
  return known;
}
function listPowerCircuits(graph: DrawingGraph): readonly string[] {
  return Object.keys(graph.drawing.circuits).sort().filter((id) => {
    const circuit = graph.drawing.circuits[id] as Circuit;
    return circuit.wiring === "field" && circuit.system !== "data" && circuit.system !== "ground";
  });
}
