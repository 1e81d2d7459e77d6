import type { Drawing, Point } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";

interface Box { x: number; y: number; width: number; height: number }
/** Room kept around a box, and the steps in which a place is looked for, grid units. */
const GAP = 2;
const STEP = 2;
/** Part of the sheet that is looked through: inside the frame of the smallest sheet, left of the title block. */
const AREA = { left: 2, top: 2, right: 100, bottom: 70 };

const meet = (a: Box, b: Box): boolean => a.x < b.x + b.width + GAP && b.x < a.x + a.width + GAP && a.y < b.y + b.height + GAP && b.y < a.y + a.height + GAP;

/** Boxes of everything that stands on the sheet by itself. A turned symbol keeps its longer side free both ways. */
function boxes(drawing: Drawing): Box[] {
  const equipment = Object.values(drawing.equipment).filter((each) => each.parent === null && !each.offSheet).map((each): Box => {
    if (each.size) return { ...each.at, ...each.size };
    const { x, y, width, height } = kindDefinition(each.kind).box;
    const reach = Math.max(Math.abs(x), Math.abs(y), Math.abs(x + width), Math.abs(y + height));
    return each.rotation === 0 && !each.mirrored ? { x: each.at.x + x, y: each.at.y + y, width, height } : { x: each.at.x - reach, y: each.at.y - reach, width: 2 * reach, height: 2 * reach };
  });
  const raceways = Object.values(drawing.raceways).filter((each) => !each.offSheet).map((each): Box => ({ ...each.at, ...each.size }));
  return [...equipment, ...raceways];
}

/** First place, read row by row, where a box of this size touches nothing; the upper left corner where there is none. */
export function freePlace(drawing: Drawing, width: number, height: number, also: readonly Box[] = []): Point {
  const taken = [...boxes(drawing), ...also];
  for (let y = AREA.top; y + height <= AREA.bottom; y += STEP) {
    for (let x = AREA.left; x + width <= AREA.right; x += STEP) {
      if (!taken.some((box) => meet(box, { x, y, width, height }))) return { x, y };
    }
  }
  return { x: AREA.left, y: AREA.top };
}
