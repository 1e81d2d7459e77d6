import { largestOvercurrentDevice, shown, type CalcResult, type LargestDeviceDetail, type Step } from "@/lib/calc";
import { equipmentOfNode } from "@/lib/diagram/graph";
import type { ElementRef } from "@/lib/diagram/schema";
import type { CheckContext, PatchOperation, Suggestion } from "@/lib/rules/engine/types";
import { compareSizes, CONDUCTOR_SIZES, isConductorSize, type ConductorSize } from "@/lib/units";
import { standardRatingsA } from "@/lib/code";
import { columnAmpacityA, terminalsOf, wireOf, type SectionOf, type Terminals, type Wire } from "./conductors";
import { carriedBy } from "./currents";
import { circuitRef, equipmentRef, nameOf, numberOf, propertyLabel, Reader } from "./outcome";
import { powerCircuits, supplies, topology, type Side } from "./topology";

/** One device over one section of a circuit, with what the conductors permit at the terminal columns. */
export interface Guard {
  device: string;
  ratingA: number;
  section: SectionOf;
  wire: Wire;
  terminals: Terminals;
}

/** Every device that protects a circuit, against each of its sections. Missing ratings and sizes are asked for. */
export function guardsOf(context: CheckContext, circuit: string, reader: Reader): readonly Guard[] {
  const { protectors, ratingField } = topology(context.graph);
  const devices = [...new Set(protectors(circuit).map((one) => one.device))];
  return devices.flatMap((device): Guard[] => {
    const field = ratingField(device) ?? "ratingA";
    const ratingA = numberOf(context, device, field);
    if (ratingA === null) { reader.ask(equipmentRef(device), `props.${field}`, propertyLabel(context, device, field)); return []; }
    return context.graph.sections(circuit).flatMap((section): Guard[] => {
      const wire = wireOf(context, circuit, section, reader);
      return wire === null ? [] : [{ device, ratingA, section, wire, terminals: terminalsOf(context, circuit, ratingA) }];
    });
  });
}

/** Largest device over conductors of an ampacity, without the limit of small conductors, which is a rule of its own. */
export function largestDevice(context: CheckContext, circuit: string, wire: Wire, ampacityA: number): CalcResult<number, LargestDeviceDetail> {
  return largestOvercurrentDevice({
    edition: context.edition, ampacityA, size: wire.size, material: wire.material, smallConductorLimit: false,
    roundUp: !receptacleBranch(context, circuit), dwelling83: wholeDwelling(context, circuit) || asServiceConductors(context, circuit, ampacityA),
  });
}
const away = (context: CheckContext, circuit: string): Side | undefined => {
  const { side } = topology(context.graph);
  return [side(circuit, "from"), side(circuit, "to")].find((one) => supplies(one) === 0);
};
/** Branch circuit to receptacles for cord-connected loads: the device may not be rounded up. */
export function receptacleBranch(context: CheckContext, circuit: string): boolean {
  const side = away(context, circuit);
  return side !== undefined && side.buses.length === 0 && side.loads.some((id) => context.drawing.equipment[id]?.props.use === "receptacles");
}
/** Service or feeder of a one- or two-family dwelling with every load and every bus beyond it. */
export function wholeDwelling(context: CheckContext, circuit: string): boolean {
  if (context.drawing.site.occupancy !== "one- or two-family dwelling" || context.drawing.circuits[circuit]?.system !== "ac") return false;
  const { side } = topology(context.graph);
  const sides = [side(circuit, "from"), side(circuit, "to")];
  const utility = sides.find((one) => one.utilities.length > 0);
  const other = sides.find((one) => one !== utility && one.utilities.length === 0);
  return utility !== undefined && other !== undefined && utility.loads.length + utility.buses.length === 0 && other.loads.length + other.buses.length > 0;
}

/** Feeder of a dwelling whose conductors carry what its service conductors carry: they need not be larger, 310.12. */
function asServiceConductors(context: CheckContext, circuit: string, ampacityA: number): boolean {
  const serviceA = dwellingServiceA(context);
  return serviceA !== null && ampacityA >= serviceA - 1e-9 && dwellingFeeder(context, circuit);
}
/** Feeder toward loads or buses of a one- or two-family dwelling, whether it carries all of them or a part. */
export function dwellingFeeder(context: CheckContext, circuit: string): boolean {
  if (context.drawing.site.occupancy !== "one- or two-family dwelling" || context.drawing.circuits[circuit]?.system !== "ac") return false;
  const { side } = topology(context.graph);
  const sides = [side(circuit, "from"), side(circuit, "to")];
  const other = sides.find((one) => one.utilities.length === 0);
  return sides.some((one) => one.utilities.length > 0) && other !== undefined && other.buses.length > 0;
}
/** Ampacity of the conductors that carry the whole dwelling, A, the smallest; null where none are drawn or their size is not known. */
export function dwellingServiceA(context: CheckContext): number | null {
  return context.once("ampacity of the dwelling's service conductors", () => {
    if (context.drawing.site.occupancy !== "one- or two-family dwelling") return null;
    const values = powerCircuits(context.graph).filter((id) => wholeDwelling(context, id)).flatMap((id) => context.graph.sections(id).map((section) => {
      const wire = wireOf(context, id, section, new Reader(context));
      return wire && columnAmpacityA(wire, terminalsOf(context, id, null, 75).lowest);
    }));
    return values.length === 0 || values.some((value) => value === null) ? null : Math.min(...values.map((value) => value ?? 0));
  });
}

