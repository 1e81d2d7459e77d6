/**
 * Raceway and conductor dimensions against geometry, against rows typed again from memory of a pocket reference (marked so),
 * and against the wire gauge formula.
 */
import { describe, expect, it } from "vitest";
import { bareConductorDimensions, bendingSpaceIn, boxVolumeIn3, conductorDimensions, racewayDimensions, racewayTradeSizes, RACEWAY_KINDS, type Insulation, type RacewayKind } from "@/lib/code";
import { COMPACT_ROWS } from "@/lib/code/tables/compact-dimensions";
import { CONDUCTOR_DIMENSIONS } from "@/lib/code/tables/conductor-dimensions";
import { CONDUCTOR_PROPERTIES } from "@/lib/code/tables/conductor-properties";
import { RACEWAY_DIMENSIONS, RACEWAY_TABLES } from "@/lib/code/tables/raceway-dimensions";
import { TYPICAL_PV_WIRE_OD, TYPICAL_USE2_ALUMINUM_OD } from "@/lib/code/tables/typical-diameters";
import { WIREWAY_FILL, WIREWAY_SPLICE_FILL, WIREWAY_UNADJUSTED_CONDUCTORS } from "@/lib/code/tables/wireway";
import { FILL_NIPPLE, FILL_ONE, FILL_OVER_TWO, FILL_TWO, JAM_RATIO_MAX, JAM_RATIO_MIN, NIPPLE_MAX_LENGTH_IN, ROUND_UP_FROM } from "@/lib/code/tables/raceway-fill";
import { circularMils, parseConductorSize, parseTradeSize } from "@/lib/units";

const area = (diameterIn: number): number => (Math.PI / 4) * diameterIn * diameterIn;
/** What rounding of diameter and area to their printed digits can make. */
const slack = (diameterIn: number, diameterStep: number, areaStep: number): number => (Math.PI / 2) * diameterIn * (diameterStep / 2) + areaStep / 2 + 1e-9;

describe("conduit and tubing", () => {
  it("every area is π/4·d²", () => {
    let rows = 0;
    for (const table of RACEWAY_TABLES) {
      for (const row of RACEWAY_DIMENSIONS[table]) {
        expect(Math.abs(row.totalAreaIn2 - area(row.internalDiameterIn)), `${table} ${row.tradeSize}`).toBeLessThanOrEqual(slack(row.internalDiameterIn, 0.001, 0.001));
        rows += 1;
      }
    }
    expect(rows).toBe(121);
  });
  it.each<[RacewayKind, string, number[]]>([
    ["EMT", "internal diameters 1/2 to 4", [0.622, 0.824, 1.049, 1.38, 1.61, 2.067, 2.731, 3.356, 3.834, 4.334]],
    ["RMC", "internal diameters 1/2 to 6", [0.632, 0.836, 1.063, 1.394, 1.624, 2.083, 2.489, 3.09, 3.57, 4.05, 5.073, 6.093]],
    ["PVC 40", "internal diameters 1/2 to 6", [0.602, 0.804, 1.029, 1.36, 1.59, 2.047, 2.445, 3.042, 3.521, 3.998, 5.016, 6.031]],
    ["PVC 80", "internal diameters 1/2 to 6", [0.526, 0.722, 0.936, 1.255, 1.476, 1.913, 2.29, 2.864, 3.326, 3.786, 4.768, 5.709]],
    ["IMC", "internal diameters 1/2 to 4", [0.66, 0.864, 1.105, 1.448, 1.683, 2.15, 2.557, 3.176, 3.671, 4.166]],
  ])("%s %s, from memory", (kind, _, diameters) => {
    expect(racewayTradeSizes(kind).map((size) => racewayDimensions(kind, size).internalDiameterIn)).toEqual(diameters);
  });
  it("40 % of EMT comes to the printed column: .122 .213 .346 .598 .814 1.342 2.343 3.538 4.618 5.901 (from memory)", () => {
    const printed = [0.122, 0.213, 0.346, 0.598, 0.814, 1.342, 2.343, 3.538, 4.618, 5.901];
    racewayTradeSizes("EMT").forEach((size, index) => {
      expect(Math.abs(FILL_OVER_TWO * racewayDimensions("EMT", size).totalAreaIn2 - (printed[index] ?? 0))).toBeLessThanOrEqual(0.0006);
    });
  });
  it("grows with trade size in every kind, and knows the kinds without rows of their own", () => {
    for (const kind of RACEWAY_KINDS) {
      const areas = racewayTradeSizes(kind).map((size) => racewayDimensions(kind, size).totalAreaIn2);
      expect([...areas].sort((a, b) => a - b)).toEqual(areas);
    }
    expect(racewayDimensions("HDPE", "2")).toEqual(racewayDimensions("PVC 40", "2"));
    for (const size of racewayTradeSizes("LFNC")) {
      for (const type of ["LFNC-A", "LFNC-B", "LFNC-C"] as const) expect(racewayDimensions("LFNC", size).totalAreaIn2).toBeLessThanOrEqual(racewayDimensions(type, size).totalAreaIn2);
    }
    expect(() => racewayDimensions("EMT", "5")).toThrow(/holds no EMT 5/);
  });
  it("fill limits 53, 31, 40, 60 % to 24 in; wireway 20 % and 75 %, 30 conductors (from memory)", () => {
    expect([FILL_ONE, FILL_TWO, FILL_OVER_TWO, FILL_NIPPLE, NIPPLE_MAX_LENGTH_IN]).toEqual([0.53, 0.31, 0.4, 0.6, 24]);
    expect([JAM_RATIO_MIN, JAM_RATIO_MAX, ROUND_UP_FROM]).toEqual([2.8, 3.2, 0.8]);
    expect([WIREWAY_FILL, WIREWAY_SPLICE_FILL, WIREWAY_UNADJUSTED_CONDUCTORS]).toEqual([0.2, 0.75, 30]);
  });
});

