import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { crossesBox, isOrthogonal, lengthOf, middleOf, route, simplify, stretchEnds, type RouteBox, type RoutePoint } from "@/lib/routing";

const empty = { obstacles: [], lines: [] };
const end = (x: number, y: number, direction: "left" | "right" | "up" | "down" | null = null) => ({ point: { x, y }, direction });

describe("routing one line", () => {
  it("goes straight between facing ports", () => {
    const { points } = route({ from: end(0, 5, "right"), to: end(20, 5, "left"), via: [] }, empty);
    expect(points).toEqual([{ x: 0, y: 5 }, { x: 20, y: 5 }]);
  });

  // The shortest orthogonal way between two places is |dx| + |dy| (definition of the rectilinear distance).
  it("takes the rectilinear distance where nothing is in the way", () => {
    fc.assert(fc.property(fc.integer({ min: 3, max: 60 }), fc.integer({ min: -30, max: 30 }), (dx, dy) => {
      const { points, blocked } = route({ from: end(0, 0, "right"), to: end(dx, dy, "left"), via: [] }, empty);
      expect(blocked).toBe(false);
      expect(lengthOf(points)).toBeCloseTo(dx + Math.abs(dy), 6);
    }));
  });

  it("goes around a box, by the shorter side", () => {
    const box: RouteBox = { x: 8, y: -2, width: 4, height: 12 };
    const { points } = route({ from: end(0, 0, "right"), to: end(20, 0, "left"), via: [] }, { obstacles: [box], lines: [] });
    expect(crossesBox(points, box)).toBe(false);
    // Over the top edge at y = -2 with one unit of margin: 3 up and 3 down beside 20 along.
    expect(lengthOf(points)).toBeCloseTo(26, 6);
    expect(Math.min(...points.map((p) => p.y))).toBeCloseTo(-3, 6);
  });

  it("leaves and enters in the directions of its ports", () => {
    const { points } = route({ from: end(0, 0, "up"), to: end(10, 0, "up"), via: [] }, empty);
    expect(points[1]).toEqual({ x: 0, y: -1 });
    expect(points.at(-2)).toEqual({ x: 10, y: -1 });
  });

  it("passes through every point a person placed", () => {
    const via = [{ x: 6, y: 9 }, { x: 15, y: -4 }];
    const { points } = route({ from: end(0, 0, "right"), to: end(20, 0, "left"), via }, empty);
    for (const place of via) {
      const on = points.some((p, i) => {
        const q = points[i + 1];
        return q && Math.min(p.x, q.x) <= place.x && Math.max(p.x, q.x) >= place.x && Math.min(p.y, q.y) <= place.y && Math.max(p.y, q.y) >= place.y;
      });
      expect(on).toBe(true);
    }
  });

  it("lies beside a drawn line, not on it", () => {
    const drawn: RoutePoint[] = [{ x: -5, y: 0 }, { x: 30, y: 0 }];
    const { points } = route({ from: end(0, 6, "up"), to: end(20, 6, "up"), via: [] }, { obstacles: [], lines: [drawn] });
    const shared = points.some((p, i) => { const q = points[i + 1]; return q && p.y === 0 && q.y === 0 && p.x !== q.x; });
    expect(shared).toBe(false);
  });

  it("stays orthogonal, keeps its ends and crosses no box, for any field of boxes", () => {
    const boxes = fc.array(fc.record({ x: fc.integer({ min: 6, max: 50 }), y: fc.integer({ min: -20, max: 20 }), width: fc.integer({ min: 1, max: 8 }), height: fc.integer({ min: 1, max: 8 }) }), { maxLength: 12 });
    fc.assert(fc.property(boxes, (obstacles) => {
      const from = end(0, 0, "right");
      const to = end(62, 3, "left");
      const { points, blocked } = route({ from, to, via: [] }, { obstacles, lines: [] });
      expect(isOrthogonal(points)).toBe(true);
      expect(points[0]).toEqual(from.point);
      expect(points.at(-1)).toEqual(to.point);
      expect(blocked).toBe(false);
      for (const box of obstacles) expect(crossesBox(points, box)).toBe(false);
    }), { numRuns: 60 });
  });

  it("gives the same picture for the same drawing", () => {
    const obstacles = [{ x: 4, y: -3, width: 3, height: 6 }, { x: 12, y: -8, width: 3, height: 9 }];
    const once = () => route({ from: end(0, 0, "right"), to: end(20, -2, "left"), via: [] }, { obstacles, lines: [] });
    expect(once()).toEqual(once());
  });

  it("bends between two ends that may be left any way", () => {
    const { points } = route({ from: end(0, 0), to: end(6, 9), via: [] }, empty);
    expect(isOrthogonal(points)).toBe(true);
    expect(points).toHaveLength(3);
  });

  it("says so when an end is walled in", () => {
    const wall = [{ x: -3, y: -3, width: 1, height: 6 }, { x: 2, y: -3, width: 1, height: 6 }, { x: -3, y: -4, width: 6, height: 1.5 }, { x: -3, y: 2.5, width: 6, height: 1.5 }];
    const { points, blocked } = route({ from: end(0, 0), to: end(20, 0), via: [] }, { obstacles: wall, lines: [] });
    expect(blocked).toBe(true);
    expect(isOrthogonal(points)).toBe(true);
  });
});

describe("points of a line", () => {
  it("drops points that bend nothing", () => {
    expect(simplify([{ x: 0, y: 0 }, { x: 1, y: 0 }, { x: 1, y: 0 }, { x: 3, y: 0 }, { x: 3, y: 2 }])).toEqual([{ x: 0, y: 0 }, { x: 3, y: 0 }, { x: 3, y: 2 }]);
  });
  it("keeps hand-made bends when an end moves", () => {
    const line = [{ x: 0, y: 0 }, { x: 5, y: 0 }, { x: 5, y: 8 }, { x: 12, y: 8 }];
    expect(stretchEnds(line, { x: -2, y: 1 }, { x: 12, y: 8 })).toEqual([{ x: -2, y: 1 }, { x: 5, y: 1 }, { x: 5, y: 8 }, { x: 12, y: 8 }]);
  });
  it("refuses to slant a line that has no bend to give", () => {
    expect(stretchEnds([{ x: 0, y: 0 }, { x: 5, y: 0 }], { x: 0, y: 2 }, { x: 5, y: 0 })).toBeNull();
  });
  it("finds the middle", () => {
    expect(middleOf([{ x: 0, y: 0 }, { x: 4, y: 0 }, { x: 4, y: 4 }])).toEqual({ x: 4, y: 0 });
  });
});
