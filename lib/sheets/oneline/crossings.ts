import type { DrawingGraph } from "@/lib/diagram/graph";
import { endpointPosition } from "@/lib/diagram/graph";
import type { Circuit, Point } from "@/lib/diagram/schema";
import { isDrawn } from "./appearance";

/** Half width of the hop with which one line crosses another, grid units. */
export const HOP = 0.42;
const NEAR = 0.05;

/** Line of a circuit as drawn: its routed points, else a straight or single-bend lead for factory wiring, else a direct line. */
export function circuitLine(graph: DrawingGraph, id: string): { points: readonly Point[]; routed: boolean } {
  const circuit = graph.drawing.circuits[id] as Circuit;
  if (circuit.offSheet) return { points: [], routed: true };
  if (circuit.points.length >= 2) return { points: circuit.points, routed: true };
  // Wiring to a part that its carrier's symbol stands for lies inside that symbol.
  const hidden = (["from", "to"] as const).some((end) => graph.drawing.equipment[circuit[end].equipment] !== undefined && !isDrawn(graph, circuit[end].equipment));
  if (circuit.wiring === "factory" && hidden) return { points: [], routed: true };
  const from = endpointPosition(graph, circuit, "from");
  const to = endpointPosition(graph, circuit, "to");
  if (!from || !to || (Math.abs(from.x - to.x) < NEAR && Math.abs(from.y - to.y) < NEAR)) return { points: [], routed: true };
  if (circuit.wiring !== "factory") return { points: [from, to], routed: false };
  const straight = Math.abs(from.x - to.x) < NEAR || Math.abs(from.y - to.y) < NEAR;
  return { points: straight ? [from, to] : [from, { x: to.x, y: from.y }, to], routed: true };
}

interface Vertical { circuit: string; x: number; top: number; bottom: number }
const cache = new WeakMap<DrawingGraph, readonly Vertical[]>();

/** Every vertical stretch of every routed circuit, worked out once for a graph. */
function verticals(graph: DrawingGraph): readonly Vertical[] {
  const known = cache.get(graph);
  if (known) return known;
  const found = Object.keys(graph.drawing.circuits).flatMap((circuit) => {
    const { points, routed } = circuitLine(graph, circuit);
    if (!routed) return [];
    return points.slice(1).flatMap((b, i): Vertical[] => {
      const a = points[i] as Point;
      return Math.abs(a.x - b.x) < NEAR && Math.abs(a.y - b.y) > NEAR
        ? [{ circuit, x: a.x, top: Math.min(a.y, b.y), bottom: Math.max(a.y, b.y) }]
        : [];
    });
  });
  cache.set(graph, found);
  return found;
}

/**
 * Places, along the stretch from `a` to `b` of a circuit, where it hops over another circuit's line.
 * Only horizontal stretches hop, so that of two crossing lines one always does. Lines that end on
 * the stretch are joints or lie side by side, and are not hopped.
 */
export function hopsOn(graph: DrawingGraph, circuit: string, a: Point, b: Point): readonly number[] {
  if (Math.abs(a.y - b.y) > NEAR) return [];
  const left = Math.min(a.x, b.x);
  const right = Math.max(a.x, b.x);
  const at = verticals(graph)
    .filter((v) => v.circuit !== circuit && v.x > left + HOP && v.x < right - HOP && v.top < a.y - NEAR && v.bottom > a.y + NEAR)
    .map((v) => v.x);
  const sorted = [...new Set(at)].sort((p, q) => (a.x < b.x ? p - q : q - p));
  // Lines closer together than a hop is wide are taken in one.
  return sorted.filter((x, i) => i === 0 || Math.abs(x - (sorted[i - 1] as number)) > 2 * HOP);
}
