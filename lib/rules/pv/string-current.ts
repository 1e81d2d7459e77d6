import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { carriedBy } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { powerCircuits } from "@/lib/rules/shared/topology";

const TOLERANCE_A = 0.01;

export const stringCurrent: Rule = {
  meta: {
    id: "string-current", group: "PV source circuits", severity: "must-fix", evidence: "derived",
    statement: "The current a PV circuit is sized for is 125 % of the sum of the short-circuit currents of its parallel strings.",
    risk: "On a bright cold day the wire and its device carry more than they were chosen for.",
    citations: sections(["690.8(A)(1)(1)", "read"], ["690.8(A)(1)(a)(1)", "read"], ["690.8(A)(1)(a)(1)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.load", "circuits.from", "circuits.to", "equipment.props.shortCircuitA", "equipment.props.bifacialGainPercent", "equipment.props.converters"], absorbs: [],
  },
  subjects: ({ graph, drawing }) => powerCircuits(graph).filter((id) => drawing.circuits[id]?.system === "pv-dc").map(circuitRef),
  evaluate: ({ id }, context) => {
    const reader = new Reader(context);
    const carried = carriedBy(context, id, reader);
    if (!carried) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    const stated = context.drawing.circuits[id]?.load ?? null;
    // Without a statement of the designer every other rule takes the current worked out here.
    if (stated === null) return PASS;
    const statedA = stated.continuousA + stated.otherA;
    const maximumA = carried.required.detail.maximumA;
    if (Math.abs(statedA - maximumA) <= TOLERANCE_A || statedA > maximumA) return PASS;
    const anchor = circuitRef(id);
    return found({
      variant: "stated-too-low", anchor, field: "load.continuousA", related: carried.from.map(equipmentRef),
      message: `${nameOf(context, anchor)} is stated with ${statedA} A; its ${carried.from.length} string${carried.from.length === 1 ? "" : "s"} make ${maximumA.toFixed(2)} A.`,
      steps: [...carried.required.steps, { symbol: "I", expression: "stated, not below Imax", substituted: `${statedA} A ≥ ${maximumA.toFixed(2)} A`, result: "fails", unit: "" }],
    });
  },
  suggest: ({ anchor: { id } }) => [{ label: "Take the current worked out from the strings", also: "", patches: [{ op: "replace", path: `/circuits/${id}/load`, value: null }] }],
  examples: { violates: "A string of 14.05 A short-circuit current stated with 14.05 A.", passes: "17.56 A, or no statement." },
};
