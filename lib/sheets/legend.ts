import type { System } from "@/lib/equipment/define";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { WEIGHTS, box, ellipseData, group, n, path, text, type Primitive } from "./primitives";
import { boundsOf } from "./geometry";
import { isDrawn, symbolOf } from "./oneline/appearance";
import { calloutMark, lineInStyle } from "./oneline/circuits";
import { shape } from "./oneline/shape";
import { keynoteMark } from "./oneline/texts";

/** Legend words of every symbol, in the order in which the legend lists them. */
const SYMBOL_WORDS: readonly (readonly [string, string])[] = [
  ["utility", "UTILITY SERVICE"], ["meter", "UTILITY METER"], ["generator", "GENERATOR"], ["pv", "PV STRING"], ["battery", "BATTERY"],
  ["inverter", "HYBRID INVERTER"], ["breaker", "BREAKER"], ["plugon", "PLUG-ON, HOLD-DOWN"], ["switch", "SWITCH"], ["fusedswitch", "FUSED SWITCH"],
  ["contactor", "CONTACTOR, COIL"], ["doublethrow", "TRANSFER SWITCH"], ["interlock", "INTERLOCK"], ["ct", "CURRENT SENSOR"], ["spd", "SURGE DEVICE"],
  ["load", "BRANCH LOAD"], ["motor", "MOTOR"], ["rod", "GROUND ROD"], ["ground", "ELECTRODE"], ["mbj", "N-G BOND"], ["estop", "SHUTDOWN INITIATOR"],
];
const SYSTEM_WORDS: readonly (readonly [System, string])[] = [
  ["ac", "AC POWER"], ["pv-dc", "PV DC"], ["battery-dc", "BATTERY DC"], ["ground", "GROUNDING"], ["data", "DATA, CLASS 2"],
];

export interface LegendEntry { words: string; sample: (x: number, y: number) => Primitive[] }
/** Room of a sample, px. */
const SAMPLE = { width: 42, height: 18 };

/** A symbol scaled into the sample's room, about its middle. */
function symbolSample(symbol: string): LegendEntry["sample"] {
  return (x, y) => {
    const drawn = shape(symbol);
    const bounds = boundsOf(drawn.paths);
    if (!bounds) return [];
    const width = bounds.right - bounds.left, height = bounds.bottom - bounds.top;
    const scale = Math.min(1, SAMPLE.width / width, SAMPLE.height / height);
    const move = { x: x + SAMPLE.width / 2 - (scale * (bounds.left + bounds.right)) / 2, y: y - (scale * (bounds.top + bounds.bottom)) / 2 };
    // Lines keep their weight however much the symbol shrinks.
    return [group(drawn.paths.map((each) => ({ ...each, weight: (each.weight * 0.8) / Math.max(scale, 0.4) })), { ...move, scale, layer: "symbol" })];
  };
}

/** Symbols that the drawing uses. */
export function symbolLegend(graph: DrawingGraph): LegendEntry[] {
  const { drawing } = graph;
  const used = new Set(Object.keys(drawing.equipment).filter((id) => isDrawn(graph, id)).map((id) => symbolOf(graph, id)));
  if (used.has("pvswitch")) used.add("switch");
  if (Object.keys(drawing.sensors).length) used.add("ct");
  if (Object.keys(drawing.interlocks).length) used.add("interlock");
  if (Object.values(drawing.bonds).some((bond) => bond.at)) used.add("mbj");
  return SYMBOL_WORDS.filter(([id]) => used.has(id)).map(([id, words]) => ({ words, sample: symbolSample(id) }));
}

/** Lines, boxes and marks that the drawing uses. */
export function lineLegend(graph: DrawingGraph, scheduleNumber: string): LegendEntry[] {
  const { drawing } = graph;
  const systems = new Set(Object.values(drawing.circuits).map((circuit) => circuit.system));
  const raceways = new Set(Object.values(drawing.raceways).map((raceway) => raceway.kind));
  const entry = (words: string, sample: LegendEntry["sample"]): LegendEntry => ({ words, sample });
  const line = (system: System): LegendEntry["sample"] => (x, y) => lineInStyle(`M${n(x)} ${n(y)}h${SAMPLE.width}`, system);
  const rectangle = (height: number, extra: Parameters<typeof box>[4]): LegendEntry["sample"] => (x, y) => [box(x, y - height / 2, SAMPLE.width, height, extra)];
  const found = SYSTEM_WORDS.filter(([system]) => systems.has(system)).map(([system, words]) => entry(words, line(system)));
  if (Object.keys(drawing.equipment).length) found.push(entry("ENCLOSURE", rectangle(13, { weight: WEIGHTS.enclosure, dash: "enclosure" })));
  if (raceways.has("wireway")) {
    found.push(entry("WIREWAY", (x, y) => [
      box(x, y - 7, SAMPLE.width, 14, { fill: "ww", weight: WEIGHTS.band }),
      path(`M${n(x)} ${n(y - 4)}h${SAMPLE.width}M${n(x)} ${n(y + 4)}h${SAMPLE.width}`, { weight: WEIGHTS.bandInner, layer: "ground" }),
    ]));
  }
  if (raceways.has("conduit")) found.push(entry("CONDUIT", (x, y) => [...line("ac")(x, y), path(ellipseData(x + 22, y, 4, 7.5), { weight: WEIGHTS.mark, layer: "mark" })]));
  if (raceways.has("nipple")) found.push(entry("NIPPLE", (x, y) => [...line("ac")(x, y), path(`M${n(x + 16)} ${n(y - 7)}v14M${n(x + 28)} ${n(y - 7)}v14`, { weight: WEIGHTS.nipple, layer: "mark" })]));
  if (Object.values(drawing.circuits).some((circuit) => circuit.wiring === "field")) found.push(entry(`CIRCUIT, SEE ${scheduleNumber}`, (x, y) => calloutMark(x + 22, y, "F1")));
  if (Object.values(drawing.texts).some((each) => each.keynote)) found.push(entry("KEYNOTE", (x, y) => [keynoteMark(x + 22, y, "1")]));
  return found;
}

/** Entries under each other. */
export function legendPrimitives(x: number, y: number, rowPx: number, entries: readonly LegendEntry[]): Primitive[] {
  return entries.flatMap((each, i) => [...each.sample(x, y + i * rowPx), text(x + SAMPLE.width + 9, y + i * rowPx + 4.6, each.words, "note")]);
}
