import type { Ink, PathPrimitive, Primitive, TextPrimitive } from "./primitives";

export interface XY { x: number; y: number }
/** A turn, mirror, scale and move, applied to points: x' = ax + cy + e, y' = bx + dy + f. */
type Matrix = readonly [number, number, number, number, number, number];
const IDENTITY: Matrix = [1, 0, 0, 1, 0, 0];
const times = (m: Matrix, k: Matrix): Matrix => [
  m[0] * k[0] + m[2] * k[1], m[1] * k[0] + m[3] * k[1], m[0] * k[2] + m[2] * k[3], m[1] * k[2] + m[3] * k[3],
  m[0] * k[4] + m[2] * k[5] + m[4], m[1] * k[4] + m[3] * k[5] + m[5],
];
const apply = (m: Matrix, p: XY): XY => ({ x: m[0] * p.x + m[2] * p.y + m[4], y: m[1] * p.x + m[3] * p.y + m[5] });

/** Straight pieces of one contour; curves are broken into pieces of about 2 px. */
export type Contour = readonly XY[];
const CURVE_STEPS = 12;

/** Points of an elliptical arc between two points, after the SVG specification's conversion (no x-axis rotation is used here). */
function arc(from: XY, rx0: number, ry0: number, large: boolean, sweep: boolean, to: XY): XY[] {
  if (from.x === to.x && from.y === to.y) return [];
  const hx = (from.x - to.x) / 2, hy = (from.y - to.y) / 2;
  const grow = Math.max(1, Math.sqrt((hx / rx0) ** 2 + (hy / ry0) ** 2));
  const rx = rx0 * grow, ry = ry0 * grow;
  const under = Math.max(0, (rx * ry) ** 2 - (rx * hy) ** 2 - (ry * hx) ** 2) / ((rx * hy) ** 2 + (ry * hx) ** 2);
  const k = (large === sweep ? -1 : 1) * Math.sqrt(under);
  const cx = (k * rx * hy) / ry + (from.x + to.x) / 2, cy = (-k * ry * hx) / rx + (from.y + to.y) / 2;
  const start = Math.atan2((from.y - cy) / ry, (from.x - cx) / rx);
  let turn = Math.atan2((to.y - cy) / ry, (to.x - cx) / rx) - start;
  if (sweep && turn < 0) turn += 2 * Math.PI;
  if (!sweep && turn > 0) turn -= 2 * Math.PI;
  return Array.from({ length: CURVE_STEPS }, (_, i) => {
    const angle = start + (turn * (i + 1)) / CURVE_STEPS;
    return { x: cx + rx * Math.cos(angle), y: cy + ry * Math.sin(angle) };
  });
}

const bezier = (points: readonly XY[], t: number): XY =>
  points.length === 1 ? (points[0] as XY) : bezier(points.slice(1).map((p, i) => {
    const before = points[i] as XY;
    return { x: before.x + (p.x - before.x) * t, y: before.y + (p.y - before.y) * t };
  }), t);

/** Contours of path data. @throws RangeError on a command that primitives do not use */
export function contours(d: string): Contour[] {
  const tokens = d.match(/[a-zA-Z]|-?(?:\d+\.?\d*|\.\d+)(?:e-?\d+)?/g) ?? [];
  const found: XY[][] = [];
  let at: XY = { x: 0, y: 0 };
  let start: XY = at;
  let line: XY[] = [];
  let control: XY = at;
  let command = "";
  let i = 0;
  const number = () => Number(tokens[i++]);
  const point = (relative: boolean): XY => { const x = number(), y = number(); return relative ? { x: at.x + x, y: at.y + y } : { x, y }; };
  const to = (p: XY) => { line.push(p); at = p; };
  while (i < tokens.length) {
    if (/[a-zA-Z]/.test(tokens[i] as string)) command = tokens[i++] as string;
    const relative = command === command.toLowerCase();
    switch (command.toUpperCase()) {
      case "M": at = point(relative); start = at; line = [at]; found.push(line); command = relative ? "l" : "L"; break;
      case "L": to(point(relative)); break;
      case "H": { const x = number(); to({ x: relative ? at.x + x : x, y: at.y }); break; }
      case "V": { const y = number(); to({ x: at.x, y: relative ? at.y + y : y }); break; }
      case "A": {
        const rx = number(), ry = number(); number();
        const large = number() === 1, sweep = number() === 1, end = point(relative);
        line.push(...arc(at, rx, ry, large, sweep, end)); at = end; break;
      }
      case "Q": case "C": case "S": {
        const from = at;
        const upper = command.toUpperCase();
        // A smooth curve starts as the curve before it ended.
        const first = upper === "S" ? [{ x: 2 * from.x - control.x, y: 2 * from.y - control.y }] : [];
        const controls = [from, ...first, ...Array.from({ length: upper === "C" ? 3 : 2 }, () => point(relative))];
        control = controls.at(-2) as XY;
        for (let s = 1; s <= CURVE_STEPS; s += 1) line.push(bezier(controls, s / CURVE_STEPS));
        at = controls.at(-1) as XY; break;
      }
      case "Z": line.push(start); at = start; line = [at]; found.push(line); break;
      default: throw new RangeError(`path command ${command} is not drawn`);
    }
  }
  return found.filter((contour) => contour.length > 1);
}

export interface FlatPath { type: "path"; contours: Contour[]; fill: Ink | null; stroke: Ink | null; weight: number; source: PathPrimitive }
export interface FlatText { type: "text"; text: TextPrimitive }
/** Primitives in drawing order with groups resolved: sheet px everywhere. Images are left out. */
export function flatten(primitives: readonly Primitive[], matrix: Matrix = IDENTITY): (FlatPath | FlatText)[] {
  return primitives.flatMap((each): (FlatPath | FlatText)[] => {
    if (each.type === "image") return [];
    if (each.type === "group") {
      const angle = (each.turn * Math.PI) / 180;
      const cos = Math.round(Math.cos(angle) * 1e9) / 1e9, sin = Math.round(Math.sin(angle) * 1e9) / 1e9;
      const sx = each.mirrored ? -each.scale : each.scale;
      return flatten(each.children, times(matrix, [cos * sx, sin * sx, -sin * each.scale, cos * each.scale, each.x, each.y]));
    }
    const scale = Math.hypot(matrix[0], matrix[1]);
    if (each.type === "text") {
      const p = apply(matrix, each);
      return [{ type: "text", text: { ...each, ...p, size: each.size * scale } }];
    }
    return [{ type: "path", contours: contours(each.d).map((c) => c.map((p) => apply(matrix, p))), fill: each.fill, stroke: each.stroke, weight: each.weight * scale, source: each }];
  });
}

export interface Bounds { left: number; top: number; right: number; bottom: number }
/** Bounds of the paths among primitives, px; null without any. Line weights are not counted. */
export function boundsOf(primitives: readonly Primitive[]): Bounds | null {
  const points = flatten(primitives).flatMap((each) => (each.type === "path" ? each.contours.flat() : []));
  if (points.length === 0) return null;
  const xs = points.map((p) => p.x), ys = points.map((p) => p.y);
  return { left: Math.min(...xs), top: Math.min(...ys), right: Math.max(...xs), bottom: Math.max(...ys) };
}
