import { freeSpaces, withParts, type Command } from "@/lib/diagram/commands";
import { buildGraph, type DrawingGraph, type End } from "@/lib/diagram/graph";
import type { Circuit, ElementRef, Point } from "@/lib/diagram/schema";
import { applyAll } from "@/lib/client/gate";
import { simplify } from "@/lib/routing";
import { calloutPlace, circuitLine, equipmentBox, interlockPlace, racewayBox } from "@/lib/sheets/oneline";
import type { Corner } from "@/components/diagram/canvas/canvasActions";
import { withRoutes, type Edit } from "./edit";
import { enclosureAt } from "./hits";

/** Least size of an enclosure, a band or a box, grid units. */
const LEAST = 2;

/** Ends of factory circuits that slide along a bus when the part at their other end is moved. */
function slides(graph: DrawingGraph, moved: ReadonlySet<string>, dx: number, dy: number): Command[] {
  return Object.entries(graph.drawing.circuits).flatMap(([id, circuit]) => {
    if (circuit.wiring !== "factory") return [];
    return (["from", "to"] as const).flatMap((end: End): Command[] => {
      const other = circuit[end === "from" ? "to" : "from"];
      const bus = graph.drawing.equipment[circuit[end].equipment]?.bus;
      if (circuit[end].port !== "bus" || !bus || moved.has(circuit[end].equipment) || !moved.has(other.equipment)) return [];
      const offset = Math.max(0, Math.min(bus.length, circuit[end].offset + (bus.vertical ? dy : dx)));
      return offset === circuit[end].offset ? [] : [{ type: "setEnd", circuit: id, end, endpoint: { ...circuit[end], offset } }];
    });
  });
}

/** Moves elements by grid steps; circuits follow, a lone circuit's callout or an interlock's mark moves by itself. */
export function moveEdit(graph: DrawingGraph, refs: readonly ElementRef[], dx: number, dy: number): Edit {
  const special = refs.flatMap((ref): Command[] => {
    if (ref.collection === "circuits" && refs.length === 1) {
      const place = calloutPlace(graph, ref.id);
      const points = graph.drawing.circuits[ref.id]?.points ?? [];
      return place ? [{ type: "routeCircuit", circuit: ref.id, points, calloutAt: { x: place.x + dx, y: place.y + dy } }] : [];
    }
    if (ref.collection === "interlocks" && !graph.drawing.interlocks[ref.id]?.at) {
      const place = interlockPlace(graph, ref.id);
      return place ? [{ type: "setInterlock", id: ref.id, change: { at: { x: place.x + dx, y: place.y + dy } } }] : [];
    }
    return [];
  });
  if (refs.length === 1 && special.length > 0) return { commands: special, title: refs[0]?.collection === "circuits" ? "move a callout" : "move an interlock" };
  const moved = withParts(graph.drawing, refs.filter((ref) => ref.collection === "equipment").map((ref) => ref.id));
  return { commands: withRoutes(graph, [{ type: "moveElements", refs, dx, dy }, ...slides(graph, moved, dx, dy), ...special]) };
}

/** Circuit that joins a part to the bus of the panel it stands in, or null. */
const busCircuit = (graph: DrawingGraph, part: string, panel: string): string | null =>
  graph.circuitsAt(part).find((id) => {
    const circuit = graph.drawing.circuits[id] as Circuit;
    return circuit.wiring === "factory" && [circuit.from, circuit.to].some((end) => end.equipment === panel && end.port === "bus");
  }) ?? null;

/** What follows when a part has come to stand in another enclosure: it belongs there, and a breaker lands on the bus. */
function rehome(graph: DrawingGraph, id: string): Command[] {
  const equipment = graph.drawing.equipment[id];
  if (!equipment || equipment.integral || equipment.size !== null || graph.kind(id).capabilities.enclosure) return [];
  const box = equipmentBox(graph, id);
  const parent = enclosureAt(graph, { x: box.x + box.width / 2, y: box.y + box.height / 2 }, id);
  if (parent === equipment.parent) return [];
  const commands: Command[] = [];
  const old = equipment.parent ? busCircuit(graph, id, equipment.parent) : null;
  if (old) commands.push({ type: "deleteElements", refs: [{ collection: "circuits", id: old }] });
  commands.push({ type: "setParent", id, parent });
  const panel = parent ? graph.drawing.equipment[parent] : undefined;
  const free = graph.circuitsAt(id, "line").filter((circuit) => circuit !== old).length === 0;
  const systems = [graph.port(id, "line")?.system, parent ? graph.port(parent, "bus")?.system : undefined];
  if (parent && panel?.bus && graph.kind(id).capabilities.switching === "breaker" && free && systems[0] === systems[1]) {
    const line = graph.port(id, "line")?.position ?? equipment.at;
    const along = panel.bus.vertical ? line.y - panel.at.y - panel.bus.y : line.x - panel.at.x - panel.bus.x;
    const offset = Math.max(0, Math.min(panel.bus.length, along));
    const poles = typeof equipment.props.poles === "number" ? equipment.props.poles : 2;
    commands.push(
      { type: "joinPorts", id: `${id}-bus${Object.keys(graph.drawing.circuits).length}`.slice(0, 64), from: { equipment: parent, port: "bus", offset }, to: { equipment: id, port: "line", offset: 0 }, change: { wiring: "factory" } },
      { type: "setField", ref: { collection: "equipment", id }, path: ["spaces"], value: freeSpaces(graph.drawing, parent, poles) },
    );
  }
  return commands;
}

