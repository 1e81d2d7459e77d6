import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { equipmentRef, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";

/** Ratings that every part of a power path must show, whatever else is asked of it. */
const RATINGS = ["ratingA", "busA", "interruptingKA", "shortCircuitKA"] as const;
/** Withstand and interrupting ratings stand for a must-fix judgment of the fault current: sealing waits for them. */
const FAULT_RATINGS = new Set<string>(["interruptingKA", "shortCircuitKA"]);

/** A part that power passes: it switches, protects, meters or distributes, and a circuit lands on it. */
function onPath(context: CheckContext, id: string): boolean {
  const { capabilities, properties } = context.graph.kind(id);
  const passes = capabilities.switching !== undefined || capabilities.bus === true || context.graph.edges.some((edge) => edge.id === id && edge.by === "solid");
  return passes && RATINGS.some((name) => Object.hasOwn(properties, name)) && context.graph.circuitsAt(id).some((circuit) => { const system = context.drawing.circuits[circuit]?.system; return system !== "data" && system !== "ground"; });
}

export const ratingUnknown: Rule = {
  meta: {
    id: "rating-unknown", group: "Ratings and completeness", severity: "should-fix", evidence: "derived",
    statement: "No rating on a power path is left unknown: each missing value is one redline, with the rules that wait for it.",
    risk: "What is not known is not checked.",
    citations: notCode("completeness of the drawing"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: RATINGS.map((name) => `equipment.props.${name}`), absorbs: [],
  },
  subjects: ({ drawing }) => Object.keys(drawing.equipment).sort().map(equipmentRef),
  evaluate: ({ id }, context) => {
    if (!onPath(context, id)) return NOT_APPLICABLE;
    const { properties } = context.graph.kind(id);
    const outcomes: Outcome[] = [];
    for (const name of RATINGS) {
      if (!Object.hasOwn(properties, name)) continue;
      const reader = new Reader(context);
      reader.number(id, name);
      if (!reader.complete) outcomes.push({ outcome: "needs-data", fields: reader.missing, ...(FAULT_RATINGS.has(name) ? { blocks: true } : {}) });
    }
    return outcomes.length > 0 ? outcomes : PASS;
  },
  examples: { violates: "Short-circuit rating of a switch not given.", passes: "Every device of the path with its ratings." },
};
