import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Collection, ElementRef } from "@/lib/diagram/schema";
import { layered, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import { isDrawn, type Box, type OneLineOptions } from "./appearance";
import { bondPrimitives, bondTag } from "./bonds";
import { calloutMark, calloutPlace, calloutText, circuitPrimitives } from "./circuits";
import { equipmentPrimitives } from "./equipment";
import { interlockPrimitives, interlockTag } from "./interlocks";
import { racewayLabel, racewayPrimitives } from "./raceways";
import { sensorPrimitives, sensorTag } from "./sensors";
import { equipmentLabel, textBox, textPrimitives } from "./texts";
import { sheetPx } from "@/lib/sheets/primitives";

export type { Box, OneLineOptions } from "./appearance";
export { bondPrimitives, circuitPrimitives, equipmentPrimitives, interlockPrimitives, racewayPrimitives, sensorPrimitives, textPrimitives };
export { LINE_STYLES, calloutPlace, circuitData, lineInStyle } from "./circuits";
export { circuitLine } from "./crossings";
export { equipmentBox } from "./appearance";
export { racewayBox } from "./raceways";
export { interlockPlace } from "./interlocks";
export { placementOf } from "./texts";

type Draw = (graph: DrawingGraph, id: string, options?: OneLineOptions) => Primitive[];
const DRAW: Partial<Record<Collection, Draw>> = {
  raceways: racewayPrimitives, equipment: equipmentPrimitives, circuits: circuitPrimitives,
  sensors: sensorPrimitives, bonds: bondPrimitives, interlocks: interlockPrimitives, texts: textPrimitives,
};

/** Primitives of one element, whatever it is. Labels and acceptances have none of their own. */
export function elementPrimitives(graph: DrawingGraph, ref: ElementRef, options: OneLineOptions = {}): Primitive[] {
  return DRAW[ref.collection]?.(graph, ref.id, options) ?? [];
}

/** The whole one-line, laid over each other in the order of the layers; elements in id order. */
export function oneLine(graph: DrawingGraph, options: OneLineOptions = {}): Primitive[] {
  const all = (Object.entries(DRAW) as [Collection, Draw][]).flatMap(([collection, draw]) =>
    Object.keys(graph.drawing[collection]).sort().flatMap((id) => draw(graph, id, options)));
  return layered(all);
}

/** Lettering that a finding at this element underlines. Null when the element is not on the sheet. */
function tagOf(graph: DrawingGraph, ref: ElementRef, options: OneLineOptions): TextPrimitive | null {
  const { drawing } = graph;
  const { collection, id } = ref;
  if (collection === "equipment") {
    const equipment = drawing.equipment[id];
    if (!equipment) return null;
    // What stands behind the tag (its status) is not underlined.
    if (isDrawn(graph, id)) return { ...equipmentLabel(graph, id, options).tag, text: equipment.tag };
    return equipment.parent ? tagOf(graph, { collection, id: equipment.parent }, options) : null;
  }
  if (collection === "circuits") {
    const circuit = drawing.circuits[id];
    const place = circuit ? calloutPlace(graph, id) : null;
    if (!circuit || !place) return null;
    return calloutMark(sheetPx(place.x), sheetPx(place.y), calloutText(circuit), options).find((p): p is TextPrimitive => p.type === "text") ?? null;
  }
  if (collection === "raceways") return drawing.raceways[id] ? racewayLabel(drawing.raceways[id], options).tag : null;
  if (collection === "bonds") return bondTag(graph, id, options);
  if (collection === "interlocks") return interlockTag(graph, id, options);
  if (collection === "sensors") return drawing.sensors[id] ? sensorTag(graph, id, options) : null;
  return null;
}

/** Box of an element's tag in sheet px. Parts that their parent draws give the parent's tag; others without one give null. */
export function tagBox(graph: DrawingGraph, ref: ElementRef, options: OneLineOptions = {}): Box | null {
  const tag = tagOf(graph, ref, options);
  return tag ? textBox(tag) : null;
}
