import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, PatchOperation, Rule } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, racewayRef, Reader } from "@/lib/rules/shared/outcome";
import { comparison, uniqueRefs } from "@/lib/rules/shared/protection";
import { circuitsIn } from "@/lib/rules/shared/raceways";
import { powerCircuits } from "@/lib/rules/shared/topology";
import { largestVoltageV } from "@/lib/rules/shared/voltage";

const ROLES = ["ungrounded", "grounded"] as const;
/** Largest voltage of each power circuit, worked out once for all raceways. */
const voltages = (context: CheckContext): ReadonlyMap<string, { volts: number | null; missing: Reader["missing"] }> => context.once("largest voltage of power circuits", () =>
  new Map(powerCircuits(context.graph).map((id) => { const reader = new Reader(context); return [id, { volts: largestVoltageV(context, id, reader), missing: reader.missing }]; })));
/** Highest voltage in each raceway, and the circuit that has it. */
const highest = (context: CheckContext): ReadonlyMap<string, { volts: number; circuit: string }> => context.once("highest voltage in raceways", () => {
  const map = new Map<string, { volts: number; circuit: string }>();
  for (const [id, { volts }] of voltages(context)) {
    if (volts === null) continue;
    for (const section of Object.values(context.drawing.circuits[id]?.sections ?? {})) for (const { raceway } of section.route) if (volts > (map.get(raceway)?.volts ?? 0)) map.set(raceway, { volts, circuit: id });
  }
  return map;
});

/** Lowest rating among the conductors of a circuit; missing ones are asked for. */
function lowestRatingV(context: CheckContext, id: string, reader: Reader): number | null {
  const values: number[] = [];
  for (const section of context.graph.sections(id)) for (const role of ROLES) {
    const conductor = section[role];
    if (!conductor || conductor.count === 0 || conductor.insulation === "bare") continue;
    if (conductor.voltageRatingV === null) reader.ask(circuitRef(id), `sections.${section.id}.${role}.voltageRatingV`, `voltage rating of the ${role} conductors of ${nameOf(context, circuitRef(id))}`);
    else values.push(conductor.voltageRatingV);
  }
  return values.length > 0 ? Math.min(...values) : null;
}
/** Lowest rating in the drawing: below this voltage nobody lacks anything. */
const leastRatingV = (context: CheckContext): number => context.once("lowest voltage rating of conductors", () => Math.min(Infinity, ...[...voltages(context).keys()].map((id) => lowestRatingV(context, id, new Reader(context)) ?? Infinity)));

export const insulationVoltageClass: Rule = {
  meta: {
    id: "insulation-voltage-class", group: "Conductors and overcurrent", severity: "must-fix", evidence: "rated",
    statement: "Insulation must be rated for the largest voltage of its circuit and of every other circuit in the same raceway.",
    risk: "The insulation breaks down in the cold, when the strings stand highest.",
    citations: sameSection("300.3(C)(1), 310"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.ungrounded.voltageRatingV", "circuits.sections.grounded.voltageRatingV", "circuits.sections.route", "equipment.props.openCircuitV", "equipment.props.mostV", "equipment.props.systemVoltage", "site.recordLowC", "site.serviceSystem"], absorbs: [],
  },
  subjects: (context) => powerCircuits(context.graph).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const { id } = anchor;
    const own = voltages(context).get(id);
    if (context.graph.sections(id).every((section) => !section.ungrounded)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    for (const one of own?.missing ?? []) reader.ask(one.ref, one.field, one.label);
    if (own?.volts == null) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    const { volts } = own;
    const ratedV = lowestRatingV(context, id, reader);
    const short = ratedV !== null && ratedV < volts - 1e-9 ? [{ id, ratedV }] : [];
    // Each circuit speaks for itself; what its neighbors lack because of it is said once, by the one with the highest voltage.
    const raceways = volts <= leastRatingV(context) ? [] : [...new Set(context.graph.racewaysOf(id).map((step) => step.raceway))].filter((raceway) => highest(context).get(raceway)?.circuit === id);
    const neighbors = [...new Set(raceways.flatMap((raceway) => circuitsIn(context.graph.occupants(raceway))))].filter((one) => one !== id && voltages(context).has(one)).sort();
    for (const one of neighbors) {
      const lowest = lowestRatingV(context, one, new Reader(context));
      if (lowest !== null && lowest < volts - 1e-9 && lowest >= (voltages(context).get(one)?.volts ?? 0) - 1e-9) short.push({ id: one, ratedV: lowest });
    }
    if (short.length === 0) return reader.complete ? PASS : reader.outcome();
    const worst = Math.min(...short.map((one) => one.ratedV));
    return found({
      variant: "below-voltage", anchor, field: "sections.ungrounded.voltageRatingV", related: uniqueRefs([...short.map((one) => circuitRef(one.id)), ...(short.some((one) => one.id !== id) ? raceways.map(racewayRef) : [])], anchor),
      message: `${nameOf(context, anchor)} reaches ${Math.round(volts)} V; ${names(context, short.map((one) => circuitRef(one.id)))} ${short.length === 1 ? "has" : "have"} ${worst} V insulation${short.some((one) => one.id !== id) ? " in the same raceway" : ""}.`,
      steps: short.map((one) => comparison(`U, ${nameOf(context, circuitRef(one.id))}`, volts, one.ratedV, "V", false)),
    });
  },
  suggest: ({ anchor, related }, context) => {
    const circuits = [anchor.id, ...related.filter((ref) => ref.collection === "circuits").map((ref) => ref.id)];
    const rating = [600, 1000, 2000].find((one) => one >= (voltages(context).get(anchor.id)?.volts ?? Infinity));
    if (rating === undefined) return [];
    const patches = circuits.flatMap((id) => context.graph.sections(id).flatMap((section) => ROLES.flatMap((role): PatchOperation[] => {
      const conductor = section[role];
      return conductor && conductor.insulation !== "bare" && conductor.voltageRatingV !== null && conductor.voltageRatingV < rating ? [{ op: "replace", path: `/circuits/${id}/sections/${section.id}/${role}/voltageRatingV`, value: rating }] : [];
    })));
    const changed = circuits.filter((id) => patches.some((patch) => patch.path.startsWith(`/circuits/${id}/`)));
    return patches.length === 0 ? [] : [{ label: `Pull ${names(context, changed.map(circuitRef))} in ${rating} V insulation`, also: "Enter the outside diameter and check the raceway fill.", patches }];
  },
  examples: { violates: "600 V THWN-2 in a string that reaches 787 V.", passes: "PV wire of 1000 V or 2000 V in the same string." },
};
