import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, PatchOperation, Rule } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, racewayRef } from "@/lib/rules/shared/outcome";
import { powerCircuits } from "@/lib/rules/shared/topology";

/** Raceways of a section in which its borrowed equipment grounding conductor does not lie. */
function apart(context: CheckContext, id: string): readonly { section: string; owner: string; raceways: readonly string[] }[] {
  return context.graph.sections(id).flatMap((section) => {
    const owner = section.sharesGroundOf;
    if (owner === null || (section.equipmentGround?.count ?? 0) > 0 || !context.drawing.circuits[owner]) return [];
    const there = new Set(context.graph.sections(owner).filter((one) => (one.equipmentGround?.count ?? 0) > 0).flatMap((one) => one.route.map((step) => step.raceway)));
    // Boxes and enclosures only pass conductors on; the run between them counts.
    const raceways = section.route.map((step) => step.raceway).filter((raceway) => context.drawing.raceways[raceway]?.kind !== "box" && !there.has(raceway));
    return raceways.length > 0 ? [{ section: section.id, owner, raceways }] : [];
  });
}

export const circuitConductorsTogether: Rule = {
  meta: {
    id: "circuit-conductors-together", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "All conductors of an ac circuit, with its equipment grounding conductor, must run in the same raceway, cable or trench.",
    risk: "The loop between them has so much reactance that a fault current stays small and the device waits; steel between them heats.",
    citations: sections(["300.3(B), 300.20, 690.43(C)", "read"], ["300.3(B), 300.20, 690.43(C)", "read"], ["300.3(B), 300.20, 690.43(C)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.sharesGroundOf", "circuits.sections.route", "circuits.sections.equipmentGround"], absorbs: ["egc-missing"],
  },
  // The grounding conductor of a dc circuit may run apart from it.
  subjects: ({ drawing, graph }) => powerCircuits(graph).filter((id) => drawing.circuits[id]?.system === "ac" && Object.values(drawing.circuits[id]?.sections ?? {}).some((section) => section.sharesGroundOf !== null)).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const parts = apart(context, anchor.id);
    const [first] = parts;
    if (!first) return context.graph.sections(anchor.id).some((section) => section.sharesGroundOf !== null && section.route.length > 0) ? PASS : NOT_APPLICABLE;
    const raceways = [...new Set(parts.flatMap((part) => part.raceways))];
    return found({
      variant: "ground-apart", anchor, field: `sections.${first.section}.sharesGroundOf`, related: [circuitRef(first.owner), ...raceways.map(racewayRef)],
      message: `${nameOf(context, anchor)} shares the equipment grounding conductor of ${nameOf(context, circuitRef(first.owner))}, which does not lie in ${names(context, raceways.map(racewayRef))} with it.`,
      steps: [],
    });
  },
  suggest: ({ anchor }, context) => {
    const patches = apart(context, anchor.id).flatMap(({ section, owner }): PatchOperation[] => {
      const like = context.graph.sections(owner).find((one) => (one.equipmentGround?.count ?? 0) > 0)?.equipmentGround;
      const base = `/circuits/${anchor.id}/sections/${section}`;
      return like ? [{ op: "replace", path: `${base}/equipmentGround`, value: like }, { op: "replace", path: `${base}/sharesGroundOf`, value: null }] : [];
    });
    return patches.length > 0 ? [{ label: `Give ${nameOf(context, anchor)} an equipment grounding conductor of its own`, also: "Check its size and the raceway fill.", patches }] : [];
  },
  examples: { violates: "An equipment grounding conductor in another conduit than its phases.", passes: "All conductors in the same conduit." },
};
