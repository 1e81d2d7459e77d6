/**
 * Ampacity, correction, overcurrent and grounding tables against values typed again from other copies: the columns of
 * electricians' pocket references, from memory, marked so; and against the physics behind the tables.
 */
import { describe, expect, it } from "vitest";
import {
  ambientCorrectionFactor, bondingJumperSize, bundlingFactor, dwellingServiceSize, egcSizeForOcpd, gecSizeForSupply, rooftopAdderC, smallConductorLimitA,
  standardRatingsA, tableAmpacityA, type ConductorRatingC, type Material,
} from "@/lib/code";
import { ADDITIONAL_FUSE_RATINGS } from "@/lib/code/tables/overcurrent";
import { BONDING_JUMPER_ROWS } from "@/lib/code/tables/bonding-jumper";
import { CORRECTION_BASE_30C, CORRECTION_BASE_40C, CORRECTION_PV_WIRE } from "@/lib/code/tables/correction";
import { DWELLING_SERVICE_ROWS } from "@/lib/code/tables/dwelling-service";
import { EGC_ROWS } from "@/lib/code/tables/egc";
import { FINE_STRAND_ROWS, PV_WIRE_AMPACITY_ROWS } from "@/lib/code/tables/pv-wire-ampacity";
import { AMPACITY_ROWS } from "@/lib/code/tables/ampacity";
import { GEC_ROWS } from "@/lib/code/tables/gec";
import { ROOFTOP_ADDER_2014 } from "@/lib/code/tables/wireway";
import { circularMils, CONDUCTOR_SIZES, parseConductorSize } from "@/lib/units";

const SIZES = "14 12 10 8 6 4 3 2 1 1/0 2/0 3/0 4/0 250 300 350 400 500 600 700 750 800 900 1000 1250 1500 1750 2000".split(" ");

describe("ampacity table, whole columns typed from memory of a pocket reference", () => {
  const columns: [Material, ConductorRatingC, (number | null)[]][] = [
    ["copper", 60, [15, 20, 30, 40, 55, 70, 85, 95, 110, 125, 145, 165, 195, 215, 240, 260, 280, 320, 350, 385, 400, 410, 435, 455, 495, 525, 545, 555]],
    ["copper", 75, [20, 25, 35, 50, 65, 85, 100, 115, 130, 150, 175, 200, 230, 255, 285, 310, 335, 380, 420, 460, 475, 490, 520, 545, 590, 625, 650, 665]],
    ["copper", 90, [25, 30, 40, 55, 75, 95, 115, 130, 145, 170, 195, 225, 260, 290, 320, 350, 380, 430, 475, 520, 535, 555, 585, 615, 665, 705, 735, 750]],
    ["aluminum", 60, [null, 15, 25, 35, 40, 55, 65, 75, 85, 100, 115, 130, 150, 170, 195, 210, 225, 260, 285, 315, 320, 330, 355, 375, 405, 435, 455, 470]],
    ["aluminum", 75, [null, 20, 30, 40, 50, 65, 75, 90, 100, 120, 135, 155, 180, 205, 230, 250, 270, 310, 340, 375, 385, 395, 425, 445, 485, 520, 545, 560]],
    ["aluminum", 90, [null, 25, 35, 45, 55, 75, 85, 100, 115, 135, 150, 175, 205, 230, 260, 280, 305, 350, 385, 425, 435, 445, 480, 500, 545, 585, 615, 630]],
  ];
  it.each(columns)("%s %d °C", (material, columnC, values) => {
    SIZES.forEach((size, index) => {
      const expected = values[index] ?? null;
      if (expected === null) expect(() => tableAmpacityA(parseConductorSize(size), material, columnC)).toThrow(/no ampacity/);
      else expect(tableAmpacityA(parseConductorSize(size), material, columnC), size).toBe(expected);
    });
  });
  it("holds no other rows than these and 18 and 16 AWG at 90 °C (14 and 18 A)", () => {
    expect(AMPACITY_ROWS).toHaveLength(SIZES.length + 2);
    expect(tableAmpacityA("18 AWG", "copper", 90)).toBe(14);
    expect(tableAmpacityA("16 AWG", "copper", 90)).toBe(18);
  });
  it("the 90 °C column follows the 75 °C column by √(60/45) within the rounding to 5 A", () => {
    for (const size of CONDUCTOR_SIZES.slice(5)) {
      for (const material of ["copper", "aluminum"] as const) {
        const ratio = tableAmpacityA(size, material, 90) / tableAmpacityA(size, material, 75);
        expect(Math.abs(ratio / Math.sqrt(60 / 45) - 1), `${size} ${material}`).toBeLessThan(0.05);
      }
    }
  });
});

