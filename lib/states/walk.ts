import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentOfNode } from "@/lib/diagram/graph";
import type { Interlock } from "@/lib/diagram/schema";
import { Joined, type Network, type NetworkSwitch } from "./network";
import type { StateGroup } from "./types";

/** Facts of a contracted cluster that decide a state. */
export interface Part {
  sources: readonly string[];
  converters: readonly string[];
  buses: readonly string[];
}
/** One outcome of the walk: which parts are live together, with the positions that lead to it. */
export interface Walked {
  group: StateGroup;
  closed: readonly string[];
  thrown: ReadonlyMap<string, string>;
  positions: number;
  /** Sources taken as lost; only where not every position is walked. */
  lost: readonly string[];
  /** Live parts: contracted clusters joined with each other. */
  live: readonly (readonly number[])[];
}
export interface WalkResult { outcomes: readonly Walked[]; counts: Record<StateGroup, number>; everyPosition: boolean; all: number; excluded: number }

/** To this number of switches every single position is walked. */
export const EVERY_POSITION_LIMIT = 18;

/** An interlock keeps its switches apart when it is mechanical, or electrical and listed. A device known not to be listed does not. */
export function holds(interlock: Interlock): boolean {
  return interlock.listed !== false && (interlock.kind !== "electrical" || interlock.listed === true);
}

/** Positions of switches: all of them, and how many an interlock shuts out. Worked out group by group of interlocked switches. */
export function countPositions(switches: readonly NetworkSwitch[], interlocks: readonly (readonly string[])[]): { all: number; excluded: number } {
  const size = (one: NetworkSwitch): number => one.positions.length + (one.hasOff ? 1 : 0);
  const all = switches.reduce((product, one) => product * size(one), 1);
  const index = new Map(switches.map((one, i) => [one.id, i]));
  const sets = interlocks.map((ids) => ids.flatMap((id) => index.get(id) ?? [])).filter((set) => set.length > 1);
  const joined = new Joined(switches.length);
  for (const set of sets) for (const member of set) joined.join(set[0] ?? member, member);
  let allowed = switches.reduce((product, one, i) => (sets.some((set) => set.includes(i)) ? product : product * size(one)), 1);
  for (const root of new Set(sets.flat().map((member) => joined.root(member)))) {
    const members = [...new Set(sets.flat())].filter((member) => joined.root(member) === root);
    const rows = sets.filter((set) => joined.root(set[0] ?? 0) === root).map((set) => set.map((member) => members.indexOf(member)));
    allowed *= countGroup(members.map((member) => switches[member] as NetworkSwitch), rows);
  }
  return { all, excluded: all - allowed };
}

/** Allowed positions of switches that one chain of interlocks ties together; a branch is left as soon as two meet. */
function countGroup(switches: readonly NetworkSwitch[], rows: readonly (readonly number[])[]): number {
  const closed: boolean[] = [];
  const count = (at: number): number => {
    const one = switches[at];
    if (!one) return 1;
    closed[at] = false;
    const open = one.hasOff ? count(at + 1) : 0;
    closed[at] = true;
    const clash = rows.some((row) => row.includes(at) && row.some((other) => other < at && closed[other] === true));
    return open + (clash ? 0 : one.positions.length * count(at + 1));
  };
  return count(0);
}

export function partsOf(graph: DrawingGraph, net: Network, joined: Joined): ReadonlyMap<number, Part> {
  const parts = new Map<number, { sources: Set<string>; converters: Set<string>; buses: Set<string> }>();
  net.nodes.forEach((nodes, i) => {
    if (net.isAc[i] !== true) return;
    const root = joined.root(i);
    const part = parts.get(root) ?? { sources: new Set(), converters: new Set(), buses: new Set() };
    parts.set(root, part);
    for (const node of nodes) {
      const id = equipmentOfNode(node);
      const { source, converter, bus } = graph.kind(id).capabilities;
      if (source === "utility" || source === "generator") part.sources.add(id);
      if (converter) part.converters.add(id);
      if (bus && node.endsWith("/bus")) part.buses.add(id);
    }
  });
  return new Map([...parts].map(([root, part]) => [root, { sources: [...part.sources].sort(), converters: [...part.converters].sort(), buses: [...part.buses].sort() }]));
}

