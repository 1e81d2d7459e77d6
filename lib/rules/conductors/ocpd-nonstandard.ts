import { isStandardRatingA } from "@/lib/code";
import { NEVER_MUST_FIX, sameSection } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { deviceRatingA } from "@/lib/rules/shared/conductors";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { compact, runEquipment, smallerDevice } from "@/lib/rules/shared/protection";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

export const ocpdNonstandard: Rule = {
  meta: {
    id: "ocpd-nonstandard", group: "Conductors and overcurrent", severity: "advice", evidence: "rated",
    statement: "The rating of a fixed-trip device should be one of the standard sizes; others are permitted but seldom stocked.",
    risk: "The device cannot be bought, and another one is put in its place on site.",
    citations: sameSection("240.6(A)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.ratingA", "equipment.props.fuseA", "equipment.props.trip", "equipment.props.current", "equipment.props.maximumOvercurrentA"], absorbs: [],
  },
  subjects: (context) => Object.keys(context.drawing.equipment).sort().filter((id) => topology(context.graph).ratingField(id) !== null).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const { id } = anchor;
    const field = topology(context.graph).ratingField(id) ?? "ratingA";
    const ratingA = deviceRatingA(context, id);
    const reader = new Reader(context);
    if (ratingA === null) { reader.ask(anchor, `props.${field}`, propertyLabel(context, id, field)); return reader.outcome(); }
    const fuse = context.graph.kind(id).capabilities.switching !== "breaker";
    // PV fuses come in a series of their own; an adjustable trip is set, not bought.
    if ((fuse && textOf(context, id, "current") === "PV dc") || textOf(context, id, "trip") === "adjustable") return NOT_APPLICABLE;
    if (isStandardRatingA(ratingA, context.edition, fuse)) return PASS;
    const printed = powerCircuits(context.graph).filter((circuit) => topology(context.graph).protectors(circuit).some((one) => one.device === id)).some((circuit) => runEquipment(context, circuit).some((one) => numberOf(context, one, "maximumOvercurrentA") === ratingA));
    if (printed) return NOT_APPLICABLE;
    return found({
      variant: "not-standard", anchor, field: `props.${field}`, related: [], message: `${nameOf(context, anchor)}: ${ratingA} A is no standard rating.`,
      steps: [{ symbol: "In", expression: "one of the standard ratings", substituted: `${ratingA} A`, result: "not in the list", unit: "" }],
    });
  },
  suggest: ({ anchor }, context) => {
    const guarded = powerCircuits(context.graph).filter((circuit) => topology(context.graph).protectors(circuit).some((one) => one.device === anchor.id));
    return compact([smallerDevice(context, anchor.id, guarded, deviceRatingA(context, anchor.id) ?? 0, () => true, "Check that it still carries the load.")]);
  },
  examples: { violates: "A 65 A breaker.", passes: "A 70 A breaker." },
};
