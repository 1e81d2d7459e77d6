import { applyAll } from "@/lib/client/gate";
import { routeFor } from "@/lib/client/routes";
import type { Command } from "@/lib/diagram/commands";
import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef } from "@/lib/diagram/schema";

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
  for (const id of Object.keys(after.drawing.circuits).sort()) {
    const circuit = after.drawing.circuits[id];
    if (!circuit || circuit.points.length > 0) continue;
    const before = graph.drawing.circuits[id];
    if (before && before.points.length === 0) continue; // It had none before either: inner wiring that is not drawn.
    if (after.drawing.equipment[circuit.from.equipment]?.integral && circuit.wiring === "factory") continue;
    if (after.drawing.equipment[circuit.to.equipment]?.integral && circuit.wiring === "factory") continue;
    const points = routeFor(after, id, before?.points ?? []);
    if (points.length < 2) continue;
    routed.push({ type: "routeCircuit", circuit: id, points });
    // Later circuits go around this one as well.
    after = buildGraph({ ...after.drawing, circuits: { ...after.drawing.circuits, [id]: { ...circuit, points } } });
  }
  return [...commands, ...routed];
}
