import type { Circuit } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";
import { racewayRef } from "@/lib/rules/shared/outcome";

/** Conductors that may run exposed by their kind, so that no raceway is missing. */
const EXPOSED = new Set(["PV wire", "USE-2"]);

/** Sections of a circuit that neither lie in a raceway nor are a cable or a kind of conductor that needs none. */
function loose(context: CheckContext, id: string): readonly string[] {
  return context.graph.sections(id).filter((section) => {
    if (section.route.length > 0) return false;
    if (section.cable?.class === "power") return false;
    const insulation = section.ungrounded?.insulation ?? null;
    return !(insulation !== null && EXPOSED.has(insulation));
  }).map((section) => section.id);
}

export const racewayNotRouted: Rule = {
  meta: {
    id: "raceway-not-routed", group: "Ratings and completeness", severity: "should-fix", evidence: "derived",
    statement: "Every circuit that leaves an enclosure runs in a raceway or is a cable, and the drawing says which.",
    risk: "Fill, heat and separation of a circuit without a way are checked by nobody.",
    citations: notCode("plan review: wiring method of each run"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["circuits.sections.route", "circuits.sections.cable", "circuits.sections.ungrounded.insulation"], absorbs: [],
  },
  subjects: ({ drawing }) => Object.keys(drawing.circuits).sort().filter((id) => { const circuit = drawing.circuits[id] as Circuit; return circuit.wiring === "field" && circuit.system !== "ground"; }).map(circuitRef),
  evaluate: (anchor, context) => {
    const sections = context.graph.sections(anchor.id);
    if (sections.length === 0) return NOT_APPLICABLE;
    const open = loose(context, anchor.id);
    if (open.length === 0) return PASS;
    return found({ variant: "no-raceway", anchor, field: `sections.${open[0]}.route`, related: [], message: `${nameOf(context, anchor)} is assigned to no raceway or cable${sections.length > 1 ? ` in ${open.length} of its ${sections.length} sections` : ""}.`, steps: [] });
  },
  suggest: (finding, context) => {
    const open = loose(context, finding.anchor.id);
    const circuit = context.drawing.circuits[finding.anchor.id] as Circuit;
    if (open.length !== 1) return [];
    // Raceways that already join the same two enclosures for the same system.
    const places = [circuit.from, circuit.to].map((end) => context.graph.enclosures(end.equipment));
    return Object.keys(context.drawing.raceways).sort().filter((id) => {
      const raceway = context.drawing.raceways[id];
      const same = context.graph.occupants(id).every((one) => one.system === circuit.system);
      const joins = (a: string | null, b: string | null): boolean => a !== null && b !== null && places[0]?.includes(a) === true && places[1]?.includes(b) === true;
      return raceway !== undefined && same && (joins(raceway.from, raceway.to) || joins(raceway.to, raceway.from));
    }).slice(0, 2).map((id) => ({
      label: `Route it through ${nameOf(context, racewayRef(id))}`, also: "Fill and bundling are checked again.",
      patches: [{ op: "replace" as const, path: `/circuits/${finding.anchor.id}/sections/${open[0]}/route`, value: [{ raceway: id, compartment: Object.keys(context.drawing.raceways[id]?.compartments ?? {})[0] ?? null }] }],
    }));
  },
  examples: { violates: "A feeder drawn from panel to panel with no raceway named.", passes: "The same feeder in R-4." },
};