describe("ambient correction is √((Tc − Ta)/(Tc − Tbase)) with Ta the top of the band", () => {
  it.each([[CORRECTION_BASE_30C, 30], [CORRECTION_BASE_40C, 40]] as const)("base %#", (rows, base) => {
    let checked = 0;
    for (const band of rows) {
      for (const rating of [60, 75, 90] as const) {
        const factor = band.factors[rating];
        if (factor === null) {
          expect(band.maxC, `${rating} at ${band.maxC}`).toBeGreaterThanOrEqual(rating - 5);
          continue;
        }
        expect(Math.abs(factor - Math.sqrt((rating - band.maxC) / (rating - base))), `${rating} at ${band.maxC}`).toBeLessThanOrEqual(0.0061);
        checked += 1;
      }
    }
    expect(checked).toBeGreaterThan(30);
  });
  it("the same for 105 °C and 125 °C conductors of PV circuits", () => {
    let checked = 0;
    for (const band of CORRECTION_PV_WIRE) {
      for (const rating of [105, 125] as const) {
        const factor = band.factors[rating];
        if (factor === null || band.maxC === 30) continue;
        expect(Math.abs(factor - Math.sqrt((rating - band.maxC) / (rating - 30))), `${rating} at ${band.maxC}`).toBeLessThanOrEqual(0.0061);
        checked += 1;
      }
    }
    expect(checked).toBe(14 + 18);
  });
  it.each([[40, 90, 0.91], [40, 75, 0.88], [40.1, 90, 0.87], [50, 75, 0.75], [10, 60, 1.29], [-20, 90, 1.15], [30, 60, 1], [68, 90, 0.58]] as const)("%d °C, %d °C conductor: %d (from memory of the printed table)", (ambient, rating, factor) => {
    expect(ambientCorrectionFactor(ambient, rating)).toBe(factor);
  });
});

describe("adjustment, rooftop adder", () => {
  it("steps of the count, from memory: 4–6 80, 7–9 70, 10–20 50, 21–30 45, 31–40 40, 41 up 35 %", () => {
    const expected = [1, 1, 1, 0.8, 0.8, 0.8, 0.7, 0.7, 0.7, 0.5];
    expect(expected.map((_, index) => bundlingFactor(index + 1))).toEqual(expected);
    expect([20, 21, 30, 31, 40, 41, 200].map((n) => bundlingFactor(n))).toEqual([0.5, 0.45, 0.45, 0.4, 0.4, 0.35, 0.35]);
  });
  it("adds 33 °C (60 °F) below 7/8 in in 2017 and 2020, below 3/4 in from 2023, never for XHHW-2", () => {
    expect([0.5, 0.8, 0.875, 4].map((h) => rooftopAdderC(h, "THWN-2", "2020"))).toEqual([33, 33, 0, 0]);
    for (const edition of ["2023", "2026"] as const) expect([0.5, 0.74, 0.75, 0.8].map((h) => rooftopAdderC(h, "THWN-2", edition))).toEqual([33, 33, 0, 0]);
    expect(rooftopAdderC(0, "XHHW-2", "2017")).toBe(0);
    expect(rooftopAdderC(null, "THWN-2", "2023")).toBe(0);
    expect(33 * 1.8).toBeCloseTo(60, -1);
  });
  it("keeps the adders of 2014 for old drawings (from memory: 60, 40, 30, 25 °F)", () => {
    expect(ROOFTOP_ADDER_2014.map((row) => row.adderC)).toEqual([60, 40, 30, 25].map((f) => Math.round((f * 5) / 9)));
  });
});

