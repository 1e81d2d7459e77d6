import type { Point } from "@/lib/diagram/schema";
import { FRAME_ORIGIN_PX, PX_PER_UNIT, sheetPx } from "@/lib/sheets/primitives";

/** Grid units from px of the sheet at 100 %. */
export const toUnits = (px: number): number => (px - FRAME_ORIGIN_PX) / PX_PER_UNIT;
export const pointToUnits = (point: Point): Point => ({ x: toUnits(point.x), y: toUnits(point.y) });
export const pointToPx = (point: Point): Point => ({ x: sheetPx(point.x), y: sheetPx(point.y) });
/** Nearest grid point. */
export const snapped = (point: Point): Point => ({ x: Math.round(point.x), y: Math.round(point.y) });
/** SVG path of a line given in grid units. */
export const pathData = (points: readonly Point[]): string => points.map((p, i) => `${i ? "L" : "M"}${sheetPx(p.x).toFixed(1)} ${sheetPx(p.y).toFixed(1)}`).join("");
