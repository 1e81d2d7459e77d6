import type { RouteBox, RoutePoint } from "./types";

/** Two values on the same line: well below a printed line's width. */
export const EPSILON = 1e-6;
const same = (a: number, b: number): boolean => Math.abs(a - b) < EPSILON;

/** Leaves out repeated points and points in the middle of a straight piece. */
export function simplify(points: readonly RoutePoint[]): RoutePoint[] {
  const kept: RoutePoint[] = [];
  for (const point of points) {
    const last = kept.at(-1);
    if (last && same(last.x, point.x) && same(last.y, point.y)) continue;
    const before = kept.at(-2);
    const straight = before && last && ((same(before.x, last.x) && same(last.x, point.x)) || (same(before.y, last.y) && same(last.y, point.y)));
    // A line that turns back on itself keeps its far point: leaving it out would shorten the line.
    const forward = before && last && (last.x - before.x) * (point.x - last.x) + (last.y - before.y) * (point.y - last.y) > 0;
    if (straight && forward) kept.pop();
    kept.push({ x: point.x, y: point.y });
  }
  return kept;
}

/** Length along the line, grid units. */
export function lengthOf(points: readonly RoutePoint[]): number {
  let total = 0;
  for (let i = 1; i < points.length; i++) {
    const a = points[i - 1] as RoutePoint;
    const b = points[i] as RoutePoint;
    total += Math.abs(a.x - b.x) + Math.abs(a.y - b.y);
  }
  return total;
}

/** True when every piece is horizontal or vertical. */
export function isOrthogonal(points: readonly RoutePoint[]): boolean {
  return points.every((point, i) => {
    const before = points[i - 1];
    return !before || same(before.x, point.x) || same(before.y, point.y);
  });
}

/** True when an orthogonal line runs through the inside of the box; touching its edge does not count. */
export function crossesBox(points: readonly RoutePoint[], box: RouteBox): boolean {
  for (let i = 1; i < points.length; i++) {
    const a = points[i - 1] as RoutePoint;
    const b = points[i] as RoutePoint;
    if (Math.max(a.x, b.x) > box.x + EPSILON && Math.min(a.x, b.x) < box.x + box.width - EPSILON
      && Math.max(a.y, b.y) > box.y + EPSILON && Math.min(a.y, b.y) < box.y + box.height - EPSILON) return true;
  }
  return false;
}

/** Moves the ends of a drawn line to new places and keeps its inner bends, so that hand work outlives a move. */
export function stretchEnds(points: readonly RoutePoint[], from: RoutePoint, to: RoutePoint): RoutePoint[] | null {
  if (points.length < 2) return null;
  const moved = points.map((point) => ({ ...point }));
  const move = (index: number, next: number, place: RoutePoint): boolean => {
    const end = moved[index] as { x: number; y: number };
    const neighbor = moved[next] as { x: number; y: number };
    const dx = place.x - end.x;
    const dy = place.y - end.y;
    if (same(dx, 0) && same(dy, 0)) return true;
    const horizontal = same(end.y, neighbor.y);
    const vertical = same(end.x, neighbor.x);
    // The neighbor follows sideways; it must not be the other end, which stays where it is.
    const fixed = next === 0 || next === moved.length - 1;
    if ((horizontal && !same(dy, 0) && fixed) || (vertical && !same(dx, 0) && fixed)) return false;
    if (horizontal && !vertical) neighbor.y += dy;
    else if (vertical && !horizontal) neighbor.x += dx;
    end.x = place.x;
    end.y = place.y;
    return true;
  };
  if (!move(0, 1, from) || !move(moved.length - 1, moved.length - 2, to)) return null;
  return isOrthogonal(moved) ? moved : null;
}

/** Point of the line halfway along it: where a callout goes. */
export function middleOf(points: readonly RoutePoint[]): RoutePoint | null {
  const half = lengthOf(points) / 2;
  let walked = 0;
  for (let i = 1; i < points.length; i++) {
    const a = points[i - 1] as RoutePoint;
    const b = points[i] as RoutePoint;
    const piece = Math.abs(a.x - b.x) + Math.abs(a.y - b.y);
    if (walked + piece >= half && piece > 0) {
      const t = (half - walked) / piece;
      return { x: a.x + (b.x - a.x) * t, y: a.y + (b.y - a.y) * t };
    }
    walked += piece;
  }
  return points[0] ?? null;
}
