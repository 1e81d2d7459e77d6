import { smallConductorLimitA } from "@/lib/code";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, guardsOf, largerConductor, runEquipment, smallerDevice, uniqueRefs } from "@/lib/rules/shared/protection";
import { motorCircuit, powerCircuits } from "@/lib/rules/shared/topology";

export const smallConductorCap: Rule = {
  meta: {
    id: "small-conductor-cap", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Copper 14, 12 and 10 AWG take at most 15, 20 and 30 A, aluminum 12 and 10 AWG at most 15 and 25 A, unless an article lifts it.",
    risk: "Small conductors overheat on a sustained overload that the device does not see.",
    citations: sameSection("240.4(D)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.ratingA", "equipment.props.fuseA", "equipment.props.use", "circuits.sections.ungrounded", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    // Motors and air conditioning follow their own articles: 240.4(E) and (G).
    if (motorCircuit(context.graph, id)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const guards = guardsOf(context, id, reader);
    const judged = guards.flatMap((guard) => { const capA = smallConductorLimitA(guard.wire.size, guard.wire.material, context.edition); return capA === null ? [] : [{ guard, capA }]; });
    const worst = judged.filter(({ guard, capA }) => guard.ratingA > capA).toSorted((a, b) => b.guard.ratingA - a.guard.ratingA)[0];
    if (worst) {
      const { guard, capA } = worst;
      const anchor = equipmentRef(guard.device);
      return found({
        variant: "above-cap", anchor, field: "props.ratingA", related: uniqueRefs([circuitRef(id), ...runEquipment(context, id).map(equipmentRef)], anchor),
        message: `${nameOf(context, anchor)} is ${guard.ratingA} A on ${guard.wire.size} ${guard.wire.material} of ${nameOf(context, circuitRef(id))}; that size takes ${capA} A at most.`,
        steps: [{ symbol: "Imax", expression: "limit of small conductors", substituted: `${guard.wire.size} ${guard.wire.material}`, result: capA, unit: "A", citation: "240.4(D)" }, comparison("In", guard.ratingA, capA, "A", false)],
      });
    }
    if (!reader.complete) return reader.outcome();
    return judged.length > 0 ? PASS : NOT_APPLICABLE;
  },
  suggest: (finding, context) => {
    const circuits = finding.related.filter((ref) => ref.collection === "circuits").map((ref) => ref.id);
    const guards = circuits.flatMap((circuit) => guardsOf(context, circuit, new Reader(context)).filter((guard) => guard.device === finding.anchor.id));
    const capOf = (size: (typeof guards)[number]["wire"]): number => smallConductorLimitA(size.size, size.material, context.edition) ?? Infinity;
    const ratingA = Math.max(...guards.map((guard) => guard.ratingA));
    return compact([
      smallerDevice(context, finding.anchor.id, circuits, ratingA, (rating) => guards.every((guard) => rating <= capOf(guard.wire)), "Check that it still carries the load."),
      circuits.length === 1 ? largerConductor(context, circuits[0] ?? "", (_, wire) => ratingA <= capOf(wire), "Check the raceway fill and the terminals.") : null,
    ]);
  },
  examples: { violates: "A branch circuit of 12 AWG copper on a 25 A breaker.", passes: "The same wire on 20 A, or on 25 A where it feeds one air conditioner alone." },
};
