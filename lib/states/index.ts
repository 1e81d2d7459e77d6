import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentOfNode } from "@/lib/diagram/graph";
import { contract, type Contracted } from "./contract";
import { network, type Network } from "./network";
import { neutrals, type NeutralPart, type Neutrals } from "./neutral";
import { countPositions, holds, partsOf, walk, type Part, type Walked } from "./walk";
import type { Island, OperatingState, StateGroup, StateSpace } from "./types";

export type { Contraction, Island, OperatingState, StateGroup, StateSpace } from "./types";
export { EVERY_POSITION_LIMIT, holds } from "./walk";

export interface StateOptions {
  /** Interlocks taken as absent, ids: to ask what depends on them. */
  without?: readonly string[];
}

/** A generator beside a utility, two generators or two utilities may meet only where every generator of them is listed and set for it. */
export function mayMeet(graph: DrawingGraph, sources: readonly string[]): boolean {
  if (sources.length < 2) return true;
  const generators = sources.filter((id) => graph.kind(id).capabilities.source === "generator");
  return sources.length - generators.length <= 1 && generators.every((id) => graph.drawing.equipment[id]?.props.listedParallelWithUtility === true);
}

/**
 * Every combination of switch positions that the interlocks allow, after taking out switches that cannot change which
 * sources meet, which bonds are in force or which buses are live. Positions with the same outcome are one state with its count.
 */
export function stateSpace(graph: DrawingGraph, options: StateOptions = {}): StateSpace {
  const net = network(graph);
  const without = new Set(options.without ?? []);
  const interlocks = Object.entries(graph.drawing.interlocks)
    .filter(([id, interlock]) => !without.has(id) && holds(interlock))
    .map(([, interlock]) => Object.keys(interlock.switches).sort());
  const neutral = neutrals(graph);
  const contracted = contract(graph, net, new Set(interlocks.flat()));
  const parts = partsOf(graph, net, contracted.joined);
  const held = contracted.walked.filter((one) => one.kind === "contactor" && graph.drawing.equipment[one.id]?.props.interconnectDevice === true);
  const references = referenceParts(net, contracted, parts);
  const walked = walk(graph, net, contracted.walked, contracted.joined, interlocks, references, neutral.switching);
  const islandsOf = islandReader(graph, net, contracted, neutral, parts);
  const build = (outcome: Walked): OperatingState => {
    let islands: readonly Island[] | null = null;
    return { group: outcome.group, closed: outcome.closed, positions: outcome.positions, get islands() { islands ??= islandsOf(outcome); return islands; } };
  };
  const states: OperatingState[] = [];
  const forbidden: OperatingState[] = [];
  const heldOff: OperatingState[] = [];
  const allowed: OperatingState[] = [];
  for (const outcome of walked.outcomes) {
    const state = build(outcome);
    states.push(state);
    const meet = outcome.live.some((live) => !mayMeet(graph, live.flatMap((root) => parts.get(root)?.sources ?? []).filter((id) => !outcome.lost.includes(id))));
    if (meet) forbidden.push(state);
    else if (held.some((one) => feedsBeyond(net, contracted, parts, outcome, one.id, references))) heldOff.push(state);
    else allowed.push(state);
  }
  const total = countPositions(contracted.listed, interlocks);
  return {
    switches: contracted.listed.map((one) => one.id), contractions: contracted.contractions, walked: contracted.walked.map((one) => one.id),
    held: held.map((one) => one.id), positionsAll: total.all, positionsExcluded: total.excluded,
    walkedAll: walked.all, walkedExcluded: walked.excluded, counts: walked.counts, everyPosition: walked.everyPosition,
    states, forbidden, heldOff, allowed,
  };
}

