import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { askTerminal, terminalField, terminalsAt, terminalSubjects } from "@/lib/rules/shared/terminals";

const TAKES: Readonly<Record<"Cu" | "Al", readonly string[]>> = { Cu: ["CU", "AL9CU", "CU-AL"], Al: ["AL", "AL9CU", "CU-AL"] };

export const alCuTermination: Rule = {
  meta: {
    id: "al-cu-termination", group: "Conductors and overcurrent", severity: "must-fix", evidence: "rated",
    statement: "The terminal must be marked for the metal of the conductor: AL, AL9CU or CU-AL for aluminum.",
    risk: "Aluminum under a copper screw creeps and oxidizes; the joint heats until it fails.",
    citations: sections(["110.14, 110.14(A)", "read"], ["110.14, 110.14(A)", "read"], ["110.14, 110.14(A)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.ungrounded.metal", "equipment.ports.terminal.metals", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => terminalsAt(context, id).map((landed): Outcome => {
    const { section, circuit, terminal } = landed;
    if (!section.ungrounded) return NOT_APPLICABLE;
    const { metal } = section.ungrounded;
    const metals = terminal?.metals ?? null;
    const reader = new Reader(context);
    if (metals === "AL9CU" || metals === "CU-AL") return PASS;
    if (metal === null) reader.ask(circuitRef(circuit), `sections.${section.id}.ungrounded.metal`, `metal of the conductors of ${nameOf(context, circuitRef(circuit))}`);
    if (metals === null) askTerminal(context, reader, landed, "metals", "conductor metal marked for the terminal");
    if (metal === null || metals === null) return reader.outcome();
    if (TAKES[metal].includes(metals)) return PASS;
    const anchor = equipmentRef(id);
    return found({
      variant: `${landed.port}-metal`, anchor, field: terminalField(landed, "metals"), related: [circuitRef(circuit)],
      message: `${nameOf(context, circuitRef(circuit))} is ${metal === "Al" ? "aluminum" : "copper"}; the terminal of ${nameOf(context, anchor)} is marked ${metals}.`,
      steps: [{ symbol: "metal", expression: "marked for the conductor", substituted: `${metal} in ${metals}`, result: "fails", unit: "" }],
    });
  }),
  examples: { violates: "An aluminum feeder on a lug marked CU.", passes: "The same feeder on a lug marked AL9CU." },
};
