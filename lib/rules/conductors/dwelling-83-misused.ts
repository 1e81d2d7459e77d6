import { largestOvercurrentDevice } from "@/lib/calc";
import { DWELLING_SERVICE_FACTOR, DWELLING_SERVICE_MAX_A, DWELLING_SERVICE_MIN_A } from "@/lib/code/tables/dwelling-service";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, dwellingFeeder, dwellingServiceA, guardsOf, largerConductor, largestDevice, smallerDevice, wholeDwelling, type Guard } from "@/lib/rules/shared/protection";
import { powerCircuits } from "@/lib/rules/shared/topology";

const ampacityA = (guard: Guard): number => columnAmpacityA(guard.wire, guard.terminals.highest);
/** True where only the 83 % would permit the device. */
function misused(context: CheckContext, id: string, guard: Guard): boolean {
  const amperes = ampacityA(guard);
  if (guard.ratingA < DWELLING_SERVICE_MIN_A || guard.ratingA > DWELLING_SERVICE_MAX_A || guard.ratingA * DWELLING_SERVICE_FACTOR > amperes + 1e-9) return false;
  return guard.ratingA > largestDevice(context, id, guard.wire, amperes).value + 1e-9;
}

export const dwelling83Misused: Rule = {
  meta: {
    id: "dwelling-83-misused", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "The 83 % sizing serves only the service or a feeder of 100 to 400 A that carries the whole load of one dwelling; a feeder to a part of it is sized by its own rating, though never above the service conductors.",
    risk: "A part of the house can load its feeder fully where the whole house never would.",
    citations: sections(["310.15(B)(7)", "read"], ["310.12(A)-(C)", "read"], ["310.12(A)-(C), 240.4(H)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["site.occupancy", "equipment.props.ratingA", "circuits.sections.ungrounded", "circuits.from", "circuits.to"], absorbs: ["ocpd-above-conductor"],
  },
  subjects: (context) => powerCircuits(context.graph).filter((id) => dwellingFeeder(context, id) && !wholeDwelling(context, id)).map(circuitRef),
  evaluate: ({ id }, context): Outcome => {
    const reader = new Reader(context);
    const guards = guardsOf(context, id, reader);
    if (!reader.complete) return reader.outcome();
    if (guards.length === 0) return NOT_APPLICABLE;
    const worst = guards.filter((guard) => misused(context, id, guard)).toSorted((a, b) => b.ratingA - a.ratingA)[0];
    if (!worst) return PASS;
    const anchor = equipmentRef(worst.device);
    const amperes = ampacityA(worst);
    const serviceA = dwellingServiceA(context);
    const plain = largestOvercurrentDevice({ edition: context.edition, ampacityA: amperes, size: worst.wire.size, material: worst.wire.material, smallConductorLimit: false });
    return found({
      variant: "part-of-the-load", anchor, field: "props.ratingA", related: [circuitRef(id)],
      message: `${nameOf(context, anchor)} is ${worst.ratingA} A on ${worst.wire.size} ${worst.wire.material} of ${nameOf(context, circuitRef(id))}, ${amperes} A: 83 % may not be used for a feeder to a part of the dwelling's load.`,
      steps: [...plain.steps, ...(serviceA === null ? [] : [{ symbol: "As", expression: "ampacity of the service conductors", substituted: "", result: serviceA, unit: "A" }]), comparison("In", worst.ratingA, plain.value, "A", false)],
    });
  },
  suggest: ({ anchor, related }, context) => {
    const id = related[0]?.id ?? "";
    const guards = guardsOf(context, id, new Reader(context));
    const guard = guards.find((one) => one.device === anchor.id);
    if (!guard) return [];
    const most = largestDevice(context, id, guard.wire, ampacityA(guard)).value;
    return compact([
      largerConductor(context, id, (_, wire) => guard.ratingA <= largestDevice(context, id, wire, columnAmpacityA(wire, guard.terminals.lowest)).value + 1e-9, "Check the raceway fill and the terminals."),
      smallerDevice(context, anchor.id, [id], deviceRatingA(context, anchor.id) ?? 0, (rating) => rating <= most, "Check that it still carries the load."),
    ]);
  },
  examples: { violates: "A 400 A service and a 200 A feeder to the backed-up half of the house on 2/0 AWG copper, 175 A.", passes: "3/0 AWG copper, 200 A; or the 200 A service itself on 2/0 AWG." },
};
