import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Equipment, Point } from "@/lib/diagram/schema";
import { LETTERING, PX_PER_UNIT, WEIGHTS, box, group, owned, path, polyline, sheetPx, text, type Primitive } from "@/lib/sheets/primitives";
import { bodyOf, equipmentBox, isDrawn, symbolOf, type OneLineOptions } from "./appearance";
import { shape } from "./shape";
import { equipmentLabel } from "./texts";

/** Panels smaller than this (grid units) are drawn as a closed box with a short bus. */
const SMALL_PANEL = 5;

/**
 * Symbol, outline, bus and lettering of one piece of equipment.
 * @returns primitives in sheet px; nothing for an integral part that its parent's symbol stands for
 */
export function equipmentPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const equipment = graph.drawing.equipment[id];
  if (!equipment || !isDrawn(graph, id)) return [];
  const label = equipmentLabel(graph, id, options);
  return owned([...outline(graph, id), ...bus(equipment), ...symbolPrimitives(graph, id), label.tag, ...label.lines], { collection: "equipment", id });
}

function outline(graph: DrawingGraph, id: string): Primitive[] {
  const symbol = symbolOf(graph, id);
  const kind = symbol === null ? null : bodyOf(symbol).outline;
  if (symbol !== null && kind === null) return [];
  const { x, y, width, height } = equipmentBox(graph, id);
  const dashed = symbol === null ? Math.min(width, height) >= SMALL_PANEL : kind === "dashed";
  return [box(sheetPx(x), sheetPx(y), width * PX_PER_UNIT, height * PX_PER_UNIT, {
    weight: dashed ? WEIGHTS.enclosure : WEIGHTS.outline, dash: dashed ? "enclosure" : "solid",
  })];
}

/** Both ends of the bus line on the sheet, grid units; null without a bus. */
export function busEnds(equipment: Equipment): readonly [Point, Point] | null {
  const { bus, at } = equipment;
  if (!bus) return null;
  const start = { x: at.x + bus.x, y: at.y + bus.y };
  return [start, bus.vertical ? { x: start.x, y: start.y + bus.length } : { x: start.x + bus.length, y: start.y }];
}

function bus(equipment: Equipment): Primitive[] {
  const ends = busEnds(equipment);
  if (!ends) return [];
  const thin = (equipment.bus?.length ?? 0) < 3;
  return [polyline(ends.map((p) => ({ x: sheetPx(p.x), y: sheetPx(p.y) })), { weight: thin ? WEIGHTS.busThin : WEIGHTS.bus, cap: "square", layer: "bus" })];
}

function symbolPrimitives(graph: DrawingGraph, id: string): Primitive[] {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const symbol = symbolOf(graph, id);
  if (symbol === null) return [];
  const offset = bodyOf(symbol).symbolAt;
  const place = { turn: equipment.rotation, mirrored: equipment.mirrored };
  if (symbol === "pvswitch") return pvSwitch(equipment);
  const inner = shape(symbol);
  const strokes = group(inner.paths, { x: offset.x * PX_PER_UNIT, y: offset.y * PX_PER_UNIT });
  const x = sheetPx(equipment.at.x);
  const y = sheetPx(equipment.at.y);
  // Letters in a symbol stay upright however the symbol is turned.
  const letters = inner.texts.map((each) => {
    const p = turned({ x: each.x + offset.x * PX_PER_UNIT, y: each.y - each.size * 0.36 + offset.y * PX_PER_UNIT }, equipment);
    return text(x + p.x, y + p.y + each.size * 0.36, each.text, "callout", { size: Math.max(each.size, LETTERING.keynote.size), anchor: "middle", layer: "symbol" });
  });
  return [group([strokes], { x, y, ...place }), ...letters];
}

/** Turns a point about the origin as the equipment is turned and mirrored. */
export function turned(point: Point, equipment: Pick<Equipment, "rotation" | "mirrored">): Point {
  const x = equipment.mirrored ? -point.x : point.x;
  const { y } = point;
  switch (equipment.rotation) {
    case 90: return { x: -y, y: x };
    case 180: return { x: -x, y: -y };
    case 270: return { x: y, y: -x };
    default: return { x, y };
  }
}

/** Poles of a PV switch side by side, ganged; leads run down from the load side to the line side. */
function pvSwitch(equipment: Equipment): Primitive[] {
  const channels = typeof equipment.props["channels"] === "number" ? equipment.props["channels"] : 1;
  const pole = shape("switch").paths;
  const poles = Array.from({ length: channels }, (_, i) => group(pole, { x: i * 4 * PX_PER_UNIT, turn: 90 }));
  const link = channels > 1
    ? [path(`M7 13H${(channels - 1) * 4 * PX_PER_UNIT + 7}`, { dash: "link", weight: WEIGHTS.symbol })]
    : [];
  return [group([...poles, ...link], { x: sheetPx(equipment.at.x), y: sheetPx(equipment.at.y), turn: equipment.rotation, mirrored: equipment.mirrored })];
}
