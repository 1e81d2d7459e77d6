import { equipmentOfNode, type ConductionEdge, type DrawingGraph } from "@/lib/diagram/graph";

/*
 * What lies beyond an edge is asked for every circuit, so it is not walked each time: regions (what is joined without a
 * throw of a transfer switch) are numbered once by a depth-first walk, and one side of a bridge is an interval of those
 * numbers or the rest of its region. Time and memory grow with the drawing, not with its square.
 */

/** What lies on one side of a circuit with every switch closed. Converters end a side; two throws of one transfer switch are never taken together. */
export interface Side {
  utilities: readonly string[];
  generators: readonly string[];
  strings: readonly string[];
  batteries: readonly string[];
  converters: readonly string[];
  loads: readonly string[];
  buses: readonly string[];
  nodes: ReadonlySet<string>;
  /** Circuits whose both ends lie here. */
  edges: ReadonlySet<string>;
}
/** Nodes of one region between two numbers, or all of it but those. */
interface Part { region: number; first: number; last: number; inside: boolean }
interface Throw { equipment: string; from: number; to: number }

interface Numbered {
  index: ReadonlyMap<string, number>;
  names: readonly string[];
  region: Int32Array;
  /** Number of each node in its region's walk, and the last number below it. */
  entry: Int32Array;
  last: Int32Array;
  bridge: ReadonlySet<ConductionEdge>;
  throws: ReadonlyMap<number, readonly Throw[]>;
}

const ordinary = (edge: ConductionEdge): boolean => edge.by !== "converter" && edge.by !== "throw";

function numberNodes(graph: DrawingGraph): Numbered {
  const index = new Map<string, number>();
  const names: string[] = [];
  const node = (name: string): number => {
    let at = index.get(name);
    if (at === undefined) { at = names.length; index.set(name, at); names.push(name); }
    return at;
  };
  for (const id of Object.keys(graph.drawing.equipment).sort()) for (const port of graph.ports(id)) node(`${id}/${port.id}`);
  const around: { to: number; edge: ConductionEdge }[][] = names.map(() => []);
  const throws = new Map<number, Throw[]>();
  for (const edge of graph.edges) {
    const [a, b] = [node(edge.a), node(edge.b)];
    while (around.length < names.length) around.push([]);
    if (edge.by === "throw") {
      for (const [from, to] of [[a, b], [b, a]] as const) throws.set(from, [...(throws.get(from) ?? []), { equipment: edge.id, from, to }]);
    } else if (ordinary(edge)) {
      around[a]?.push({ to: b, edge });
      around[b]?.push({ to: a, edge });
    }
  }
  const count = names.length;
  const region = new Int32Array(count).fill(-1);
  const entry = new Int32Array(count);
  const last = new Int32Array(count);
  const low = new Int32Array(count);
  const bridge = new Set<ConductionEdge>();
  let regions = 0;
  for (let root = 0; root < count; root += 1) {
    if (region[root] !== -1) continue;
    let number = 0;
    const open = (at: number): void => { region[at] = regions; entry[at] = low[at] = number; number += 1; };
    open(root);
    const stack: { at: number; by: ConductionEdge | null; next: number }[] = [{ at: root, by: null, next: 0 }];
    for (let top = stack.at(-1); top; top = stack.at(-1)) {
      const way = around[top.at]?.[top.next];
      top.next += 1;
      if (!way) {
        last[top.at] = number - 1;
        stack.pop();
        const parent = stack.at(-1);
        if (parent && top.by) {
          low[parent.at] = Math.min(low[parent.at] as number, low[top.at] as number);
          if ((low[top.at] as number) > (entry[parent.at] as number)) bridge.add(top.by);
        }
      } else if (way.edge !== top.by) {
        if (region[way.to] === -1) { open(way.to); stack.push({ at: way.to, by: way.edge, next: 0 }); }
        else low[top.at] = Math.min(low[top.at] as number, entry[way.to] as number);
      }
    }
    regions += 1;
  }
  return { index, names, region, entry, last, bridge, throws };
}

const holds = (part: Part, region: number, entry: number): boolean => part.region === region && (entry >= part.first && entry <= part.last) === part.inside;
const ALL = { first: -1, last: -1, inside: false } as const;

/** Parts of the drawing reached from a node without one edge. Two throws of one transfer switch are never taken together. */
function partsFrom(n: Numbered, start: number, without: ConductionEdge | null): Part[] {
  const cut = without && n.bridge.has(without) ? without : null;
  const [a, b] = cut ? [n.index.get(cut.a) as number, n.index.get(cut.b) as number] : [0, 0];
  // Of a bridge's two ends the one entered later is the top of the part that hangs from it.
  const below = cut ? ((n.entry[a] as number) > (n.entry[b] as number) ? a : b) : -1;
  const partOf = (node: number): Part => {
    const region = n.region[node] as number;
    if (below < 0 || region !== n.region[below]) return { region, ...ALL };
    const [first, last] = [n.entry[below] as number, n.last[below] as number];
    return { region, first, last, inside: (n.entry[node] as number) >= first && (n.entry[node] as number) <= last };
  };
  const parts: Part[] = [];
  const seen = new Set<string>();
  const queue: { part: Part; at: number; thrown: string }[] = [{ part: partOf(start), at: -1, thrown: "" }];
  for (let next = queue.pop(); next; next = queue.pop()) {
    const { part, at, thrown } = next;
    const key = `${part.region} ${part.inside} ${at} ${thrown}`;
    if (seen.has(key)) continue;
    seen.add(key);
    if (!parts.some((one) => one.region === part.region && one.inside === part.inside)) parts.push(part);
    for (const [from, list] of n.throws) {
      if (!holds(part, n.region[from] as number, n.entry[from] as number)) continue;
      for (const each of list) if (!(from === at && each.equipment === thrown)) queue.push({ part: partOf(each.to), at: each.to, thrown: each.equipment });
    }
  }
  return parts;
}

