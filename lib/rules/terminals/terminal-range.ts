import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { askTerminal, terminalField, terminalsAt, terminalSubjects } from "@/lib/rules/shared/terminals";
import { compareSizes, isConductorSize } from "@/lib/units";

export const terminalRange: Rule = {
  meta: {
    id: "terminal-range", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "rated",
    statement: "The conductor must lie within the wire range that is marked for the terminal.",
    risk: "A conductor too small is not held, one too large is cut down to fit; both burn.",
    citations: sections(["110.3(B), 110.14", "read"], ["110.3(B), 110.14", "read"], ["110.3(B), 110.14", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.ports.terminal.smallest", "equipment.ports.terminal.largest", "circuits.sections.ungrounded.size", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => {
    const anchor = equipmentRef(id);
    return terminalsAt(context, id).map((landed): Outcome => {
      const { section, terminal, circuit } = landed;
      const size = section.ungrounded?.size;
      const reader = new Reader(context);
      if (!isConductorSize(size)) { reader.ask(circuitRef(circuit), `sections.${section.id}.ungrounded.size`, `size of the conductors of ${nameOf(context, circuitRef(circuit))}`); return reader.outcome(); }
      const [smallest, largest] = [terminal?.smallest ?? null, terminal?.largest ?? null];
      if (smallest === null || !isConductorSize(smallest)) askTerminal(context, reader, landed, "smallest", "smallest conductor marked for the terminal");
      if (largest === null || !isConductorSize(largest)) askTerminal(context, reader, landed, "largest", "largest conductor marked for the terminal");
      const below = isConductorSize(smallest) && compareSizes(size, smallest) < 0;
      const above = isConductorSize(largest) && compareSizes(size, largest) > 0;
      if (!below && !above) return reader.complete ? PASS : reader.outcome();
      return found({
        variant: `${landed.port}-${above ? "above" : "below"}-range`, anchor, field: terminalField(landed, above ? "largest" : "smallest"), related: [circuitRef(circuit)],
        message: `${nameOf(context, anchor)} takes ${smallest ?? "?"} to ${largest ?? "?"}; ${nameOf(context, circuitRef(circuit))} lands on it with ${size}.`,
        steps: [{ symbol: "size", expression: "within the marked range", substituted: `${smallest ?? "?"} ≤ ${size} ≤ ${largest ?? "?"}`, result: "fails", unit: "" }],
      });
    });
  },
  examples: { violates: "250 kcmil on a lug marked 14 AWG to 2/0 AWG.", passes: "250 kcmil on a lug marked 6 AWG to 250 kcmil." },
};
