import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Point, Sensor } from "@/lib/diagram/schema";
import { letter } from "@/lib/sheets/lettering";
import { PX_PER_UNIT, WEIGHTS, ellipseData, group, owned, path, sheetPx, text, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import type { OneLineOptions } from "./appearance";
import { circuitLine } from "./crossings";
import { LINE_PITCH } from "./texts";

/** A sensor's ring stands in the middle of three units, as two-port symbols do. */
const LENGTH = 3;

/** Sensors at the same place share one ring; the first by id draws it and the tags stand over each other. */
function sharing(graph: DrawingGraph, sensor: Sensor): string[] {
  return Object.entries(graph.drawing.sensors)
    .filter(([, each]) => each.circuit === sensor.circuit && Math.abs(each.at.x - sensor.at.x) < 0.1 && Math.abs(each.at.y - sensor.at.y) < 0.1)
    .map(([id]) => id).sort();
}

/** Direction in which the arrow points at the sensor's place, along the circuit; null when it is not known. */
export function arrowDirection(graph: DrawingGraph, sensor: Sensor): Point | null {
  if (sensor.arrow === null || !graph.drawing.circuits[sensor.circuit]) return null;
  const { points } = circuitLine(graph, sensor.circuit);
  const upright = sensor.rotation === 90 || sensor.rotation === 270;
  const center = upright ? { x: sensor.at.x, y: sensor.at.y + LENGTH / 2 } : { x: sensor.at.x + LENGTH / 2, y: sensor.at.y };
  let best: Point | null = null;
  let least = Infinity;
  points.slice(1).forEach((b, i) => {
    const a = points[i] as Point;
    const horizontal = Math.abs(a.y - b.y) < 0.05;
    const lowX = Math.min(a.x, b.x), highX = Math.max(a.x, b.x), lowY = Math.min(a.y, b.y), highY = Math.max(a.y, b.y);
    const dx = center.x < lowX ? lowX - center.x : center.x > highX ? center.x - highX : 0;
    const dy = center.y < lowY ? lowY - center.y : center.y > highY ? center.y - highY : 0;
    const distance = Math.hypot(dx, dy) + (horizontal === upright ? 0.5 : 0);
    if (distance < least) { least = distance; best = { x: Math.sign(b.x - a.x), y: Math.sign(b.y - a.y) }; }
  });
  const along: Point | null = best;
  if (!along) return null;
  const { x, y } = along as Point;
  return sensor.arrow === "to" ? { x, y } : { x: -x, y: -y };
}

/** Tag of a sensor. */
export function sensorTag(graph: DrawingGraph, id: string, options: OneLineOptions = {}): TextPrimitive {
  const sensor = graph.drawing.sensors[id] as Sensor;
  const order = sharing(graph, sensor);
  const fromLast = order.length - 1 - order.indexOf(id);
  const upright = sensor.rotation === 90 || sensor.rotation === 270;
  const big = options.detail === "tags" ? { size: 19.5, bold: 0.5 } : {};
  const x = sensor.at.x + (upright ? 1.4 : 0.3);
  const y = upright ? sensor.at.y + LENGTH / 2 + 0.4 + order.indexOf(id) * LINE_PITCH : sensor.at.y - 1.7 - fromLast * LINE_PITCH;
  return text(sheetPx(x), sheetPx(y), letter(sensor.tag), "tag", big);
}

/** A current sensor: a ring on its circuit, with an arrow to the end that its maker's arrow points to. */
export function sensorPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const sensor = graph.drawing.sensors[id];
  if (!sensor) return [];
  const tag = sensorTag(graph, id, options);
  if (sharing(graph, sensor)[0] !== id) return owned([tag], { collection: "sensors", id });
  const upright = sensor.rotation === 90 || sensor.rotation === 270;
  const middle = (LENGTH / 2) * PX_PER_UNIT;
  const direction = arrowDirection(graph, sensor);
  const turn = direction === null ? 0 : direction.x > 0 ? 0 : direction.x < 0 ? 180 : direction.y > 0 ? 90 : 270;
  const arrow = direction === null ? [] : [group(
    [path("M-4 0H6M6 0L1.6 -2.6M6 0L1.6 2.6", { weight: WEIGHTS.symbol, cap: "round" })],
    upright ? { x: -9, y: middle - 13, turn } : { x: middle + (turn === 180 ? -13 : 13), y: -7, turn },
  )];
  const ring = path(ellipseData(upright ? 0 : middle, upright ? middle : 0, 9), { weight: WEIGHTS.symbol });
  return owned([group([ring, ...arrow], { x: sheetPx(sensor.at.x), y: sheetPx(sensor.at.y) }), tag], { collection: "sensors", id });
}
