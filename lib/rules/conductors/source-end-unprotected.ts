import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, wireOf } from "@/lib/rules/shared/conductors";
import { breakerAtBus } from "@/lib/rules/shared/devices";
import { circuitRef, equipmentRef, found, isTrue, nameOf, names, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, uniqueRefs } from "@/lib/rules/shared/protection";
import { feedA, fittingRatingA, landingsOf, permittedA, type Landing } from "@/lib/rules/shared/taps";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";
import { PV_IRRADIANCE_FACTOR } from "@/lib/code/tables/source-constants";

/** A landing without a device that this rule judges: on a dc bus, or of a source's own circuit on an ac bus. Loads tapped from an ac bus are taps; what the utility feeds without a device is supply side. */
function judged(context: CheckContext, id: string): readonly Landing[] {
  const { system } = context.drawing.circuits[id] ?? {};
  return landingsOf(context, id).filter((landing) => {
    if (system === "battery-dc") return true;
    if (system !== "ac") return false;
    const own = topology(context.graph).side(id, landing.other);
    return own.converters.length > 0 && own.utilities.length === 0 && landing.feeds.every((feed) => feed.device !== null || feed.converter);
  });
}

/** Strings joined without fuses: the others feed a fault in this one. What the module fuse forbids is the rule of strings; here the conductors count. */
function stringOutcome(context: CheckContext, id: string): Outcome {
  const { runs, side } = topology(context.graph);
  for (const [end, other] of [["from", "to"], ["to", "from"]] as const) {
    const own = side(id, other).strings;
    const others = side(id, end).strings;
    if (own.length !== 1 || others.length < 2 || runs(id, end).some((run) => run.stop === "device") || runs(id, other).some((run) => run.stop === "device")) continue;
    if (others.some((string) => isTrue(context, string, "converters"))) continue;
    const reader = new Reader(context);
    const currents = others.map((string) => reader.number(string, "shortCircuitA"));
    const wires = context.graph.sections(id).map((section) => wireOf(context, id, section, reader));
    if (!reader.complete) return reader.outcome();
    const sumA = currents.reduce<number>((sum, value) => sum + PV_IRRADIANCE_FACTOR * (value ?? 0), 0);
    const fuseA = numberOf(context, own[0] ?? "", "seriesFuseA");
    const ampacityA = Math.min(...wires.map((wire) => (wire ? columnAmpacityA(wire, 75) : Infinity)));
    if (sumA <= ampacityA + 1e-9 || (fuseA !== null && sumA > fuseA)) continue;
    return found({
      variant: "strings-above-conductor", anchor: circuitRef(id), field: "sections", related: [...own, ...others].map(equipmentRef),
      message: `${nameOf(context, circuitRef(id))} carries ${ampacityA} A and has no overcurrent device; ${others.length} other strings can feed ${Math.round(sumA * 10) / 10} A into it.`,
      steps: [{ symbol: "I", expression: "1.25 × sum of Isc of the other strings", substituted: names(context, others.map(equipmentRef)), result: sumA, unit: "A" }, comparison("I", sumA, ampacityA, "A", false)],
    });
  }
  return NOT_APPLICABLE;
}

function landingOutcome(context: CheckContext, id: string, landing: Landing): Outcome {
  const reader = new Reader(context);
  const permitted = permittedA(context, id, reader);
  const feed = feedA(context, landing.feeds, reader);
  if (permitted === null || feed === null) return reader.outcome();
  if (feed.sumA <= permitted + 1e-9) return PASS;
  const anchor = circuitRef(id);
  const feeders = [...new Set(landing.feeds.map((one) => one.device ?? one.node.split("/")[0] ?? ""))];
  const amount = Number.isFinite(feed.sumA) ? `${feed.sumA} A` : "its full short-circuit current";
  return found({
    variant: "no-device-at-source-end", anchor, field: landing.end, related: uniqueRefs([equipmentRef(landing.bus), ...feeders.map(equipmentRef)], anchor),
    message: `${nameOf(context, anchor)} lands on ${nameOf(context, equipmentRef(landing.bus))} without an overcurrent device; ${names(context, feeders.map(equipmentRef))} can feed ${amount} into conductors that permit ${permitted} A.`,
    steps: [
      { symbol: "ΣIn", expression: "devices that feed the bus from elsewhere", substituted: names(context, feeders.map(equipmentRef)), result: Number.isFinite(feed.sumA) ? feed.sumA : "not limited", unit: Number.isFinite(feed.sumA) ? "A" : "" },
      ...(Number.isFinite(feed.sumA) ? [comparison("ΣIn", feed.sumA, permitted, "A", false)] : [{ symbol: "In", expression: "device that the conductors permit", substituted: nameOf(context, anchor), result: permitted, unit: "A" }]),
    ],
  });
}

export const sourceEndUnprotected: Rule = {
  meta: {
    id: "source-end-unprotected", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Every conductor must have overcurrent protection where it gets its supply; one with sources at both ends is judged at both.",
    risk: "A fault in the conductor is fed by everything on the bus and burns until the cable is gone.",
    citations: sections(["240.21, 690.9(A), 705.65, 706.21(A)", "read"], ["240.21, 690.9(A)(1)-(3), 705.30, 706.31(A)", "read"], ["240.21, 690.9(A)(1)-(3), 705.30, 706.31(A)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.from", "circuits.to", "circuits.sections.ungrounded", "equipment.props.ratingA", "equipment.props.shortCircuitA"], absorbs: ["dedicated-source-ocpd"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    if (context.drawing.circuits[id]?.system === "pv-dc") return stringOutcome(context, id);
    const landings = judged(context, id);
    return landings.length === 0 ? NOT_APPLICABLE : landings.map((landing) => landingOutcome(context, id, landing));
  },
  suggest: ({ anchor: { id }, variant }, context) => {
    if (variant !== "no-device-at-source-end") return [];
    const rating = fittingRatingA(context, id);
    return rating === null ? [] : compact(judged(context, id).slice(0, 1).map((landing) => breakerAtBus(context, id, landing.end, rating)));
  },
  examples: { violates: "A 250 kcmil cable from a dc bus fed by four 125 A packs to an inverter, with no breaker at the bus.", passes: "The same cable behind a 250 A dc breaker at the bus." },
};
