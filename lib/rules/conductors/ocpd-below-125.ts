import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { carriedBy, carriedName, type Carried } from "@/lib/rules/shared/currents";
import { generatorDevice } from "@/lib/rules/shared/devices";
import { circuitRef, equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { largestDevice, runEquipment, uniqueRefs } from "@/lib/rules/shared/protection";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";
import { smallConductorLimitA, standardRatingsA } from "@/lib/code";

/** Devices that carry the circuit's current. One between the circuit and a generator alone follows the set, not what else hangs here. */
function devicesOf(context: CheckContext, circuit: string): readonly string[] {
  const devices = [...new Set(topology(context.graph).protectors(circuit).map((one) => one.device))];
  return devices.filter((device) => !generatorDevice(context, device));
}
/** Margin of the article, or none where device and assembly are listed for 100 %. */
const neededA = (context: CheckContext, device: string, carried: Carried): number =>
  isTrue(context, device, "listedHundredPercent") ? carried.required.detail.maximumA : carried.required.detail.minimumOcpdA ?? 0;

export const ocpdBelow125: Rule = {
  meta: {
    id: "ocpd-below-125", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "The overcurrent device of a continuous source or load must be rated at least 125 % of its current, unless device and assembly are listed for 100 %.",
    risk: "The device runs hot for hours and opens without a fault; its terminals age.",
    citations: sections(["210.20(A), 215.3, 690.9(B), 705.60(B), 706.21(B)", "read"], ["210.20(A), 215.3, 690.9(B)(1), 705.30(B), 706.31(B)", "read"], ["210.20(A), 215.3, 690.9(B)(1), 705.30(B), 706.31(B)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.ratingA", "equipment.props.fuseA", "equipment.props.listedHundredPercent", "equipment.props.continuousA", "equipment.props.shortCircuitA", "equipment.props.currentA", "equipment.props.continuous", "circuits.load", "circuits.from", "circuits.to"],
    absorbs: [],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    const devices = devicesOf(context, id);
    if (devices.length === 0) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const carried = carriedBy(context, id, reader);
    if (!reader.complete) return reader.outcome();
    // Motors, air conditioning and generators size their devices by articles of their own.
    if (!carried || carried.required.detail.minimumOcpdA === null) return NOT_APPLICABLE;
    return devices.map((device) => {
      const anchor = equipmentRef(device);
      const ratingA = deviceRatingA(context, device);
      const field = `props.${topology(context.graph).ratingField(device) ?? "ratingA"}`;
      if (ratingA === null) return { outcome: "needs-data" as const, fields: [{ ref: anchor, field, label: propertyLabel(context, device, field.slice(6)) }] };
      const needed = neededA(context, device, carried);
      if (ratingA >= needed - 1e-9) return PASS;
      return found({
        variant: "below-125", anchor, field, related: uniqueRefs([circuitRef(id), ...carried.from.map(equipmentRef)], anchor),
        message: `${nameOf(context, anchor)} is ${ratingA} A; ${carriedName(context, carried.from) || `the load of ${nameOf(context, circuitRef(id))}`} asks for ${Math.round(needed * 100) / 100} A.`,
        steps: [...carried.required.steps, { symbol: "In", expression: "not below", substituted: `${ratingA} A ≥ ${Math.round(needed * 100) / 100} A`, result: "fails", unit: "" }],
      });
    });
  },
  suggest: ({ anchor }, context) => {
    const { ratingField, protectors } = topology(context.graph);
    const field = ratingField(anchor.id);
    if (field === null) return [];
    const guarded = powerCircuits(context.graph).filter((id) => protectors(id).some((one) => one.device === anchor.id));
    const needed = Math.max(...guarded.map((id) => { const carried = carriedBy(context, id, new Reader(context)); return carried ? neededA(context, anchor.id, carried) : 0; }));
    const most = Math.min(Infinity, ...guarded.flatMap((id) => {
      const terminal = terminalsOf(context, id, deviceRatingA(context, anchor.id)).lowest;
      const nameplates = runEquipment(context, id).map((one) => context.drawing.equipment[one]?.props.maximumOvercurrentA ?? context.graph.port(one, "ac")?.data.maximumOvercurrentA).filter((value): value is number => typeof value === "number");
      return [...nameplates, ...context.graph.sections(id).flatMap((section) => {
        const wire = wireOf(context, id, section, new Reader(context));
        return wire ? [largestDevice(context, id, wire, columnAmpacityA(wire, terminal)).value, smallConductorLimitA(wire.size, wire.material, context.edition) ?? Infinity] : [];
      })];
    }));
    const rating = standardRatingsA(context.edition, field === "fuseA").find((one) => one >= needed - 1e-9);
    if (rating === undefined || rating > most) return [];
    return [{ label: `Set ${nameOf(context, anchor)} to ${rating} A`, also: "Check the busbar, the equipment grounding conductor and the interrupting rating.", patches: [{ op: "add", path: `/equipment/${anchor.id}/props/${field}`, value: rating }] }];
  },
  examples: { violates: "An inverter of 33.3 A on a 40 A breaker: 41.7 A is needed.", passes: "The same inverter on 45 A." },
};
