import { newCircuit, newEquipment } from "@/lib/diagram/commands";
import { equipmentPrefix, nextTag } from "@/lib/diagram/commands/tags";
import { nodeKey, type ConductionEdge, type End } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import type { CheckContext, PatchOperation, Suggestion } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, nameOf } from "./outcome";
import { topology, type Side } from "./topology";

/** Switched path inside a device; null where it has none. */
export function switchEdge({ graph }: Pick<CheckContext, "graph">, device: string): ConductionEdge | null {
  for (const port of graph.ports(device)) {
    const edge = graph.edgesAt(nodeKey(device, port.id)).find((one) => one.id === device && one.by === "switch");
    if (edge) return edge;
  }
  return null;
}
/** What lies on the line and on the load side of a device. */
export function deviceSides(context: CheckContext, device: string): { line: Side; load: Side } | null {
  return context.once(`sides of ${device}`, () => {
    const edge = switchEdge(context, device);
    if (!edge) return null;
    const { beyond } = topology(context.graph);
    return { line: beyond(edge.a, edge), load: beyond(edge.b, edge) };
  });
}
/** True for a device that stands between a generator set and everything else. */
export function generatorDevice(context: CheckContext, device: string): boolean {
  return context.once(`generator device ${device}`, () => {
    const sides = deviceSides(context, device);
    return sides !== null && [sides.line, sides.load].some((side) => side.generators.length > 0 && side.utilities.length + side.converters.length + side.loads.length === 0);
  });
}

/** Puts a breaker between a bus and the end of a circuit that lands on it. What the breaker is marked with stays to be read. */
export function breakerAtBus(context: CheckContext, id: string, end: End, ratingA: number): Suggestion | null {
  const circuit = context.drawing.circuits[id] as Circuit;
  const bus = circuit[end];
  const place = context.drawing.equipment[bus.equipment];
  if (!place || bus.port !== "bus" || (circuit.system !== "ac" && circuit.system !== "battery-dc")) return null;
  let n = 1;
  while (context.drawing.equipment[`cb-new-${n}`] || context.drawing.circuits[`j-cb-new-${n}`]) n += 1;
  const made = newEquipment("breaker", nextTag(context.drawing, equipmentPrefix("CB")), { x: place.at.x + (place.bus?.x ?? 0) + 2, y: place.at.y + (place.bus?.y ?? 0) + bus.offset });
  const dc = circuit.system === "battery-dc";
  const breaker = { ...made, parent: bus.equipment, location: place.location, props: { ...made.props, current: dc ? "battery dc" : "ac", ratingA, mount: dc ? "stud" : "bolt-on" } };
  const joint: Circuit = { ...newCircuit(circuit.system, "", { ...bus }, { equipment: `cb-new-${n}`, port: "line", offset: 0 }), wiring: "factory" };
  const patches: PatchOperation[] = [
    { op: "add", path: `/equipment/cb-new-${n}`, value: breaker },
    { op: "add", path: `/circuits/j-cb-new-${n}`, value: joint },
    { op: "replace", path: `/circuits/${id}/${end}`, value: { equipment: `cb-new-${n}`, port: "load", offset: 0 } },
    { op: "replace", path: `/circuits/${id}/points`, value: [] },
  ];
  return { label: `Put a breaker of ${ratingA} A where ${nameOf(context, circuitRef(id))} lands on ${nameOf(context, equipmentRef(bus.equipment))}`, also: "Enter its ratings and give it a space.", patches };
}
