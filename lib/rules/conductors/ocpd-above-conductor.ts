import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, askTerminals } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, guardsOf, largerConductor, largestDevice, runEquipment, smallerDevice, uniqueRefs, withinColumn, type Guard } from "@/lib/rules/shared/protection";
import { motorCircuit, powerCircuits } from "@/lib/rules/shared/topology";
import { standardRatingAtMostA } from "@/lib/code";

/** Column by which a designer would read the table: the better marked end. The weaker end is the rule of the terminals. */
const permittedA = (context: CheckContext, circuit: string, guard: Guard): number => largestDevice(context, circuit, guard.wire, columnAmpacityA(guard.wire, guard.terminals.highest)).value;
const nameplateA = (context: CheckContext, circuit: string): number =>
  Math.min(...runEquipment(context, circuit).map((id) => { const value = context.drawing.equipment[id]?.props.maximumOvercurrentA; return typeof value === "number" ? value : Infinity; }), Infinity);

export const ocpdAboveConductor: Rule = {
  meta: {
    id: "ocpd-above-conductor", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "An overcurrent device may not be rated above the ampacity of its conductors, except the next standard size to 800 A where the ampacity is no standard rating.",
    risk: "The conductors overheat before the device opens; insulation fails and can start a fire.",
    citations: sameSection("240.4"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.ratingA", "equipment.props.fuseA", "equipment.ports.terminal.temperatureC", "circuits.sections.ungrounded", "circuits.from", "circuits.to", "site.occupancy"],
    absorbs: ["derated-ampacity", "ocpd-above-nameplate", "small-conductor-cap"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    if (motorCircuit(context.graph, id)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const guards = guardsOf(context, id, reader);
    if (!reader.complete) return reader.outcome();
    if (guards.length === 0) return NOT_APPLICABLE;
    const failing = guards.filter((guard) => !withinColumn(context, id, guard, guard.terminals.highest));
    const open = failing.filter((guard) => guard.terminals.unmarked.length > 0 && withinColumn(context, id, guard, 90));
    const certain = failing.filter((guard) => !open.includes(guard));
    const worst = certain.toSorted((a, b) => b.ratingA - a.ratingA)[0];
    if (!worst) {
      for (const guard of open) askTerminals(context, reader, guard.terminals);
      return open.length > 0 ? reader.outcome() : PASS;
    }
    const anchor = equipmentRef(worst.device);
    const ampacityA = columnAmpacityA(worst.wire, worst.terminals.highest);
    const largest = largestDevice(context, id, worst.wire, ampacityA);
    return found({
      variant: "above-ampacity", anchor, field: "props.ratingA",
      related: uniqueRefs([circuitRef(id), ...certain.map((guard) => equipmentRef(guard.device)), ...runEquipment(context, id).map(equipmentRef)], anchor),
      message: `${nameOf(context, anchor)} is ${worst.ratingA} A on ${worst.wire.size} ${worst.wire.material} of ${nameOf(context, circuitRef(id))}; its ${ampacityA} A at ${worst.terminals.highest} °C permit ${largest.value} A.`,
      steps: [...largest.steps, comparison("In", worst.ratingA, largest.value, "A", false)],
    });
  },
  suggest: (finding: FindingDraft, context) => {
    const circuits = finding.related.filter((ref) => ref.collection === "circuits").map((ref) => ref.id);
    const guards = circuits.flatMap((circuit) => guardsOf(context, circuit, new Reader(context)).filter((guard) => guard.device === finding.anchor.id).map((guard) => ({ circuit, guard })));
    const ratingA = Math.max(...guards.map(({ guard }) => guard.ratingA));
    const most = Math.min(...guards.map(({ circuit, guard }) => largestDevice(context, circuit, guard.wire, columnAmpacityA(guard.wire, guard.terminals.lowest)).value), ...circuits.map((circuit) => nameplateA(context, circuit)));
    const enlarge = circuits.length === 1 ? largerConductor(context, circuits[0] ?? "", (section, wire) => ratingA <= permittedA(context, circuits[0] ?? "", { ...(guards[0]?.guard as Guard), section, wire }), "Check the raceway fill, the terminals and the equipment grounding conductor.") : null;
    const smaller = smallerDevice(context, finding.anchor.id, circuits, ratingA, (rating) => rating <= (standardRatingAtMostA(most, context.edition) ?? 0), "Check that it still carries the load.");
    // A device above the nameplate stays wrong however large the wire.
    return compact([smaller, ratingA <= Math.min(...circuits.map((circuit) => nameplateA(context, circuit))) ? enlarge : null]);
  },
  examples: { violates: "A 60 A breaker on 8 AWG copper at 75 °C terminals: 50 A is itself a standard size.", passes: "A 45 A or 50 A breaker on the same wire." },
};
