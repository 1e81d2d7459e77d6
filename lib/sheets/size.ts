import type { SHEET_SIZES } from "@/lib/diagram/schema";

export type SheetSize = (typeof SHEET_SIZES)[number];
/** Trimmed sizes, long edge first, in. ANSI from ASME Y14.1, ARCH as sold (both from memory, in agreement with common practice). */
export const SHEET_INCHES: Readonly<Record<SheetSize, readonly [number, number]>> = {
  "ANSI B": [17, 11], "ANSI C": [22, 17], "ANSI D": [34, 22], "ANSI E": [44, 34],
  "ARCH B": [18, 12], "ARCH C": [24, 18], "ARCH D": [36, 24], "ARCH E": [48, 36],
};
/** The frame is drawn for a sheet at least this wide, px. */
export const LEAST_WIDTH_PX = 1632;

export interface SheetGeometry { size: SheetSize; widthIn: number; heightIn: number; widthPx: number; heightPx: number; pxPerIn: number; halfSize: string | null }
/**
 * Sheet px of a size. Large sheets are drawn at 48 px to the plotted inch, so that the half-size print has 96;
 * a sheet too small for the frame at that scale gets more px to the inch, and so smaller lettering.
 */
export function sheetGeometry(size: SheetSize): SheetGeometry {
  const [widthIn, heightIn] = SHEET_INCHES[size];
  const pxPerIn = Math.max(48, LEAST_WIDTH_PX / widthIn);
  const half = pxPerIn === 48 ? `HALF SIZE ${widthIn / 2} × ${heightIn / 2}` : null;
  return { size, widthIn, heightIn, pxPerIn, widthPx: Math.round(widthIn * pxPerIn), heightPx: Math.round(heightIn * pxPerIn), halfSize: half };
}
