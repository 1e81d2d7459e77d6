import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { correctedAmpacity, deviceRatingA, terminalsOf } from "@/lib/rules/shared/conductors";
import { deratingOf } from "@/lib/rules/shared/derating";
import { carriedBy } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, racewayRef, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, largerConductor, largestDevice, smallerDevice } from "@/lib/rules/shared/protection";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

export const deratedAmpacity: Rule = {
  meta: {
    id: "derated-ampacity", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "After correction for temperature and adjustment for the number of conductors, a conductor must carry its current and stay protected by its device.",
    risk: "In a hot or crowded raceway the insulation ages fast and fails long before the device opens.",
    citations: sections(["310.15(A)(2), 310.15(B)", "read"], ["310.14(A)(2), 310.15(B), (C)", "read"], ["310.14(A)(2), 310.15(B), (C)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.ungrounded", "circuits.sections.route", "circuits.sections.ambientC", "raceways.stretches", "raceways.kind", "raceways.location.ambientC", "interlocks", "equipment.props.ratingA"],
    absorbs: ["bundling-count"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    const { outcome, shortfalls, judged } = deratingOf(context, id);
    const worst = shortfalls.toSorted((a, b) => a.ampacity.value - b.ampacity.value)[0];
    if (!worst) return outcome ?? (judged ? PASS : NOT_APPLICABLE);
    const anchor = circuitRef(id);
    const { against, ampacity, wire, section } = worst;
    const part = ampacity.detail.parts[ampacity.detail.governingPart];
    const limit = against.kind === "load" ? against.carried.required.detail.maximumA : against.ratingA;
    const raceways = section.route.map((step) => step.raceway);
    return found({
      variant: against.kind === "load" ? "below-load" : "device-above-corrected", anchor, field: `sections.${section.id}.ungrounded.size`,
      related: [...raceways.map(racewayRef), ...(against.kind === "load" ? against.carried.from : [against.device]).map(equipmentRef)],
      message: `${nameOf(context, anchor)} in ${part?.label ?? "its route"}: ${wire.size} ${wire.material} carries ${Math.round(ampacity.value * 10) / 10} A at ${part?.ambientC ?? 30} °C; ${against.kind === "load" ? `its current is ${Math.round(limit * 10) / 10} A` : `${nameOf(context, equipmentRef(against.device))} is ${limit} A`}.`,
      steps: [...ampacity.steps, ...(against.kind === "load" ? [comparison("Imax", limit, ampacity.value, "A", false)] : [...largestDevice(context, id, wire, ampacity.value).steps, comparison("In", limit, largestDevice(context, id, wire, ampacity.value).value, "A", false)])],
    });
  },
  suggest: (finding, context) => {
    const { id } = finding.anchor;
    const devices = [...new Set(topology(context.graph).protectors(id).map((one) => one.device))];
    const ratings = devices.flatMap((device) => deviceRatingA(context, device) ?? []);
    const carried = carriedBy(context, id, new Reader(context))?.required.detail.maximumA ?? 0;
    const column = terminalsOf(context, id, ratings.length > 0 ? Math.max(...ratings) : null).lowest;
    const enlarge = largerConductor(context, id, (section, wire) => {
      const ampacity = correctedAmpacity(context, id, section, wire, column, new Reader(context));
      return ampacity !== null && ampacity.value >= carried && ratings.every((rating) => rating <= largestDevice(context, id, wire, ampacity.value).value);
    }, "Check the raceway fill and the terminals.");
    const device = finding.variant === "device-above-corrected" ? finding.related.find((ref) => devices.includes(ref.id)) : undefined;
    const shortfall = deratingOf(context, id).shortfalls.filter((one) => one.against.kind === "device").toSorted((a, b) => a.ampacity.value - b.ampacity.value)[0];
    const smaller = device && shortfall && devices.length === 1
      ? smallerDevice(context, device.id, [id], deviceRatingA(context, device.id) ?? 0, (rating) => rating <= largestDevice(context, id, shortfall.wire, shortfall.ampacity.value).value, "Check that it still carries the load.")
      : null;
    return compact([enlarge, smaller]);
  },
  examples: { violates: "6 AWG copper, 90 °C, among 12 current-carrying conductors at 45 °C: 75 A × 0.87 × 0.5 = 32.6 A on a 50 A circuit.", passes: "Two raceways with six conductors each: 75 A × 0.87 × 0.8 = 52.2 A." },
};
