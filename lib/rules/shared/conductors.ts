import { conductorAmpacity, type AmpacityDetail, type CalcResult, type RoutePart } from "@/lib/calc";
import { insulationRatingC, isInsulation, MATERIAL_BY_SYMBOL, tableAmpacityA, type Insulation, type Material } from "@/lib/code";
import { TERMINAL_60C_MAX_A } from "@/lib/code/tables/source-constants";
import { stretchesOf, type End } from "@/lib/diagram/graph";
import type { Circuit, Raceway, Section } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { compareSizes, isConductorSize, type ConductorSize } from "@/lib/units";
import { askLength, circuitsIn, racewayLengthFt } from "./raceways";
import { circuitRef, equipmentRef, nameOf, numberOf, racewayRef, Reader } from "./outcome";
import { topology } from "./topology";

export interface Wire { size: ConductorSize; material: Material; insulation: Insulation; sets: number }
export type SectionOf = Section & { id: string };
type Column = 60 | 75 | 90;

/** Ungrounded conductors of a section, or null; what is missing is asked for. */
export function wireOf(context: CheckContext, circuit: string, section: SectionOf, reader: Reader): Wire | null {
  const ref = circuitRef(circuit);
  const name = nameOf(context, ref);
  const { ungrounded } = section;
  const field = `sections.${section.id}.ungrounded`;
  if (!ungrounded || !isConductorSize(ungrounded.size)) {
    reader.ask(ref, ungrounded ? `${field}.size` : field, `size of the conductors of ${name}`);
    return null;
  }
  if (ungrounded.metal === null) reader.ask(ref, `${field}.metal`, `metal of the conductors of ${name}`);
  if (ungrounded.insulation === null || !isInsulation(ungrounded.insulation)) reader.ask(ref, `${field}.insulation`, `insulation of the conductors of ${name}`);
  if (ungrounded.metal === null || !isInsulation(ungrounded.insulation)) return null;
  return { size: ungrounded.size, material: MATERIAL_BY_SYMBOL[ungrounded.metal], insulation: ungrounded.insulation, sets: section.parallelSets };
}

/** Terminal temperatures of a circuit. */
export interface Terminals {
  lowest: Column;
  highest: Column;
  /** Ends without a marking in the drawing; they count as 60 °C to 100 A and 75 °C above. */
  unmarked: readonly { equipment: string; port: string }[];
  /** End whose terminal is the lowest. */
  lowestAt: string;
}
/** Reads the markings at both ends. Array leads and the utility's drop are no terminals of the circuit. */
export function terminalsOf(context: CheckContext, id: string, ratingA: number | null, assume: Column | null = null): Terminals {
  const circuit = context.drawing.circuits[id] as Circuit;
  const unmarked: { equipment: string; port: string }[] = [];
  const ends = (["from", "to"] as const).flatMap((end: End): { at: string; c: Column }[] => {
    const { equipment, port } = circuit[end];
    const { source } = context.graph.kind(equipment).capabilities;
    const { temperatureC: marked = null, noTemperatureMark } = context.graph.port(equipment, port)?.data.terminal ?? {};
    // What nobody marked has a rule of its own.
    if (marked === null && noTemperatureMark === true) return [];
    if (marked !== null) return [{ at: equipment, c: marked }];
    if (source === "pv" || source === "utility") return [];
    unmarked.push({ equipment, port });
    return [{ at: equipment, c: assume ?? (smallCircuit(circuit, ratingA) ? 60 : 75) }];
  });
  const columns = ends.map((end) => end.c);
  const lowest = columns.length > 0 ? (Math.min(...columns) as Column) : 90;
  return { lowest, highest: columns.length > 0 ? (Math.max(...columns) as Column) : 90, unmarked, lowestAt: ends.find((end) => end.c === lowest)?.at ?? "" };
}
/** 110.14(C)(1): to 100 A, or wires to 1 AWG where no device tells. */
function smallCircuit(circuit: Circuit, ratingA: number | null): boolean {
  if (ratingA !== null) return ratingA <= TERMINAL_60C_MAX_A;
  return Object.values(circuit.sections).some((section) => isConductorSize(section.ungrounded?.size) && compareSizes(section.ungrounded.size, "1 AWG") <= 0);
}
export function askTerminals(context: CheckContext, reader: Reader, terminals: Terminals): void {
  for (const { equipment, port } of terminals.unmarked) {
    reader.ask(equipmentRef(equipment), `ports.${port}.terminal.temperatureC`, `terminal temperature marking at ${nameOf(context, equipmentRef(equipment))}`);
  }
}

