import type { ElementRef } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode, sameSection, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { declaredRule } from "@/lib/rules/families/declared";
import { equipmentRef } from "@/lib/rules/shared/outcome";

const base = { group: "Ratings and completeness", evidence: "declared", mustFixAllowed: NEVER_MUST_FIX, limits: {}, absorbs: [] } as const;
const all = (context: CheckContext): readonly string[] => Object.keys(context.drawing.equipment).sort();
const buses = (context: CheckContext, status: "new" | "existing"): readonly string[] =>
  all(context).filter((id) => context.graph.kind(id).capabilities.bus === true && context.graph.port(id, "bus")?.system === "ac" && context.drawing.equipment[id]?.status === status);
/** Where a question about the whole site is asked: at the utility, or at the first piece. */
const site = (context: CheckContext): readonly ElementRef[] => {
  const ids = all(context);
  const at = ids.find((id) => context.graph.kind(id).capabilities.source === "utility") ?? ids[0];
  return at === undefined ? [] : [equipmentRef(at)];
};
const marks: readonly ["unconfirmed", "unconfirmed", "unconfirmed"] = ["unconfirmed", "unconfirmed", "unconfirmed"];

/** Questions that a one-line cannot answer about what is there already and what the place is. */
export const completenessStatements: readonly Rule[] = [
  declaredRule({
    meta: {
      ...base, id: "existing-new-unmarked", severity: "should-fix",
      statement: "Each item carries the status found on site: existing, new, relocated or removed.", risk: "Rules of new work are asked of what may stay, or not asked of what is new.",
      citations: notCode("plan review, common practice"), reads: ["statements", "equipment.status"], question: "Was the existing or new status of each item checked on site?",
    },
    subjects: site, refused: (name) => `The status of the items behind ${name} was not checked on site.`,
    examples: { violates: "A 200 A panel that was there before, drawn as new.", passes: "The same panel marked existing after a visit." },
  }),
  declaredRule({
    meta: {
      ...base, id: "existing-load-method", severity: "should-fix",
      statement: "Load added to an existing service uses a stated method: additions to an existing dwelling, or 125 % of the highest demand of twelve months plus the new load.",
      risk: "The existing service is loaded beyond its rating and nobody knows.", citations: sections(["220.83, 220.87", "unconfirmed"], ["220.83, 220.87", "unconfirmed"], ["220.83, 220.87", "unconfirmed"], "Article 120"),
      reads: ["statements", "equipment.status", "circuits.from", "circuits.to"], question: "Is the load on the existing equipment worked out by a stated method, and does it fit?",
    },
    // New loads on a bus that is there already.
    subjects: (context) => buses(context, "existing").filter((bus) => context.graph.children(bus).some((id) => context.drawing.equipment[id]?.status === "new")).map(equipmentRef),
    refused: (name) => `No method is stated for the load added to ${name}.`,
    examples: { violates: "Two vehicle chargers added to an existing panel without a method.", passes: "A 220.83 sheet attached." },
  }),
  declaredRule({
    meta: {
      ...base, id: "load-record-with-pv", severity: "should-fix",
      statement: "The exception with a 30-day record of demand is not used on a service that has PV, wind or peak shaving.", risk: "The record shows what the sources left over, not the load.",
      citations: sameSection("220.87 exception", marks), reads: ["statements", "equipment.status"], question: "Is the existing load taken from twelve months of data or from a computation, and not from a 30-day record?",
    },
    subjects: (context) => {
      const sources = all(context).some((id) => context.drawing.equipment[id]?.status === "existing" && (context.graph.kind(id).capabilities.source === "pv" || context.graph.kind(id).capabilities.converter === true));
      return sources ? buses(context, "existing").slice(0, 1).map(equipmentRef) : [];
    },
    refused: (name) => `The load on ${name} rests on a 30-day record although sources were running.`,
    examples: { violates: "A 30-day log on a house with PV.", passes: "A 220.83 computation." },
  }),
  declaredRule({
    meta: {
      ...base, id: "afci-gfci-question", severity: "advice",
      statement: "Where branch circuits of a dwelling move to a new panel, arc-fault and ground-fault protection is looked at circuit by circuit.", risk: "A circuit that was extended may need protection that the old one did not have.",
      citations: sameSection("210.8, 210.12", marks), reads: ["statements", "site.occupancy", "equipment.status"], question: "Were arc-fault and ground-fault protection looked at for each circuit that moves?",
    },
    subjects: (context) => (["one- or two-family dwelling", "multifamily dwelling"].includes(context.drawing.site.occupancy ?? "") && buses(context, "existing").length > 0 ? buses(context, "new").map(equipmentRef) : []),
    refused: (name) => `Arc-fault and ground-fault protection of the circuits moved to ${name} was not looked at.`,
    examples: { violates: "Ten dwelling circuits moved without a note.", passes: "A note: extension under 6 ft, no new outlets." },
  }),
  declaredRule({
    meta: {
      ...base, id: "agricultural-building", severity: "advice",
      statement: "In farm buildings with animals or corrosive dust the rules of Article 547 are looked at: grounding, enclosures, site isolating device, equipotential planes.", risk: "Corrosion and stray voltage: animals feel a few volts.",
      citations: sameSection("Article 547", marks), reads: ["statements", "site.occupancy", "equipment.location.room"], question: "Was Article 547 looked at, and does the work follow it or does it not apply?",
    },
    subjects: (context) => (context.drawing.site.occupancy === "farm building" || all(context).some((id) => context.drawing.equipment[id]?.location.room === "barn or livestock area") ? site(context) : []),
    refused: () => "Article 547 was not looked at for this farm building.",
    examples: { violates: "A dairy barn panel in a type 1 enclosure, nothing noted.", passes: "Noted: no animals, no corrosive dust." },
  }),
];
