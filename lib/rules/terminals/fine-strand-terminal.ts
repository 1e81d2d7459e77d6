import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { askTerminal, terminalField, terminalsAt, terminalSubjects } from "@/lib/rules/shared/terminals";

export const fineStrandTerminal: Rule = {
  meta: {
    id: "fine-strand-terminal", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "rated",
    statement: "Finely stranded cable must end in a terminal that is identified for its strands; a ferrule helps only where the terminal is identified for it.",
    risk: "Fine strands flow under a set screw; the joint loosens within months and burns.",
    citations: sections(["110.14, 690.31(H), 706.32", "read"], ["110.14, 690.31(C)(5)", "read"], ["110.14, 690.31(C)(5)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.ungrounded.strands", "equipment.ports.terminal.fineStrand", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => terminalsAt(context, id).map((landed): Outcome => {
    const { section, circuit, terminal } = landed;
    const strands = section.ungrounded?.strands ?? null;
    const fits = terminal?.fineStrand ?? null;
    if (fits === true) return PASS;
    const reader = new Reader(context);
    // Battery leads are fine-stranded as often as not; building wire is not.
    if (strands === null && section.ungrounded && context.drawing.circuits[circuit]?.system === "battery-dc") {
      reader.ask(circuitRef(circuit), `sections.${section.id}.ungrounded.strands`, `stranding of ${nameOf(context, circuitRef(circuit))}`);
      return reader.outcome();
    }
    if (strands !== "class K") return NOT_APPLICABLE;
    if (fits === null) { askTerminal(context, reader, landed, "fineStrand", "whether the terminal is identified for finely stranded conductors"); return reader.outcome(); }
    const anchor = equipmentRef(id);
    return found({
      variant: `${landed.port}-fine-strands`, anchor, field: terminalField(landed, "fineStrand"), related: [circuitRef(circuit)],
      message: `${nameOf(context, circuitRef(circuit))} is finely stranded; the terminal of ${nameOf(context, anchor)} is not identified for it.`,
      steps: [{ symbol: "strands", expression: "terminal identified for the class", substituted: "class K", result: "fails", unit: "" }],
    });
  }),
  suggest: ({ anchor, related }, context) => {
    const circuit = related[0]?.id ?? "";
    const ends = [context.drawing.circuits[circuit]?.from.equipment, context.drawing.circuits[circuit]?.to.equipment];
    const patches = context.graph.sections(circuit).filter((section) => section.ungrounded?.strands === "class K").map((section) => ({ op: "replace" as const, path: `/circuits/${circuit}/sections/${section.id}/ungrounded/strands`, value: "class B" }));
    return patches.length > 0 && ends.includes(anchor.id) ? [{ label: `Pull ${nameOf(context, circuitRef(circuit))} in class B strands`, also: "Or take a compression lug listed for the cable. Check that it still bends into the enclosure, and its diameter.", patches }] : [];
  },
  examples: { violates: "Welding-type cable in a box lug.", passes: "The same cable in a compression lug on a stud." },
};