describe("insulated conductors", () => {
  it("every area is π/4·d²", () => {
    let rows = 0;
    for (const group of Object.values(CONDUCTOR_DIMENSIONS)) {
      for (const [size, diameterIn, areaIn2] of group) {
        expect(Math.abs(areaIn2 - area(diameterIn)), size).toBeLessThanOrEqual(slack(diameterIn, 0.001, 0.0001));
        rows += 1;
      }
    }
    expect(rows).toBe(136);
  });
  it.each<[Insulation, string, number[]]>([
    ["THHN", "14 12 10 8 6 4 3 2 1 1/0 2/0 3/0 4/0 250 300 350 400 500", [0.0097, 0.0133, 0.0211, 0.0366, 0.0507, 0.0824, 0.0973, 0.1158, 0.1562, 0.1855, 0.2223, 0.2679, 0.3237, 0.397, 0.4608, 0.5242, 0.5863, 0.7073]],
    ["XHHW-2", "14 12 10 8 6 4 3 2 1 1/0 2/0 3/0 4/0 250 300 350 400 500", [0.0139, 0.0181, 0.0243, 0.0437, 0.059, 0.0814, 0.0962, 0.1146, 0.1534, 0.1825, 0.219, 0.2642, 0.3197, 0.3904, 0.4536, 0.5166, 0.5782, 0.6984]],
    ["THW", "14 12 10 8 6 4 3 2 1 1/0 2/0 3/0 4/0 250", [0.0139, 0.0181, 0.0243, 0.0437, 0.0726, 0.0973, 0.1134, 0.1333, 0.1901, 0.2223, 0.2624, 0.3117, 0.3718, 0.4596]],
  ])("%s areas, from memory of the printed table", (insulation, sizes, areas) => {
    expect(sizes.split(" ").map((size) => conductorDimensions(parseConductorSize(size), insulation).areaIn2)).toEqual(areas);
  });
  it("RHW with a covering is never smaller than without", () => {
    for (const [size, diameterIn] of CONDUCTOR_DIMENSIONS["RHW-covered"]) {
      expect(diameterIn).toBeGreaterThanOrEqual(conductorDimensions(size, "RHW-2", false, false).diameterIn);
    }
    expect(conductorDimensions("12 AWG", "RHW-2", false, false).areaIn2).toBe(0.026);
  });
  it("compact conductors: area is π/4·d², and smaller than concentric ones of that type", () => {
    let cells = 0;
    for (const row of COMPACT_ROWS) {
      for (const cell of [row.rhwUse, row.thw, row.thhn, row.xhhw]) {
        if (cell === null) continue;
        expect(Math.abs(cell[1] - area(cell[0])), row.size).toBeLessThanOrEqual(slack(cell[0], 0.001, 0.0001));
        expect(cell[0]).toBeGreaterThan(row.bareDiameterIn);
        // Compacting takes 5 to 11 % off the diameter of the concentric stranded conductor.
        const compacted = row.bareDiameterIn / bareConductorDimensions(row.size).diameterIn;
        expect(compacted, row.size).toBeGreaterThan(0.885);
        expect(compacted, row.size).toBeLessThan(0.95);
        cells += 1;
      }
      if (row.xhhw !== null) expect(row.xhhw[0]).toBeLessThanOrEqual(conductorDimensions(row.size, "XHHW-2").diameterIn + 0.001);
    }
    expect(cells).toBeGreaterThan(70);
    // From memory of the printed table: XHHW compact 2 AWG 0.1017, 1/0 0.159, 250 kcmil 0.3421.
    expect((["2 AWG", "1/0 AWG", "250 kcmil"] as const).map((size) => conductorDimensions(size, "XHHW-2", true).areaIn2)).toEqual([0.1017, 0.159, 0.3421]);
  });
  it("typical diameters of USE-2 aluminum meet the compact rows within 3 %", () => {
    let met = 0;
    for (const { size, outsideDiameterIn } of TYPICAL_USE2_ALUMINUM_OD) {
      const row = COMPACT_ROWS.find((item) => item.size === size)?.rhwUse;
      if (row === undefined || row === null) continue;
      expect(Math.abs(outsideDiameterIn / row[0] - 1), size).toBeLessThan(0.03);
      met += 1;
    }
    expect(met).toBeGreaterThan(12);
  });
  it("typical PV wire is thicker than building wire of its size (from memory, an entry hint only)", () => {
    for (const { size, outsideDiameterIn } of TYPICAL_PV_WIRE_OD) expect(outsideDiameterIn).toBeGreaterThan(conductorDimensions(size, "THWN-2").diameterIn);
  });
});

