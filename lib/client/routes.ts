import { endpointPosition, type DrawingGraph, type End } from "@/lib/diagram/graph";
import type { Circuit, Point, Raceway } from "@/lib/diagram/schema";
import type { Side } from "@/lib/equipment/define";
import { crossesBox, isOrthogonal, route, stretchEnds, type RouteBox, type RouteDirection, type RouteEnd } from "@/lib/routing";
import { equipmentBox, isDrawn } from "@/lib/sheets/oneline/appearance";

const DIRECTION: Readonly<Record<Side, RouteDirection>> = { left: "left", right: "right", top: "up", bottom: "down" };
const QUARTER: readonly RouteDirection[] = ["right", "down", "left", "up"];

/** Way in which a circuit leaves its port, after the equipment's mirror and turn; a bus is left on the side of the other end. */
function endOf(graph: DrawingGraph, circuit: Circuit, end: End): RouteEnd | null {
  const point = endpointPosition(graph, circuit, end);
  const other = endpointPosition(graph, circuit, end === "from" ? "to" : "from");
  const endpoint = circuit[end];
  const equipment = graph.drawing.equipment[endpoint.equipment];
  const port = graph.port(endpoint.equipment, endpoint.port);
  if (!point || !equipment || !port) return null;
  if (endpoint.port === "bus" && equipment.bus && other) {
    return { point, direction: equipment.bus.vertical ? (other.x < point.x ? "left" : "right") : other.y < point.y ? "up" : "down" };
  }
  // A ground bar is a place to land on from anywhere.
  if (port.system === "ground" && port.many) return { point, direction: null };
  const plain = DIRECTION[port.side];
  const mirrored = equipment.mirrored && (plain === "left" || plain === "right") ? (plain === "left" ? "right" : "left") : plain;
  return { point, direction: QUARTER[(QUARTER.indexOf(mirrored) + equipment.rotation / 90) % 4] ?? mirrored };
}

/** Boxes a circuit goes around: all drawn equipment except what it starts, ends or stands in. */
function obstaclesFor(graph: DrawingGraph, circuit: Circuit): RouteBox[] {
  const around = new Set([circuit.from.equipment, circuit.to.equipment].flatMap((id) => graph.enclosures(id).slice(1)));
  const ends = new Set([circuit.from.equipment, circuit.to.equipment]);
  return Object.keys(graph.drawing.equipment)
    .filter((id) => isDrawn(graph, id) && !around.has(id))
    // A panel whose bus is the end is open to its own circuit.
    .filter((id) => !(ends.has(id) && graph.drawing.equipment[id]?.bus))
    .map((id) => equipmentBox(graph, id));
}

/** Inner distance of a band's lanes from its edge and from each other, grid units. */
const LANE_EDGE = 1.4;
const LANE_STEP = 1.5;
/** Lane of a band (its place across the band, grid units) that no other drawn circuit of this band lies in; the middle when all are taken. */
export function freeLane(graph: DrawingGraph, racewayId: string, circuitId: string): number {
  const raceway = graph.drawing.raceways[racewayId] as Raceway;
  const start = raceway.vertical ? raceway.at.x : raceway.at.y;
  const depth = raceway.vertical ? raceway.size.width : raceway.size.height;
  const taken = [...new Set(graph.occupants(racewayId).map((occupant) => occupant.circuit))]
    .filter((id) => id !== circuitId)
    .flatMap((id) => {
      const points = graph.drawing.circuits[id]?.points ?? [];
      return points.flatMap((p, i) => {
        const q = points[i + 1];
        if (!q) return [];
        return raceway.vertical ? (p.x === q.x ? [p.x] : []) : p.y === q.y ? [p.y] : [];
      });
    });
  for (let lane = start + LANE_EDGE; lane <= start + depth - LANE_EDGE + 1e-6; lane += LANE_STEP) {
    if (!taken.some((at) => Math.abs(at - lane) < LANE_STEP / 2)) return lane;
  }
  return start + depth / 2;
}

const clamp = (value: number, low: number, high: number): number => Math.max(low, Math.min(high, value));

/** Points a circuit passes because of the bands and boxes in its route, in order from its first end. */
function bandPoints(graph: DrawingGraph, circuitId: string, circuit: Circuit, from: Point, to: Point): Point[] {
  const points: Point[] = [];
  let last = from;
  for (const step of graph.racewaysOf(circuitId)) {
    const raceway = graph.drawing.raceways[step.raceway];
    if (!raceway || (raceway.kind !== "wireway" && raceway.kind !== "box") || raceway.size.width < 2 || raceway.size.height < 2) continue;
    const lane = freeLane(graph, step.raceway, circuitId);
    const { x, y } = raceway.at;
    const { width, height } = raceway.size;
    const near = raceway.vertical ? [lane, clamp(last.y, y + 1, y + height - 1)] : [clamp(last.x, x + 1, x + width - 1), lane];
    const far = raceway.vertical ? [lane, clamp(to.y, y + 1, y + height - 1)] : [clamp(to.x, x + 1, x + width - 1), lane];
    const entry = { x: near[0] as number, y: near[1] as number };
    const exit = { x: far[0] as number, y: far[1] as number };
    points.push(entry);
    if (raceway.kind === "wireway" && (entry.x !== exit.x || entry.y !== exit.y)) points.push(exit);
    last = points.at(-1) as Point;
  }
  return points;
}

/** Orthogonal points for a circuit as the drawing stands; empty when an end does not exist. Bends of `before` are kept where they still fit. */
export function routeFor(graph: DrawingGraph, circuitId: string, before: readonly Point[] = []): Point[] {
  const circuit = graph.drawing.circuits[circuitId] as Circuit;
  const from = endOf(graph, circuit, "from");
  const to = endOf(graph, circuit, "to");
  if (!from || !to) return [];
  const obstacles = obstaclesFor(graph, circuit);
  const stretched = stretchEnds(before, from.point, to.point);
  if (stretched && isOrthogonal(stretched) && !obstacles.some((box) => crossesBox(stretched, box))) return stretched;
  const lines = Object.entries(graph.drawing.circuits).filter(([id, other]) => id !== circuitId && other.points.length > 1).map(([, other]) => other.points);
  const via = circuit.bends.length > 0 ? circuit.bends : bandPoints(graph, circuitId, circuit, from.point, to.point);
  return route({ from, to, via }, { obstacles, lines }).points.map(round);
}
/** Hundredths of a grid unit are finer than any print; more decimals only make patches longer. */
const round = (point: Point): Point => ({ x: Math.round(point.x * 100) / 100, y: Math.round(point.y * 100) / 100 });
