import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Equipment, Interlock, Point } from "@/lib/diagram/schema";
import { letter } from "@/lib/sheets/lettering";
import { WEIGHTS, n, owned, path, sheetPx, text, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import type { OneLineOptions } from "./appearance";
import { turned } from "./equipment";

/** Middle of a switch's symbol, and the edge where the dashed link reaches it; grid units. */
function contact(equipment: Equipment): { middle: Point; top: Point } {
  const half = turned({ x: 1.5, y: 0 }, equipment);
  const middle = { x: equipment.at.x + half.x, y: equipment.at.y + half.y };
  return { middle, top: { x: middle.x, y: middle.y - 1.4 } };
}
const switchesOf = (graph: DrawingGraph, interlock: Interlock): Equipment[] =>
  Object.keys(interlock.switches).sort().flatMap((id) => graph.drawing.equipment[id] ?? []);

/** Where the triangle stands, grid units: as placed, else above and between its switches. Null without switches. */
export function interlockPlace(graph: DrawingGraph, id: string): Point | null {
  const interlock = graph.drawing.interlocks[id];
  if (!interlock) return null;
  if (interlock.at) return interlock.at;
  const middles = switchesOf(graph, interlock).map((each) => contact(each).middle);
  if (middles.length === 0) return null;
  return { x: middles.reduce((sum, p) => sum + p.x, 0) / middles.length, y: Math.min(...middles.map((p) => p.y)) - 3.6 };
}

/** Tag of an interlock; null when it stands nowhere. */
export function interlockTag(graph: DrawingGraph, id: string, options: OneLineOptions = {}): TextPrimitive | null {
  const place = interlockPlace(graph, id);
  if (!place) return null;
  const words = letter((graph.drawing.interlocks[id] as Interlock).tag);
  return text(sheetPx(place.x + 1.3), sheetPx(place.y - 0.75), words, "tag", options.detail === "tags" ? { size: 19.5, bold: 0.5 } : {});
}

/** A triangle with dashed links to every switch of which at most one can be closed. */
export function interlockPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const interlock = graph.drawing.interlocks[id];
  const place = interlockPlace(graph, id);
  const tag = interlockTag(graph, id, options);
  if (!interlock || !place || !tag) return [];
  const x = sheetPx(place.x);
  const y = sheetPx(place.y);
  const links = switchesOf(graph, interlock).map((each) => {
    const { middle, top } = contact(each);
    const end = place.y > middle.y ? { x: middle.x, y: middle.y + 0.8 } : top;
    const side = middle.x < place.x - 0.8 ? x - 9 : middle.x > place.x + 0.8 ? x + 9 : null;
    return side === null ? `M${n(x)} ${n(y + 7)}V${n(sheetPx(end.y))}` : `M${n(side)} ${n(y)}H${n(sheetPx(middle.x))}V${n(sheetPx(end.y))}`;
  });
  return owned([
    path(links.join(""), { weight: WEIGHTS.symbol, dash: "link" }),
    path(`M${n(x - 10)} ${n(y + 7)}L${n(x)} ${n(y - 9)}L${n(x + 10)} ${n(y + 7)}Z`, { weight: WEIGHTS.symbol, fill: "paper" }),
    tag,
  ], { collection: "interlocks", id });
}
