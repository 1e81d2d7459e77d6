import { voltageDrop, voltageDropPct, type Step } from "@/lib/calc";
import { VOLTAGE_DROP_BRANCH_PCT, VOLTAGE_DROP_TOTAL_PCT } from "@/lib/code/tables/source-constants";
import { nodeKey } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { wireOf } from "@/lib/rules/shared/conductors";
import type { Carried } from "@/lib/rules/shared/currents";
import { circuitRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { comparison, compact, largerConductor } from "@/lib/rules/shared/protection";
import { powerCircuits } from "@/lib/rules/shared/topology";
import { drops, sectionInput, type Flow } from "@/lib/rules/shared/voltageDrop";

/** Worked lines of a finding. */
const stepsOf = (context: CheckContext, id: string, flow: Flow): readonly Step[] => context.graph.sections(id).flatMap((section) => {
  const wire = wireOf(context, id, section, new Reader(context));
  return wire && section.lengthFt !== null ? voltageDrop(sectionInput(context, id, section, wire, flow)).steps : [];
});
/** Sum of the drops from the utility to the far end of each circuit, with the largest single one on the way. One walk from the service. */
const totals = (context: CheckContext): ReadonlyMap<string, { percent: number; worst: number; path: readonly string[] }> => context.once("voltage drop from the service", () => {
  const { graph, drawing } = context;
  const reached = new Map<string, { percent: number; worst: number; path: readonly string[] }>();
  const seen = new Set<string>();
  const queue = Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.source === "utility").flatMap((id) => graph.ports(id)).map((port) => ({ node: nodeKey(port.equipment, port.id), percent: 0, worst: 0, path: [] as readonly string[] }));
  for (let i = 0; i < queue.length; i += 1) {
    const at = queue[i];
    if (!at || seen.has(at.node)) continue;
    seen.add(at.node);
    for (const edge of graph.edgesAt(at.node)) {
      const next = edge.a === at.node ? edge.b : edge.a;
      if (edge.by === "converter" || seen.has(next)) continue;
      // The utility's own drop is not the customer's; a source's circuit is no load.
      const drop = edge.by === "circuit" ? drops(context).get(edge.id) : undefined;
      const own = drop && drop.flow.kind !== "inverter output" && drop.flow.kind !== "generator" ? drop.percent : 0;
      const step = { node: next, percent: at.percent + own, worst: Math.max(at.worst, own), path: own > 0 ? [...at.path, edge.id] : at.path };
      if (edge.by === "circuit" && own > 0) reached.set(edge.id, step);
      queue.push(step);
    }
  }
  return reached;
});
const limitOf = (context: CheckContext, kind: Carried["kind"]): number => context.limit(kind === "inverter output" ? "sourcePercent" : "segmentPercent");

export const voltageDropAdvice: Rule = {
  meta: {
    id: "voltage-drop-advice", group: "Conductors and overcurrent", severity: "advice", evidence: "derived",
    statement: "Long runs should keep the voltage drop near 3 % a circuit and 5 % in all, and the rise toward an inverter near 2 %, so that it does not trip on high voltage.",
    risk: "Motors start badly, energy is lost, and inverters drop out on sunny days.",
    citations: sections(["210.19(A)(1) note 4, 215.2(A)(1) note 2", "unconfirmed"], ["210.19(A) note 3, 215.2(A)(1) note 2", "unconfirmed"], ["210.19 note, 215.2(A)(2) note 2", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX,
    limits: {
      segmentPercent: { value: VOLTAGE_DROP_BRANCH_PCT, unit: "%", source: "informational notes of 210.19 and 215.2" }, totalPercent: { value: VOLTAGE_DROP_TOTAL_PCT, unit: "%", source: "informational notes of 210.19 and 215.2" },
      sourcePercent: { value: 2, unit: "% rise", source: "common practice, no published source" },
    },
    reads: ["circuits.sections.lengthFt", "circuits.sections.ungrounded", "circuits.load", "equipment.props.currentA", "equipment.props.continuousA", "equipment.props.systemVoltage", "site.serviceSystem", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => powerCircuits(context.graph).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const drop = drops(context).get(anchor.id);
    if (!drop) return NOT_APPLICABLE;
    const most = limitOf(context, drop.flow.kind);
    const what = drop.flow.kind === "inverter output" ? "rise" : "drop";
    if (drop.percent > most + 1e-9) {
      return found({
        variant: what, anchor, field: "sections.ungrounded.size", related: [],
        message: `${nameOf(context, anchor)}: voltage ${what} ${drop.percent.toFixed(1)} % at ${Math.round(drop.flow.amperes * 10) / 10} A; it should stay near ${most} %.`,
        steps: [...stepsOf(context, anchor.id, drop.flow), comparison("Vd%", drop.percent, most, "%", false)],
      });
    }
    const total = totals(context).get(anchor.id);
    const inAll = context.limit("totalPercent");
    if (total && total.percent > inAll + 1e-9 && total.percent - drop.percent <= inAll + 1e-9 && total.worst <= context.limit("segmentPercent") + 1e-9) {
      return found({
        variant: "in-all", anchor, field: "sections.ungrounded.size", related: total.path.filter((id) => id !== anchor.id).map(circuitRef),
        message: `From the service to the end of ${nameOf(context, anchor)} the voltage drops ${total.percent.toFixed(1)} %; it should stay near ${inAll} % in all.`,
        steps: [...stepsOf(context, anchor.id, drop.flow), comparison("ΣVd%", total.percent, inAll, "%", false)],
      });
    }
    return drop.missing.length > 0 ? { outcome: "needs-data", fields: drop.missing } : PASS;
  },
  suggest: ({ anchor: { id }, variant }, context) => {
    const drop = drops(context).get(id);
    const total = totals(context).get(id);
    if (!drop) return [];
    const most = variant === "in-all" && total ? drop.percent - (total.percent - context.limit("totalPercent")) : limitOf(context, drop.flow.kind);
    const count = context.graph.sections(id).length;
    return most <= 0 ? [] : compact([largerConductor(context, id, (section, wire) => voltageDropPct(sectionInput(context, id, section, wire, drop.flow)) <= most / count, "Check the raceway fill, the terminals and the equipment grounding conductor, which grows with it.")]);
  },
  examples: { violates: "40 A at 240 V over 130 ft of 8 AWG copper: 3.4 %.", passes: "6 AWG copper: 2.1 %." },
};