describe("conductor properties", () => {
  const GAUGE: Record<string, number> = { "1/0": 0, "2/0": -1, "3/0": -2, "4/0": -3 };
  it("circular mils follow the wire gauge, d = 0.005 in × 92^((36 − n)/39)", () => {
    for (const row of CONDUCTOR_PROPERTIES) {
      const [name = "", unit] = row.size.split(" ");
      const expected = unit === "kcmil" ? Number(name) * 1000 : (5 * 92 ** ((36 - (GAUGE[name] ?? Number(name))) / 39)) ** 2;
      expect(Math.abs(row.circularMils / expected - 1), row.size).toBeLessThan(0.003);
      expect(row.circularMils).toBe(circularMils(row.size));
    }
  });
  it("strands are those of concentric lay, 1 + 3·n·(n + 1)", () => {
    const lay = [0, 1, 2, 3, 4, 5, 6].map((n) => 1 + 3 * n * (n + 1));
    for (const row of CONDUCTOR_PROPERTIES) expect(lay, row.size).toContain(row.strands);
    expect((["8 AWG", "2 AWG", "1 AWG", "4/0 AWG", "250 kcmil", "500 kcmil", "600 kcmil", "1000 kcmil", "1250 kcmil", "2000 kcmil"] as const).map((size) => CONDUCTOR_PROPERTIES.findLast((row) => row.size === size)?.strands)).toEqual([7, 7, 19, 19, 37, 37, 61, 61, 91, 127]);
  });
  it("resistance × circular mils is one constant a metal, as resistivity at 75 °C asks (12.9 and 21.2 Ω·cmil/ft)", () => {
    for (const row of CONDUCTOR_PROPERTIES) {
      expect((row.copperUncoated * row.circularMils) / 1000, row.size).toBeGreaterThan(12.5);
      expect((row.copperUncoated * row.circularMils) / 1000, row.size).toBeLessThan(13.1);
      expect((row.aluminum * row.circularMils) / 1000, row.size).toBeGreaterThan(20.6);
      expect((row.aluminum * row.circularMils) / 1000, row.size).toBeLessThan(21.4);
      // Tinning adds 2.5 to 4 % in large wires and up to 7 % in fine strands.
      expect(row.copperCoated / row.copperUncoated, row.size).toBeGreaterThan(1.02);
      expect(row.copperCoated / row.copperUncoated, row.size).toBeLessThan(1.075);
    }
  });
  it("bare area is π/4·d² and larger than the metal", () => {
    for (const row of CONDUCTOR_PROPERTIES) {
      // Small areas are printed to one digit, some cut instead of rounded: one unit of the last digit.
      expect(Math.abs(row.overallAreaIn2 - area(row.overallDiameterIn)), row.size).toBeLessThanOrEqual(slack(row.overallDiameterIn, 0.001, 0.002));
      expect(row.overallAreaIn2).toBeGreaterThan(row.circularMils * 1e-6 * (Math.PI / 4) * 0.97 - 0.0006);
    }
    const column = (solid: boolean): number[] => CONDUCTOR_PROPERTIES.filter((row) => (row.strands === 1) === solid).map((row) => row.overallAreaIn2);
    expect(column(true), "solid, typed from memory").toEqual([0.001, 0.002, 0.003, 0.005, 0.008, 0.013]);
    expect(column(false), "stranded, typed from memory").toEqual([0.002, 0.003, 0.004, 0.006, 0.011, 0.017, 0.027, 0.042, 0.053, 0.067, 0.087, 0.109, 0.137, 0.173, 0.219, 0.26, 0.312, 0.364, 0.416, 0.519, 0.626, 0.73, 0.782, 0.834, 0.94, 1.042, 1.305, 1.566, 1.829, 2.092]);
    expect(bareConductorDimensions("8 AWG", true).areaIn2).toBe(0.013);
    expect(bareConductorDimensions("6 AWG").areaIn2).toBe(0.027);
  });
});

