import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Equipment } from "@/lib/diagram/schema";
import { letter, textSpan, textWidth } from "@/lib/sheets/lettering";
import { LETTERING, PX_PER_UNIT, group, n, owned, path, sheetPx, text, type Face, type Primitive, type Style, type TextPrimitive } from "@/lib/sheets/primitives";
import { STATUS_MARK, defaultPlacement, equipmentBox, symbolOf, type Box, type OneLineOptions, type Placement } from "./appearance";

/** Distance between lines of lettering, grid units. */
export const LINE_PITCH = 1.2;
/** How much tags grow where ratings are left out. */
const TAG_GROWTH = 1.5;

/** Placement of an equipment's tag with what the drawing says about it. */
export function placementOf(graph: DrawingGraph, id: string): Placement {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const placement = defaultPlacement(graph, id);
  if (!equipment.label) return placement;
  // A heading that stands over its enclosure has its lines beside it, since the enclosure's edge runs below.
  const over = placement.heading && symbolOf(graph, id) === null && equipment.label.y < 0;
  return { ...placement, ...equipment.label, ...(over ? { lines: "beside" as const } : {}) };
}

/** Half of the free width around a centered label, px: the distance to the nearest alike part in the same row. */
function room(graph: DrawingGraph, id: string): number {
  const equipment = graph.drawing.equipment[id] as Equipment;
  let least = Infinity;
  for (const [other, each] of Object.entries(graph.drawing.equipment)) {
    if (other === id || each.kind !== equipment.kind || each.rotation !== equipment.rotation || each.integral) continue;
    if (Math.abs(each.at.y - equipment.at.y) > 0.5) continue;
    least = Math.min(least, Math.abs(each.at.x - equipment.at.x));
  }
  return least * PX_PER_UNIT;
}

/** Lines printed with the tag. In a crowded row only what fits between its neighbors is printed; the schedules hold the rest. */
function linesFor(graph: DrawingGraph, id: string, anchor: Placement["anchor"]): string[] {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const lines = graph.kind(id).annotation(equipment.props as never).map(letter);
  if (anchor !== "middle") return lines;
  const free = room(graph, id) - 4;
  return lines.flatMap((line) => {
    if (textWidth(line, LETTERING.note.size, "narrow") <= free) return [line];
    // The rating stands first; poles follow it and may go.
    const rating = /^\S+ (?:A|V|kW|kWh)\b/.exec(line)?.[0];
    return rating && textWidth(rating, LETTERING.note.size, "narrow") <= free ? [rating] : [];
  });
}

const grown = (words: TextPrimitive, options: OneLineOptions): TextPrimitive =>
  options.detail === "tags" ? { ...words, size: words.size * (words.size > 15 ? 1.24 : TAG_GROWTH), bold: words.bold * TAG_GROWTH } : words;

interface Label { tag: TextPrimitive; lines: TextPrimitive[] }
/** Lettering of one piece of equipment: its tag and its ratings. */
export function equipmentLabel(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Label {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const placement = placementOf(graph, id);
  const words = equipment.tag + STATUS_MARK[equipment.status];
  const crowded = placement.anchor === "middle" && textWidth(words, 13, "normal") > room(graph, id) - 4;
  const style: Style = placement.heading ? "heading" : crowded ? "tagNarrow" : "tag";
  const x = equipment.at.x + placement.x;
  const y = equipment.at.y + placement.y;
  const lines = options.detail === "tags" || equipment.integral ? [] : linesFor(graph, id, placement.anchor);
  const tagUp = placement.lines === "over" ? lines.length * LINE_PITCH : 0;
  const tag = grown(text(sheetPx(x), sheetPx(y - tagUp), words, style, { anchor: placement.anchor }), options);
  return { tag, lines: lines.map((line, i) => lineText(graph, id, line, i, { placement, x, y, tag, count: lines.length })) };
}

interface LineContext { placement: Placement; x: number; y: number; tag: TextPrimitive; count: number }
function lineText(graph: DrawingGraph, id: string, line: string, index: number, context: LineContext): TextPrimitive {
  const { placement, x, y, tag, count } = context;
  const note = (atX: number, atY: number) => text(atX, atY, line, "note", { anchor: placement.anchor });
  if (placement.lines === "over") return note(sheetPx(x), sheetPx(y - (count - 1 - index) * LINE_PITCH));
  const first = placement.heading ? 1.3 : LINE_PITCH;
  if (placement.lines === "beside") {
    if (index > 0) return note(sheetPx(x), sheetPx(y + LINE_PITCH * index));
    const span = textSpan(tag.x, tag.text, tag.size, tag.face, tag.anchor);
    const beside = placement.anchor === "end" ? span.left - 6 : span.right + 6;
    return placement.anchor === "middle" ? note(sheetPx(x), sheetPx(y + LINE_PITCH)) : note(beside, sheetPx(y));
  }
  // A converter letters its first two lines beside the symbol and the rest under it.
  if (symbolOf(graph, id) === "inverter" && index > 1) {
    const box = equipmentBox(graph, id);
    return text(sheetPx(box.x + 0.6), sheetPx(y + first + LINE_PITCH * index), line, "note");
  }
  return note(sheetPx(x), sheetPx(y + first + LINE_PITCH * index));
}

/** Box of a line of lettering, px on the sheet, for underlines and picking. */
export function textBox(words: TextPrimitive): Box {
  const span = textSpan(words.x, words.text, words.size, words.face, words.anchor);
  const rise = words.size * 0.76;
  if (words.turn === -90 || words.turn === 270) {
    return { x: words.x - rise, y: words.y - (span.right - words.x), width: rise * 1.2, height: span.right - span.left };
  }
  return { x: span.left, y: words.y - rise, width: span.right - span.left, height: rise * 1.2 };
}

/** Notes, headings and compartment names that stand on the drawing by themselves, and keynote marks. */
export function textPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const element = graph.drawing.texts[id];
  if (!element) return [];
  const x = sheetPx(element.at.x);
  const y = sheetPx(element.at.y);
  const of = { collection: "texts", id } as const;
  if (element.keynote !== null) return options.detail === "tags" ? [] : owned([keynoteMark(x, y, element.keynote)], of);
  if (options.detail === "tags" && element.style === "note") return [];
  const style: Style = element.style === "note" ? "note" : element.style === "heading" ? "heading" : "compartment";
  const pitch = (LETTERING[style].size / LETTERING.note.size) * LINE_PITCH * PX_PER_UNIT;
  return owned(element.lines.split("\n").map((line, i) => text(
    element.vertical ? x + i * pitch : x, element.vertical ? y : y + i * pitch, letter(line), style, { turn: element.vertical ? -90 : 0 },
  )), of);
}

/** A hexagon with a number that leads to the keynotes. */
export function keynoteMark(x: number, y: number, number: string, radius = 9): Primitive {
  const corner = (i: number) => `${n(radius * Math.cos((Math.PI / 3) * i))} ${n(radius * Math.sin((Math.PI / 3) * i))}`;
  return group([
    path(`M${[0, 1, 2, 3, 4, 5].map(corner).join("L")}Z`, { fill: "paper", weight: 1, layer: "mark" }),
    text(0, 4.5, number, "keynote", { anchor: "middle", layer: "mark" }),
  ], { x, y, layer: "mark" });
}
export const faceOf = (style: Style): Face => LETTERING[style].face;
