import { equipmentOfNode, nodeKey, type ConductionEdge } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, names, nameOf, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";
import { parallelGroups } from "@/lib/rules/shared/parallel";
import { topology, type RunEnd } from "@/lib/rules/shared/topology";

/** Bus on which a device lands, through what only passes current on; null where the way branches first. */
function busBehind({ graph }: CheckContext, device: string, farNode: string): string | null {
  let arrived: ConductionEdge | null = graph.edgesAt(farNode).find((edge) => edge.id === device && edge.by === "switch") ?? null;
  for (let node = farNode, steps = 0; steps < 50; steps += 1) {
    if (node.endsWith("/bus")) return equipmentOfNode(node);
    const onward: readonly ConductionEdge[] = graph.edgesAt(node).filter((edge) => edge !== arrived && edge.by !== "converter");
    const [edge] = onward;
    if (!edge || onward.length > 1) return null;
    arrived = edge;
    node = edge.a === node ? edge.b : edge.a;
  }
  return null;
}
interface Landing { end: RunEnd; bus: string | null }
/** Where the output of each unit lands first, once a run. */
function landings(context: CheckContext): ReadonlyMap<string, readonly Landing[]> {
  return context.once("outputs of inverters in parallel", () => new Map(parallelGroups(context).flat().map((unit) => [
    unit, topology(context.graph).runsFrom(nodeKey(unit, "ac")).map((end) => ({ end, bus: end.device !== null && end.farNode !== null ? busBehind(context, end.device, end.farNode) : null })),
  ])));
}

/** Units whose output meets others before a device of its own, or shares one, with the equipment where that is. */
function withoutOwnDevice(context: CheckContext, group: readonly string[]): ReadonlyMap<string, readonly string[]> {
  const all = landings(context);
  return new Map(group.flatMap((unit): (readonly [string, readonly string[]])[] => {
    const own = all.get(unit) ?? [];
    const bare = own.filter(({ end }) => end.device === null).map(({ end }) => equipmentOfNode(end.node));
    const shared = own.flatMap(({ end }) => (end.device !== null && group.some((other) => other !== unit && all.get(other)?.some((one) => one.end.device === end.device)) ? [end.device] : []));
    return bare.length + shared.length > 0 ? [[unit, [...new Set([...bare, ...shared])]]] : [];
  }));
}

export const parallelCommonOutput: Rule = {
  meta: {
    id: "parallel-common-output", group: "Parallel inverters", severity: "should-fix", evidence: "derived",
    statement: "The output of each unit in parallel has an overcurrent device of its own, and all of them land on one bus.",
    risk: "A device sized for several units does not protect the terminals and conductors of one.",
    citations: sameSection("705.30", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["circuits.from", "circuits.to", "equipment.kind"], absorbs: [],
  },
  subjects: (context) => parallelGroups(context).flat().map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const all = landings(context);
    const group = parallelGroups(context).find((each) => each.includes(anchor.id));
    const own = all.get(anchor.id);
    if (!group || !own || own.length === 0) return NOT_APPLICABLE;
    const name = nameOf(context, anchor);
    const circuits = [...new Set(own.flatMap(({ end }) => end.circuits))].map(circuitRef);
    // Units wired together are one fault: the first of them speaks for all.
    const mixed = withoutOwnDevice(context, group);
    if (mixed.has(anchor.id)) {
      const [first, ...others] = [...mixed.keys()];
      if (first !== anchor.id) return NOT_APPLICABLE;
      const places = [...new Set([...mixed.values()].flat())];
      return found({
        variant: "no-own-device", anchor, related: [...others, ...places.filter((each) => !mixed.has(each))].map(equipmentRef).concat(circuits),
        message: `The output${mixed.size === 1 ? "" : "s"} of ${names(context, [...mixed.keys()].map(equipmentRef))} meet${mixed.size === 1 ? "s" : ""} others at ${names(context, places.map(equipmentRef))} without an overcurrent device of ${mixed.size === 1 ? "its" : "their"} own. Each unit should have one.`, steps: [],
      });
    }
    const bus = own.map((one) => one.bus).find((each) => each !== null) ?? null;
    const first = group.map((unit) => all.get(unit)?.map((one) => one.bus).find((each) => each !== null) ?? null).find((each) => each !== null) ?? null;
    if (bus !== first && bus !== null && first !== null) return found({ variant: "other-bus", anchor, related: [equipmentRef(bus), equipmentRef(first), ...circuits], message: `${name} lands on ${nameOf(context, equipmentRef(bus))}, the units beside it on ${nameOf(context, equipmentRef(first))}. All outputs should meet on one bus.`, steps: [] });
    return PASS;
  },
  examples: { violates: "Unit 2 wired through the terminals of unit 1.", passes: "Two 45 A breakers on one bus." },
};
