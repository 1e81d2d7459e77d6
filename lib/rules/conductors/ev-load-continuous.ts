import { standardRatingAtLeastA } from "@/lib/code";
import { CONTINUOUS_FACTOR } from "@/lib/code/tables/source-constants";
import { nodeKey } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { largestDevice } from "@/lib/rules/shared/protection";
import { topology } from "@/lib/rules/shared/topology";

export const evLoadContinuous: Rule = {
  meta: {
    id: "ev-load-continuous", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Vehicle supply equipment is a continuous load: its circuit must be rated 125 % of the current it is set to.",
    risk: "The breaker trips in the night, and its terminals age with every charge.",
    citations: sameSection("625.41, 625.42", ["agreed", "agreed", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.currentA", "equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: ["ocpd-below-125"],
  },
  // Equipment that listed load management may limit is supply equipment for vehicles.
  subjects: ({ drawing, graph }) => Object.keys(drawing.equipment).sort().filter((id) => { const { properties, capabilities } = graph.kind(id); return capabilities.load !== undefined && Object.hasOwn(properties, "managed"); }).map(equipmentRef),
  evaluate: ({ id }, context) => {
    const ends = topology(context.graph).runsFrom(nodeKey(id, "line")).filter((run) => run.device !== null);
    if (ends.length === 0) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const setA = reader.number(id, "currentA");
    return ends.map((run) => {
      const device = run.device ?? "";
      const ratingA = deviceRatingA(context, device);
      if (ratingA === null) reader.number(device, topology(context.graph).ratingField(device) ?? "ratingA");
      if (setA === null || ratingA === null) return reader.outcome();
      const needed = setA * (isTrue(context, device, "listedHundredPercent") ? 1 : CONTINUOUS_FACTOR);
      if (ratingA >= needed - 1e-9) return PASS;
      const anchor = equipmentRef(device);
      return found({
        variant: "below-125", anchor, field: "props.ratingA", related: [equipmentRef(id), ...run.circuits.map(circuitRef)],
        message: `${nameOf(context, anchor)} is ${ratingA} A; ${nameOf(context, equipmentRef(id))} is set to ${setA} A and asks for ${Math.round(needed * 100) / 100} A.`,
        steps: [{ symbol: "In", expression: "1.25 × current as set", substituted: `1.25 × ${setA} A`, result: needed, unit: "A", citation: "625.41" }, { symbol: "In", expression: "not below", substituted: `${ratingA} A ≥ ${needed} A`, result: "fails", unit: "" }],
      });
    });
  },
  suggest: ({ anchor, related }, context) => {
    const charger = related[0]?.id ?? "";
    const setA = numberOf(context, charger, "currentA");
    const ratingA = deviceRatingA(context, anchor.id);
    const field = topology(context.graph).ratingField(anchor.id);
    if (setA === null || ratingA === null || field === null) return [];
    const rating = standardRatingAtLeastA(setA * CONTINUOUS_FACTOR, context.edition, field === "fuseA");
    const permits = related.filter((ref) => ref.collection === "circuits" && context.drawing.circuits[ref.id]?.wiring === "field").every(({ id }) => context.graph.sections(id).every((section) => {
      const wire = wireOf(context, id, section, new Reader(context));
      return wire !== null && rating <= largestDevice(context, id, wire, columnAmpacityA(wire, terminalsOf(context, id, rating).lowest)).value;
    }));
    const lower = Math.floor(ratingA / CONTINUOUS_FACTOR);
    return [
      ...(permits ? [{ label: `Set ${nameOf(context, anchor)} to ${rating} A`, also: "Check the busbar and the load calculation.", patches: [{ op: "add" as const, path: `/equipment/${anchor.id}/props/${field}`, value: rating }] }] : []),
      { label: `Set ${nameOf(context, equipmentRef(charger))} to ${lower} A`, also: "By the maker's instruction, in a way that the user cannot change.", patches: [{ op: "add" as const, path: `/equipment/${charger}/props/currentA`, value: lower }] },
    ];
  },
  examples: { violates: "A unit set to 48 A on a 50 A breaker.", passes: "The same unit on 60 A." },
};