/** The buses nearest to the converters name a state by what feeds them; without converters, every bus does. */
function referenceParts(net: Network, contracted: Contracted, parts: ReadonlyMap<number, Part>): readonly number[] {
  const found = new Set<number>();
  for (const [start, part] of parts) {
    if (part.converters.length === 0) continue;
    let ring = [start];
    const seen = new Set(ring);
    let buses: number[] = [];
    while (ring.length > 0) {
      buses = ring.filter((root) => (parts.get(root)?.buses.length ?? 0) > 0);
      if (buses.length > 0) break;
      ring = [...new Set(ring.flatMap((root) => contracted.walked.flatMap((one) => one.positions.flatMap((position) => position.joins)
        .flatMap(([a, b]) => [[a, b], [b, a]]).filter(([a]) => contracted.joined.root(a ?? 0) === root).map(([, b]) => contracted.joined.root(b ?? 0)))))]
        .filter((root) => !seen.has(root));
      for (const root of ring) seen.add(root);
    }
    for (const root of buses.length > 0 ? buses : [start]) found.add(root);
  }
  if (found.size > 0) return [...found].sort((a, b) => a - b);
  const buses = [...parts].filter(([, part]) => part.buses.length > 0).map(([root]) => root);
  return buses.length > 0 ? buses : [...parts].filter(([, part]) => part.sources.length === 0).map(([root]) => root);
}

/** Converters without the utility reach a bus that only the closed contactor ties to their own. */
function feedsBeyond(net: Network, contracted: Contracted, parts: ReadonlyMap<number, Part>, outcome: Walked, contactor: string, references: readonly number[]): boolean {
  if (!outcome.closed.includes(contactor)) return false;
  const ends = contracted.walked.find((one) => one.id === contactor)?.positions[0]?.joins[0];
  if (!ends) return false;
  const [a, b] = ends.map((end) => contracted.joined.root(end));
  const live = outcome.live.find((roots) => a !== undefined && b !== undefined && roots.includes(a) && roots.includes(b));
  if (!live) return false;
  const has = (pick: (part: Part) => readonly string[]): boolean => live.some((root) => { const part = parts.get(root); return part !== undefined && pick(part).some((id) => !outcome.lost.includes(id)); });
  if (!has((part) => part.converters) || has((part) => part.sources)) return false;
  return live.some((root) => (parts.get(root)?.buses.length ?? 0) > 0 && !references.includes(root));
}

function islandReader(graph: DrawingGraph, net: Network, contracted: Contracted, neutral: Neutrals, parts: ReadonlyMap<number, Part>): (outcome: Walked) => readonly Island[] {
  const nodesOf = new Map<number, string[]>();
  net.nodes.forEach((nodes, i) => {
    const root = contracted.joined.root(i);
    nodesOf.set(root, [...(nodesOf.get(root) ?? []), ...nodes]);
  });
  const seen = new Map<string, Island>();
  return (outcome) => outcome.live.map((live) => {
    const key = `${outcome.group} ${live.join()} ${outcome.lost.join()} ${[...outcome.thrown].join(" ")}`;
    const known = seen.get(key);
    if (known) return known;
    const pick = (from: (part: Part) => readonly string[]): string[] => live.flatMap((root) => { const part = parts.get(root); return part ? from(part) : []; }).sort();
    const sources = pick((part) => part.sources).filter((id) => !outcome.lost.includes(id));
    const converters = pick((part) => part.converters);
    const nodes = new Set(live.flatMap((root) => nodesOf.get(root) ?? []));
    const joinedNeutrals = neutralParts(neutral, [...sources, ...converters], outcome.thrown, outcome.group);
    const island: Island = {
      sources, converters, nodes,
      bondGroups: joinedNeutrals.flatMap((part) => part.bondGroups),
      hasNeutral: joinedNeutrals.length > 0,
      neutralOwners: new Set(joinedNeutrals.flatMap((part) => [...part.owners])),
    };
    seen.set(key, island);
    return island;
  });
}

/** The neutral that the sources of an island work on. A source without a neutral conductor has none. */
function neutralParts(neutral: Neutrals, suppliers: readonly string[], thrown: ReadonlyMap<string, string>, group: StateGroup): readonly NeutralPart[] {
  const parts: NeutralPart[] = [];
  for (const id of suppliers) {
    if (parts.some((part) => part.owners.has(id))) continue;
    const part = neutral.partOf(id, thrown, group);
    if (part.hasNeutral && !parts.some((other) => [...part.owners].some((owner) => other.owners.has(owner)))) parts.push(part);
  }
  return parts;
}

/** Equipment whose ports are live in an island, in id order. */
export function liveEquipment(island: Island): readonly string[] {
  return [...new Set([...island.nodes].map(equipmentOfNode))].sort();
}
