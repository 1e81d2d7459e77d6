import { describe, expect, it } from "vitest";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { checkContext } from "@/lib/rules/engine/context";
import { deviceAhead, faultCurrents, faultRows, faultSteps, totalA, type FaultPoint } from "@/lib/rules/shared/faultCurrent";
import { DrawingBuilder, route, wire } from "@/seeders/demo/build";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { secondSystem } from "@/tests/fixtures/secondSystem";

const contextOf = (drawing: Drawing) => checkContext(buildGraph(drawing));
function pointAt(drawing: Drawing, node: string): FaultPoint {
  const point = faultCurrents(contextOf(drawing)).at(node);
  if (!point) throw new Error(`nothing reaches ${node}`);
  return point;
}
/** Utility, main breaker and a transformer behind it: three pieces, so that every figure can be worked out on paper. */
function behindTransformer(kva: number, percent: number | null, secondaryV: number | null): Drawing {
  const build = new DrawingBuilder();
  build.add("utility", "U", [0, 0], { systemVoltage: "277/480 V 3-ph 4-W", availableFaultCurrentA: 20_000 });
  build.add("breaker", "Q", [0, 8], { current: "ac", ratingA: 100, poles: 3, interruptingKA: 25 });
  build.add("transformer", "T", [0, 16], { ratedKVA: kva, primaryV: 480, secondaryV, impedancePercent: percent, construction: "two windings", secondary: "3-wire, 120/240 V" });
  build.add("panelboard", "P", [0, 24], { busA: 225, shortCircuitKA: 10 });
  build.circuit("A", "U.load", "Q.line", [{ lengthFt: 10, ungrounded: wire(3, "1 AWG", null) }]);
  build.circuit("B", "Q.load", "T.primary", [{ lengthFt: 0, ungrounded: wire(2, "1 AWG", null) }]);
  build.circuit("C", "T.secondary", "P.bus@0", [{ lengthFt: 0, ungrounded: wire(2, "1/0 AWG", null) }]);
  return { ...cleanDrawing(), raceways: {}, bonds: {}, interlocks: {}, sensors: {}, equipment: build.equipment, circuits: build.circuits };
}

describe("available fault current along the conductors", () => {
  it("on the farm system, by the point-to-point method worked out by hand", () => {
    const figures = [["cb-f1/line", 10_400], ["ds-1/line", 9_601], ["ic-200/bus", 6_350], ["pnl-c/bus", 4_873], ["pnl-n/bus", 3_074]] as const;
    for (const [node, amperes] of figures) expect(pointAt(cleanDrawing(), node).sourceA ?? 0, node).toBeCloseTo(amperes, -0.5);
    expect(pointAt(cleanDrawing(), "ic-200/bus").invertersA).toBe(120);
  });
  it("the published method adds the impedance of conductors and so never gives more (300 kVA, 208 V, 20 ft of 2 × 500 kcmil: 39,425 A)", () => {
    const drawing = cleanDrawing();
    drawing.equipment["util"]!.props = { ...drawing.equipment["util"]!.props, systemVoltage: "120/208 V 3-ph 4-W", availableFaultCurrentA: 46_273 };
    const [section] = Object.values(drawing.circuits["f1a"]!.sections);
    Object.assign(section!, { lengthFt: 20, parallelSets: 2, ungrounded: wire(3, "500 kcmil", null), route: route("R-1a") });
    const point = pointAt(drawing, "ds-1/line");
    expect(point.sourceA).toBeGreaterThan(39_425);
    // 120.1 V / (120.1/46,273 + 20 ft × .029/1000/2) Ω, Table 9 in steel.
    expect(point.sourceA).toBeCloseTo(41_622, -1);
  });
  it("a generator behind a transfer switch and the utility are alternatives", () => {
    expect(pointAt(secondSystem(), "gen/load").sourceA).toBe(410);
    expect(pointAt(secondSystem(), "ats/b").source?.id).toBe("gen");
    expect(pointAt(secondSystem(), "ats/a").source?.id).toBe("grid");
    expect(pointAt(secondSystem(), "hp/bus").source?.id).toBe("grid");
  });
  it("a set listed to run beside the utility adds to it", () => {
    const drawing = secondSystem();
    const alone = pointAt(drawing, "hp/bus");
    drawing.equipment["gen"]!.props.listedParallelWithUtility = true;
    // Behind the other throw it still is an alternative; on the bus itself it adds.
    expect(totalA(pointAt(drawing, "sp/bus"))).toBeCloseTo(8_000 + 120, 6);
    drawing.circuits["c3"]!.to = { equipment: "hp", port: "bus", offset: 9 };
    expect((pointAt(drawing, "hp/bus").sourceA ?? 0) - (alone.sourceA ?? 0)).toBeGreaterThan(380);
  });
  it("behind a transformer its own impedance and that of the supply count", () => {
    // 25 kVA, 2 %: 104.17 A × 100 / (.9 × 2) = 5,787 A alone, .041472 Ω; the supply's two phases 2 × 277.1/20,000 = .027713 Ω, by (240/480)² .006928 Ω.
    const point = pointAt(behindTransformer(25, 2, 240), "p/bus");
    expect(point.sourceA).toBeCloseTo(240 / (0.041472 + 0.006928), 0);
    expect(faultSteps(contextOf(behindTransformer(25, 2, 240)), point).some((step) => step.symbol === "Is")).toBe(true);
    // Without its impedance the figure is an upper bound; without its voltage there is none.
    expect(pointAt(behindTransformer(25, null, 240), "p/bus").sourceA).toBeCloseTo(240 / 0.006928, -1);
    expect(pointAt(behindTransformer(25, 2, null), "p/bus").unrated).toHaveLength(1);
  });
  it("names the device ahead, and a row for every piece with a rating", () => {
    const context = contextOf(cleanDrawing());
    const rows = faultRows(context);
    const row = (id: string) => rows.find((one) => one.equipment === id)!;
    expect(deviceAhead(context.graph, row("cb-l").point, "cb-l")).toBe("cb-u");
    expect(deviceAhead(context.graph, row("cb-m").point, "cb-m")).toBeNull();
    expect(rows.map((one) => one.equipment)).toContain("spd-1");
    expect(rows.some((one) => one.equipment.startsWith("bt-"))).toBe(false);
    expect(rows).toBe(faultRows(context));
  });
  it("the worked lines end at the figure", () => {
    const context = contextOf(cleanDrawing());
    const point = faultCurrents(context).at("pnl-c/bus")!;
    expect(faultSteps(context, point).at(-1)?.result).toBeCloseTo(totalA(point), 6);
  });
});