/** Sources, converters and loads at the ends of a circuit's run, for the list of elements. */
export function runEquipment(context: CheckContext, circuit: string): readonly string[] {
  const { runs } = topology(context.graph);
  return [...new Set((["from", "to"] as const).flatMap((end) => runs(circuit, end)).filter((run) => ["source", "converter", "load"].includes(run.stop)).map((run) => equipmentOfNode(run.node)))];
}
/** Comparison line that closes a worksheet. */
export function comparison(symbol: string, left: number, right: number, unit: string, holds: boolean, decimals = 2): Step {
  return { symbol, expression: "not above", substituted: `${shown(left, decimals)} ${unit} ≤ ${shown(right, decimals)} ${unit}`, result: holds ? "passes" : "fails", unit: "" };
}

/** Largest standard rating that the test permits and that still carries the circuit; the smallest that carries it where its current is known. */
export function smallerDevice(context: CheckContext, device: string, circuits: readonly string[], belowA: number, permits: (ratingA: number) => boolean, also: string): Suggestion | null {
  const field = topology(context.graph).ratingField(device);
  if (field === null) return null;
  const needed = circuits.map((circuit) => carriedBy(context, circuit, new Reader(context))?.required.detail.minimumOcpdA ?? null).filter((value): value is number => value !== null);
  const least = Math.max(0, ...needed);
  const fitting = standardRatingsA(context.edition, field === "fuseA").filter((rating) => rating < belowA && rating >= least - 1e-9 && permits(rating));
  const rating = needed.length > 0 ? fitting[0] : fitting.at(-1);
  if (rating === undefined) return null;
  return { label: `Set ${nameOf(context, equipmentRef(device))} to ${rating} A`, also, patches: [{ op: "add", path: `/equipment/${device}/props/${field}`, value: rating }] };
}

/** Next conductor size that a test permits, over every section of a circuit; the neutral grows with it where it has the same size. */
export function largerConductor(context: CheckContext, circuit: string, permits: (section: SectionOf, wire: Wire) => boolean, also: string): Suggestion | null {
  const patches: PatchOperation[] = [];
  let label = "";
  for (const section of context.graph.sections(circuit)) {
    const wire = wireOf(context, circuit, section, new Reader(context));
    if (!wire || permits(section, wire)) continue;
    const size = CONDUCTOR_SIZES.find((one) => compareSizes(one, wire.size) > 0 && buildingSize(one) && fitsTerminals(context, circuit, one) && permits(section, { ...wire, size: one }));
    if (size === undefined) return null;
    patches.push(...sizePatches(circuit, section, size));
    label = size;
  }
  return patches.length === 0 ? null : { label: `Enlarge ${nameOf(context, circuitRef(circuit))} to ${label}`, also, patches };
}
/** True where the marked wire ranges at both ends take a size; what is not marked is left to the reader. */
export function fitsTerminals(context: CheckContext, circuit: string, size: ConductorSize): boolean {
  const { from, to } = context.drawing.circuits[circuit] ?? {};
  return [from, to].every((end) => {
    const most = end && context.graph.port(end.equipment, end.port)?.data.terminal?.largest;
    return !isConductorSize(most) || compareSizes(size, most) <= 0;
  });
}
const buildingSize = (size: ConductorSize): boolean => !["18 AWG", "16 AWG"].includes(size);
function sizePatches(circuit: string, section: SectionOf, size: ConductorSize): PatchOperation[] {
  const base = `/circuits/${circuit}/sections/${section.id}`;
  const old = section.ungrounded?.size;
  // A measured diameter belongs to the old wire.
  const one = (role: "ungrounded" | "grounded"): PatchOperation[] => [
    { op: "replace", path: `${base}/${role}/size`, value: size },
    ...(section[role]?.outerDiameterIn != null && section[role]?.strands !== "class K" && section[role]?.insulation !== "PV wire" ? [{ op: "replace" as const, path: `${base}/${role}/outerDiameterIn`, value: null }] : []),
  ];
  return [...one("ungrounded"), ...(section.grounded && isConductorSize(section.grounded.size) && section.grounded.size === old ? one("grounded") : [])];
}
export const withinColumn = (context: CheckContext, circuit: string, guard: Guard, column: 60 | 75 | 90): boolean =>
  guard.ratingA <= largestDevice(context, circuit, guard.wire, columnAmpacityA(guard.wire, column)).value + 1e-9;
export const compact = <T>(list: readonly (T | null)[]): readonly T[] => list.filter((one): one is T => one !== null);
export const uniqueRefs = (refs: readonly ElementRef[], not: ElementRef): readonly ElementRef[] => {
  const seen = new Set([`${not.collection}/${not.id}`]);
  return refs.filter((ref) => { const key = `${ref.collection}/${ref.id}`; if (seen.has(key)) return false; seen.add(key); return true; });
};
