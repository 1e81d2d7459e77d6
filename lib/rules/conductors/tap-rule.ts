import { TAP_SHARE_10_FT, TAP_SHARE_25_FT } from "@/lib/code/tables/source-constants";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule } from "@/lib/rules/engine/types";
import type { Step } from "@/lib/calc";
import { shown } from "@/lib/calc";
import { columnAmpacityA, correctedAmpacity, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { breakerAtBus } from "@/lib/rules/shared/devices";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, racewayRef, Reader } from "@/lib/rules/shared/outcome";
import { compact, largerConductor, uniqueRefs } from "@/lib/rules/shared/protection";
import { feedA, fittingRatingA, landingsOf, permittedA, type Landing } from "@/lib/rules/shared/taps";
import { motorCircuit, powerCircuits, topology } from "@/lib/rules/shared/topology";
import { stretchesOf } from "@/lib/diagram/graph";

/** What the tap ends in: one device, equipment with devices of its own, or neither. */
interface TapEnd { kind: "device" | "equipment" | "none"; id: string; ratingA: number | null }
function tapEnd(context: CheckContext, id: string, landing: Landing, reader: Reader): TapEnd {
  const [run, more] = topology(context.graph).runs(id, landing.other);
  if (!run || more) return { kind: "none", id: "", ratingA: null };
  if (run.device !== null) {
    const ratingA = deviceRatingA(context, run.device);
    if (ratingA === null) reader.number(run.device, topology(context.graph).ratingField(run.device) ?? "ratingA");
    return { kind: "device", id: run.device, ratingA };
  }
  const at = run.node.split("/")[0] ?? "";
  return run.stop === "bus" ? { kind: "equipment", id: at, ratingA: reader.number(at, "busA") } : { kind: "none", id: at, ratingA: null };
}
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
function isOutdoors(context: CheckContext, id: string, reader: Reader): boolean {
  const exposures = context.graph.sections(id).flatMap((section) => section.route.flatMap((step) => {
    const raceway = context.drawing.raceways[step.raceway];
    return raceway ? stretchesOf(raceway).map((stretch) => ({ step: step.raceway, at: stretch.id, exposure: stretch.exposure ?? raceway.location.exposure })) : [];
  }));
  for (const one of exposures) if (one.exposure === null) reader.ask(racewayRef(one.step), `stretches.${one.at}.exposure`, `surroundings of ${nameOf(context, racewayRef(one.step))}`);
  return exposures.length > 0 && exposures.every((one) => one.exposure === "outdoor" || one.exposure === "underground" || one.exposure === "roof");
}

const outermost = (context: CheckContext, equipment: string): string => context.graph.enclosures(equipment).at(-1) ?? equipment;
interface Judged { ok: boolean; variant: string; says: string; steps: Step[]; neededA: number | null }
function judge(context: CheckContext, id: string, tap: { landing: Landing; baseA: number }, amperes: number, reader: Reader): Judged | null {
  const end = tapEnd(context, id, tap.landing, reader);
  const sections = context.graph.sections(id);
  for (const section of sections) if (section.lengthFt === null) reader.ask(circuitRef(id), `sections.${section.id}.lengthFt`, `length of ${nameOf(context, circuitRef(id))}`);
  const outside = isOutdoors(context, id, reader);
  if (!reader.complete) return null;
  const feet = sections.reduce((sum, section) => sum + (section.lengthFt ?? 0), 0);
  // The tenth and the raceway are asked for only where the tap leaves the enclosure it starts in.
  const circuit = context.drawing.circuits[id];
  const leaves = !circuit || outermost(context, circuit.from.equipment) !== outermost(context, circuit.to.equipment);
  const enclosed = !leaves || sections.every((section) => section.route.length > 0 || section.cable !== null);
  const [third, tenth] = [tap.baseA * TAP_SHARE_25_FT, leaves ? tap.baseA * TAP_SHARE_10_FT : 0];
  const line = (symbol: string, expression: string, substituted: string, holds: boolean): Step => ({ symbol, expression, substituted, result: holds ? "passes" : "fails", unit: "" });
  const toEnd = end.ratingA !== null && amperes >= end.ratingA - 1e-9;
  const single = end.kind === "device" && toEnd;
  const ten = feet <= context.limit("shortFt") && end.kind !== "none" && toEnd && enclosed && amperes >= tenth - 1e-9;
  const twentyFive = feet <= context.limit("longFt") && single && enclosed && amperes >= third - 1e-9;
  const steps = [
    line("10 ft", "length to 10 ft, ampacity not below the rating at the end and 1/10 of the device", `${feet} ft; ${shown(amperes, 1)} A, ${end.ratingA ?? "no"} A at the end, ${shown(tenth, 1)} A`, ten),
    line("25 ft", "length to 25 ft, one device at the end, ampacity not below 1/3 of the device", `${feet} ft; ${shown(amperes, 1)} A, ${shown(third, 1)} A`, twentyFive),
    line("outside", "outdoors throughout, one device at the end within the ampacity", outside ? "outdoors" : "not outdoors throughout", outside && single),
  ];
  if (fromTap(context, tap.landing)) return { ok: false, variant: "tap-from-tap", says: "it is taken from conductors that are a tap themselves", steps, neededA: null };
  if (ten || twentyFive || (outside && single)) return { ok: true, variant: "", says: "", steps, neededA: null };
  if (end.kind === "none" || (end.kind === "equipment" && feet > context.limit("shortFt"))) return { ok: false, variant: "no-single-device", says: `it is ${feet} ft long and does not end in one device`, steps, neededA: null };
  if (!enclosed) return { ok: false, variant: "not-in-raceway", says: "it must run in a raceway", steps, neededA: null };
  if (feet > context.limit("longFt")) return { ok: false, variant: "too-long", says: `it is ${feet} ft long, above ${context.limit("longFt")} ft, and not outdoors throughout`, steps, neededA: null };
  const neededA = Math.max(end.ratingA ?? 0, feet > context.limit("shortFt") ? third : tenth);
  return { ok: false, variant: "too-small", says: `at ${feet} ft its ${shown(amperes, 1)} A must not be below ${shown(neededA, 1)} A`, steps, neededA };
}
function ampacityA(context: CheckContext, id: string, reader: Reader): number | null {
  const column = terminalsOf(context, id, null, 75).lowest;
  const values = context.graph.sections(id).map((section) => { const wire = wireOf(context, id, section, reader); return wire && (correctedAmpacity(context, id, section, wire, column, reader)?.value ?? null); });
  return values.length === 0 || values.some((value) => value === null) ? null : Math.min(...values.map((value) => value ?? 0));
}
function evaluate(context: CheckContext, id: string): Outcome {
  const reader = new Reader(context);
  const tap = tapOf(context, id, reader);
  if (!tap) return reader.complete ? NOT_APPLICABLE : reader.outcome();
  const amperes = ampacityA(context, id, reader);
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
  const amperes = tap && ampacityA(context, id, reader);
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
