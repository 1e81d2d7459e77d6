import { equipmentOfNode, type ConductionEdge } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, nameOf, names, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";
import type { OperatingState } from "@/lib/states/types";

/** Sources of one forbidden state that meet, utility and generators. */
const met = (state: OperatingState): readonly string[] => state.islands.find((island) => island.sources.length > 1)?.sources ?? [];

/** Switches and edges on the shortest way between two sources with every switch closed. */
function wayBetween(context: CheckContext, from: string, to: string): readonly ConductionEdge[] {
  const start = context.graph.ports(from).map((port) => `${from}/${port.id}`);
  const came = new Map<string, { node: string; edge: ConductionEdge } | null>(start.map((node) => [node, null]));
  const queue = [...start];
  for (let node = queue.shift(); node !== undefined; node = queue.shift()) {
    if (equipmentOfNode(node) === to) {
      const way: ConductionEdge[] = [];
      for (let step = came.get(node); step; step = came.get(step.node)) way.unshift(step.edge);
      return way;
    }
    for (const edge of context.graph.edgesAt(node)) {
      const next = edge.a === node ? edge.b : edge.a;
      if (edge.by === "converter" || came.has(next)) continue;
      came.set(next, { node, edge });
      queue.push(next);
    }
  }
  return [];
}

/** The two hand-operated devices nearest to where both ways meet: those an interlock would hold apart. */
function pair(context: CheckContext, utility: string, generator: string): readonly [string, string] | null {
  const way = wayBetween(context, generator, utility);
  const meeting = way.findIndex((edge) => [edge.a, edge.b].some((node) => node.endsWith("/bus") && context.graph.kind(equipmentOfNode(node)).capabilities.bus));
  const manual = (edge: ConductionEdge): boolean => edge.by === "switch" && context.graph.kind(edge.id).capabilities.switching !== "contactor";
  const before = way.slice(0, meeting < 0 ? way.length : meeting + 1).findLast(manual);
  const after = way.slice(meeting < 0 ? way.length : meeting + 1).find(manual);
  return before && after ? [after.id, before.id] : null;
}

export const sourcesNotInterlocked: Rule = {
  meta: {
    id: "sources-not-interlocked", group: "Generators and transfer", severity: "must-fix", evidence: "derived",
    statement: "Sources that are not meant to run together can never be joined, whatever position the switches are in.",
    risk: "The generator feeds the line on which a lineworker believes no voltage, or meets the utility out of step and is destroyed.",
    citations: sections(["702.5", "read"], ["702.5", "agreed"], ["702.5", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.from", "circuits.to", "interlocks", "equipment.props.listedParallelWithUtility"],
    absorbs: ["utility-and-island-tie", "generator-parallel", "ac-coupled-on-generator", "cycle-in-graph"],
  },
  subjects: ({ drawing, graph }) => Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.source === "generator").map(equipmentRef),
  evaluate: ({ id }, context) => {
    const space = context.states();
    if (!space.states.some((state) => state.islands.some((island) => island.sources.includes(id)))) return NOT_APPLICABLE;
    const bad = space.forbidden.filter((state) => met(state).includes(id));
    const first = bad.toSorted((a, b) => a.closed.length - b.closed.length)[0];
    if (!first) return PASS;
    const other = met(first).find((source) => source !== id) ?? id;
    const devices = pair(context, other, id);
    const anchor = equipmentRef(devices?.[0] ?? id);
    const positions = bad.reduce((sum, state) => sum + state.positions, 0);
    return found({
      variant: "joined", anchor, related: [...(devices ? [equipmentRef(devices[1])] : []), equipmentRef(id), equipmentRef(other)],
      message: `${devices ? `${names(context, devices.map(equipmentRef))} can be closed together and join` : "Switches can be closed so that they join"} ${nameOf(context, equipmentRef(other))} and ${nameOf(context, equipmentRef(id))}.`,
      steps: [
        { symbol: "n", expression: "switch positions examined", substituted: `${space.walked.length} switches`, result: space.walkedAll, unit: "" },
        { symbol: "n excluded", expression: "shut out by interlocks", substituted: `${Object.keys(context.drawing.interlocks).length} interlocks`, result: space.walkedExcluded, unit: "" },
        { symbol: "n joined", expression: "positions that join both", substituted: first.closed.map((each) => nameOf(context, equipmentRef(each.split(":")[0] ?? each))).join(", "), result: positions, unit: "" },
      ],
    });
  },
  suggest: (finding, context) => {
    const other = finding.related[0]?.id;
    const able = (id: string | undefined): id is string => id !== undefined && context.graph.kind(id).capabilities.switching !== undefined;
    if (!able(finding.anchor.id) || !able(other)) return [];
    const id = `il-${finding.anchor.id}-${other}`.slice(0, 64);
    const at = context.drawing.equipment[finding.anchor.id]?.at ?? { x: 0, y: 0 };
    return [{
      label: `Add a mechanical interlock between ${names(context, [finding.anchor, equipmentRef(other)])}`, also: "It must be listed for this cabinet and these breakers; enter the listing in its data.",
      patches: [{ op: "add", path: `/interlocks/${id}`, value: { tag: freeTag(context), kind: "mechanical slide", listed: null, switches: { [finding.anchor.id]: true, [other]: true }, at: { x: at.x + 5, y: at.y - 4 }, note: "" } }],
    }];
  },
  examples: { violates: "Utility breaker and generator breaker on one bus, both able to close.", passes: "A slide bar that lets only one of the two close." },
};
function freeTag({ drawing }: CheckContext): string {
  const used = new Set(Object.values(drawing.interlocks).map((each) => each.tag));
  for (let n = 1; ; n++) if (!used.has(`IL-${n}`)) return `IL-${n}`;
}
