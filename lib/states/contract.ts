import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentOfNode } from "@/lib/diagram/graph";
import { Joined, type Network, type NetworkSwitch } from "./network";
import type { Contraction } from "./types";

/** What stays to be walked, and the clusters with every contracted switch taken as closed. */
export interface Contracted {
  listed: readonly NetworkSwitch[];
  contractions: readonly Contraction[];
  walked: readonly NetworkSwitch[];
  /** Contracted number of each cluster. */
  joined: Joined;
}

/** Above this many walked switches, converter branches on one bus are taken as alike too. */
const ALIKE_CONVERTERS_FROM = 16;

/**
 * Takes out switches that cannot change which ac sources meet, which bonds are in force or which buses are live.
 * Each is listed with its reason. Interlocked and controlled switches always stay.
 */
export function contract(graph: DrawingGraph, net: Network, interlocked: ReadonlySet<string>): Contracted {
  const joined = new Joined(net.nodes.length);
  const contractions: Contraction[] = [];
  const gone = new Set<string>();
  const listed = loadSide(net, joined, contractions, gone);
  const left = (ac: boolean): NetworkSwitch[] => listed.filter((one) => !gone.has(one.id) && isAc(net, one) === ac);
  for (const ac of [true, false]) series(net, left(ac), joined, interlocked, contractions, gone);
  alike(net, left(false), joined, contractions, gone, () => true);
  for (const one of left(false)) {
    gone.add(one.id);
    contractions.push({ equipment: one.id, reason: "behind a converter", with: null });
  }
  if (left(true).length > ALIKE_CONVERTERS_FROM) {
    const convertersOnly = (cluster: number): boolean => (net.nodes[cluster] ?? []).some((node) => graph.kind(equipmentOfNode(node)).capabilities.converter === true);
    alike(net, left(true).filter((one) => !interlocked.has(one.id)), joined, contractions, gone, convertersOnly);
  }
  return { listed, contractions, walked: left(true), joined };
}

const isAc = (net: Network, one: NetworkSwitch): boolean => one.positions.some((position) => position.joins.some(([a]) => net.isAc[a] === true));
const ends = (one: NetworkSwitch): readonly number[] => one.positions.flatMap((position) => position.joins.flat());
const closeAll = (joined: Joined, one: NetworkSwitch): void => {
  for (const position of one.positions) for (const [a, b] of position.joins) joined.join(a, b);
};

/** Prunes branches that end without source or bond. Switches beyond the first one of such a branch are not listed at all. */
function loadSide(net: Network, joined: Joined, contractions: Contraction[], gone: Set<string>): readonly NetworkSwitch[] {
  const touching = new Map<number, Set<NetworkSwitch>>();
  for (const one of net.switches) for (const end of ends(one)) touching.set(end, (touching.get(end) ?? new Set()).add(one));
  const pruned = new Set<number>();
  const dropped = new Set<NetworkSwitch>();
  for (let again = true; again;) {
    again = false;
    for (const [cluster, switches] of touching) {
      const left = [...switches].filter((one) => !dropped.has(one));
      const only = left[0];
      if (pruned.has(cluster) || net.terminal[cluster] === true || left.length > 1) continue;
      pruned.add(cluster);
      again = true;
      // A transfer switch with one dead throw still moves the other one.
      if (only && (only.positions.length === 1 || ends(only).every((end) => pruned.has(end) || end === cluster))) dropped.add(only);
    }
  }
  for (const one of dropped) closeAll(joined, one);
  const listed = net.switches.filter((one) => !dropped.has(one) || ends(one).some((end) => !pruned.has(end)));
  for (const one of listed) {
    if (!dropped.has(one)) continue;
    gone.add(one.id);
    contractions.push({ equipment: one.id, reason: "load side: no source or bond beyond", with: null });
  }
  return listed;
}

/** Two hand-operated switches with nothing between them act as one. */
function series(net: Network, candidates: readonly NetworkSwitch[], joined: Joined, interlocked: ReadonlySet<string>, contractions: Contraction[], gone: Set<string>): void {
  const simple = (one: NetworkSwitch): boolean => one.positions.length === 1 && one.positions[0]?.joins.length === 1
    && (one.kind === "breaker" || one.kind === "switch") && !interlocked.has(one.id);
  for (let again = true; again;) {
    again = false;
    const touching = new Map<number, NetworkSwitch[]>();
    for (const one of candidates) {
      if (gone.has(one.id)) continue;
      for (const end of new Set(ends(one).map((at) => joined.root(at)))) touching.set(end, [...(touching.get(end) ?? []), one]);
    }
    for (const [cluster, list] of touching) {
      const [first, second] = list;
      if (list.length !== 2 || !first || !second || !simple(first) || !simple(second) || busy(net, joined, cluster)) continue;
      closeAll(joined, second);
      gone.add(second.id);
      contractions.push({ equipment: second.id, reason: "series with another", with: first.id });
      again = true;
      break;
    }
  }
}

/** Something joins here besides the two switches: a source, a converter, a bond or a bus. */
function busy(net: Network, joined: Joined, root: number): boolean {
  return net.nodes.some((_, i) => joined.root(i) === root && (net.terminal[i] === true || net.hasBus[i] === true));
}

/** Branches from the same bus with the same kind and rating of switch act alike. */
function alike(net: Network, candidates: readonly NetworkSwitch[], joined: Joined, contractions: Contraction[], gone: Set<string>, leaf: (cluster: number) => boolean): void {
  const degree = new Map<number, number>();
  for (const one of candidates) for (const end of new Set(ends(one).map((at) => joined.root(at)))) degree.set(end, (degree.get(end) ?? 0) + 1);
  const first = new Map<string, NetworkSwitch>();
  for (const one of candidates) {
    const roots = [...new Set(ends(one).map((at) => joined.root(at)))];
    const bus = roots.find((root) => net.nodes.some((_, i) => joined.root(i) === root && net.hasBus[i] === true));
    const end = roots.find((root) => root !== bus);
    if (one.positions.length !== 1 || roots.length !== 2 || bus === undefined || end === undefined || degree.get(end) !== 1) continue;
    if (!net.nodes.some((_, i) => joined.root(i) === end && leaf(i)) || !sameSide(net, joined, end)) continue;
    const key = `${bus} ${one.kind} ${one.ratingA} ${sourceKinds(net, joined, end)}`;
    const other = first.get(key);
    if (!other) { first.set(key, one); continue; }
    gone.add(one.id);
    contractions.push({ equipment: one.id, reason: "alike with another", with: other.id });
  }
  for (const one of candidates) if (gone.has(one.id)) closeAll(joined, one);
}

/** The far end holds no bus of its own, so that nothing but its source hangs on the branch. */
const sameSide = (net: Network, joined: Joined, end: number): boolean => !net.nodes.some((_, i) => joined.root(i) === end && net.hasBus[i] === true);
const sourceKinds = (net: Network, joined: Joined, end: number): string =>
  net.nodes.flatMap((list, i) => (joined.root(i) === end ? list.map((node) => node.slice(node.indexOf("/"))) : [])).filter((port) => port === "/dc" || port === "/battery" || port === "/ac").sort().join();