/** Ampacity of the table at a terminal column, all sets, A; the insulation never lets the column be higher than its own. */
export function columnAmpacityA(wire: Wire, column: Column): number {
  const rating = insulationRatingC(wire.insulation, false);
  const usable = Math.min(column, rating) as Column;
  return tableAmpacityA(wire.size, wire.material, usable === 60 || usable === 75 ? usable : 90) * wire.sets;
}

/** Ampacity with correction and adjustment along the route. Null where data are missing; they are asked for. */
export function correctedAmpacity(context: CheckContext, circuit: string, section: SectionOf, wire: Wire, terminalC: Column, reader: Reader, bundled = true): CalcResult<number, AmpacityDetail> | null {
  const parts = routeParts(context, circuit, section, reader, bundled);
  if (parts === null) return null;
  const wet = isWet(context, section) && wire.insulation !== "THHN";
  return conductorAmpacity({ edition: context.edition, size: wire.size, material: wire.material, insulation: wire.insulation, wet, terminalC, sets: wire.sets, parts });
}

const outdoors = (exposure: string | null | undefined): boolean => exposure === "outdoor" || exposure === "roof" || exposure === "underground";
function isWet(context: CheckContext, section: SectionOf): boolean {
  return section.route.some((step) => {
    const raceway = context.drawing.raceways[step.raceway];
    return raceway !== undefined && (outdoors(raceway.location.exposure) || Object.values(raceway.stretches).some((stretch) => outdoors(stretch.exposure)));
  });
}

function routeParts(context: CheckContext, circuit: string, section: SectionOf, reader: Reader, bundled: boolean): readonly RoutePart[] | null {
  const before = reader.missing.length;
  const parts = section.route.flatMap((step): RoutePart[] => {
    const raceway = context.drawing.raceways[step.raceway];
    if (!raceway || raceway.kind === "box") return [];
    const count = bundled ? Math.max(1, currentCarrying(context, step.raceway, step.compartment)) : 1;
    return racewayParts(context, step.raceway, raceway, count, reader);
  });
  if (parts.length === 0) parts.push(...openParts(context, circuit, section, reader));
  return reader.missing.length > before ? null : parts;
}

function racewayParts(context: CheckContext, id: string, raceway: Raceway, count: number, reader: Reader): RoutePart[] {
  const label = nameOf(context, racewayRef(id));
  const whole = racewayLengthFt(raceway);
  if (whole === null) askLength(reader, id, raceway);
  if (raceway.kind === "wireway" && raceway.metal === null) reader.ask(racewayRef(id), "metal", `metal or nonmetallic wireway ${label}`);
  const stretches = stretchesOf(raceway);
  const list = stretches.length > 0 ? stretches : [{ id: "", lengthFt: whole, ambientC: raceway.location.ambientC, exposure: raceway.location.exposure, aboveRoofIn: null }];
  return list.flatMap((stretch): RoutePart[] => {
    const ambientC = stretch.ambientC ?? raceway.location.ambientC ?? (outdoors(stretch.exposure ?? raceway.location.exposure) ? context.drawing.site.designHighC : null);
    if (ambientC === null) reader.ask(racewayRef(id), stretch.id === "" ? "location.ambientC" : `stretches.${stretch.id}.ambientC`, `ambient temperature of ${label}`);
    if (ambientC === null || whole === null) return [];
    // A short stretch of a long raceway is bundled like the rest; only the whole length makes a nipple.
    const kind = raceway.kind === "wireway" ? (raceway.metal === false ? "nonmetallic wireway" : "metal wireway") : whole * 12 > 24 && (stretch.lengthFt ?? whole) * 12 <= 24 ? "nonmetallic wireway" : "raceway";
    return [{ label, kind, lengthFt: stretch.lengthFt ?? whole, ambientC, currentCarryingCount: count, rooftopHeightIn: stretch.aboveRoofIn }];
  });
}

