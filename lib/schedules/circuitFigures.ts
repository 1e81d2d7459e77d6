import { requiredAmpacity, voltageDrop } from "@/lib/calc";
import type { ConduitMaterial } from "@/lib/code";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { columnAmpacityA, correctedAmpacity, deviceRatingA, terminalsOf, wireOf, type SectionOf } from "@/lib/rules/shared/conductors";
import { carriedBy, loadA } from "@/lib/rules/shared/currents";
import { numberOf, Reader, textOf } from "@/lib/rules/shared/outcome";
import { motorCircuit, topology, type Side } from "@/lib/rules/shared/topology";
import { checkContext } from "@/lib/rules/engine/context";
import { attempt, perGraph } from "./context";

/** Figures of a whole circuit. Null is not known, or has no meaning for it. */
export interface CircuitFigures {
  /** Current it carries, A, and the ampacity asked for before correction and adjustment (usually 125 %), A. */
  loadA: number | null;
  requiredA: number | null;
  /** Smallest device that protects it, A. */
  deviceA: number | null;
  /** Temperature of its lowest terminal, °C; an end without a marking counts as 60 up to 100 A and as 75 above. */
  terminalC: 60 | 75 | 90;
  dropPct: number | null;
}
/** Figures of one section, A: at the terminal column, after correction and adjustment, and what may be used. */
export interface SectionFigures { terminalA: number | null; correctedA: number | null; usableA: number | null }

const sidesOf = (graph: DrawingGraph, id: string): readonly [Side, Side] => {
  const { side } = topology(graph);
  return [side(id, "from"), side(id, "to")];
};

/** Load current and ampacity asked for. A circuit of motors alone follows the largest motor. */
function required(context: CheckContext, id: string): { loadA: number; requiredA: number } | null {
  if (motorCircuit(context.graph, id)) {
    const loads = sidesOf(context.graph, id).find((side) => side.utilities.length + side.generators.length + side.converters.length === 0)?.loads ?? [];
    const currents = loads.map((load) => loadA(context, load)).filter((value): value is number => value !== null).sort((a, b) => b - a);
    const [largestA] = currents;
    if (largestA === undefined || currents.length < loads.length) return null;
    const { detail } = requiredAmpacity({ edition: context.edition, use: { kind: "motor", largestA, otherMotorsA: currents.slice(1).reduce((a, b) => a + b, 0) } });
    return { loadA: currents.reduce((a, b) => a + b, 0), requiredA: detail.beforeFactorsA };
  }
  const detail = carriedBy(context, id, new Reader(context))?.required.detail;
  return detail ? { loadA: detail.maximumA, requiredA: detail.beforeFactorsA } : null;
}

/** Voltage between the conductors, V, from the source that the drawing shows. */
function voltageOf(context: CheckContext, id: string, circuit: Circuit, sides: readonly [Side, Side]): number | null {
  const all = (pick: (side: Side) => readonly string[]): string[] => sides.flatMap(pick);
  if (circuit.system === "pv-dc") {
    const [string] = sides.find((side) => side.converters.length === 0)?.strings ?? [];
    const modules = string ? numberOf(context, string, "modules") : null;
    const each = string ? numberOf(context, string, "maximumPowerV") : null;
    return modules === null || each === null ? null : modules * each;
  }
  if (circuit.system === "battery-dc") return all((side) => side.batteries).map((one) => numberOf(context, one, "nominalV")).find((value) => value !== null) ?? null;
  const [utility] = all((side) => side.utilities);
  const named = utility ? /^(?:(\d+)\/)?(\d+) V/.exec(textOf(context, utility, "systemVoltage") ?? "") : null;
  const source = [...all((side) => side.generators), ...all((side) => side.converters)].map((one) => numberOf(context, one, "outputV")).find((value) => value !== null) ?? null;
  const lineV = named ? Number(named[2]) : source;
  const toNeutral = context.graph.sections(id).some((section) => section.ungrounded?.count === 1 && (section.grounded?.count ?? 0) > 0);
  if (!toNeutral || lineV === null) return lineV;
  return named?.[1] ? Number(named[1]) : lineV / 2;
}

