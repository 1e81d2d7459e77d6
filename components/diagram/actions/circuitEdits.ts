import { applyAll } from "@/lib/client/gate";
import { routeFor } from "@/lib/client/routes";
import type { Command } from "@/lib/diagram/commands";
import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import type { RouteStep } from "@/lib/diagram/schema";
import type { Edit } from "./edit";

/** Another part of the circuit with its own wire, after the last one. */
export const addSectionCommand = (graph: DrawingGraph, circuit: string, id: string): Command =>
  ({ type: "splitSection", circuit, section: graph.sections(circuit).at(-1)?.id ?? "", id, lengthFt: null });

/** Finds the circuit's way again and forgets bends made by hand. */
export function rerouteEdit(graph: DrawingGraph, id: string): Edit {
  const circuit = graph.drawing.circuits[id];
  if (!circuit) return { commands: [] };
  const plain = buildGraph({ ...graph.drawing, circuits: { ...graph.drawing.circuits, [id]: { ...circuit, bends: [] } } });
  return { commands: [{ type: "routeCircuit", circuit: id, points: routeFor(plain, id), bends: [], calloutAt: null }] };
}

/** Sets the raceways a section passes. The line is drawn through the bands among them, unless a person has bent it. */
export function rerouteWith(graph: DrawingGraph, id: string, section: string, route: readonly RouteStep[]): Edit {
  const set: Command = { type: "setSection", circuit: id, section, change: { route: [...route] } };
  const applied = applyAll(graph.drawing, [set]);
  const circuit = graph.drawing.circuits[id];
  if (!applied.ok || !circuit || circuit.bends.length > 0) return { commands: [set], title: `route ${circuit?.tag ?? ""}`.trim() };
  return { commands: [set, { type: "routeCircuit", circuit: id, points: routeFor(buildGraph(applied.drawing), id) }], title: `route ${circuit.tag}` };
}
