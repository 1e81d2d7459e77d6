import { EPSILON } from "./geometry";
import type { Mesh } from "./mesh";
import type { RouteDirection, RouteOptions, RoutePoint } from "./types";

const ORDER: readonly RouteDirection[] = ["right", "down", "left", "up"];
const OPPOSITE = [2, 3, 0, 1] as const;

/** Smallest-first queue of states; equal prices leave in the order they came, so that results repeat. */
class Queue {
  private readonly items: { state: number; price: number; turn: number }[] = [];
  private turn = 0;
  private before(a: number, b: number): boolean {
    const x = this.items[a] as { price: number; turn: number };
    const y = this.items[b] as { price: number; turn: number };
    return x.price < y.price - 1e-9 || (Math.abs(x.price - y.price) <= 1e-9 && x.turn < y.turn);
  }
  private swap(a: number, b: number): void {
    const item = this.items[a] as Queue["items"][number];
    this.items[a] = this.items[b] as Queue["items"][number];
    this.items[b] = item;
  }
  push(state: number, price: number): void {
    this.items.push({ state, price, turn: this.turn++ });
    for (let i = this.items.length - 1; i > 0;) {
      const parent = (i - 1) >> 1;
      if (!this.before(i, parent)) break;
      this.swap(i, parent);
      i = parent;
    }
  }
  pop(): number | null {
    const top = this.items[0];
    const last = this.items.pop();
    if (!top || !last) return null;
    if (this.items.length === 0) return top.state;
    this.items[0] = last;
    for (let i = 0; ;) {
      const left = 2 * i + 1;
      const right = left + 1;
      let least = i;
      if (left < this.items.length && this.before(left, least)) least = left;
      if (right < this.items.length && this.before(right, least)) least = right;
      if (least === i) break;
      this.swap(i, least);
      i = least;
    }
    return top.state;
  }
}

const indexOf = (values: readonly number[], value: number): number => values.findIndex((v) => Math.abs(v - value) < EPSILON);

/**
 * Cheapest way over the mesh from one place to another (A*; a state is a place and the direction of arrival).
 * `leave` and `enter` fix the first and last direction. Null when there is none.
 */
export function search(mesh: Mesh, from: RoutePoint, to: RoutePoint, leave: RouteDirection | null, enter: RouteDirection | null, options: RouteOptions): RoutePoint[] | null {
  const { xs, ys } = mesh;
  const [sx, sy, tx, ty] = [indexOf(xs, from.x), indexOf(ys, from.y), indexOf(xs, to.x), indexOf(ys, to.y)];
  if (sx < 0 || sy < 0 || tx < 0 || ty < 0) return null;
  // One state more than places and directions: arrived, whichever way.
  const arrived = xs.length * ys.length * 4;
  const size = arrived + 1;
  const best = new Float64Array(size).fill(Infinity);
  const came = new Int32Array(size).fill(-1);
  const key = (i: number, j: number, d: number): number => (j * xs.length + i) * 4 + d;
  const guess = (i: number, j: number): number => Math.abs((xs[i] as number) - to.x) + Math.abs((ys[j] as number) - to.y);
  const queue = new Queue();
  ORDER.forEach((direction, d) => {
    if (leave && direction !== leave) return;
    const state = key(sx, sy, d);
    best[state] = 0;
    queue.push(state, guess(sx, sy));
  });
  const done = new Uint8Array(size);
  for (let state = queue.pop(); state !== null; state = queue.pop()) {
    if (done[state]) continue;
    done[state] = 1;
    if (state === arrived) return walkBack(came[state] as number, came, xs, ys);
    const d = state % 4;
    const place = (state - d) / 4;
    const i = place % xs.length;
    const j = (place - i) / xs.length;
    if (i === tx && j === ty && !(enter && ORDER[OPPOSITE[d] as number] === enter)) {
      // The last turn into the port is a bend like any other; coming in backwards is not arriving.
      const price = (best[state] as number) + (enter && ORDER[d] !== enter ? options.bendCost : 0);
      if (price < (best[arrived] as number)) {
        best[arrived] = price;
        came[arrived] = state;
        queue.push(arrived, price);
      }
    }
    for (let turn = 0; turn < 4; turn++) {
      if (turn === OPPOSITE[d]) continue;
      const ni = i + (turn === 0 ? 1 : turn === 2 ? -1 : 0);
      const nj = j + (turn === 1 ? 1 : turn === 3 ? -1 : 0);
      if (ni < 0 || nj < 0 || ni >= xs.length || nj >= ys.length) continue;
      const extra = ni !== i ? mesh.across(Math.min(i, ni), j) : mesh.down(i, Math.min(j, nj));
      if (extra === Infinity) continue;
      const length = Math.abs((xs[ni] as number) - (xs[i] as number)) + Math.abs((ys[nj] as number) - (ys[j] as number));
      const price = (best[state] as number) + length + extra + (turn === d ? 0 : options.bendCost);
      const next = key(ni, nj, turn);
      if (price < (best[next] as number) - 1e-9) {
        best[next] = price;
        came[next] = state;
        queue.push(next, price + guess(ni, nj));
      }
    }
  }
  return null;
}

function walkBack(end: number, came: Int32Array, xs: readonly number[], ys: readonly number[]): RoutePoint[] {
  const points: RoutePoint[] = [];
  for (let state = end; state >= 0; state = came[state] as number) {
    const place = Math.floor(state / 4);
    points.push({ x: xs[place % xs.length] as number, y: ys[Math.floor(place / xs.length)] as number });
  }
  return points.reverse();
}
