import { describe, expect, it } from "vitest";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { LINE_STYLES, circuitData, circuitLine, circuitPrimitives, elementPrimitives, equipmentPrimitives, oneLine, racewayPrimitives, tagBox } from "@/lib/sheets/oneline";
import { arrowDirection } from "@/lib/sheets/oneline/sensors";
import { bondPrimitives } from "@/lib/sheets/oneline/bonds";
import { dividerShares } from "@/lib/sheets/oneline/raceways";
import { contours, flatten } from "@/lib/sheets/geometry";
import { DASHES, sheetPx, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import { farm, farmGraph, raceway } from "./support/farm";

const words = (primitives: readonly Primitive[]): string[] => flatten(primitives).flatMap((each) => (each.type === "text" ? [each.text.text] : []));
const changed = (edit: (drawing: Drawing) => void) => { const drawing = farm(); edit(drawing); return buildGraph(drawing); };

describe("circuits", () => {
  it("differ by line pattern before color: dc, ground and data each have their own", () => {
    const patterns = Object.values(LINE_STYLES).map((style) => `${DASHES[style.dash].join(" ")} ${style.double}`);
    expect(new Set(patterns).size).toBe(5);
  });
  it("hop over what they cross without joining, and only there", () => {
    const graph = farmGraph();
    // S1 runs along y = 45 and crosses both uprights of the data link; nothing else crosses.
    expect(circuitData(graph, "s1").match(/A/g)).toHaveLength(2);
    expect(circuitData(graph, "kdat")).not.toMatch(/A/);
    expect(circuitData(graph, "f2")).not.toMatch(/A/);
    const middles = (circuitData(graph, "s1").match(/L([\d.]+) 600A/g) ?? []).map((hit) => Number(hit.slice(1, hit.indexOf(" "))));
    for (const [x, upright] of [[middles[0], 90.5], [middles[1], 78.8]] as const) expect(Math.abs((x ?? 0) - sheetPx(upright))).toBeCloseTo(5, 0);
  });
  it("show one bubble for runs that share a callout", () => {
    const graph = farmGraph();
    expect(words(circuitPrimitives(graph, "f1a"))).toEqual(["F1"]);
    expect(words(circuitPrimitives(graph, "f1b"))).toEqual([]);
    expect(words(circuitPrimitives(graph, "f1bus"))).toEqual([]);
  });
  it("cover their line under the bubble", () => {
    const order = flatten(oneLine(farmGraph()));
    const bubble = order.findIndex((each) => each.type === "path" && each.source.of?.id === "f1a" && each.fill === "paper");
    const line = order.findIndex((each) => each.type === "path" && each.source.of?.id === "f1a" && each.fill === null);
    expect(bubble).toBeGreaterThan(line);
    expect(line).toBeGreaterThanOrEqual(0);
  });
  it("lead from a bubble that stands beside its circuit", () => {
    const graph = farmGraph();
    const leader = circuitPrimitives(graph, "svc").find((each) => each.type === "path" && each.weight < 1);
    // Bubble at x = 5, service drop at x = 8, y = 7.4 on both.
    expect(leader?.type === "path" ? contours(leader.d)[0] : null).toEqual([{ x: sheetPx(5), y: sheetPx(7.4) }, { x: sheetPx(8), y: sheetPx(7.4) }]);
  });
  it("are dotted and direct while nobody has routed them", () => {
    const graph = changed((drawing) => { const f2 = drawing.circuits.f2; if (f2) { f2.points = []; f2.calloutAt = null; } });
    expect(circuitLine(graph, "f2")).toEqual({ points: [{ x: 50, y: 26 }, { x: 74, y: 29.9 }], routed: false });
    expect(circuitPrimitives(graph, "f2").some((each) => each.type === "path" && each.dash === "unrouted")).toBe(true);
  });
});

describe("equipment", () => {
  it("prints tag and ratings, and leaves out what is not known", () => {
    expect(words(equipmentPrimitives(farmGraph(), "cbf"))).toEqual(["CB-F1", "125 A 2P"]);
    const unknown = changed((drawing) => { const breaker = drawing.equipment.cbf; if (breaker) breaker.props.ratingA = null; });
    expect(words(equipmentPrimitives(unknown, "cbf"))).toEqual(["CB-F1", "2P"]);
  });
  it("says what is existing", () => {
    const graph = changed((drawing) => { const meter = drawing.equipment.mtr; if (meter) meter.status = "existing"; });
    expect(words(equipmentPrimitives(graph, "mtr"))).toContain("MTR-1 (E)");
    // What a finding underlines is the tag alone.
    expect(tagBox(graph, { collection: "equipment", id: "mtr" })).toEqual(tagBox(farmGraph(), { collection: "equipment", id: "mtr" }));
  });
  it("keeps letters in a symbol upright however it is turned", () => {
    const graph = changed((drawing) => { const generator = drawing.equipment.gen; if (generator) generator.rotation = 90; });
    const letterG = flatten(equipmentPrimitives(graph, "gen")).find((each) => each.type === "text" && each.text.text === "G");
    expect(letterG?.type === "text" ? letterG.text.turn : null).toBe(0);
  });
  it("drops ratings and grows tags at small zooms", () => {
    const graph = farmGraph();
    const small = equipmentPrimitives(graph, "cbf", { detail: "tags" }).filter((each): each is TextPrimitive => each.type === "text");
    expect(small.map((each) => each.text)).toEqual(["CB-F1"]);
    expect(small[0]?.size).toBeGreaterThan(13);
  });
  it("does not draw a part that its carrier's symbol stands for, but gives findings a place to underline", () => {
    const graph = changed((drawing) => { const breaker = drawing.equipment.cbf; if (breaker) breaker.integral = true; });
    expect(equipmentPrimitives(graph, "cbf")).toEqual([]);
    expect(tagBox(graph, { collection: "equipment", id: "cbf" })).toEqual(tagBox(graph, { collection: "equipment", id: "mm" }));
  });
  it("has its tag in the place that the drawing says", () => {
    const graph = changed((drawing) => { const ds = drawing.equipment.ds; if (ds) ds.label = { x: 10, y: 5, anchor: "start" }; });
    const box = tagBox(graph, { collection: "equipment", id: "ds" });
    expect(box?.x).toBeCloseTo(sheetPx(36), 6);
  });
});

describe("raceways, sensors, bonds and interlocks", () => {
  it("prints a conduit's size, type, length and depth, and no word for what is not known", () => {
    const graph = farmGraph();
    expect(words(racewayPrimitives(graph, "r5"))).toEqual(["R-5", "1 IN PVC 40, 85 FT", "18 IN DEEP"]);
    const unknown = changed((drawing) => { const conduit = drawing.raceways.r5; if (conduit) { conduit.stretches = {}; conduit.type = null; } });
    expect(words(racewayPrimitives(unknown, "r5"))).toEqual(["R-5", "1 IN"]);
  });
  it("divides a wireway by the widths of its compartments, in order", () => {
    const compartment = (order: number, widthIn: number | null) => ({ order, name: String(order), widthIn });
    expect(dividerShares(raceway("wireway", "WW", { x: 0, y: 0 }, { compartments: { b: compartment(1, 2), a: compartment(0, 4) } }))).toEqual([4 / 6]);
    expect(dividerShares(raceway("wireway", "WW", { x: 0, y: 0 }, { compartments: { a: compartment(0, 4), b: compartment(1, null), c: compartment(2, 1) } }))).toEqual([1 / 3, 2 / 3]);
    expect(dividerShares(raceway("wireway", "WW", { x: 0, y: 0 }))).toEqual([]);
  });
  it("points a sensor's arrow along its circuit to the end it names, and not at all while that is unknown", () => {
    const at = (arrow: "from" | "to" | null) => changed((drawing) => { const sensor = drawing.sensors.ct1; if (sensor) sensor.arrow = arrow; });
    const direction = (arrow: "from" | "to" | null) => { const graph = at(arrow); const sensor = graph.drawing.sensors.ct1; return sensor ? arrowDirection(graph, sensor) : undefined; };
    expect(direction("from")?.x).toBe(-1);
    expect(direction("to")?.x).toBe(1);
    expect(direction(null)).toBeNull();
  });
  it("draws a strap that is out as open, and says so", () => {
    const out = bondPrimitives(farmGraph(), "strap");
    const graph = changed((drawing) => { const strap = drawing.bonds.strap; if (strap) strap.fitted = true; });
    expect(words(out)).toEqual(["NS-1", "OUT"]);
    expect(words(bondPrimitives(graph, "strap"))).toEqual(["NS-1", "IN"]);
    expect(JSON.stringify(bondPrimitives(graph, "strap"))).not.toBe(JSON.stringify(out));
  });
  it("links an interlock to each of its switches and to nothing else", () => {
    const graph = farmGraph();
    const link = elementPrimitives(graph, { collection: "interlocks", id: "il" }).find((each) => each.type === "path" && each.dash === "link");
    const ends = link?.type === "path" ? contours(link.d).map((line) => line.at(-1)?.x) : [];
    // Symbols are three units long: the links end over their middles, at 37.9 and 48.5.
    expect(ends.map((x) => Math.round(x ?? 0)).sort()).toEqual([sheetPx(37.9), sheetPx(48.5)].map(Math.round).sort());
  });
});

it("draws the same primitives for the same drawing, whatever the order of its keys", () => {
  const drawing = farm();
  const turnedRound = { ...drawing, equipment: Object.fromEntries(Object.entries(drawing.equipment).reverse()), circuits: Object.fromEntries(Object.entries(drawing.circuits).reverse()) };
  expect(oneLine(buildGraph(turnedRound))).toEqual(oneLine(buildGraph(drawing)));
});
