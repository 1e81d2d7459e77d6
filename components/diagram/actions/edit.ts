import { applyAll } from "@/lib/client/gate";
import { routeFor } from "@/lib/client/routes";
import type { Command } from "@/lib/diagram/commands";
import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef, Point } from "@/lib/diagram/schema";
import { lengthOf } from "@/lib/routing";
import { racewayBox } from "@/lib/sheets/oneline";

/** What an action does: commands that together are one step, its title, and what is selected afterwards. */
export interface Edit { readonly commands: readonly Command[]; readonly title?: string; readonly selectAll?: readonly ElementRef[]; readonly note?: string }
export interface PlacedEdit extends Edit { readonly select: ElementRef }
export interface Refused { readonly reason: string }

/**
 * Adds the drawn way of every circuit that the commands left without one. A circuit that was drawn before keeps its bends
 * where they still fit. Commands that are refused come back as they are: the gate says why.
 */
export function withRoutes(graph: DrawingGraph, commands: readonly Command[]): readonly Command[] {
  const applied = applyAll(graph.drawing, commands);
  if (!applied.ok) return commands;
  let after = buildGraph(applied.drawing);
  const routed: Command[] = [];
  const carried = new Set<string>();
  for (const id of Object.keys(after.drawing.circuits).sort()) {
    const circuit = after.drawing.circuits[id];
    if (!circuit || circuit.points.length > 0) continue;
    const before = graph.drawing.circuits[id];
    if (before && before.points.length === 0) continue; // It had none before either: inner wiring that is not drawn.
    if (after.drawing.equipment[circuit.from.equipment]?.integral && circuit.wiring === "factory") continue;
    if (after.drawing.equipment[circuit.to.equipment]?.integral && circuit.wiring === "factory") continue;
    const points = routeFor(after, id, before?.points ?? []);
    if (points.length < 2) continue;
    routed.push({ type: "routeCircuit", circuit: id, points }, ...carryAlong(after, id, before?.points ?? [], points, carried));
    // Later circuits go around this one as well.
    after = buildGraph({ ...after.drawing, circuits: { ...after.drawing.circuits, [id]: { ...circuit, points } } });
  }
  return [...commands, ...routed];
}

interface OnLine { readonly share: number; readonly distance: number }
/** How far along a line the place nearest to a point lies, as a share of its length. */
function alongLine(points: readonly Point[], at: Point): OnLine {
  const total = lengthOf(points);
  let walked = 0;
  let best: OnLine = { share: 0, distance: Infinity };
  for (let i = 1; i < points.length; i++) {
    const a = points[i - 1] as Point;
    const b = points[i] as Point;
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    const t = length === 0 ? 0 : Math.max(0, Math.min(1, ((at.x - a.x) * (b.x - a.x) + (at.y - a.y) * (b.y - a.y)) / (length * length)));
    const distance = Math.hypot(a.x + (b.x - a.x) * t - at.x, a.y + (b.y - a.y) * t - at.y);
    if (distance < best.distance) best = { share: total === 0 ? 0 : (walked + length * t) / total, distance };
    walked += length;
  }
  return best;
}

/** A mark this near to its circuit stands on it, grid units. */
const ON_LINE = 1.2;
/** Sensors, nipples and conduit marks that stand on a circuit go with its line when it is drawn anew; each goes once. */
function carryAlong(graph: DrawingGraph, id: string, before: readonly Point[], after: readonly Point[], carried: Set<string>): Command[] {
  if (before.length < 2) return [];
  const place = (center: Point): { at: Point; level: boolean } | null => {
    const { share, distance } = alongLine(before, center);
    return distance > ON_LINE ? null : pointAlong(after, share);
  };
  const commands: Command[] = [];
  for (const [sensor, each] of Object.entries(graph.drawing.sensors)) {
    if (each.circuit !== id) continue;
    const upright = each.rotation === 90 || each.rotation === 270;
    const to = place(upright ? { x: each.at.x, y: each.at.y + 1.5 } : { x: each.at.x + 1.5, y: each.at.y });
    if (to) commands.push({ type: "setSensor", id: sensor, change: { at: to.level ? { x: to.at.x - 1.5, y: to.at.y } : { x: to.at.x, y: to.at.y - 1.5 }, rotation: to.level ? 0 : 90 } });
  }
  for (const step of graph.racewaysOf(id)) {
    const raceway = graph.drawing.raceways[step.raceway];
    if (!raceway || carried.has(step.raceway) || raceway.kind === "wireway" || raceway.kind === "box") continue;
    const box = racewayBox(raceway);
    const to = place({ x: box.x + box.width / 2, y: box.y + box.height / 2 });
    if (!to) continue;
    carried.add(step.raceway);
    const { width, height } = to.level === !raceway.vertical ? raceway.size : { width: raceway.size.height, height: raceway.size.width };
    commands.push({ type: "setRaceway", id: step.raceway, change: { at: { x: to.at.x - width / 2, y: to.at.y - height / 2 }, size: { width, height }, vertical: !to.level } });
  }
  return commands;
}

function pointAlong(points: readonly Point[], share: number): { at: Point; level: boolean } | null {
  let left = lengthOf(points) * share;
  for (let i = 1; i < points.length; i++) {
    const a = points[i - 1] as Point;
    const b = points[i] as Point;
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    if (length > 0 && (left <= length || i === points.length - 1)) {
      const t = Math.min(1, left / length);
      const grid = (value: number): number => Math.round(value * 2) / 2;
      const level = Math.abs(a.y - b.y) < Math.abs(a.x - b.x);
      return { at: level ? { x: grid(a.x + (b.x - a.x) * t), y: a.y } : { x: a.x, y: grid(a.y + (b.y - a.y) * t) }, level };
    }
    left -= length;
  }
  return null;
}
