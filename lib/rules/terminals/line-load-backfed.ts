import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { backfed, breakers, fedByGenerator } from "@/lib/rules/shared/backfeed";
import { equipmentRef, found, nameOf, names, NOT_APPLICABLE, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";

export const lineLoadBackfed: Rule = {
  meta: {
    id: "line-load-backfed", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "rated",
    statement: "A breaker marked LINE and LOAD may not be fed from its load terminals.",
    risk: "Its electronics or its arc chutes work one way only; fed backward it burns or does not open.",
    citations: sections(["110.3(B), 705.12(B)(4), 710.15(E), 690.13(F)(2)", "read"], ["110.3(B), 705.12(D), 710.15(E)", "read"], ["110.3(B), 710.15(E)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.lineLoadMarked", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => breakers(context).filter((id) => context.drawing.equipment[id]?.props.lineLoadMarked !== false).map(equipmentRef),
  evaluate: (anchor, context) => {
    const marked = context.drawing.equipment[anchor.id]?.props.lineLoadMarked ?? null;
    const sides = backfed(context, anchor.id);
    if (!sides) return NOT_APPLICABLE;
    const reader = new Reader(context);
    if (marked === null) { reader.ask(anchor, "props.lineLoadMarked", propertyLabel(context, anchor.id, "lineLoadMarked")); return reader.outcome(); }
    if (marked !== true) return PASS;
    const { load } = sides;
    const from = [...load.utilities, ...(load.generators.length > 0 && fedByGenerator(context, anchor.id) ? load.generators : []), ...load.converters, ...load.batteries, ...load.strings];
    return found({
      variant: "marked-line-load", anchor, field: "props.lineLoadMarked", related: from.map(equipmentRef),
      message: `${nameOf(context, anchor)} is marked LINE and LOAD and is fed at its load terminals by ${names(context, from.map(equipmentRef))}.`,
      steps: [{ symbol: "flow", expression: "from line to load alone", substituted: names(context, from.map(equipmentRef)), result: "fails", unit: "" }],
    });
  },
  examples: { violates: "A ground-fault breaker marked line and load as the breaker of a source.", passes: "A breaker without these marks." },
};
