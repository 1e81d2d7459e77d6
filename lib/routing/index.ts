import { crossesBox, isOrthogonal, simplify } from "./geometry";
import { buildMesh } from "./mesh";
import { search } from "./search";
import { DEFAULT_ROUTE_OPTIONS, STEPS, type RouteBox, type RouteDirection, type RouteEnd, type RouteField, type RouteOptions, type RoutePoint, type RouteRequest } from "./types";

export * from "./types";
export { crossesBox, isOrthogonal, lengthOf, middleOf, simplify, stretchEnds } from "./geometry";

/**
 * Orthogonal routing of one line. The picture is stored with the drawing and sheets draw what is stored,
 * so a route is asked for only when a line is new or an end has moved; lines already drawn stay as they are.
 */

/** How far around the ends a way is looked for, before the whole sheet is taken. */
const WINDOWS = [12, 40, 400] as const;
const TURNED: Readonly<Record<RouteDirection, RouteDirection>> = { left: "right", right: "left", up: "down", down: "up" };

const stub = (end: RouteEnd, length: number): RoutePoint => {
  if (!end.direction) return end.point;
  const step = STEPS[end.direction];
  return { x: end.point.x + step.x * length, y: end.point.y + step.y * length };
};

function windowAround(points: readonly RoutePoint[], extra: number): RouteBox {
  const xs = points.map((p) => p.x);
  const ys = points.map((p) => p.y);
  const x = Math.min(...xs) - extra;
  const y = Math.min(...ys) - extra;
  return { x, y, width: Math.max(...xs) + extra - x, height: Math.max(...ys) + extra - y };
}

/** One leg between two stops, in the smallest window that holds a way. */
function leg(field: RouteField, from: RoutePoint, to: RoutePoint, leave: RouteDirection | null, enter: RouteDirection | null, options: RouteOptions): RoutePoint[] | null {
  for (const extra of WINDOWS) {
    const mesh = buildMesh(field, [from, to], windowAround([from, to], extra), options);
    const found = search(mesh, from, to, leave, enter, options);
    if (found) return found;
  }
  return null;
}

function lastDirection(points: readonly RoutePoint[]): RouteDirection | null {
  const b = points.at(-1);
  const a = points.at(-2);
  if (!a || !b) return null;
  return a.x < b.x ? "right" : a.x > b.x ? "left" : a.y < b.y ? "down" : "up";
}

/** A plain line with one or two bends, for when every way is blocked: the person sees it and moves something. */
function plain(points: readonly RoutePoint[]): RoutePoint[] {
  const line: RoutePoint[] = [];
  points.forEach((point, i) => {
    const last = points[i - 1];
    if (last && last.x !== point.x && last.y !== point.y) line.push({ x: point.x, y: last.y });
    line.push(point);
  });
  return line;
}

/**
 * Points of an orthogonal line from one end to the other, both included, through every via, around every box.
 * Grid units. When no way exists the answer is a plain line that crosses what is in its way; `blocked` tells.
 */
export function route(request: RouteRequest, field: RouteField, options: RouteOptions = DEFAULT_ROUTE_OPTIONS): { points: RoutePoint[]; blocked: boolean } {
  const start = stub(request.from, options.margin);
  const end = stub(request.to, options.margin);
  // A stub that ends inside a box would be walled in: such a box is left out, and the line leaves it the short way.
  const walled = (box: RouteBox, p: RoutePoint) => p.x > box.x && p.x < box.x + box.width && p.y > box.y && p.y < box.y + box.height;
  const obstacles = field.obstacles.filter((box) => !walled(box, start) && !walled(box, end) && !request.via.some((via) => walled(box, via)));
  const open = { ...field, obstacles };
  const straight = simplify([request.from.point, start, end, request.to.point]);
  if (request.via.length === 0 && straight.length === 2 && isOrthogonal(straight) && !obstacles.some((box) => crossesBox(straight, box)) && facing(request)) return { points: straight, blocked: false };
  const stops = [start, ...request.via, end];
  let line: RoutePoint[] = [request.from.point];
  let direction = request.from.direction;
  for (let i = 1; i < stops.length; i++) {
    const last = i === stops.length - 1;
    const enter = last && request.to.direction ? TURNED[request.to.direction] : null;
    const found = leg(open, stops[i - 1] as RoutePoint, stops[i] as RoutePoint, direction, enter, options)
      ?? leg(open, stops[i - 1] as RoutePoint, stops[i] as RoutePoint, null, null, options);
    if (!found) return { points: simplify(plain([request.from.point, ...stops, request.to.point])), blocked: true };
    line = [...line, ...found];
    direction = lastDirection(simplify(line)) ?? direction;
  }
  return { points: simplify([...line, request.to.point]), blocked: false };
}

/** True when neither end asks the line to leave away from the other one. */
function facing(request: RouteRequest): boolean {
  const along = (end: RouteEnd, other: RoutePoint): boolean => {
    if (!end.direction) return true;
    const step = STEPS[end.direction];
    return step.x * (other.x - end.point.x) + step.y * (other.y - end.point.y) > 0;
  };
  return along(request.from, request.to.point) && along(request.to, request.from.point);
}
