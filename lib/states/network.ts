import type { ConductionEdge, DrawingGraph } from "@/lib/diagram/graph";
import { equipmentOfNode, nodeKey } from "@/lib/diagram/graph";

/** A switch as the walk sees it: the clusters of nodes it can join, in its closed position or positions. */
export interface NetworkSwitch {
  id: string;
  kind: "breaker" | "switch" | "contactor" | "transfer";
  ratingA: number | null;
  /** Joins of each closed position; an ordinary switch has one position named "". */
  positions: readonly { name: string; joins: readonly (readonly [number, number])[] }[];
  hasOff: boolean;
}
/** Nodes that no switch can part, numbered; ac and dc parts never share a number. */
export interface Network {
  clusterOf: ReadonlyMap<string, number>;
  nodes: readonly (readonly string[])[];
  isAc: readonly boolean[];
  switches: readonly NetworkSwitch[];
  /** Clusters holding a source, a converter port or the bus of an equipment with a fitted bond. */
  terminal: readonly boolean[];
  hasBus: readonly boolean[];
}

/** Smallest union-find: roots by path halving. */
export class Joined {
  private readonly parent: number[];
  constructor(size: number) { this.parent = Array.from({ length: size }, (_, i) => i); }
  root(of: number): number {
    let at = of;
    for (;;) {
      const up = this.parent[at] ?? at;
      if (up === at) return at;
      this.parent[at] = this.parent[up] ?? up;
      at = up;
    }
  }
  join(a: number, b: number): void {
    const [x, y] = [this.root(a), this.root(b)];
    if (x !== y) this.parent[Math.max(x, y)] = Math.min(x, y);
  }
}

const numberOrNull = (value: unknown): number | null => (typeof value === "number" ? value : null);

/** Reads the drawing as clusters and switches. Converter paths carry no fault path and join nothing here. */
export function network(graph: DrawingGraph): Network {
  const nodes = conductionNodes(graph);
  const index = new Map(nodes.map((node, i) => [node, i]));
  const joined = new Joined(nodes.length);
  for (const edge of graph.edges) {
    if (edge.by === "circuit" || edge.by === "solid") joined.join(index.get(edge.a) ?? 0, index.get(edge.b) ?? 0);
  }
  const clusterOf = new Map<string, number>();
  const members: string[][] = [];
  const byRoot = new Map<number, number>();
  nodes.forEach((node, i) => {
    const root = joined.root(i);
    let cluster = byRoot.get(root);
    if (cluster === undefined) { cluster = members.length; byRoot.set(root, cluster); members.push([]); }
    clusterOf.set(node, cluster);
    members[cluster]?.push(node);
  });
  const bonded = new Set(Object.values(graph.drawing.bonds).filter((bond) => bond.fitted !== false).map((bond) => bond.equipment));
  const isBus = (node: string): boolean => node.endsWith("/bus") && graph.kind(equipmentOfNode(node)).capabilities.bus === true;
  return {
    clusterOf, nodes: members,
    isAc: members.map((list) => list.some((node) => systemOf(graph, node) === "ac")),
    switches: switchesOf(graph, clusterOf),
    terminal: members.map((list) => list.some((node) => {
      const { capabilities } = graph.kind(equipmentOfNode(node));
      return Boolean(capabilities.source ?? capabilities.converter) || bonded.has(equipmentOfNode(node)) && !capabilities.switching;
    })),
    hasBus: members.map((list) => list.some(isBus)),
  };
}

const systemOf = (graph: DrawingGraph, node: string): string | undefined =>
  graph.port(equipmentOfNode(node), node.slice(node.indexOf("/") + 1))?.system;

/** Every power port of the drawing, in id order. */
function conductionNodes(graph: DrawingGraph): readonly string[] {
  return Object.keys(graph.drawing.equipment).sort().flatMap((id) =>
    graph.ports(id).filter((port) => port.system !== "data" && port.system !== "ground").map((port) => nodeKey(id, port.id)));
}

function switchesOf(graph: DrawingGraph, clusterOf: ReadonlyMap<string, number>): readonly NetworkSwitch[] {
  const byEquipment = new Map<string, ConductionEdge[]>();
  for (const edge of graph.edges) {
    if (edge.by !== "switch" && edge.by !== "throw") continue;
    const list = byEquipment.get(edge.id);
    if (list) list.push(edge);
    else byEquipment.set(edge.id, [edge]);
  }
  return [...byEquipment].sort(([a], [b]) => (a < b ? -1 : 1)).map(([id, edges]): NetworkSwitch => {
    const kind = graph.kind(id).capabilities.switching ?? "switch";
    const props = graph.drawing.equipment[id]?.props ?? {};
    const names = [...new Set(edges.map((edge) => edge.position ?? ""))].sort();
    const cluster = (node: string): number => clusterOf.get(node) ?? 0;
    return {
      id, kind, ratingA: numberOrNull(props.ratingA),
      positions: names.map((name) => ({ name, joins: edges.filter((edge) => (edge.position ?? "") === name).map((edge) => [cluster(edge.a), cluster(edge.b)] as const) })),
      // Only a transfer switch without an off position cannot be left open.
      hasOff: kind !== "transfer" || props.centerOff !== false,
    };
  });
}
