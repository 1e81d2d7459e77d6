import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { askTerminals, columnAmpacityA, terminalsOf, wireOf, type Terminals } from "@/lib/rules/shared/conductors";
import { carriedBy } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, guardsOf, largerConductor, largestDevice, withinColumn } from "@/lib/rules/shared/protection";
import { motorCircuit, powerCircuits } from "@/lib/rules/shared/topology";

/** Asks 125 % where the article does; the current itself elsewhere. */
function neededA(context: CheckContext, id: string): number {
  const carried = carriedBy(context, id, new Reader(context));
  return carried === null || carried.kind === "storage" || carried.kind === "generator" ? 0 : carried.required.detail.beforeFactorsA;
}
function report(context: CheckContext, id: string, terminals: Terminals, size: string, left: { what: string; amperes: number }, allowedA: number, device: string | null): Outcome {
  const anchor = equipmentRef(terminals.lowestAt);
  const circuit = context.drawing.circuits[id];
  const port = circuit?.from.equipment === anchor.id ? circuit.from.port : circuit?.to.port ?? "line";
  return found({
    variant: "weaker-terminal", anchor, field: `ports.${port}.terminal.temperatureC`, related: [circuitRef(id), ...(device !== null && device !== anchor.id ? [equipmentRef(device)] : [])],
    message: `${nameOf(context, anchor)} is marked ${terminals.lowest} °C; there ${size} of ${nameOf(context, circuitRef(id))} counts for ${allowedA} A, and ${left.what} ${Math.round(left.amperes * 100) / 100} A.`,
    steps: [
      { symbol: "A", expression: `table, ${terminals.highest} °C column of the better end`, substituted: size, result: "not usable", unit: "" },
      { symbol: "At", expression: `table, ${terminals.lowest} °C column of the weaker end`, substituted: size, result: allowedA, unit: "A" },
      comparison("I", left.amperes, allowedA, "A", false),
    ],
  });
}

export const terminalTempColumn: Rule = {
  meta: {
    id: "terminal-temp-column", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "derived",
    statement: "The ampacity used may not be above the column of the lowest-rated terminal on the circuit.",
    risk: "The weaker terminal runs above its rating, loosens and burns.",
    citations: sameSection("110.14(C)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.ports.terminal.temperatureC", "equipment.props.ratingA", "circuits.sections.ungrounded", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    const reader = new Reader(context);
    const guards = motorCircuit(context.graph, id) ? [] : guardsOf(context, id, new Reader(context));
    for (const guard of guards) {
      const { terminals } = guard;
      if (terminals.lowest === terminals.highest || withinColumn(context, id, guard, terminals.lowest) || !withinColumn(context, id, guard, terminals.highest)) continue;
      if (terminals.unmarked.length > 0) { askTerminals(context, reader, terminals); continue; }
      const allowed = largestDevice(context, id, guard.wire, columnAmpacityA(guard.wire, terminals.lowest)).value;
      return report(context, id, terminals, `${guard.wire.size} ${guard.wire.material}`, { what: `${nameOf(context, equipmentRef(guard.device))} is`, amperes: guard.ratingA }, allowed, guard.device);
    }
    const needed = neededA(context, id);
    const terminals = terminalsOf(context, id, guards.length > 0 ? Math.max(...guards.map((guard) => guard.ratingA)) : null);
    for (const section of needed > 0 && terminals.lowest < terminals.highest ? context.graph.sections(id) : []) {
      const wire = wireOf(context, id, section, new Reader(context));
      if (!wire || columnAmpacityA(wire, terminals.lowest) >= needed - 1e-9 || columnAmpacityA(wire, terminals.highest) < needed - 1e-9) continue;
      if (terminals.unmarked.length > 0) { askTerminals(context, reader, terminals); continue; }
      return report(context, id, terminals, `${wire.size} ${wire.material}`, { what: "its circuit asks for", amperes: needed }, columnAmpacityA(wire, terminals.lowest), null);
    }
    if (!reader.complete) return reader.outcome();
    return guards.length > 0 || needed > 0 ? PASS : NOT_APPLICABLE;
  },
  suggest: (finding, context) => compact(finding.related.filter((ref) => ref.collection === "circuits").map(({ id }) => {
    const guards = guardsOf(context, id, new Reader(context));
    const needed = neededA(context, id);
    const { lowest } = terminalsOf(context, id, guards.length > 0 ? Math.max(...guards.map((guard) => guard.ratingA)) : null);
    return largerConductor(context, id, (_, wire) => columnAmpacityA(wire, lowest) >= needed && guards.every((guard) => withinColumn(context, id, { ...guard, wire }, lowest)), "Check the raceway fill, or take equipment marked 75 °C.");
  })),
  examples: { violates: "6 AWG copper counted at 75 A by its 90 °C lug while the breaker is marked 75 °C.", passes: "The same wire counted at 65 A." },
};
