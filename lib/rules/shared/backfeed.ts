import type { CheckContext } from "@/lib/rules/engine/types";
import { nodeKey } from "@/lib/diagram/graph";
import { deviceSides } from "./devices";
import { supplies, type Side } from "./topology";

/** True where an allowed state lets a generator feed the load terminals of a device. */
export const fedByGenerator = (context: CheckContext, id: string): boolean => context.once(`load side of ${id} fed by a generator`, () => {
  const node = nodeKey(id, "load");
  return context.states().allowed.some((state) => state.group === "generator" && state.islands.some((island) => island.nodes.has(node) && island.sources.some((source) => context.graph.kind(source).capabilities.source === "generator")));
});

/** Sides of a breaker whose load terminals can be fed: current may pass it from load to line. Null where it cannot. */
export function backfed(context: CheckContext, id: string): { line: Side; load: Side } | null {
  const sides = deviceSides(context, id);
  if (!sides || supplies(sides.load) === 0) return null;
  const { line, load } = sides;
  // A set behind an interlock never feeds back past it.
  if (load.generators.length === supplies(load) && !fedByGenerator(context, id)) return null;
  // Toward a source that takes nothing, such as the breaker of a generator, there is no current back.
  return line.utilities.length + line.loads.length + line.buses.length + line.batteries.length + line.converters.length > 0 ? sides : null;
}

/** Breakers of the drawing, in id order. */
export const breakers = (context: CheckContext): readonly string[] => context.once("breakers", () =>
  Object.keys(context.drawing.equipment).sort().filter((id) => { const { switching, overcurrent } = context.graph.kind(id).capabilities; return switching === "breaker" && overcurrent === true; }));

/** Nodes that stay joined to the utility until somebody opens a switch by hand: what lies behind a listed interconnect contactor, a transfer switch or an interlock is an island of its own. */
function utilityZone(context: CheckContext): ReadonlySet<string> {
  const { graph, drawing } = context;
  const locked = new Set(Object.values(drawing.interlocks).flatMap((interlock) => Object.keys(interlock.switches)));
  const parts = (id: string): boolean => locked.has(id) || (graph.kind(id).capabilities.switching === "contactor" && drawing.equipment[id]?.props.interconnectDevice !== false);
  const zone = new Set<string>();
  const queue = Object.keys(drawing.equipment).filter((id) => graph.kind(id).capabilities.source === "utility").flatMap((id) => graph.ports(id).map((port) => nodeKey(id, port.id)));
  for (let node = queue.pop(); node !== undefined; node = queue.pop()) {
    if (zone.has(node)) continue;
    zone.add(node);
    for (const edge of graph.edgesAt(node)) if (edge.by !== "converter" && edge.by !== "throw" && !(edge.by === "switch" && parts(edge.id))) queue.push(edge.a === node ? edge.b : edge.a);
  }
  return zone;
}
/** True where the line terminals of a device can be kept live without the utility. */
export const onIsland = (context: CheckContext, device: string): boolean => !context.once("utility zone", () => utilityZone(context)).has(nodeKey(device, "line"));
