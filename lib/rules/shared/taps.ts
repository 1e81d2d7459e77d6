import { equipmentOfNode, type End } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import { standardRatingsA } from "@/lib/code";
import type { CheckContext } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA, terminalsOf, wireOf } from "./conductors";
import { carriedBy } from "./currents";
import { Reader } from "./outcome";
import { largestDevice } from "./protection";
import { supplies, topology, type RunEnd } from "./topology";

/** What feeds a bus. `device` null: a source reaches it without one. `converter`: the source behind is a converter alone. */
export interface BusSupply { circuit: string; device: string | null; stop: RunEnd["stop"]; node: string; converter: boolean }

/** Everything that can feed a bus through one of the circuits landing on it, in id order. A bus fed from another bus is fed by what feeds that one. */
export function busSupplies(context: CheckContext, bus: string, not: readonly string[] = []): readonly BusSupply[] {
  const own = context.once(`supplies of bus ${bus}`, () => directSupplies(context, bus));
  return own.filter((one) => !not.includes(one.circuit)).flatMap((one) =>
    one.stop === "bus" ? busSupplies(context, equipmentOfNode(one.node), [...not, ...context.graph.circuitsAt(bus, "bus"), one.circuit]).map((beyond) => ({ ...beyond, circuit: one.circuit })) : [one]);
}
function directSupplies(context: CheckContext, bus: string): readonly BusSupply[] {
  const { graph } = context;
  const { runs, beyond } = topology(graph);
  return graph.circuitsAt(bus, "bus").flatMap((id): BusSupply[] => {
    const circuit = context.drawing.circuits[id] as Circuit;
    const away: End = circuit.from.equipment === bus ? "to" : "from";
    return runs(id, away).flatMap((run): BusSupply[] => {
      if (run.stop === "bus") return [{ circuit: id, device: null, stop: "bus", node: run.node, converter: false }];
      if (run.stop === "source" || run.stop === "converter") return [{ circuit: id, device: null, stop: run.stop, node: run.node, converter: run.stop === "converter" }];
      if (run.device === null || run.farNode === null) return [];
      const edge = graph.edgesAt(run.farNode).find((one) => one.id === run.device && one.by === "switch") ?? null;
      const side = beyond(run.farNode, edge);
      if (supplies(side) === 0) return [];
      return [{ circuit: id, device: run.device, stop: "device", node: run.node, converter: side.converters.length > 0 && side.utilities.length + side.generators.length + side.batteries.length === 0 }];
    });
  });
}

/** End of a circuit that lands on a bus without a device of its own, with what feeds that bus from elsewhere. */
export interface Landing { end: End; other: End; bus: string; feeds: readonly BusSupply[] }
export function landingsOf(context: CheckContext, id: string): readonly Landing[] {
  const { runs } = topology(context.graph);
  return (["from", "to"] as const).flatMap((end): Landing[] => {
    const [run, more] = runs(id, end);
    if (!run || more || run.stop !== "bus") return [];
    const bus = equipmentOfNode(run.node);
    const last = run.circuits.at(-1) ?? id;
    const feeds = busSupplies(context, bus, [last]);
    return feeds.length > 0 ? [{ end, other: end === "from" ? "to" : "from", bus, feeds }] : [];
  });
}

/** Sum of what can feed a bus, A, and the largest device; null while a rating is missing, which is asked for. Sources without a device count as unlimited, converters by their device. */
export function feedA(context: CheckContext, feeds: readonly BusSupply[], reader: Reader): { sumA: number; largestA: number; device: string | null } | null {
  let [sumA, largestA]: [number, number] = [0, 0];
  let device: string | null = null;
  const seen = new Set<string>();
  for (const feed of feeds) {
    if (feed.device === null) { if (!feed.converter) sumA = Infinity; continue; }
    if (seen.has(feed.device)) continue;
    seen.add(feed.device);
    const ratingA = deviceRatingA(context, feed.device);
    if (ratingA === null) { reader.number(feed.device, topology(context.graph).ratingField(feed.device) ?? "ratingA"); continue; }
    sumA += ratingA;
    if (ratingA > largestA) { largestA = ratingA; device = feed.device; }
  }
  return reader.complete ? { sumA, largestA, device } : null;
}

/** Largest device that the conductors of a circuit permit at their weaker terminals, A; null while a size is missing. */
export function permittedA(context: CheckContext, id: string, reader: Reader): number | null {
  const sections = context.graph.sections(id);
  const values = sections.map((section) => {
    const wire = wireOf(context, id, section, reader);
    return wire && largestDevice(context, id, wire, columnAmpacityA(wire, terminalsOf(context, id, null, 75).lowest)).value;
  });
  return values.length === 0 || values.some((value) => value === null) ? null : Math.min(...values.map((value) => value ?? 0));
}

/** Smallest standard rating that carries a circuit and that its conductors permit; the largest permitted where its current is not known. */
export function fittingRatingA(context: CheckContext, id: string): number | null {
  const permitted = permittedA(context, id, new Reader(context));
  if (permitted === null) return null;
  const needed = carriedBy(context, id, new Reader(context))?.required.detail.minimumOcpdA ?? null;
  const fitting = standardRatingsA(context.edition).filter((rating) => rating <= permitted + 1e-9 && rating >= (needed ?? 0) - 1e-9);
  return (needed === null ? fitting.at(-1) : fitting[0]) ?? null;
}