type ListName = "utility" | "generator" | "pv" | "battery" | "converter" | "load" | "bus";
interface Item { id: string; region: number; entry: number }

/** Makes the reader of sides for one drawing. What a side holds is worked out when it is asked for. */
export function reacher(graph: DrawingGraph): (node: string, without: ConductionEdge | null) => Side {
  const n = numberNodes(graph);
  const lists: Record<ListName, Item[]> = { utility: [], generator: [], pv: [], battery: [], converter: [], load: [], bus: [] };
  const circuits: Item[] = [];
  n.names.forEach((name, i) => {
    const id = equipmentOfNode(name);
    const { source, converter, load, bus } = graph.kind(id).capabilities;
    const item: Item = { id, region: n.region[i] as number, entry: n.entry[i] as number };
    if (source) lists[source].push(item);
    if (converter) lists.converter.push(item);
    if (load) lists.load.push(item);
    if (bus && name.endsWith("/bus")) lists.bus.push(item);
  });
  for (const edge of graph.edges) {
    if (edge.by !== "circuit") continue;
    const at = n.index.get(edge.a) as number;
    circuits.push({ id: edge.id, region: n.region[at] as number, entry: n.entry[at] as number });
  }
  for (const list of [...Object.values(lists), circuits]) list.sort(byId);
  const numbered = new Map<readonly Item[], ReadonlyMap<number, readonly Item[]>>([...Object.values(lists), circuits].map((list) => [list, inOrderOfEntry(list)]));

  const pick = (list: readonly Item[], parts: readonly Part[], not: string | null): readonly string[] => {
    const found: string[] = [];
    const [only] = parts;
    // What hangs from a bridge is few things among many: they stand next to each other by number.
    if (only?.inside && parts.length === 1) {
      const region = numbered.get(list)?.get(only.region) ?? [];
      for (let i = firstFrom(region, only.first); i < region.length && (region[i] as Item).entry <= only.last; i += 1) found.push((region[i] as Item).id);
      return [...new Set(found)].sort().filter((id) => id !== not);
    }
    for (const item of list) {
      if (item.id === not || found.at(-1) === item.id) continue;
      if (parts.some((part) => holds(part, item.region, item.entry))) found.push(item.id);
    }
    return found;
  };
  const known = new Map<string, Side>();
  return (node, without) => {
    const start = n.index.get(node);
    if (start === undefined) return EMPTY;
    const parts = partsFrom(n, start, without);
    // A circuit that is no bridge is still not part of its own sides.
    const own = without?.by === "circuit" ? without.id : null;
    const key = `${parts.map((part) => `${part.region}${part.inside ? "+" : "-"}${part.first}`).join(" ")} ${own ?? ""}`;
    let side = known.get(key);
    if (!side) {
      side = new LazySide(
        (list) => pick(lists[list], parts, null), () => new Set(pick(circuits, parts, own)),
        () => new Set(n.names.filter((_, i) => parts.some((part) => holds(part, n.region[i] as number, n.entry[i] as number)))),
      );
      known.set(key, side);
    }
    return side;
  };
}

const byId = (a: Item, b: Item): number => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);
function inOrderOfEntry(list: readonly Item[]): ReadonlyMap<number, readonly Item[]> {
  const map = new Map<number, Item[]>();
  for (const item of list) {
    const own = map.get(item.region);
    if (own) own.push(item);
    else map.set(item.region, [item]);
  }
  for (const own of map.values()) own.sort((a, b) => a.entry - b.entry);
  return map;
}
/** Place of the first item whose number is not below `entry`. */
function firstFrom(list: readonly Item[], entry: number): number {
  let [low, high] = [0, list.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle] as Item).entry < entry) low = middle + 1;
    else high = middle;
  }
  return low;
}
const EMPTY: Side = { utilities: [], generators: [], strings: [], batteries: [], converters: [], loads: [], buses: [], nodes: new Set(), edges: new Set() };

/** A side whose lists are made on first use and kept. */
class LazySide implements Side {
  private readonly made = new Map<ListName, readonly string[]>();
  private madeEdges: ReadonlySet<string> | null = null;
  private madeNodes: ReadonlySet<string> | null = null;
  constructor(private readonly list: (name: ListName) => readonly string[], private readonly makeEdges: () => ReadonlySet<string>, private readonly makeNodes: () => ReadonlySet<string>) {}
  private of(name: ListName): readonly string[] {
    let list = this.made.get(name);
    if (!list) { list = this.list(name); this.made.set(name, list); }
    return list;
  }
  get utilities(): readonly string[] { return this.of("utility"); }
  get generators(): readonly string[] { return this.of("generator"); }
  get strings(): readonly string[] { return this.of("pv"); }
  get batteries(): readonly string[] { return this.of("battery"); }
  get converters(): readonly string[] { return this.of("converter"); }
  get loads(): readonly string[] { return this.of("load"); }
  get buses(): readonly string[] { return this.of("bus"); }
  get edges(): ReadonlySet<string> { return (this.madeEdges ??= this.makeEdges()); }
  get nodes(): ReadonlySet<string> { return (this.madeNodes ??= this.makeNodes()); }
}
