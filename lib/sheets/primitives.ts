import type { ElementRef } from "@/lib/diagram/schema";

/**
 * What a sheet is made of. The canvas, the previews and the PDF draw the same primitives, so what is on
 * the sheet is what prints. Lengths are px at half size: 12 px a grid unit, 96 px to the inch on the
 * 17 × 11 in print of an ANSI D sheet.
 */
export const PX_PER_UNIT = 12;
/** Place of the drawing's origin (the inner frame's corner) on the sheet, px. */
export const FRAME_ORIGIN_PX = 60;
/** Sheet px of a coordinate given in grid units. */
export const sheetPx = (units: number): number => FRAME_ORIGIN_PX + units * PX_PER_UNIT;

/** Names of inks; the screen resolves them by theme, the print by `PRINT_INKS`. */
export const INKS = ["ink", "ink2", "paper", "ww", "pv", "bat", "seal", "red", "copper"] as const;
export type Ink = (typeof INKS)[number];
export const FACES = ["normal", "narrow"] as const;
export type Face = (typeof FACES)[number];
export type Anchor = "start" | "middle" | "end";

/** Dash patterns, px of line and gap by turns. The pattern tells the system, color only repeats it. */
export const DASHES = {
  solid: [],
  "pv-dc": [15, 4],
  ground: [11, 3, 2.2, 3],
  data: [4.5, 3],
  enclosure: [12, 4],
  link: [5, 3.5],
  unrouted: [2, 5],
  placeholder: [3, 4],
} as const satisfies Record<string, readonly number[]>;
export type Dash = keyof typeof DASHES;

/** Line weights, px. At full size 1 px is 1/48 in (0.53 mm). */
export const WEIGHTS = {
  bus: 4.4, busThin: 3, power: 1.9, battery: 5.2, batteryCore: 2.2, ground: 1.4, data: 1.1,
  lead: 1.9, symbol: 1.45, outline: 1.35, enclosure: 1, band: 1.1, bandInner: 0.6, mark: 1, nipple: 1.6, leader: 0.7,
  frame: 2, border: 0.8, tableOutline: 1.3, tableLine: 0.7, seal: 1.1,
} as const;

/** Lettering. `tag` is also stroked in its own ink, which makes it bold from the same outlines. */
export const LETTERING = {
  tag: { size: 13, face: "normal", bold: 0.35 },
  tagNarrow: { size: 13, face: "narrow", bold: 0.35 },
  heading: { size: 17, face: "normal", bold: 0.5 },
  note: { size: 13, face: "narrow", bold: 0 },
  callout: { size: 13, face: "normal", bold: 0 },
  keynote: { size: 12.6, face: "normal", bold: 0 },
  compartment: { size: 21, face: "narrow", bold: 0 },
} as const satisfies Record<string, { size: number; face: Face; bold: number }>;
export type Style = keyof typeof LETTERING;

/** Order in which things are laid over each other on the sheet. */
export const LAYERS = ["ground", "wire", "bus", "symbol", "mark", "text"] as const;
export type Layer = (typeof LAYERS)[number];

interface Base { layer: Layer; /** Element of the drawing that it belongs to, for picking and for tests. */ of?: ElementRef }
export interface PathPrimitive extends Base {
  type: "path";
  /** SVG path data; only M L H V A Q C S Z, upper or lower case. */
  d: string;
  stroke: Ink | null;
  fill: Ink | null;
  weight: number;
  dash: Dash;
  cap: "butt" | "round" | "square";
}
export interface TextPrimitive extends Base {
  type: "text";
  /** Place of the baseline's anchor. */
  x: number;
  y: number;
  text: string;
  size: number;
  face: Face;
  ink: Ink;
  /** Width of the stroke that makes it bold; 0 is plain. */
  bold: number;
  anchor: Anchor;
  /** Degrees clockwise about the anchor. */
  turn: number;
}
export interface ImagePrimitive extends Base {
  type: "image";
  x: number; y: number; width: number; height: number;
  /** PNG as a data address. */
  href: string;
}
/** Children are turned about the origin, mirrored left to right, scaled, then moved: move · turn · mirror · scale. */
export interface GroupPrimitive extends Base {
  type: "group";
  x: number;
  y: number;
  turn: number;
  mirrored: boolean;
  scale: number;
  children: readonly Primitive[];
}
export type Primitive = PathPrimitive | TextPrimitive | ImagePrimitive | GroupPrimitive;

type PathExtra = Partial<Omit<PathPrimitive, "type" | "d">>;
/** A stroked path in ink, unless said otherwise. */
export function path(d: string, extra: PathExtra = {}): PathPrimitive {
  return { type: "path", d, stroke: "ink", fill: null, weight: WEIGHTS.symbol, dash: "solid", cap: "butt", layer: "symbol", ...extra };
}
/** An axis-parallel box. */
export function box(x: number, y: number, width: number, height: number, extra: PathExtra = {}): PathPrimitive {
  return path(`M${n(x)} ${n(y)}H${n(x + width)}V${n(y + height)}H${n(x)}Z`, { layer: "ground", ...extra });
}
/** A straight line through points. */
export function polyline(points: readonly { x: number; y: number }[], extra: PathExtra = {}): PathPrimitive {
  return path(points.map((p, i) => `${i ? "L" : "M"}${n(p.x)} ${n(p.y)}`).join(""), { layer: "wire", ...extra });
}
/** Path data of a circle or an ellipse. */
export const ellipseData = (cx: number, cy: number, rx: number, ry = rx): string =>
  `M${n(cx - rx)} ${n(cy)}A${n(rx)} ${n(ry)} 0 1 0 ${n(cx + rx)} ${n(cy)}A${n(rx)} ${n(ry)} 0 1 0 ${n(cx - rx)} ${n(cy)}Z`;

type TextExtra = Partial<Omit<TextPrimitive, "type" | "x" | "y" | "text">>;
/** A line of lettering in one of the named styles. */
export function text(x: number, y: number, words: string, style: Style, extra: TextExtra = {}): TextPrimitive {
  return { type: "text", x, y, text: words, ...LETTERING[style], ink: "ink", anchor: "start", turn: 0, layer: "text", ...extra };
}
/** Children moved, turned or mirrored together. */
export function group(children: readonly Primitive[], extra: Partial<Omit<GroupPrimitive, "type" | "children">> = {}): GroupPrimitive {
  return { type: "group", x: 0, y: 0, turn: 0, mirrored: false, scale: 1, layer: "symbol", children, ...extra };
}
/** Marks primitives as belonging to an element. */
export function owned<P extends Primitive>(primitives: readonly P[], of: ElementRef): P[] {
  return primitives.map((primitive) => ({ ...primitive, of }));
}
/** Sorted by layer; within a layer the given order stays. */
export function layered(primitives: readonly Primitive[]): Primitive[] {
  return LAYERS.flatMap((layer) => primitives.filter((primitive) => primitive.layer === layer));
}

/** A number for path data: at most two decimals, never -0. */
export function n(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return String(rounded === 0 ? 0 : rounded);
}
