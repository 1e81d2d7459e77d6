import { numbered, type MarkKind } from "./markKind";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentBox, oneLine, tagBox, type Box, type OneLineOptions } from "@/lib/sheets/oneline";
import { textSpan } from "@/lib/sheets/lettering";
import { isDrawn } from "@/lib/sheets/oneline/appearance";
import { PX_PER_UNIT, sheetPx, type Primitive } from "@/lib/sheets/primitives";
import type { Finding } from "@/lib/rules/engine/types";

export interface PlacedMark {
  readonly finding: Finding;
  readonly kind: MarkKind;
  readonly number: number;
  /** Keys of further findings of the same kind at the same tag: they share the mark, so that a drawing in the making stays readable. */
  readonly also: readonly string[];
  /** Tag that is underlined, px on the sheet. */
  readonly tag: Box;
  /** Center of the mark. */
  readonly x: number;
  readonly y: number;
}

/** Boxes of all lettering on the sheet, which no mark should cover. */
function letteringBoxes(primitives: readonly Primitive[], dx = 0, dy = 0): Box[] {
  return primitives.flatMap((primitive): Box[] => {
    if (primitive.type === "group") return primitive.turn === 0 ? letteringBoxes(primitive.children, dx + primitive.x, dy + primitive.y) : [];
    if (primitive.type !== "text" || primitive.turn !== 0) return [];
    const span = textSpan(primitive.x, primitive.text, primitive.size, primitive.face, primitive.anchor);
    return [{ x: span.left + dx, y: primitive.y + dy - primitive.size * 0.76, width: span.right - span.left, height: primitive.size * 0.95 }];
  });
}

const overlap = (a: Box, b: Box): number =>
  Math.max(0, Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x)) * Math.max(0, Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y));

/**
 * Where the numbered marks stand: beside their tag, at the first place that covers no lettering and no other mark.
 * `scale` is the size of a mark against that at 100 %.
 */
export function placeMarks(graph: DrawingGraph, findings: readonly Finding[], options: OneLineOptions, scale: number): readonly PlacedMark[] {
  const taken = letteringBoxes(oneLine(graph, options));
  // Symbols may be covered at their edge rather than lettering, so they weigh less.
  const symbols = Object.keys(graph.drawing.equipment).filter((id) => graph.drawing.equipment[id]?.size === null && isDrawn(graph, id))
    .map((id) => equipmentBox(graph, id)).map((box): Box => ({ x: sheetPx(box.x), y: sheetPx(box.y), width: box.width * PX_PER_UNIT, height: box.height * PX_PER_UNIT }));
  const half = 11 * scale;
  return together(numbered(findings)).flatMap(({ finding, kind, number, also }): PlacedMark[] => {
    const tag = tagBox(graph, finding.anchor, options);
    if (!tag) return [];
    const middle = tag.y + tag.height / 2;
    const right = tag.x + tag.width;
    const spots = [
      { x: right + half + 4, y: middle }, { x: tag.x - half - 4, y: middle }, { x: right + half, y: middle - half * 1.8 }, { x: right + half, y: middle + half * 1.8 },
      { x: tag.x - half, y: middle - half * 1.8 }, { x: tag.x + tag.width / 2, y: tag.y - half - 3 }, { x: right + half * 3 + 4, y: middle }, { x: right + half * 5 + 4, y: middle },
      { x: tag.x - half * 3 - 4, y: middle }, { x: right + half * 7, y: middle }, { x: right + half * 3, y: middle - half * 2 },
    ].map((spot) => {
      const box = { x: spot.x - half, y: spot.y - half, width: half * 2, height: half * 2 };
      return { ...spot, box, cost: taken.reduce((sum, other) => sum + overlap(box, other), 0) + symbols.reduce((sum, other) => sum + overlap(box, other) / 4, 0) };
    });
    // A mark may touch lettering by a corner; it must not hide it.
    const best = spots.find((spot) => spot.cost < half * half * 0.3) ?? spots.reduce((a, b) => (b.cost < a.cost ? b : a));
    taken.push(best.box);
    return [{ finding, kind, number, also, tag, x: best.x, y: best.y }];
  });
}

type Numbered = ReturnType<typeof numbered>[number];
/** One mark for all findings of one kind at one element; each must-fix keeps its own. */
function together(list: readonly Numbered[]): readonly (Numbered & { also: readonly string[] })[] {
  const groups = new Map<string, Numbered & { also: string[] }>();
  for (const one of list) {
    const { anchor, key } = one.finding;
    const name = one.kind === "must" ? key : `${one.kind} ${anchor.collection}/${anchor.id}`;
    const known = groups.get(name);
    if (known) known.also.push(key);
    else groups.set(name, { ...one, also: [] });
  }
  return [...groups.values()];
}
