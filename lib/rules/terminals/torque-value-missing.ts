import { NEVER_MUST_FIX, sameSection } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { askTerminal, terminalField, terminalsAt, terminalSubjects } from "@/lib/rules/shared/terminals";

export const torqueValueMissing: Rule = {
  meta: {
    id: "torque-value-missing", group: "Terminals, temperature, torque", severity: "should-fix", evidence: "rated",
    statement: "Every terminal should have a tightening torque in lbf·in and where it was read: the marking, the instruction or the default table.",
    risk: "Without a number the screw is tightened by feel; three of four then miss the value by more than a fifth.",
    citations: sameSection("110.14(D)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.ports.terminal.torqueLbfIn", "equipment.ports.terminal.torqueSource", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => {
    const anchor = equipmentRef(id);
    return terminalsAt(context, id).map((landed): Outcome => {
      const torque = landed.terminal?.torqueLbfIn ?? null;
      const source = landed.terminal?.torqueSource?.trim() ?? "";
      if (torque !== null && source !== "") return PASS;
      const related = [circuitRef(landed.circuit)];
      // Words in place of a number are an instruction that nobody can follow; with neither, the value is still to be read.
      if (torque === null && source !== "") {
        return found({ variant: `${landed.port}-no-number`, anchor, field: terminalField(landed, "torqueLbfIn"), related, message: `${nameOf(context, anchor)}: the torque for ${nameOf(context, related[0] ?? anchor)} is given as “${source}”, without a value in lbf·in.`, steps: [] });
      }
      if (torque !== null) {
        return found({ variant: `${landed.port}-no-source`, anchor, field: terminalField(landed, "torqueSource"), related, message: `${nameOf(context, anchor)}: ${torque} lbf·in for ${nameOf(context, related[0] ?? anchor)} should say whether it is marked, instructed or a default.`, steps: [] });
      }
      const reader = new Reader(context);
      askTerminal(context, reader, landed, "torqueLbfIn", "tightening torque");
      return reader.outcome();
    });
  },
  examples: { violates: "A lug with the words “tighten firmly” in place of a torque.", passes: "35 lbf·in, from the marking." },
};