describe("standard ratings and small conductors", () => {
  it("ratings typed from memory; 10 A joins in 2023", () => {
    const list = "15 20 25 30 35 40 45 50 60 70 80 90 100 110 125 150 175 200 225 250 300 350 400 450 500 600 700 800 1000 1200 1600 2000 2500 3000 4000 5000 6000".split(" ").map(Number);
    expect(standardRatingsA("2017")).toEqual(list);
    expect(standardRatingsA("2020")).toEqual(list);
    expect(standardRatingsA("2023")).toEqual([10, ...list]);
    expect(ADDITIONAL_FUSE_RATINGS["2017"]).toEqual([1, 3, 6, 10, 601]);
    expect(standardRatingsA("2023", true).slice(0, 4)).toEqual([1, 3, 6, 10]);
  });
  it("limits of small conductors, from memory: 15, 20, 30 A copper; 15, 25 A aluminum; 7, 10 A for 18, 16 AWG", () => {
    expect((["18 AWG", "16 AWG", "14 AWG", "12 AWG", "10 AWG", "8 AWG"] as const).map((size) => smallConductorLimitA(size, "copper", "2020"))).toEqual([7, 10, 15, 20, 30, null]);
    expect((["14 AWG", "12 AWG", "10 AWG", "8 AWG"] as const).map((size) => smallConductorLimitA(size, "aluminum", "2023"))).toEqual([null, 15, 25, null]);
    expect(smallConductorLimitA("14 AWG", "copper-clad aluminum", "2020")).toBeNull();
    expect(smallConductorLimitA("14 AWG", "copper-clad aluminum", "2023")).toBe(10);
  });
});

describe("grounding tables, typed from memory of a pocket reference", () => {
  it("equipment grounding conductor", () => {
    const rows = [[15, 14, 12], [20, 12, 10], [60, 10, 8], [100, 8, 6], [200, 6, 4], [300, 4, 2], [400, 3, 1], [500, 2, "1/0"], [600, 1, "2/0"], [800, "1/0", "3/0"], [1000, "2/0", "4/0"], [1200, "3/0", 250], [1600, "4/0", 350], [2000, 250, 400], [2500, 350, 600], [3000, 400, 600], [4000, 500, 750], [5000, 700, 1250], [6000, 800, 1250]] as const;
    expect(EGC_ROWS).toHaveLength(rows.length);
    let below = 0;
    for (const [ocpd, copper, aluminum] of rows) {
      expect(egcSizeForOcpd(ocpd, "copper")).toBe(parseConductorSize(copper));
      expect(egcSizeForOcpd(ocpd, "aluminum")).toBe(parseConductorSize(aluminum));
      // A device between two rows takes the larger row.
      expect(egcSizeForOcpd(below + 0.5, "copper")).toBe(parseConductorSize(copper));
      below = ocpd;
    }
  });
  it("electrode conductor: the larger end of every row and one step beyond", () => {
    const rows = [[2, "1/0", 8, 6], ["1/0", "3/0", 6, 4], ["3/0", 250, 4, 2], [350, 500, 2, "1/0"], [600, 900, "1/0", "3/0"]] as const;
    rows.forEach(([copperMax, aluminumMax, copper, aluminum]) => {
      expect(gecSizeForSupply(circularMils(parseConductorSize(copperMax)), "copper", "copper")).toBe(parseConductorSize(copper));
      expect(gecSizeForSupply(circularMils(parseConductorSize(aluminumMax)), "aluminum", "aluminum")).toBe(parseConductorSize(aluminum));
    });
    expect(gecSizeForSupply(circularMils("2 AWG") + 1, "copper", "copper")).toBe("6 AWG");
    expect(gecSizeForSupply(1100e3, "copper", "copper")).toBe("2/0 AWG");
    expect(gecSizeForSupply(1100e3 + 1, "copper", "copper")).toBe("3/0 AWG");
    expect(gecSizeForSupply(1750e3, "aluminum", "aluminum")).toBe("4/0 AWG");
    expect(gecSizeForSupply(1750e3 + 1, "aluminum", "aluminum")).toBe("250 kcmil");
  });
  it("bonding jumpers share the rows of the electrode table and go on at 12.5 %", () => {
    expect(BONDING_JUMPER_ROWS).toEqual(GEC_ROWS.slice(0, -1));
    expect(bondingJumperSize(1100e3, "copper", "copper")).toBe("2/0 AWG");
    // 4 × 500 kcmil = 2000 kcmil, × 0.125 = 250 kcmil (arithmetic of the note).
    expect(bondingJumperSize(2000e3, "copper", "copper")).toBe("250 kcmil");
    expect(bondingJumperSize(1200e3, "copper", "copper")).toBe("3/0 AWG");
  });
});

