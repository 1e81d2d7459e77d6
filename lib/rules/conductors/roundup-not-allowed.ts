import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { largestOvercurrentDevice } from "@/lib/calc";
import { correctedAmpacity, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, guardsOf, largerConductor, receptacleBranch, smallerDevice } from "@/lib/rules/shared/protection";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

/** Weakest section of a receptacle circuit after factors. */
function weakest(context: CheckContext, id: string, reader: Reader) {
  const guards = guardsOf(context, id, reader);
  const sectionsOf = context.graph.sections(id).map((section) => {
    const wire = wireOf(context, id, section, reader);
    const ratingA = guards.length > 0 ? Math.max(...guards.map((one) => one.ratingA)) : null;
    const ampacity = wire && correctedAmpacity(context, id, section, wire, terminalsOf(context, id, ratingA, 75).lowest, reader);
    return wire && ampacity ? { wire, section, ampacity } : null;
  });
  const known = sectionsOf.filter((one): one is NonNullable<typeof one> => one !== null).toSorted((a, b) => a.ampacity.value - b.ampacity.value);
  const worst = guards.toSorted((a, b) => b.ratingA - a.ratingA)[0];
  return known[0] && worst ? { ...known[0], device: worst.device, ratingA: worst.ratingA } : null;
}

export const roundupNotAllowed: Rule = {
  meta: {
    id: "roundup-not-allowed", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "On branch circuits to receptacles for portable loads the device may not be rounded up above the ampacity after correction and adjustment; feeder taps and transformer secondaries have the same bar.",
    risk: "Nobody limits what is plugged in: the conductors carry the whole rating of the device for hours.",
    citations: sections(["240.4(B)(1)", "read"], ["240.4(B)(1)", "read"], ["240.4(B)(1)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.use", "equipment.props.ratingA", "circuits.sections.ungrounded", "circuits.sections.route", "raceways.stretches", "circuits.from", "circuits.to"], absorbs: ["derated-ampacity", "ocpd-above-conductor"],
  },
  subjects: (context) => powerCircuits(context.graph).filter((id) => receptacleBranch(context, id)).map(circuitRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const reader = new Reader(context);
    const worst = weakest(context, id, reader);
    if (!reader.complete) return reader.outcome();
    if (!worst) return NOT_APPLICABLE;
    const { ampacity, wire, ratingA, device } = worst;
    if (ratingA <= ampacity.value + 1e-9) return PASS;
    const rounded = largestOvercurrentDevice({ edition: context.edition, ampacityA: ampacity.value, size: wire.size, material: wire.material, smallConductorLimit: false });
    // A device that no rounding would permit is the rule of device and conductor.
    if (ratingA > rounded.value + 1e-9) return NOT_APPLICABLE;
    return found({
      variant: "rounded-up", anchor, field: `sections.${worst.section.id}.ungrounded.size`, related: [equipmentRef(device)],
      message: `${nameOf(context, anchor)} feeds receptacles: ${wire.size} ${wire.material} carries ${Math.round(ampacity.value * 10) / 10} A after factors, and ${nameOf(context, equipmentRef(device))} of ${ratingA} A may not be rounded up to.`,
      steps: [...ampacity.steps, comparison("In", ratingA, ampacity.value, "A", false)],
    });
  },
  suggest: ({ anchor: { id }, related }, context) => {
    const device = related[0]?.id ?? "";
    const ratingA = deviceRatingA(context, device) ?? 0;
    const column = terminalsOf(context, id, ratingA, 75).lowest;
    const worst = weakest(context, id, new Reader(context));
    return compact([
      largerConductor(context, id, (section, wire) => (correctedAmpacity(context, id, section, wire, column, new Reader(context))?.value ?? 0) >= ratingA, "Check the raceway fill and the terminals."),
      worst && topology(context.graph).protectors(id).length === 1 ? smallerDevice(context, device, [id], ratingA, (rating) => rating <= worst.ampacity.value, "Check that it still carries the load.") : null,
    ]);
  },
  examples: { violates: "12 AWG among seven conductors at 40 °C, 30 A × 0.91 × 0.7 = 19.1 A, on a 20 A receptacle circuit.", passes: "10 AWG in the same place, 25.5 A." },
};