/** The move at its end: as shown, and parts now belong to the enclosure they stand in. */
export function settleMove(graph: DrawingGraph, refs: readonly ElementRef[], dx: number, dy: number): Edit {
  const edit = moveEdit(graph, refs, dx, dy);
  const applied = applyAll(graph.drawing, edit.commands);
  if (!applied.ok) return edit;
  const after = buildGraph(applied.drawing);
  const commands = refs.filter((ref) => ref.collection === "equipment").flatMap((ref) => rehome(after, ref.id));
  return commands.length === 0 ? edit : { ...edit, commands: [...edit.commands, ...withRoutes(after, commands)] };
}

/** Drags a corner of an enclosure, a band or a box. */
export function resizeEdit(graph: DrawingGraph, ref: ElementRef, corner: Corner, dx: number, dy: number): Edit | null {
  const raceway = ref.collection === "raceways" ? graph.drawing.raceways[ref.id] : undefined;
  const box = raceway ? racewayBox(raceway) : ref.collection === "equipment" ? equipmentBox(graph, ref.id) : null;
  if (!box) return null;
  const west = corner === "nw" || corner === "sw";
  const north = corner === "nw" || corner === "ne";
  const width = Math.max(LEAST, box.width + (west ? -dx : dx));
  const height = Math.max(LEAST, box.height + (north ? -dy : dy));
  const at = { x: west ? box.x + box.width - width : box.x, y: north ? box.y + box.height - height : box.y };
  return { commands: withRoutes(graph, [{ type: "resizeElement", ref, at, size: { width, height } }]) };
}

const half = (value: number): number => Math.round(value * 2) / 2;

/** Drags one straight piece of a circuit sideways. Let go inside a wireway, the circuit is routed through it. */
export function bendEdit(graph: DrawingGraph, id: string, segment: number, dx: number, dy: number): Edit | null {
  const line = circuitLine(graph, id).points.map((point) => ({ ...point }));
  const a = line[segment];
  const b = line[segment + 1];
  const circuit = graph.drawing.circuits[id];
  if (!a || !b || !circuit) return null;
  const level = Math.abs(a.y - b.y) < 1e-6;
  const by = half(level ? dy : dx);
  const moved: Point[] = [a, b].map((point) => (level ? { x: point.x, y: point.y + by } : { x: point.x + by, y: point.y }));
  // The ends of the circuit stay on their ports: a piece that holds one gets a short leg beside it.
  const points = [...line.slice(0, segment + (segment === 0 ? 1 : 0)), ...moved, ...line.slice(segment + 1 + (segment === line.length - 2 ? 0 : 1))];
  const clean = simplify(points);
  const commands: Command[] = [{ type: "routeCircuit", circuit: id, points: clean, bends: clean.slice(1, -1) }];
  const band = Object.entries(graph.drawing.raceways).find(([, raceway]) => {
    if (raceway.kind !== "wireway") return false;
    const box = racewayBox(raceway);
    const inside = (p: Point): boolean => p.x >= box.x && p.x <= box.x + box.width && p.y >= box.y && p.y <= box.y + box.height;
    const middle = { x: ((moved[0] as Point).x + (moved[1] as Point).x) / 2, y: ((moved[0] as Point).y + (moved[1] as Point).y) / 2 };
    return moved.some(inside) || inside(middle);
  });
  const sections = graph.sections(id);
  const last = sections.at(-1);
  if (band && last && !graph.racewaysOf(id).some((step) => step.raceway === band[0])) {
    const compartments = Object.entries(band[1].compartments).sort(([, p], [, q]) => p.order - q.order);
    commands.push({ type: "addToRoute", circuit: id, section: last.id, raceway: band[0], compartment: compartments[0]?.[0] ?? null });
    return { commands, title: `route ${circuit.tag} through ${band[1].tag}` };
  }
  return { commands };
}
