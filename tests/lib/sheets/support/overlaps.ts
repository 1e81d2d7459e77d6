import { flatten, type Contour, type FlatPath, type XY } from "@/lib/sheets/geometry";
import { textSpan } from "@/lib/sheets/lettering";
import type { Primitive, TextPrimitive } from "@/lib/sheets/primitives";

/** Four corners of a line of capitals, turned as drawn; px. */
export function corners(text: TextPrimitive, inset = 0): XY[] {
  const { left, right } = textSpan(text.x, text.text, text.size, text.face, text.anchor);
  const top = text.y - text.size * 0.72 + inset;
  const bottom = text.y - inset;
  const angle = (text.turn * Math.PI) / 180;
  return ([[left + inset, top], [right - inset, top], [right - inset, bottom], [left + inset, bottom]] as const).map(([x, y]) => ({
    x: text.x + (x - text.x) * Math.cos(angle) - (y - text.y) * Math.sin(angle),
    y: text.y + (x - text.x) * Math.sin(angle) + (y - text.y) * Math.cos(angle),
  }));
}

const side = (a: XY, b: XY, p: XY): number => (b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x);
const insideConvex = (shape: readonly XY[], p: XY): boolean => {
  const signs = shape.map((a, i) => Math.sign(side(a, shape[(i + 1) % shape.length] as XY, p)));
  return signs.every((s) => s >= 0) || signs.every((s) => s <= 0);
};
const insideContour = (shape: Contour, p: XY): boolean => {
  let inside = false;
  shape.forEach((a, i) => {
    const b = shape[(i + 1) % shape.length] as XY;
    if (a.y > p.y !== b.y > p.y && p.x < ((b.x - a.x) * (p.y - a.y)) / (b.y - a.y) + a.x) inside = !inside;
  });
  return inside;
};
/** Two convex shapes overlap unless a side of one separates them. */
const overlapConvex = (a: readonly XY[], b: readonly XY[]): boolean => ![a, b].some((shape) => shape.some((p, i) => {
  const q = shape[(i + 1) % shape.length] as XY;
  const n = { x: q.y - p.y, y: p.x - q.x };
  const span = (s: readonly XY[]) => s.map((v) => v.x * n.x + v.y * n.y);
  const one = span(a), two = span(b);
  return Math.max(...one) <= Math.min(...two) || Math.max(...two) <= Math.min(...one);
}));

interface Bounds { left: number; top: number; right: number; bottom: number }
const boundsOf = (points: readonly XY[]): Bounds => {
  const b = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity };
  for (const p of points) { b.left = Math.min(b.left, p.x); b.right = Math.max(b.right, p.x); b.top = Math.min(b.top, p.y); b.bottom = Math.max(b.bottom, p.y); }
  return b;
};
const apart = (a: Bounds, b: Bounds): boolean => a.right < b.left || b.right < a.left || a.bottom < b.top || b.bottom < a.top;

/** Free paper that a line of lettering keeps to every line's middle, px. */
const CLEAR_PX = 1.5;

export interface Overlap { text: string; with: string; x: number; y: number }
const named = (path: FlatPath): string => `${path.source.of ? `${path.source.of.collection}/${path.source.of.id}` : path.source.layer} line`;

/** Ownership of a group passes to what is in it. */
const inherit = (primitives: readonly Primitive[], of?: Primitive["of"]): Primitive[] => primitives.map((each) => {
  const owner = each.of ?? of;
  const own = owner ? { ...each, of: owner } : each;
  return own.type === "group" ? { ...own, children: inherit(own.children, owner) } : own;
});

/**
 * Words that lie on other words or on a line. What is covered by a filled shape drawn later than the line, and before
 * the words, does not show and does not count.
 */
export function overlaps(primitives: readonly Primitive[]): Overlap[] {
  const flat = flatten(inherit(primitives));
  const texts = flat.flatMap((each, order) => (each.type === "text" && each.text.text.trim() ? [{ text: each.text, order }] : []));
  const paths = flat.flatMap((each, order) => (each.type === "path" ? [{ path: each, order, bounds: boundsOf(each.contours.flat()) }] : []));
  const covers = paths.filter(({ path }) => path.fill === "paper" || path.fill === "ww");
  const found: Overlap[] = [];
  texts.forEach(({ text, order }, i) => {
    const own = corners(text, -CLEAR_PX);
    const around = boundsOf(own);
    const report = (what: string) => found.push({ text: text.text, with: what, x: Math.round(text.x), y: Math.round(text.y) });
    for (const other of texts.slice(i + 1)) if (overlapConvex(corners(text, 0.6), corners(other.text, 0.6))) report(other.text.text);
    for (const line of paths) {
      if (line.path.stroke === null && line.path.fill !== "ink") continue;
      if (line.path.stroke === "paper" || apart(line.bounds, around)) continue;
      const seen = line.path.contours.some((contour) => contour.slice(1).some((b, k) => {
        const a = contour[k] as XY;
        if (apart(boundsOf([a, b]), around)) return false;
        const steps = Math.max(1, Math.ceil(Math.hypot(b.x - a.x, b.y - a.y) / 1.5));
        for (let s = 0; s <= steps; s += 1) {
          const p = { x: a.x + ((b.x - a.x) * s) / steps, y: a.y + ((b.y - a.y) * s) / steps };
          if (!insideConvex(own, p)) continue;
          const hidden = covers.some((cover) => cover.order > line.order && cover.order < order && cover.path.contours.some((shape) => insideContour(shape, p)));
          if (!hidden) return true;
        }
        return false;
      }));
      if (seen) report(named(line.path));
    }
  });
  return found;
}
