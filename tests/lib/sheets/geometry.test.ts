import { describe, expect, it } from "vitest";
import { boundsOf, contours, flatten } from "@/lib/sheets/geometry";
import { ellipseData, group, n, path, text } from "@/lib/sheets/primitives";

describe("path data", () => {
  it("follows lines, absolute and relative, and closes", () => {
    expect(contours("M10 10H30V20h-20z")[0]).toEqual([{ x: 10, y: 10 }, { x: 30, y: 10 }, { x: 30, y: 20 }, { x: 10, y: 20 }, { x: 10, y: 10 }]);
    expect(contours("M0 0L1 1M5 5l2 0")).toHaveLength(2);
  });
  it("keeps an arc on its circle: every point of x² + y² = r²", () => {
    const points = contours(ellipseData(3, 4, 9)).flat();
    expect(points.length).toBeGreaterThan(20);
    for (const p of points) expect(Math.hypot(p.x - 3, p.y - 4)).toBeCloseTo(9, 6);
  });
  it("takes the side of an arc that its sweep flag says (SVG 1.1, 8.3.8)", () => {
    const up = contours("M0 0A5 5 0 0 1 10 0")[0] ?? [];
    const down = contours("M0 0A5 5 0 0 0 10 0")[0] ?? [];
    expect(Math.min(...up.map((p) => p.y))).toBeCloseTo(-5, 6);
    expect(Math.max(...down.map((p) => p.y))).toBeCloseTo(5, 6);
  });
  it("goes on smoothly after a cubic: the mirrored control point (SVG 1.1, 8.3.6)", () => {
    const smooth = contours("M0 0C0 10 10 10 10 0S20 -10 20 0").flat();
    const spelled = contours("M0 0C0 10 10 10 10 0C10 -10 20 -10 20 0").flat();
    expect(smooth).toEqual(spelled);
  });
  it("refuses a command that no sheet draws", () => {
    expect(() => contours("M0 0T5 5")).toThrow(RangeError);
  });
});

describe("groups", () => {
  it("move, turn clockwise, mirror and scale, in that order from the outside", () => {
    const [moved] = flatten([group([path("M1 0L2 0")], { x: 10, y: 20, turn: 90, mirrored: true, scale: 2 })]);
    // Mirrored and doubled (1, 0) is (-2, 0); a quarter turn clockwise (y down) takes it to (0, -2).
    expect(moved?.type === "path" ? moved.contours[0]?.map((p) => [n(p.x), n(p.y)]) : null).toEqual([["10", "18"], ["10", "16"]]);
  });
  it("nest, and give the bounds of what they hold", () => {
    const inner = group([path("M0 0H10V4H0Z")], { x: 5, y: 5 });
    expect(boundsOf([group([inner, text(0, 0, "A", "tag")], { x: 100, y: 0 })])).toEqual({ left: 105, top: 5, right: 115, bottom: 9 });
    expect(boundsOf([text(0, 0, "A", "tag")])).toBeNull();
  });
});
