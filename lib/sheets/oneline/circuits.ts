import type { System } from "@/lib/equipment/define";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Circuit, Point } from "@/lib/diagram/schema";
import { letter, textWidth } from "@/lib/sheets/lettering";
import { LETTERING, PX_PER_UNIT, WEIGHTS, n, owned, path, polyline, sheetPx, text, type Dash, type Ink, type PathPrimitive, type Primitive } from "@/lib/sheets/primitives";
import type { OneLineOptions } from "./appearance";
import { HOP, circuitLine, hopsOn } from "./crossings";

interface LineStyle { weight: number; dash: Dash; ink: Ink; double: boolean }
/** How the line of each system looks; the legend draws from the same table. */
export const LINE_STYLES: Readonly<Record<System, LineStyle>> = {
  ac: { weight: WEIGHTS.power, dash: "solid", ink: "ink", double: false },
  "pv-dc": { weight: WEIGHTS.power, dash: "pv-dc", ink: "pv", double: false },
  "battery-dc": { weight: WEIGHTS.battery, dash: "solid", ink: "bat", double: true },
  ground: { weight: WEIGHTS.ground, dash: "ground", ink: "ink", double: false },
  data: { weight: WEIGHTS.data, dash: "data", ink: "ink", double: false },
};

/** Path data of a line in its system's style. */
export function lineInStyle(d: string, system: System, routed = true): PathPrimitive[] {
  const style = LINE_STYLES[system];
  if (!routed) return [path(d, { layer: "wire", weight: WEIGHTS.data, dash: "unrouted", stroke: style.ink })];
  const outer = path(d, { layer: "wire", weight: style.weight, dash: style.dash, stroke: style.ink });
  return style.double ? [outer, path(d, { layer: "wire", weight: WEIGHTS.batteryCore, stroke: "paper" })] : [outer];
}

/** Path data of a circuit's line, with hops where it crosses others; px on the sheet. */
export function circuitData(graph: DrawingGraph, id: string): string {
  const { points } = circuitLine(graph, id);
  const first = points[0];
  if (!first) return "";
  let d = `M${n(sheetPx(first.x))} ${n(sheetPx(first.y))}`;
  points.slice(1).forEach((b, i) => {
    const a = points[i] as Point;
    const forward = b.x > a.x;
    for (const x of hopsOn(graph, id, a, b)) {
      const before = sheetPx(forward ? x - HOP : x + HOP);
      const after = sheetPx(forward ? x + HOP : x - HOP);
      const radius = n(HOP * PX_PER_UNIT);
      d += `L${n(before)} ${n(sheetPx(a.y))}A${radius} ${radius} 0 0 ${forward ? 1 : 0} ${n(after)} ${n(sheetPx(a.y))}`;
    }
    d += `L${n(sheetPx(b.x))} ${n(sheetPx(b.y))}`;
  });
  return d;
}

/** Words in a circuit's bubble. */
export const calloutText = (circuit: Circuit): string => letter(circuit.callout ?? circuit.tag);

/** Runs that share a callout show one bubble: where the drawing placed it, else on the run that comes first. */
function showsCallout(graph: DrawingGraph, id: string, circuit: Circuit): boolean {
  if (circuit.wiring === "factory" && circuit.calloutAt === null) return false;
  if (circuit.calloutAt !== null) return true;
  const words = calloutText(circuit);
  return Object.entries(graph.drawing.circuits).every(([other, each]) =>
    other === id || each.wiring === "factory" || calloutText(each) !== words || (each.calloutAt === null && id < other));
}

/** Where a circuit's bubble stands, grid units; null when it has none. Without a place of its own: the middle of its longest stretch. */
export function calloutPlace(graph: DrawingGraph, id: string): Point | null {
  const circuit = graph.drawing.circuits[id] as Circuit;
  if (!showsCallout(graph, id, circuit)) return null;
  if (circuit.calloutAt) return circuit.calloutAt;
  const { points } = circuitLine(graph, id);
  let place: Point | null = null;
  let longest = 0;
  points.slice(1).forEach((b, i) => {
    const a = points[i] as Point;
    const length = Math.hypot(a.x - b.x, a.y - b.y);
    if (length > longest) { longest = length; place = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 }; }
  });
  return place;
}

/** The line of a circuit and its bubble. */
export function circuitPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const circuit = graph.drawing.circuits[id];
  if (!circuit) return [];
  const { points, routed } = circuitLine(graph, id);
  const d = circuitData(graph, id);
  const line = d ? lineInStyle(d, circuit.system, routed) : [];
  const place = calloutPlace(graph, id);
  const bubble = place ? [...leader(points, place), ...calloutMark(sheetPx(place.x), sheetPx(place.y), calloutText(circuit), options)] : [];
  return owned([...line, ...bubble], { collection: "circuits", id });
}

/** A short line from a bubble that stands beside its circuit to the circuit. */
function leader(points: readonly Point[], place: Point): Primitive[] {
  let best: Point | null = null;
  let least = Infinity;
  points.slice(1).forEach((b, i) => {
    const a = points[i] as Point;
    const length2 = (b.x - a.x) ** 2 + (b.y - a.y) ** 2;
    const t = length2 === 0 ? 0 : Math.max(0, Math.min(1, ((place.x - a.x) * (b.x - a.x) + (place.y - a.y) * (b.y - a.y)) / length2));
    const p = { x: a.x + t * (b.x - a.x), y: a.y + t * (b.y - a.y) };
    const distance = Math.hypot(p.x - place.x, p.y - place.y);
    if (distance < least) { least = distance; best = p; }
  });
  if (!best || least < 0.8) return [];
  return [polyline([place, best].map((p: Point) => ({ x: sheetPx(p.x), y: sheetPx(p.y) })), { weight: WEIGHTS.leader, layer: "wire" })];
}

/** A bubble with a circuit's number; it covers the line below it. */
export function calloutMark(x: number, y: number, words: string, options: OneLineOptions = {}): Primitive[] {
  const size = options.detail === "tags" ? 19 : LETTERING.callout.size;
  const half = size * 0.69;
  const width = Math.max(2.2 * half + 4, textWidth(words, size, "normal") + size * 0.85);
  const straight = width / 2 - half;
  const d = `M${n(x - straight)} ${n(y - half)}H${n(x + straight)}A${n(half)} ${n(half)} 0 0 1 ${n(x + straight)} ${n(y + half)}H${n(x - straight)}A${n(half)} ${n(half)} 0 0 1 ${n(x - straight)} ${n(y - half)}Z`;
  return [
    path(d, { fill: "paper", weight: WEIGHTS.mark, layer: "mark" }),
    text(x, y + size * 0.345, words, "callout", { size, anchor: "middle", layer: "mark" }),
  ];
}
