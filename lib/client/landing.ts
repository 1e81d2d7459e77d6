import { endpointPosition, type DrawingGraph, type PortInfo } from "@/lib/diagram/graph";
import type { Circuit, Point } from "@/lib/diagram/schema";
import type { System } from "@/lib/equipment/define";
import { equipmentBox, isDrawn } from "@/lib/sheets/oneline/appearance";
import type { PortRef } from "./editorTypes";

export const SYSTEM_WORDS: Readonly<Record<System, string>> = { ac: "ac", "pv-dc": "PV dc", "battery-dc": "battery dc", data: "data", ground: "ground" };

const tagOf = (graph: DrawingGraph, id: string): string => graph.drawing.equipment[id]?.tag || graph.kind(id).title;

/** Place of a port on the sheet, grid units; on a bus at its offset. */
export function portPoint(graph: DrawingGraph, ref: PortRef): Point | null {
  return endpointPosition(graph, { from: ref } as Circuit, "from");
}

/** Why a circuit may not land here, in one sentence, or null when it may. `from` is where it starts; null asks about starting. */
export function whyNot(graph: DrawingGraph, from: PortRef | null, to: PortRef): string | null {
  const port = graph.port(to.equipment, to.port);
  if (!port) return "There is no such port.";
  if (!port.many && graph.circuitsAt(to.equipment, to.port).length > 0) return `${tagOf(graph, to.equipment)} ${port.label.toLowerCase()} already holds a circuit; only buses and bars take several.`;
  if (!from) return null;
  if (from.equipment === to.equipment) return "A circuit joins two pieces of equipment.";
  const start = graph.port(from.equipment, from.port);
  if (start && start.system !== port.system) return `${SYSTEM_WORDS[start.system]} cannot land on ${tagOf(graph, to.equipment)} ${port.label.toLowerCase()}, which is ${SYSTEM_WORDS[port.system]}.`;
  return null;
}

export interface Landing { readonly ref: PortRef; readonly point: Point; readonly reason: string | null }

/** Nearest place on a port: the port itself, or on a bus the nearest place along its line, on the grid. */
function nearestOn(graph: DrawingGraph, port: PortInfo, at: Point): { ref: PortRef; point: Point; distance: number } {
  const equipment = graph.drawing.equipment[port.equipment];
  let offset = 0;
  if (port.id === "bus" && equipment?.bus) {
    const { bus } = equipment;
    const along = bus.vertical ? at.y - equipment.at.y - bus.y : at.x - equipment.at.x - bus.x;
    offset = Math.max(0, Math.min(bus.length, Math.round(along)));
  }
  const ref = { equipment: port.equipment, port: port.id, offset };
  const point = portPoint(graph, ref) ?? port.position;
  return { ref, point, distance: Math.hypot(point.x - at.x, point.y - at.y) };
}

const inside = (box: { x: number; y: number; width: number; height: number }, at: Point): boolean =>
  at.x >= box.x && at.x <= box.x + box.width && at.y >= box.y && at.y <= box.y + box.height;

/**
 * Where a circuit would land when let go at this place: the nearest port within `reach` grid units, those that may
 * take it first; else, on the body of a piece of equipment, its nearest port that may take it.
 */
export function landingAt(graph: DrawingGraph, from: PortRef | null, at: Point, reach: number): Landing | null {
  const candidates: (Landing & { distance: number; body: boolean })[] = [];
  for (const id of Object.keys(graph.drawing.equipment)) {
    if (from?.equipment === id) continue;
    // A part that its carrier's symbol stands for is reached on the carrier.
    const shown = isDrawn(graph, id) ? id : graph.drawing.equipment[id]?.parent ?? null;
    if (shown === null || from?.equipment === shown) continue;
    const body = inside(equipmentBox(graph, shown), at);
    for (const port of graph.ports(id)) {
      const { ref, point, distance } = nearestOn(graph, port, at);
      if (distance > reach && !body) continue;
      candidates.push({ ref, point, distance, body: distance > reach, reason: whyNot(graph, from, ref) });
    }
  }
  // A body nearest to the pointer is the innermost one, so distance orders bodies as well.
  candidates.sort((a, b) => Number(a.reason !== null) - Number(b.reason !== null) || Number(a.body) - Number(b.body) || a.distance - b.distance);
  const best = candidates[0];
  if (!best || (best.body && best.reason !== null)) return candidates.find((each) => !each.body) ?? null;
  return { ref: best.ref, point: best.point, reason: best.reason };
}

/** Every port a circuit from here may land on, nearest first: the list for joining by keyboard. */
export function landingList(graph: DrawingGraph, from: PortRef): readonly { ref: PortRef; label: string }[] {
  const start = portPoint(graph, from) ?? { x: 0, y: 0 };
  return Object.keys(graph.drawing.equipment).flatMap((id) => graph.ports(id).map((port) => ({ port, ...nearestOn(graph, port, start) })))
    .filter(({ ref }) => whyNot(graph, from, ref) === null)
    .sort((a, b) => a.distance - b.distance)
    .map(({ ref, port }) => ({ ref, label: `${tagOf(graph, ref.equipment)}, ${port.label.toLowerCase()}` }));
}