describe("dwelling service table", () => {
  it("typed from memory: copper 4 to 400, aluminum 2 to 600 kcmil", () => {
    const rows = [[100, 4, 2], [110, 3, 1], [125, 2, "1/0"], [150, 1, "2/0"], [175, "1/0", "3/0"], [200, "2/0", "4/0"], [225, "3/0", 250], [250, "4/0", 300], [300, 250, 350], [350, 350, 500], [400, 400, 600]] as const;
    expect(DWELLING_SERVICE_ROWS).toHaveLength(rows.length);
    for (const [rating, copper, aluminum] of rows) {
      expect(dwellingServiceSize(rating, "copper")).toBe(parseConductorSize(copper));
      expect(dwellingServiceSize(rating, "aluminum")).toBe(parseConductorSize(aluminum));
    }
  });
  it("every row carries 83 % of its rating at 75 °C, and one size smaller does not", () => {
    for (const row of DWELLING_SERVICE_ROWS) {
      for (const material of ["copper", "aluminum"] as const) {
        const size = row[material];
        const smaller = CONDUCTOR_SIZES[CONDUCTOR_SIZES.indexOf(size) - 1] ?? size;
        expect(tableAmpacityA(size, material, 75), `${row.ratingA} ${material}`).toBeGreaterThanOrEqual(0.83 * row.ratingA);
        expect(tableAmpacityA(smaller, material, 75), `${row.ratingA} ${material}, ${smaller}`).toBeLessThan(0.83 * row.ratingA);
      }
    }
  });
});

describe("PV wire ampacities", () => {
  it("lie above the 90 °C column and rise with size and rating", () => {
    let last = 0;
    for (const row of PV_WIRE_AMPACITY_ROWS) {
      expect(row[105]).toBeGreaterThan(last);
      expect(row[105]).toBeGreaterThan(tableAmpacityA(row.size, "copper", 90));
      // The 125 °C column is 5 to 9 % above the 105 °C one throughout the printed table.
      expect(row[125] / row[105]).toBeGreaterThan(1.05);
      expect(row[125] / row[105]).toBeLessThan(1.09);
      last = row[105];
    }
    expect(tableAmpacityA("10 AWG", "copper", 105)).toBe(46);
    expect(() => tableAmpacityA("10 AWG", "aluminum", 105)).toThrow();
  });
  it("fine-stranded cable asks for more strands the larger it is", () => {
    expect(FINE_STRAND_ROWS.map((row) => row.strands)).toEqual([17, 19, 49, 130, 259]);
  });
});
