import type { PortRef } from "@/lib/client/editorTypes";
import { portPoint } from "@/lib/client/landing";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { withRoutes, type PlacedEdit } from "./edit";

/** A drop on a bus this near to straight is meant to be straight; grid units. */
const STRAIGHT = 1.5;

/** Slides the end on a bus so that a nearly straight circuit is straight. */
function straightened(graph: DrawingGraph, end: PortRef, other: PortRef): PortRef {
  const equipment = graph.drawing.equipment[end.equipment];
  const across = portPoint(graph, other);
  if (end.port !== "bus" || !equipment?.bus || !across || other.port === "bus") return end;
  const { bus, at } = equipment;
  const wanted = bus.vertical ? across.y - at.y - bus.y : across.x - at.x - bus.x;
  return wanted >= 0 && wanted <= bus.length && Math.abs(wanted - end.offset) <= STRAIGHT ? { ...end, offset: wanted } : end;
}

/** Joins two ports and draws the circuit's way. */
export function joinEdit(graph: DrawingGraph, from: PortRef, to: PortRef, id: string): PlacedEdit {
  const a = straightened(graph, from, to);
  const b = straightened(graph, to, a);
  return { commands: withRoutes(graph, [{ type: "joinPorts", id, from: a, to: b }]), select: { collection: "circuits", id } };
}