/** Cable or conductors in free air: the ambient stated for the section, or that of the places it joins. */
function openParts(context: CheckContext, id: string, section: SectionOf, reader: Reader): RoutePart[] {
  const circuit = context.drawing.circuits[id] as Circuit;
  const places = [circuit.from.equipment, circuit.to.equipment].map((equipment) => context.drawing.equipment[equipment]?.location);
  const known = places.flatMap((place) => place?.ambientC ?? (outdoors(place?.exposure) ? context.drawing.site.designHighC ?? [] : []));
  const ambientC = section.ambientC ?? (known.length > 0 ? Math.max(...known) : null);
  const name = nameOf(context, circuitRef(id));
  if (ambientC === null) reader.ask(circuitRef(id), `sections.${section.id}.ambientC`, `ambient temperature of ${name}`);
  if (section.lengthFt === null) reader.ask(circuitRef(id), `sections.${section.id}.lengthFt`, `length of ${name}`);
  if (ambientC === null || section.lengthFt === null) return [];
  return [{ label: `${name} in the open`, kind: section.cable ? "cable" : "open", lengthFt: section.lengthFt, ambientC, currentCarryingCount: Math.max(1, section.ungrounded?.count ?? 1) }];
}

/**
 * Current-carrying conductors at the fullest cross section of a raceway: power only, without equipment grounds and
 * neutrals of the unbalance, and of circuits that an interlock keeps apart only the larger.
 */
export function currentCarrying(context: CheckContext, raceway: string, compartment: string | null = null): number {
  const divided = Object.keys(context.drawing.raceways[raceway]?.compartments ?? {}).length > 1;
  const occupants = context.graph.occupants(raceway, divided ? compartment : undefined).filter((one) => one.system !== "data" && one.system !== "ground");
  const apart = new Map<string, Map<string, number>>();
  let total = 0;
  for (const circuit of circuitsIn(occupants)) {
    const own = occupants.filter((one) => one.circuit === circuit);
    const sum = (role: string): number => own.reduce((n, one) => n + (one.role === role ? (one.conductor?.count ?? 0) * one.parallelSets : 0), 0);
    const ungrounded = sum("ungrounded");
    // With one ungrounded conductor the neutral carries the whole current; with two of one phase only the unbalance.
    const count = ungrounded + (ungrounded === 1 || context.drawing.circuits[circuit]?.system !== "ac" ? sum("grounded") : 0);
    const lock = interlockOf(context, circuit);
    if (lock === null) { total += count; continue; }
    const bySwitch = apart.get(lock.interlock) ?? new Map<string, number>();
    apart.set(lock.interlock, bySwitch.set(lock.through, (bySwitch.get(lock.through) ?? 0) + count));
  }
  return total + [...apart.values()].reduce((sum, bySwitch) => sum + Math.max(...bySwitch.values()), 0);
}

/** Interlock through one of whose switches all current of a circuit passes, with that switch. */
function interlockOf(context: CheckContext, circuit: string): { interlock: string; through: string } | null {
  const { runs } = topology(context.graph);
  const reached = new Set((["from", "to"] as const).flatMap((end) => runs(circuit, end).flatMap((run) => [...run.equipment, ...(run.device ? [run.device] : [])])));
  for (const [interlock, { listed, kind, switches }] of Object.entries(context.drawing.interlocks).sort(([a], [b]) => (a < b ? -1 : 1))) {
    const through = listed === true && kind !== "electrical" ? Object.keys(switches).sort().find((id) => reached.has(id)) : undefined;
    if (through !== undefined) return { interlock, through };
  }
  return null;
}

/** Property rating of the device that protects a circuit, or null. */
export const deviceRatingA = (context: CheckContext, device: string): number | null => {
  const field = topology(context.graph).ratingField(device);
  return field === null ? null : numberOf(context, device, field);
};
