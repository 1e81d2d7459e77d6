import type { Command } from "@/lib/diagram/commands";
import type { Point, Underlay } from "@/lib/diagram/schema";

/** Corner of the picture that is dragged; the opposite one stays. */
export type UnderlayCorner = "nw" | "ne" | "sw" | "se";
/** Least and most size that the drawing takes, grid units. */
const LEAST = 2;
const MOST = { width: 600, height: 400 };
const half = (value: number): number => Math.round(value * 2) / 2;
const hundredth = (value: number): number => Math.round(value * 100) / 100;

/** The width nearest to the wanted one with which both sides fit the drawing; the sides keep their ratio. */
function sized(underlay: Pick<Underlay, "width" | "height">, wanted: number): { width: number; height: number } {
  const ratio = underlay.height / underlay.width;
  const most = Math.min(MOST.width, MOST.height / ratio);
  const least = Math.max(LEAST, LEAST / ratio);
  const width = Math.min(most, Math.max(least, wanted));
  return { width: hundredth(width), height: hundredth(width * ratio) };
}

/** Command that moves the background by some grid units, or sizes it by a corner. Its sides keep their ratio. */
export function underlayEdit(underlay: Underlay, corner: UnderlayCorner | null, dx: number, dy: number): Command {
  const { at, width, height } = underlay;
  if (corner === null) return { type: "setUnderlay", change: { at: { x: half(at.x + dx), y: half(at.y + dy) } } };
  const east = corner.endsWith("e");
  const south = corner.startsWith("s");
  // The longer way of the two decides, so that the corner follows the pointer.
  const byWidth = width + (east ? dx : -dx);
  const byHeight = (height + (south ? dy : -dy)) * (width / height);
  const size = sized(underlay, half(Math.max(byWidth, byHeight)));
  return { type: "setUnderlay", change: { ...size, at: { x: east ? at.x : hundredth(at.x + width - size.width), y: south ? at.y : hundredth(at.y + height - size.height) } } };
}

/** Command for a typed width, grid units; the height follows. */
export const underlayWidth = (underlay: Underlay, width: number): Command => ({ type: "setUnderlay", change: sized(underlay, width) });

/** Where a picture of this many pixels lies first: as large as the area takes, in its middle. */
export function underlayFor(file: string, picture: { widthPx: number; heightPx: number }, area: { at: Point; width: number; height: number }): Command {
  const scale = Math.min(area.width / picture.widthPx, area.height / picture.heightPx);
  const size = sized({ width: picture.widthPx, height: picture.heightPx }, picture.widthPx * scale);
  return { type: "setUnderlay", change: { file, hidden: false, ...size, at: { x: half(area.at.x + (area.width - size.width) / 2), y: half(area.at.y + (area.height - size.height) / 2) } } };
}
