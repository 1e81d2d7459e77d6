import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentOfNode } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import { Joined } from "./network";
import type { StateGroup } from "./types";

/** Neutral joined with the neutrals around it, in one position of the switches that switch neutrals. */
export interface NeutralPart {
  owners: ReadonlySet<string>;
  bondGroups: readonly (readonly string[])[];
  hasNeutral: boolean;
}
export interface Neutrals {
  /** Equipment that opens a neutral; every other switch leaves it solid. */
  readonly switching: ReadonlySet<string>;
  /** The neutral of an equipment with the transfer switches in the given positions. */
  partOf: (equipment: string, thrown: ReadonlyMap<string, string>, group: StateGroup) => NeutralPart;
}

/** How the neutrals of a drawing hang together. Two-pole devices never open a neutral. */
export function neutrals(graph: DrawingGraph): Neutrals {
  const { drawing } = graph;
  const switching = new Set(Object.keys(drawing.equipment).filter((id) =>
    graph.kind(id).capabilities.switching === "transfer" && drawing.equipment[id]?.props.switchedNeutral === true));
  const places: string[] = [];
  const number = new Map<string, number>();
  const place = (name: string): number => {
    let at = number.get(name);
    if (at === undefined) { at = places.length; number.set(name, at); places.push(name); }
    return at;
  };
  const landing = (circuit: Circuit, end: "from" | "to"): string => {
    const { equipment, port } = circuit[end];
    return switching.has(equipment) ? `${equipment}/${port}` : graph.neutralOwner(equipment);
  };
  const wires: [number, number][] = [];
  for (const id of Object.keys(drawing.circuits).sort()) {
    const circuit = drawing.circuits[id] as Circuit;
    if (circuit.system !== "ac" || !drawing.equipment[circuit.from.equipment] || !drawing.equipment[circuit.to.equipment]) continue;
    if (carriesNeutral(graph, circuit)) wires.push([place(landing(circuit, "from")), place(landing(circuit, "to"))]);
  }
  const service = serviceOwners(graph);
  const cache = new Map<string, Joined>();

  const joinedFor = (thrown: ReadonlyMap<string, string>): Joined => {
    const key = [...switching].map((id) => `${id}=${thrown.get(id) ?? ""}`).join(" ");
    const known = cache.get(key);
    if (known) return known;
    const joined = new Joined(places.length + switching.size * 3 + Object.keys(drawing.equipment).length);
    for (const [a, b] of wires) joined.join(a, b);
    for (const id of switching) {
      const at = thrown.get(id);
      if (at) joined.join(place(`${id}/${at.toLowerCase()}`), place(`${id}/common`));
    }
    cache.set(key, joined);
    return joined;
  };

  return {
    switching,
    partOf: (equipment, thrown, group) => {
      const owner = graph.neutralOwner(equipment);
      const joined = joinedFor(thrown);
      const root = joined.root(place(owner));
      const owners = new Set(places.filter((_, i) => joined.root(i) === root).map((name) => (name.includes("/") ? equipmentOfNode(name) : name)));
      const inForce = Object.keys(drawing.bonds).sort().filter((id) => {
        const bond = drawing.bonds[id];
        if (!bond || bond.fitted !== true || !drawing.equipment[bond.equipment]) return false;
        return owners.has(graph.neutralOwner(bond.equipment)) && (bond.kind !== "neutral relay" || bond.closes === "always" || group === "island");
      });
      return { owners, bondGroups: groupBonds(graph, inForce, service), hasNeutral: owners.size > 1 || inForce.length > 0 };
    },
  };
}

/** Field circuits carry a neutral where one is drawn; factory wiring where both ports have the pole. */
function carriesNeutral(graph: DrawingGraph, circuit: Circuit): boolean {
  if (circuit.wiring === "field") return Object.values(circuit.sections).some((section) => (section.grounded?.count ?? 0) > 0);
  // Parts without a neutral pole inside one enclosure share its bar, which `neutralOwner` already says.
  return (["from", "to"] as const).every((end) => graph.port(circuit[end].equipment, circuit[end].port)?.poles.includes("N") === true);
}

/** Bonds at or ahead of the service disconnects are one group; elsewhere each place is one. */
function groupBonds(graph: DrawingGraph, bonds: readonly string[], service: ReadonlySet<string>): readonly (readonly string[])[] {
  const groups = new Map<string, string[]>();
  for (const id of bonds) {
    const owner = graph.neutralOwner(graph.drawing.bonds[id]?.equipment ?? "");
    const key = service.has(owner) ? "service" : owner;
    groups.set(key, [...(groups.get(key) ?? []), id]);
  }
  return [...groups.values()];
}

/**
 * Equipment at or ahead of a service disconnect: reached from the utility without passing an overcurrent device of another
 * enclosure, and either ahead of every switch, holding the first switch, or marked as service equipment.
 */
function serviceOwners(graph: DrawingGraph): ReadonlySet<string> {
  const owners = new Set<string>();
  const seen = new Set<string>();
  const queue: { node: string; ahead: boolean }[] = Object.keys(graph.drawing.equipment)
    .filter((id) => graph.kind(id).capabilities.source === "utility")
    .flatMap((id) => graph.ports(id).map((port) => ({ node: `${id}/${port.id}`, ahead: true })));
  for (let at = queue.shift(); at; at = queue.shift()) {
    const key = `${at.node} ${at.ahead}`;
    if (seen.has(key)) continue;
    seen.add(key);
    const equipment = equipmentOfNode(at.node);
    const owner = graph.neutralOwner(equipment);
    const marked = graph.enclosures(equipment).some((id) => graph.drawing.equipment[id]?.props.serviceEquipment === true);
    if (at.ahead || marked) owners.add(owner);
    for (const edge of graph.edgesAt(at.node)) {
      const to = edge.a === at.node ? edge.b : edge.a;
      if (edge.by === "converter") continue;
      const switched = edge.by === "switch" || edge.by === "throw";
      // The first switch belongs to the service disconnect; past an overcurrent device the feeder side begins.
      if (switched && graph.kind(edge.id).capabilities.overcurrent) { owners.add(at.ahead ? graph.neutralOwner(edge.id) : ""); continue; }
      queue.push({ node: to, ahead: at.ahead && !switched });
    }
  }
  owners.delete("");
  return owners;
}
