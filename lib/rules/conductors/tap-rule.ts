import { TAP_SHARE_10_FT, TAP_SHARE_25_FT } from "@/lib/code/tables/source-constants";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, correctedAmpacity, terminalsOf } from "@/lib/rules/shared/conductors";
import { breakerAtBus } from "@/lib/rules/shared/devices";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, largerConductor, uniqueRefs } from "@/lib/rules/shared/protection";
import { circuitAmpacityA, judgeTap, type Judged } from "@/lib/rules/shared/tapPaths";
import { feedA, fittingRatingA, landingsOf, permittedA, type Landing } from "@/lib/rules/shared/taps";
import { motorCircuit, powerCircuits, topology } from "@/lib/rules/shared/topology";

/** A feeder or branch taken from a bus whose device its conductors do not permit. Sources' own circuits and motor taps have rules of their own. */
function tapOf(context: CheckContext, id: string, reader: Reader): { landing: Landing; baseA: number; device: string } | null {
  if (context.drawing.circuits[id]?.system !== "ac" || motorCircuit(context.graph, id)) return null;
  for (const landing of landingsOf(context, id)) {
    const beyond = topology(context.graph).side(id, landing.other);
    if (beyond.converters.length + beyond.utilities.length + beyond.generators.length > 0 || beyond.loads.length + beyond.buses.length === 0) continue;
    // Ahead of every device the conductors are supply side, with distances of their own.
    if (landing.feeds.some((feed) => feed.device === null && !feed.converter)) continue;
    const permitted = permittedA(context, id, reader);
    const feed = feedA(context, landing.feeds, reader);
    if (permitted === null || feed === null) return null;
    if (feed.device !== null && feed.sumA > permitted + 1e-9) return { landing, baseA: feed.largestA, device: feed.device };
  }
  return null;
}
/** True where the bus it is taken from is itself fed by a tap. */
const fromTap = (context: CheckContext, landing: Landing): boolean => [...new Set(landing.feeds.map((feed) => feed.circuit))].some((circuit) =>
  context.drawing.circuits[circuit]?.wiring === "field" && tapOf(context, circuit, new Reader(context)) !== null);
const judge = (context: CheckContext, id: string, tap: { landing: Landing; baseA: number }, amperes: number, reader: Reader): Judged | null => judgeTap(context, id, {
  other: tap.landing.other, thirdA: tap.baseA * TAP_SHARE_25_FT, tenthA: tap.baseA * TAP_SHARE_10_FT, shortFt: context.limit("shortFt"), longFt: context.limit("longFt"), fromTap: fromTap(context, tap.landing),
}, amperes, reader);
function evaluate(context: CheckContext, id: string): Outcome {
  const reader = new Reader(context);
  const tap = tapOf(context, id, reader);
  if (!tap) return reader.complete ? NOT_APPLICABLE : reader.outcome();
  const amperes = circuitAmpacityA(context, id, reader);
  const judged = amperes === null ? null : judge(context, id, tap, amperes, reader);
  if (amperes === null || judged === null) return reader.outcome();
  if (judged.ok) return PASS;
  const anchor = circuitRef(id);
  return found({
    variant: judged.variant, anchor, field: "sections", related: uniqueRefs([equipmentRef(tap.landing.bus), equipmentRef(tap.device)], anchor),
    message: `${nameOf(context, anchor)} is tapped behind ${nameOf(context, equipmentRef(tap.device))} of ${tap.baseA} A: ${judged.says}.`, steps: judged.steps,
  });
}
function suggest({ anchor: { id }, variant }: FindingDraft, context: CheckContext) {
  const reader = new Reader(context);
  const tap = tapOf(context, id, reader);
  const amperes = tap && circuitAmpacityA(context, id, reader);
  if (!tap || amperes === null) return [];
  const rating = fittingRatingA(context, id);
  const { neededA } = judge(context, id, tap, amperes, reader) ?? { neededA: null };
  const column = terminalsOf(context, id, null, 75).lowest;
  return compact([
    variant === "too-small" && neededA !== null ? largerConductor(context, id, (section, wire) => Math.min(correctedAmpacity(context, id, section, wire, column, new Reader(context))?.value ?? 0, columnAmpacityA(wire, column)) >= neededA - 1e-9, "Check the raceway fill and the terminals.") : null,
    rating === null ? null : breakerAtBus(context, id, tap.landing.end, rating),
  ]);
}

export const tapRule: Rule = {
  meta: {
    id: "tap-rule", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "A feeder tap must be up to 10 ft with the rating of what it ends in and 1/10 of the feeder device, up to 25 ft with 1/3 of it and one device at its end, or outdoors with one device at its end; no next size up and no tap from a tap.",
    risk: "The feeder device never opens on an overload of the smaller conductor, and a fault burns it before the device reacts.",
    citations: sameSection("240.21(B), 240.4(E)"), mustFixAllowed: MUST_FIX_TO_2023,
    limits: { shortFt: { value: 10, unit: "ft", source: "240.21(B)(1)" }, longFt: { value: 25, unit: "ft", source: "240.21(B)(2)" } },
    reads: ["circuits.from", "circuits.to", "circuits.sections.lengthFt", "circuits.sections.ungrounded", "circuits.sections.route", "raceways.stretches", "equipment.props.ratingA", "equipment.props.busA"], absorbs: ["tap-with-source"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => evaluate(context, id), suggest,
  examples: { violates: "6 AWG copper, 65 A, 22 ft long off a 200 A feeder: a third is 66.7 A.", passes: "4 AWG copper, 85 A, ending in one device of 80 A." },
};
