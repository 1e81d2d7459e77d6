import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { askTerminal, terminalField, terminalsAt, terminalSubjects, type Landed } from "@/lib/rules/shared/terminals";

/** Landings by port with the conductors of one pole each terminal holds. A bus takes every circuit at a terminal of its own. */
function byTerminal(context: CheckContext, id: string): readonly { landings: readonly Landed[]; conductors: number }[] {
  const map = new Map<string, Landed[]>();
  for (const landed of terminalsAt(context, id)) {
    const many = context.graph.port(id, landed.port)?.many === true;
    const key = many ? `${landed.port} ${landed.circuit}` : landed.port;
    map.set(key, [...(map.get(key) ?? []), landed]);
  }
  return [...map.values()].map((landings) => ({ landings, conductors: landings.reduce((sum, one) => sum + one.section.parallelSets, 0) }));
}

export const twoWiresOneTerminal: Rule = {
  meta: {
    id: "two-wires-one-terminal", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "rated",
    statement: "A terminal holds one conductor unless it is identified for more.",
    risk: "The screw presses on one wire; the other works loose and burns.",
    citations: sameSection("110.14(A)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.ports.terminal.conductorsMost", "circuits.sections.parallelSets", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => byTerminal(context, id).map(({ landings, conductors }): Outcome => {
    const [first] = landings;
    if (!first || conductors < 2) return NOT_APPLICABLE;
    const most = first.terminal?.conductorsMost ?? null;
    if (most === null) { const reader = new Reader(context); askTerminal(context, reader, first, "conductorsMost", "number of conductors that one terminal is identified for"); return reader.outcome(); }
    if (conductors <= most) return PASS;
    const anchor = equipmentRef(id);
    return found({
      variant: `${first.port}-${most === 1 ? "two" : "too-many"}`, anchor, field: terminalField(first, "conductorsMost"), related: landings.map((one) => circuitRef(one.circuit)),
      message: `${nameOf(context, anchor)} holds ${conductors} conductors a pole of ${landings.map((one) => nameOf(context, circuitRef(one.circuit))).join(" and ")}; its terminal is for ${most}.`,
      steps: [{ symbol: "n", expression: "conductors in one terminal", substituted: `${conductors} ≤ ${most}`, result: "fails", unit: "" }],
    });
  }),
  examples: { violates: "Two conductors of one pole under one screw.", passes: "One conductor at each, or a lug marked for two." },
};
