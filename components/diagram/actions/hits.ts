import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Point } from "@/lib/diagram/schema";
import { circuitLine, equipmentBox } from "@/lib/sheets/oneline";

const inside = (box: { x: number; y: number; width: number; height: number }, at: Point): boolean =>
  at.x >= box.x && at.x <= box.x + box.width && at.y >= box.y && at.y <= box.y + box.height;

/** Innermost enclosure drawn as a box around a place; `except` and its parts are not asked. */
export function enclosureAt(graph: DrawingGraph, at: Point, except?: string): string | null {
  const found = Object.keys(graph.drawing.equipment)
    .filter((id) => id !== except && !(except && graph.enclosures(id).includes(except)))
    .filter((id) => graph.kind(id).capabilities.enclosure && !graph.drawing.equipment[id]?.integral && inside(equipmentBox(graph, id), at))
    .map((id) => ({ id, area: equipmentBox(graph, id).width * equipmentBox(graph, id).height }))
    .sort((a, b) => a.area - b.area || (a.id < b.id ? -1 : 1));
  return found[0]?.id ?? null;
}

/** Place on a drawn circuit. */
export interface OnCircuit { readonly id: string; readonly point: Point; readonly level: boolean; readonly distance: number }

/** Circuits that pass near a place, nearest first, with the nearest place on each. */
export function circuitsNear(graph: DrawingGraph, at: Point, reach: number): readonly OnCircuit[] {
  return Object.keys(graph.drawing.circuits).flatMap((id): OnCircuit[] => {
    const points = circuitLine(graph, id).points;
    let best: OnCircuit | null = null;
    for (let i = 1; i < points.length; i++) {
      const a = points[i - 1] as Point;
      const b = points[i] as Point;
      const length = Math.hypot(b.x - a.x, b.y - a.y);
      if (length === 0) continue;
      const t = Math.max(0, Math.min(1, ((at.x - a.x) * (b.x - a.x) + (at.y - a.y) * (b.y - a.y)) / (length * length)));
      const point = { x: a.x + (b.x - a.x) * t, y: a.y + (b.y - a.y) * t };
      const distance = Math.hypot(point.x - at.x, point.y - at.y);
      if (!best || distance < best.distance) best = { id, point, level: Math.abs(a.y - b.y) < Math.abs(a.x - b.x), distance };
    }
    return best && best.distance <= reach ? [best] : [];
  }).sort((a, b) => a.distance - b.distance || (a.id < b.id ? -1 : 1));
}
