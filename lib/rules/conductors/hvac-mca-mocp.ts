import { nodeKey } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, largerConductor } from "@/lib/rules/shared/protection";
import { topology } from "@/lib/rules/shared/topology";

/** Field circuits that lead to the unit alone, up to the first device. */
function unitCircuits(context: CheckContext, id: string): readonly string[] {
  const { runsFrom } = topology(context.graph);
  const own = context.graph.circuitsAt(id, "line");
  return [...new Set([...own, ...runsFrom(nodeKey(id, "line")).flatMap((run) => run.circuits)])].filter((circuit) => context.drawing.circuits[circuit]?.wiring === "field").sort();
}

export const hvacMcaMocp: Rule = {
  meta: {
    id: "hvac-mca-mocp", group: "Conductors and overcurrent", severity: "must-fix", evidence: "rated",
    statement: "Conductors to listed air-conditioning equipment must carry its marked minimum circuit ampacity; its device follows the marked maximum, not the conductor.",
    risk: "The conductors overheat at every start of the compressor.",
    citations: sameSection("440.4(B), 440.22, 440.35, 240.4(G)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.use", "equipment.props.minimumCircuitA", "circuits.sections.ungrounded", "equipment.ports.terminal.temperatureC", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => context.once("air-conditioning units", () => Object.keys(context.drawing.equipment).sort()
    .filter((id) => context.drawing.equipment[id]?.props.use === "air conditioning or refrigeration" && context.graph.kind(id).capabilities.load !== undefined)).map(equipmentRef),
  evaluate: ({ id }, context) => {
    const circuits = unitCircuits(context, id);
    if (circuits.length === 0) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const minimumA = reader.number(id, "minimumCircuitA");
    if (minimumA === null) return reader.outcome();
    const outcomes = circuits.flatMap((circuit) => context.graph.sections(circuit).flatMap((section): Outcome[] => {
      const wire = wireOf(context, circuit, section, reader);
      const ampacityA = wire && columnAmpacityA(wire, terminalsOf(context, circuit, null, 75).lowest);
      if (wire === null || ampacityA === null || ampacityA >= minimumA - 1e-9) return [];
      const anchor = circuitRef(circuit);
      return [found({
        variant: "below-minimum", anchor, field: `sections.${section.id}.ungrounded.size`, related: [equipmentRef(id)],
        message: `${nameOf(context, anchor)} is ${wire.size} ${wire.material}, ${ampacityA} A; ${nameOf(context, equipmentRef(id))} is marked for ${minimumA} A at least.`,
        steps: [comparison("MCA", minimumA, ampacityA, "A", false)],
      })];
    }));
    return outcomes.length > 0 ? outcomes : reader.complete ? PASS : reader.outcome();
  },
  suggest: ({ anchor, related }, context) => {
    const minimumA = context.drawing.equipment[related[0]?.id ?? ""]?.props.minimumCircuitA;
    return typeof minimumA !== "number" ? [] : compact([largerConductor(context, anchor.id, (_, wire) => columnAmpacityA(wire, terminalsOf(context, anchor.id, null, 75).lowest) >= minimumA, "Check the raceway fill and the terminals.")]);
  },
  examples: { violates: "A unit marked 28 A minimum circuit ampacity on 14 AWG copper.", passes: "The same unit on 10 AWG copper behind 40 A, marked 45 A maximum." },
};
