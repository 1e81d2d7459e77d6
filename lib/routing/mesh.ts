import { EPSILON } from "./geometry";
import type { RouteBox, RouteField, RouteOptions, RoutePoint } from "./types";

/** Where lines may run: every crossing of an x with a y is a place a line may bend. */
export interface Mesh {
  readonly xs: readonly number[];
  readonly ys: readonly number[];
  /** Price beyond length of going from column i to i + 1 on row j; Infinity where a box stands. */
  across(i: number, j: number): number;
  /** The same from row j to j + 1 on column i. */
  down(i: number, j: number): number;
}

interface Span { at: number; low: number; high: number }

/** Sorted, with near-equal values made one. */
function distinct(values: readonly number[], low: number, high: number): number[] {
  const sorted = values.filter((v) => v >= low - EPSILON && v <= high + EPSILON).sort((a, b) => a - b);
  return sorted.filter((v, i) => i === 0 || v - (sorted[i - 1] as number) > EPSILON);
}

function pieces(lines: RouteField["lines"], horizontal: boolean): Span[] {
  const spans: Span[] = [];
  for (const line of lines) {
    for (let i = 1; i < line.length; i++) {
      const a = line[i - 1] as RoutePoint;
      const b = line[i] as RoutePoint;
      if (horizontal && Math.abs(a.y - b.y) < EPSILON && Math.abs(a.x - b.x) > EPSILON) spans.push({ at: a.y, low: Math.min(a.x, b.x), high: Math.max(a.x, b.x) });
      if (!horizontal && Math.abs(a.x - b.x) < EPSILON && Math.abs(a.y - b.y) > EPSILON) spans.push({ at: a.x, low: Math.min(a.y, b.y), high: Math.max(a.y, b.y) });
    }
  }
  return spans;
}

/** Prices of the steps along one row (or column), counted when the row is first asked for. */
function steps(cuts: readonly number[], at: number, boxes: readonly Span[][], along: readonly Span[], crossing: readonly Span[], options: RouteOptions): Float64Array {
  const prices = new Float64Array(Math.max(0, cuts.length - 1));
  const blocks = boxes.filter((pair) => (pair[0] as Span).low < at - EPSILON && (pair[0] as Span).high > at + EPSILON).map((pair) => pair[1] as Span);
  // Closer than half the spacing reads as one line on paper.
  const near = along.filter((span) => Math.abs(span.at - at) < options.spacing / 2 - EPSILON);
  const crossed = crossing.filter((span) => span.low < at - EPSILON && span.high > at + EPSILON);
  for (let i = 0; i < prices.length; i++) {
    const a = cuts[i] as number;
    const b = cuts[i + 1] as number;
    const overlaps = (span: Span): boolean => span.low < b - EPSILON && span.high > a + EPSILON;
    if (blocks.some(overlaps)) { prices[i] = Infinity; continue; }
    let price = 0;
    for (const span of near) if (overlaps(span)) price += options.overlapCost * (b - a);
    for (const span of crossed) if (span.at > a + EPSILON && span.at <= b + EPSILON) price += options.crossingCost;
    prices[i] = price;
  }
  return prices;
}

/** Builds the mesh inside a window. `points` are places that must be on it: ends, stubs and vias. */
export function buildMesh(field: RouteField, points: readonly RoutePoint[], window: RouteBox, options: RouteOptions): Mesh {
  const right = window.x + window.width;
  const bottom = window.y + window.height;
  const boxes = field.obstacles.filter((b) => b.x < right && b.x + b.width > window.x && b.y < bottom && b.y + b.height > window.y);
  const rows = pieces(field.lines, true);
  const columns = pieces(field.lines, false);
  const inside = (low: number, high: number, span: Span) => span.low < high && span.high > low;
  const xs = distinct([
    window.x, right, ...points.map((p) => p.x), ...boxes.flatMap((b) => [b.x - options.margin, b.x + b.width + options.margin]),
    ...columns.filter((s) => inside(window.y, bottom, s)).flatMap((s) => [s.at - options.spacing, s.at + options.spacing]),
  ], window.x, right);
  const ys = distinct([
    window.y, bottom, ...points.map((p) => p.y), ...boxes.flatMap((b) => [b.y - options.margin, b.y + b.height + options.margin]),
    ...rows.filter((s) => inside(window.x, right, s)).flatMap((s) => [s.at - options.spacing, s.at + options.spacing]),
  ], window.y, bottom);
  const asRows = boxes.map((b): Span[] => [{ at: 0, low: b.y, high: b.y + b.height }, { at: 0, low: b.x, high: b.x + b.width }]);
  const asColumns = boxes.map((b): Span[] => [{ at: 0, low: b.x, high: b.x + b.width }, { at: 0, low: b.y, high: b.y + b.height }]);
  const acrossRows = new Map<number, Float64Array>();
  const downColumns = new Map<number, Float64Array>();
  return {
    xs, ys,
    across: (i, j) => {
      let prices = acrossRows.get(j);
      if (!prices) acrossRows.set(j, prices = steps(xs, ys[j] as number, asRows, rows, columns, options));
      return prices[i] as number;
    },
    down: (i, j) => {
      let prices = downColumns.get(i);
      if (!prices) downColumns.set(i, prices = steps(ys, xs[i] as number, asColumns, columns, rows, options));
      return prices[j] as number;
    },
  };
}
