import { stretchesOf, type DrawingGraph, type Occupant } from "@/lib/diagram/graph";
import type { Raceway } from "@/lib/diagram/schema";
import type { FillItem } from "@/lib/calc";
import { NIPPLE_MAX_LENGTH_IN } from "@/lib/code/tables/raceway-fill";
import { isInsulation } from "@/lib/code";
import { isConductorSize } from "@/lib/units";
import { circuitRef, nameOf, racewayRef, Reader } from "./outcome";
import type { CheckContext } from "@/lib/rules/engine/types";

/** Whole length of a raceway in ft: its stretches, or the inside length of a wireway. Null while a length is missing. */
export function racewayLengthFt(raceway: Raceway): number | null {
  const stretches = stretchesOf(raceway);
  if (stretches.length === 0) return raceway.kind === "wireway" && raceway.depthIn !== null ? raceway.depthIn / 12 : null;
  return stretches.reduce<number | null>((sum, stretch) => (sum === null || stretch.lengthFt === null ? null : sum + stretch.lengthFt), 0);
}
/** A conduit or tubing of 24 in or less; nothing but its length makes it one. */
export function isNipple(raceway: Raceway): boolean | null {
  if (raceway.kind !== "conduit" && raceway.kind !== "nipple") return false;
  const lengthFt = racewayLengthFt(raceway);
  return lengthFt === null ? null : lengthFt * 12 <= NIPPLE_MAX_LENGTH_IN + 1e-9;
}
/** Asks for the lengths of a raceway that are missing. */
export function askLength(reader: Reader, id: string, raceway: Raceway): void {
  const stretches = stretchesOf(raceway);
  if (stretches.length === 0) reader.ask(racewayRef(id), "stretches", "length");
  for (const stretch of stretches) if (stretch.lengthFt === null) reader.ask(racewayRef(id), `stretches.${stretch.id}.lengthFt`, "length");
}
/** A raceway open at one end that protects cables only: no limit of fill holds there. */
export function isSleeve(graph: DrawingGraph, id: string): boolean {
  const raceway = graph.drawing.raceways[id];
  return raceway !== undefined && (raceway.from === null || raceway.to === null) && graph.occupants(id).every((one) => one.role === "cable");
}

const FIELDS = { "ungrounded": "ungrounded", "grounded": "grounded", "equipment ground": "equipmentGround", "cable": "cable" } as const;

/** What lies in a raceway as items of the fill calculation; sizes that are missing are asked for. */
export function fillItemsOf(context: CheckContext, id: string, reader: Reader): readonly FillItem[] {
  return context.graph.occupants(id).flatMap((one): FillItem[] => {
    const ref = circuitRef(one.circuit);
    const field = `sections.${one.section}.${FIELDS[one.role]}`;
    const label = `${nameOf(context, ref)} ${one.role === "cable" ? one.cable?.type ?? "cable" : one.role}`;
    if (one.cable) {
      if (one.cable.outerDiameterIn === null) { reader.ask(ref, `${field}.outerDiameterIn`, `outside diameter of the cable of ${nameOf(context, ref)}`); return []; }
      return [{ label, count: one.cable.count, outsideDiameterIn: one.cable.outerDiameterIn }];
    }
    const { conductor } = one;
    if (!conductor) return [];
    const count = conductor.count * one.parallelSets;
    if (conductor.outerDiameterIn !== null) return [{ label, count, outsideDiameterIn: conductor.outerDiameterIn }];
    if (!isConductorSize(conductor.size)) { reader.ask(ref, `${field}.size`, `size of the ${one.role} conductors of ${nameOf(context, ref)}`); return []; }
    if (conductor.insulation === "bare") return [{ label, count, size: conductor.size, bare: true }];
    if (conductor.insulation === null) { reader.ask(ref, `${field}.insulation`, `insulation of the ${one.role} conductors of ${nameOf(context, ref)}`); return []; }
    // The tables of dimensions hold neither PV wire nor fine-stranded wire: there the diameter of the product decides.
    if (conductor.insulation === "PV wire" || conductor.strands === "class K" || !isInsulation(conductor.insulation)) {
      reader.ask(ref, `${field}.outerDiameterIn`, `outside diameter of the ${one.role} conductors of ${nameOf(context, ref)}`);
      return [];
    }
    return [{ label, count, size: conductor.size, insulation: conductor.insulation }];
  });
}

/** Circuits lying in a raceway, each once, in id order. */
export function circuitsIn(occupants: readonly Occupant[]): readonly string[] {
  return [...new Set(occupants.map((one) => one.circuit))].sort();
}

/** Lengthens a finding over the path on which the same circuits meet others: raceways in which they do, joined by a common circuit. */
export function sharedPaths(graph: DrawingGraph, mixed: ReadonlyMap<string, readonly string[]>): readonly { anchor: string; raceways: readonly string[]; circuits: readonly string[] }[] {
  const paths: { raceways: Set<string>; circuits: Set<string> }[] = [];
  for (const [raceway, circuits] of mixed) {
    const path = { raceways: new Set([raceway]), circuits: new Set(circuits) };
    for (let i = paths.length - 1; i >= 0; i -= 1) {
      const other = paths[i];
      if (!other || ![...other.circuits].some((id) => path.circuits.has(id))) continue;
      for (const id of other.raceways) path.raceways.add(id);
      for (const id of other.circuits) path.circuits.add(id);
      paths.splice(i, 1);
    }
    paths.push(path);
  }
  return paths.map((path) => {
    const circuits = [...path.circuits].sort();
    // The first raceway of the path as the longest run meets it: the place where the circuit leaves its own way.
    const steps = circuits.flatMap((id) => graph.racewaysOf(id).map((step) => step.raceway)).filter((id) => path.raceways.has(id));
    return { anchor: steps[0] ?? [...path.raceways].sort()[0] ?? "", raceways: [...path.raceways].sort(), circuits };
  });
}