describe("boxes and bending space, typed from memory of a pocket reference", () => {
  it("volume allowances 1.5, 1.75, 2, 2.25, 2.5, 3, 5 in³", () => {
    expect([18, 16, 14, 12, 10, 8, 6].map((size) => boxVolumeIn3(parseConductorSize(size)))).toEqual([1.5, 1.75, 2, 2.25, 2.5, 3, 5]);
    expect(() => boxVolumeIn3("4 AWG")).toThrow(/holds no 4 AWG/);
  });
  it("one wire a terminal: 1-1/2, 2, 2-1/2, 3, 3-1/2, 4, 4-1/2, 5, 6, 8, 10, 12 in", () => {
    const rows = [["8", 1.5], ["6", 1.5], ["4", 2], ["3", 2], ["2", 2.5], ["1", 3], ["1/0", 3.5], ["2/0", 3.5], ["3/0", 4], ["4/0", 4], ["250", 4.5], ["300", 5], ["350", 5], ["400", 6], ["500", 6], ["600", 8], ["700", 8], ["750", 8], ["900", 8], ["1000", 10], ["1250", 10], ["1500", 12], ["2000", 12]] as const;
    for (const [size, inches] of rows) expect(bendingSpaceIn(parseConductorSize(size)), size).toBe(inches);
    expect(bendingSpaceIn("10 AWG")).toBeNull();
    const several = [["2/0", [5, 7]], ["4/0", [6, 8]], ["250", [6, 8, 10]], ["350", [8, 10, 12]], ["500", [8, 10, 12, 14]], ["700", [10, 12, 14, 16]], ["900", [12, 14, 16, 18]]] as const;
    for (const [size, spaces] of several) expect(spaces.map((_, index) => bendingSpaceIn(parseConductorSize(size), index + 2)), size).toEqual(spaces);
    expect(() => bendingSpaceIn("250 kcmil", 5)).toThrow(/no value for 5 wires/);
    expect(() => bendingSpaceIn("2 AWG", 2)).toThrow(/no value for 2 wires/);
  });
  it("compact aluminum may use the row of the next smaller sizes at terminals", () => {
    expect(bendingSpaceIn("4/0 AWG", 1, true)).toBe(3.5);
    expect(bendingSpaceIn("350 kcmil", 1, true)).toBe(4.5);
    expect(parseTradeSize("1 1/4")).toBe("1-1/4");
  });
});