/** Walks the positions of the switches and gathers them by outcome. `reference` are the parts whose supply names the state. */
export function walk(graph: DrawingGraph, net: Network, switches: readonly NetworkSwitch[], base: Joined, interlocks: readonly (readonly string[])[], reference: readonly number[], watched: ReadonlySet<string>): WalkResult {
  const parts = partsOf(graph, net, base);
  const roots = [...parts.keys()].sort((a, b) => a - b);
  const slot = new Map(roots.map((root, i) => [root, i]));
  const at = (cluster: number): number => slot.get(base.root(cluster)) ?? 0;
  const kinds = roots.map((root) => (parts.get(root)?.sources ?? []).map((id) => graph.kind(id).capabilities.source));
  const present = (i: number, kind: "utility" | "generator", lost: readonly string[]): boolean =>
    (parts.get(roots[i] ?? 0)?.sources ?? []).some((id, j) => kinds[i]?.[j] === kind && !lost.includes(id));
  const feedsOf = (lost: readonly string[]) => roots.map((_, i) => ({ utility: present(i, "utility", lost), generator: present(i, "generator", lost), converter: (parts.get(roots[i] ?? 0)?.converters ?? []).some((id) => graph.kind(id).capabilities.follower !== true) }));
  const joins = switches.map((one) => one.positions.map((position) => position.joins.map(([a, b]) => [at(a), at(b)] as const)));
  const lockedWith = switches.map((one, i) => switches.flatMap((other, j) => (j < i && interlocks.some((set) => set.includes(one.id) && set.includes(other.id)) ? [j] : [])));
  const references = reference.map((root) => slot.get(root) ?? 0);
  const every = switches.length <= EVERY_POSITION_LIMIT;
  const outcomes = new Map<string, Walked>();
  const counts: Record<StateGroup, number> = { utility: 0, island: 0, generator: 0, off: 0 };
  const chosen: number[] = [];
  // Where free switches stay closed, a lost source stands for every way of opening the way to it.
  const sources = [...parts.values()].flatMap((part) => part.sources);
  const losses = every ? [[]] : Array.from({ length: 2 ** sources.length }, (_, mask) => sources.filter((__, i) => (mask >> i) & 1));
  const lossFeeds = losses.map((lost) => ({ lost, feeds: feedsOf(lost) }));

  const settle = (label: Int16Array): void => { for (const loss of lossFeeds) settleWith(label, loss.lost, loss.feeds); };
  const settleWith = (label: Int16Array, lost: readonly string[], feeds: ReturnType<typeof feedsOf>): void => {
    const live: number[][] = [];
    for (let root = 0; root < roots.length; root += 1) {
      if (label[root] !== root) continue;
      const members: number[] = [];
      let fed = false;
      for (let i = root; i < roots.length; i += 1) {
        if (label[i] !== root) continue;
        members.push(i);
        const feed = feeds[i];
        if (feed && (feed.utility || feed.generator || feed.converter)) fed = true;
      }
      if (fed) live.push(members);
    }
    const holding = (what: "utility" | "generator" | "converter"): boolean =>
      references.some((ref) => live.some((members) => members.includes(label[ref] ?? -1) && members.some((i) => feeds[i]?.[what] === true)));
    const group: StateGroup = holding("utility") ? "utility" : holding("generator") ? "generator" : holding("converter") ? "island" : "off";
    counts[group] += 1;
    const watch = switches.map((one, i) => (watched.has(one.id) ? chosen[i] ?? -1 : "")).join("");
    const key = `${group} ${lost.join()} ${live.map((members) => members.join(",")).join("|")} ${watch}`;
    const known = outcomes.get(key);
    if (known) { known.positions += 1; return; }
    outcomes.set(key, {
      group, positions: 1, lost, live: live.map((members) => members.map((i) => roots[i] ?? 0)),
      closed: switches.flatMap((one, i) => { const position = one.positions[chosen[i] ?? -1]; return position ? [position.name === "" ? one.id : `${one.id}:${position.name}`] : []; }),
      thrown: new Map(switches.flatMap((one, i) => { const position = one.positions[chosen[i] ?? -1]; return position?.name ? [[one.id, position.name] as const] : []; })),
    });
  };

  const step = (i: number, label: Int16Array): void => {
    const one = switches[i];
    if (!one) { settle(label); return; }
    const clash = (lockedWith[i] ?? []).some((j) => (chosen[j] ?? -1) >= 0);
    // Closing more only joins more: where not every position is walked, a free switch stays closed.
    const free = !every && one.positions.length === 1 && !interlocks.some((set) => set.includes(one.id)) && !watched.has(one.id);
    if (one.hasOff && !free) { chosen[i] = -1; step(i + 1, label); }
    if (clash) return;
    one.positions.forEach((_, position) => {
      chosen[i] = position;
      let next = label;
      for (const [a, b] of joins[i]?.[position] ?? []) next = merge(next, a, b);
      step(i + 1, next);
    });
  };
  const start = Int16Array.from(roots, (_, i) => i);
  step(0, start);
  const walkedCount = countPositions(switches, interlocks);
  return { outcomes: [...outcomes.values()], counts, everyPosition: every, all: walkedCount.all, excluded: walkedCount.excluded };
}

function merge(label: Int16Array, a: number, b: number): Int16Array {
  const [x, y] = [label[a] ?? a, label[b] ?? b];
  if (x === y) return label;
  const [low, high] = x < y ? [x, y] : [y, x];
  return label.map((value) => (value === high ? low : value));
}