/** Current at which the drop is worked out, A: of a string at maximum power, otherwise the load. */
function dropCurrentA(context: CheckContext, circuit: Circuit, sides: readonly [Side, Side], carriedA: number | null): number | null {
  if (circuit.system !== "pv-dc") return carriedA;
  const strings = sides.find((side) => side.converters.length === 0)?.strings ?? [];
  const currents = strings.map((one) => numberOf(context, one, "maximumPowerA"));
  return currents.length === 0 || currents.includes(null) ? null : currents.reduce<number>((sum, each) => sum + (each ?? 0), 0);
}

/** Steel raises the impedance of an ac circuit; without a raceway, in plastic and unknown it is taken as plastic. */
function conduitOf(context: CheckContext, section: SectionOf): ConduitMaterial {
  const types = section.route.map((step) => context.drawing.raceways[step.raceway]?.type);
  return types.some((type) => type === "EMT" || type === "IMC" || type === "RMC") ? "steel" : "pvc";
}

function dropPct(context: CheckContext, id: string, circuit: Circuit, carriedA: number | null): number | null {
  const sides = sidesOf(context.graph, id);
  const voltageV = voltageOf(context, id, circuit, sides);
  const currentA = dropCurrentA(context, circuit, sides, carriedA);
  if (voltageV === null || voltageV <= 0 || currentA === null) return null;
  let sum = 0;
  for (const section of context.graph.sections(id)) {
    const wire = wireOf(context, id, section, new Reader(context));
    if (!wire || section.lengthFt === null) return null;
    const threePhase = circuit.system === "ac" && (section.ungrounded?.count ?? 0) >= 3;
    sum += voltageDrop({
      edition: context.edition, system: circuit.system === "ac" ? (threePhase ? "ac 3-phase" : "ac 1-phase") : "dc", currentA, voltageV,
      lengthFt: section.lengthFt, size: wire.size, material: wire.material, sets: wire.sets,
      ...(circuit.system === "ac" ? { conduit: conduitOf(context, section) } : {}),
    }).detail.dropPct;
  }
  return context.graph.sections(id).length === 0 ? null : sum;
}

const contextOf = perGraph((graph) => checkContext(graph));
const circuitCache = perGraph(() => new Map<string, CircuitFigures>());
const sectionCache = perGraph(() => new Map<string, SectionFigures>());

/** Figures of a field circuit, worked out once a drawing. */
export function circuitFigures(graph: DrawingGraph, id: string): CircuitFigures {
  const cache = circuitCache(graph);
  const known = cache.get(id);
  if (known) return known;
  const context = contextOf(graph);
  const circuit = graph.drawing.circuits[id] as Circuit;
  const power = circuit.system !== "data" && circuit.system !== "ground";
  const ratings = power ? [...new Set(topology(graph).protectors(id).map((each) => each.device))].map((device) => deviceRatingA(context, device)) : [];
  // With an unknown rating among several the smallest is not known either.
  const deviceA = ratings.length === 0 || ratings.includes(null) ? null : Math.min(...ratings.map((each) => each as number));
  const load = power ? attempt(() => required(context, id)) : null;
  const figures: CircuitFigures = {
    loadA: load?.loadA ?? null, requiredA: load?.requiredA ?? null, deviceA,
    terminalC: terminalsOf(context, id, deviceA).lowest,
    dropPct: power ? attempt(() => dropPct(context, id, circuit, load?.loadA ?? null)) : null,
  };
  cache.set(id, figures);
  return figures;
}

/** Ampacities of one section of a field circuit, worked out once a drawing. */
export function sectionFigures(graph: DrawingGraph, id: string, sectionId: string): SectionFigures {
  const cache = sectionCache(graph);
  const key = `${id}/${sectionId}`;
  const known = cache.get(key);
  if (known) return known;
  const context = contextOf(graph);
  const section = graph.sections(id).find((each) => each.id === sectionId);
  const { system } = graph.drawing.circuits[id] as Circuit;
  const wire = section && system !== "data" && system !== "ground" ? wireOf(context, id, section, new Reader(context)) : null;
  const { terminalC } = circuitFigures(graph, id);
  const corrected = section && wire ? attempt(() => correctedAmpacity(context, id, section, wire, terminalC, new Reader(context))) : null;
  const figures: SectionFigures = {
    terminalA: wire ? attempt(() => columnAmpacityA(wire, terminalC)) : null,
    correctedA: corrected?.detail.correctedA ?? null, usableA: corrected?.value ?? null,
  };
  cache.set(key, figures);
  return figures;
}
