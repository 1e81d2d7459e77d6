/**
 * Impedance, photovoltaic, torque, space, burial, storage and climate tables against arithmetic and against rows typed
 * again from memory of a pocket reference, marked so.
 */
import { describe, expect, it } from "vitest";
import {
  acImpedance, burialCoverIn, BURIAL_LOCATIONS, BURIAL_METHODS, cite, climateStation, dcResistanceOhmPerKft, defaultTorqueLbfIn, essLimitKwh, EDITIONS, hasAcImpedance, MEANINGS, pvVoltageFactor,
  SECTIONS, smallScrewTorqueLbfIn, socketScrewTorqueLbfIn, workingSpaceDepthFt,
} from "@/lib/code";
import { TABLES } from "@/lib/code/tables";
import { AC_IMPEDANCE_ROWS } from "@/lib/code/tables/ac-impedance";
import { CLIMATE_STATIONS } from "@/lib/code/tables/climate-stations";
import * as LOAD from "@/lib/code/tables/dwelling-load";
import { ESS_SPACING_FT, ESS_UNIT_LIMIT_KWH } from "@/lib/code/tables/ess-limits";
import { VOLTAGE_CORRECTION_ROWS } from "@/lib/code/tables/pv-voltage";
import * as SOURCE from "@/lib/code/tables/source-constants";
import { SMALL_SCREW_ROWS, SOCKET_SCREW_ROWS, TORQUE_ROWS } from "@/lib/code/tables/torque";
import * as SPACE from "@/lib/code/tables/working-space";
import { convert, parseConductorSize, sizeIndex } from "@/lib/units";

describe("ac impedance", () => {
  it("the printed effective impedance is R·cos φ + X·sin φ at 0.85 within its two digits", () => {
    let checked = 0;
    for (const row of AC_IMPEDANCE_ROWS) {
      for (const [resistances, printed] of [[row.copper, row.copperZ085], [row.aluminum, row.aluminumZ085]] as const) {
        ([0, 1, 2] as const).forEach((conduit) => {
          const r = resistances[conduit];
          const z = printed[conduit];
          if (r === null || z === null) return;
          const x = conduit === 2 ? row.reactanceSteel : row.reactancePvcAluminum;
          const computed = r * 0.85 + x * Math.sqrt(1 - 0.85 * 0.85);
          // R, X and Z are each rounded to two digits; some R of one significant figure after the point.
          const step = z >= 1 ? 0.1 : z >= 0.1 ? 0.01 : 0.001;
          const roundingOfR = 0.85 * (r >= 1 ? 0.05 : r >= 0.1 ? 0.005 : 0.0005);
          expect(Math.abs(computed - z), `${row.size} ${conduit}`).toBeLessThanOrEqual(step / 2 + roundingOfR + 0.0006);
          checked += 1;
        });
      }
    }
    expect(checked).toBe(21 * 6 - 3);
  });
  it("ac resistance in PVC is the dc resistance of the other table within the two printed digits to 4/0", () => {
    for (const row of AC_IMPEDANCE_ROWS) {
      if (sizeIndex(row.size) > sizeIndex("4/0 AWG")) continue;
      const ratio = acImpedance(row.size, "copper", "pvc").resistanceOhmPerKft / dcResistanceOhmPerKft(row.size, "copper");
      expect(Math.abs(ratio - 1), row.size).toBeLessThan(0.06);
    }
  });
  it.each([["10", 1.2, 0.05, 1.2, 0.063], ["1", 0.15, 0.046, 0.16, 0.057], ["1/0", 0.12, 0.044, 0.12, 0.055], ["250", 0.052, 0.041, 0.054, 0.052], ["500", 0.027, 0.039, 0.029, 0.048]] as const)(
    "%s copper, R and X in PVC and steel (from memory)", (name, r, x, rSteel, xSteel) => {
      const size = parseConductorSize(name);
      expect(acImpedance(size, "copper", "pvc")).toEqual({ resistanceOhmPerKft: r, reactanceOhmPerKft: x });
      expect(acImpedance(size, "copper", "steel")).toEqual({ resistanceOhmPerKft: rSteel, reactanceOhmPerKft: xSteel });
    });
  it("whole columns of R and X, typed from memory of a pocket reference", () => {
    const columns = {
      x: [0.058, 0.054, 0.05, 0.052, 0.051, 0.048, 0.047, 0.045, 0.046, 0.044, 0.043, 0.042, 0.041, 0.041, 0.041, 0.04, 0.04, 0.039, 0.039, 0.038, 0.037],
      xSteel: [0.073, 0.068, 0.063, 0.065, 0.064, 0.06, 0.059, 0.057, 0.057, 0.055, 0.054, 0.052, 0.051, 0.052, 0.051, 0.05, 0.049, 0.048, 0.048, 0.048, 0.046],
      copper: [3.1, 2, 1.2, 0.78, 0.49, 0.31, 0.25, 0.19, 0.15, 0.12, 0.1, 0.077, 0.062, 0.052, 0.044, 0.038, 0.033, 0.027, 0.023, 0.019, 0.015],
      copperInAluminum: [3.1, 2, 1.2, 0.78, 0.49, 0.31, 0.25, 0.2, 0.16, 0.13, 0.1, 0.082, 0.067, 0.057, 0.049, 0.043, 0.038, 0.032, 0.028, 0.024, 0.019],
      copperInSteel: [3.1, 2, 1.2, 0.78, 0.49, 0.31, 0.25, 0.2, 0.16, 0.12, 0.1, 0.079, 0.063, 0.054, 0.045, 0.039, 0.035, 0.029, 0.025, 0.021, 0.018],
      aluminum: [null, 3.2, 2, 1.3, 0.81, 0.51, 0.4, 0.32, 0.25, 0.2, 0.16, 0.13, 0.1, 0.085, 0.071, 0.061, 0.054, 0.043, 0.036, 0.029, 0.023],
      aluminumInAluminum: [null, 3.2, 2, 1.3, 0.81, 0.51, 0.41, 0.32, 0.26, 0.21, 0.16, 0.13, 0.11, 0.09, 0.076, 0.066, 0.059, 0.048, 0.041, 0.034, 0.027],
      aluminumInSteel: [null, 3.2, 2, 1.3, 0.81, 0.51, 0.4, 0.32, 0.25, 0.2, 0.16, 0.13, 0.1, 0.086, 0.072, 0.063, 0.055, 0.045, 0.038, 0.031, 0.025],
    };
    expect(AC_IMPEDANCE_ROWS.map((row) => row.reactancePvcAluminum)).toEqual(columns.x);
    expect(AC_IMPEDANCE_ROWS.map((row) => row.reactanceSteel)).toEqual(columns.xSteel);
    expect([0, 1, 2].map((k) => AC_IMPEDANCE_ROWS.map((row) => row.copper[k]))).toEqual([columns.copper, columns.copperInAluminum, columns.copperInSteel]);
    expect([0, 1, 2].map((k) => AC_IMPEDANCE_ROWS.map((row) => row.aluminum[k]))).toEqual([columns.aluminum, columns.aluminumInAluminum, columns.aluminumInSteel]);
  });
  it("refuses what it does not hold", () => {
    expect(hasAcImpedance("700 kcmil", "copper")).toBe(false);
    expect(() => acImpedance("14 AWG", "aluminum", "pvc")).toThrow(/no aluminum 14 AWG/);
    expect(() => dcResistanceOhmPerKft("6 AWG", "copper", true)).toThrow(/no solid 6 AWG/);
    expect(() => dcResistanceOhmPerKft("6 AWG", "copper-clad aluminum")).toThrow(/no resistance/);
  });
  it.each([["14", 3.14], ["12", 1.98], ["10", 1.24], ["8", 0.778], ["6", 0.491], ["4", 0.308], ["2", 0.194], ["1/0", 0.122], ["4/0", 0.0608], ["250", 0.0515], ["500", 0.0258]] as const)("%s copper, dc, stranded: %d Ω/kft (from memory)", (size, ohm) => {
    expect(dcResistanceOhmPerKft(parseConductorSize(size), "copper")).toBe(ohm);
  });
});

describe("photovoltaic voltage factors", () => {
  it("rise 0.02 every 5 °C to 1.20 at −25 °C, then 1.21, 1.23, 1.25 (from memory)", () => {
    expect([24, 19, 14, 9, 4, -1, -6, -11, -16, -21, -26, -31, -36].map((t) => pvVoltageFactor(t))).toEqual([1.02, 1.04, 1.06, 1.08, 1.1, 1.12, 1.14, 1.16, 1.18, 1.2, 1.21, 1.23, 1.25]);
    expect(pvVoltageFactor(25)).toBe(1);
    expect(pvVoltageFactor(-24)).toBe(1.2);
    expect(pvVoltageFactor(-20.5)).toBe(1.2);
    expect(() => pvVoltageFactor(-41)).toThrow(/no factor/);
  });
  it("has bands without gaps", () => {
    VOLTAGE_CORRECTION_ROWS.slice(1).forEach((row, index) => expect(row.maxC).toBe((VOLTAGE_CORRECTION_ROWS[index]?.minC ?? 0) - 1));
  });
});

describe("torque", () => {
  it("I.1, other connectors and split bolts, from memory of copies of Annex I", () => {
    const rows = [["10", 80, 75], ["8", 80, 75], ["6", 165, 110], ["4", 165, 110], ["3", 275, 150], ["2", 275, 150], ["1", 275, 150], ["1/0", 385, 180], ["2/0", 385, 180], ["3/0", 500, 250], ["4/0", 500, 250], ["250", 650, 325], ["350", 650, 325], ["400", 825, 325], ["500", 825, 375], ["600", 1000, 375], ["750", 1000, 375], ["1000", 1100, 500], ["2000", 1100, 600]] as const;
    for (const [size, split, other] of rows) {
      expect(defaultTorqueLbfIn(parseConductorSize(size), "hex-split-bolt"), size).toBe(split);
      expect(defaultTorqueLbfIn(parseConductorSize(size), "hex-other"), size).toBe(other);
    }
    expect(() => defaultTorqueLbfIn("1/0 AWG", "slotted-narrow")).toThrow(/no value/);
  });
  it("I.1, slotted screws: 20, 25, 35, 35, 40 with a narrow slot; 35, 40, 45, then 50 with a wide one (from memory)", () => {
    expect((["12 AWG", "8 AWG", "4 AWG", "3 AWG", "2 AWG"] as const).map((size) => defaultTorqueLbfIn(size, "slotted-narrow"))).toEqual([20, 25, 35, 35, 40]);
    const wide = TORQUE_ROWS.map((row) => row.torqueLbfIn[1]);
    expect(wide).toEqual([35, 40, 45, 50, 50, 50, 50, 50, 50, 50, 50, 50, 50, null]);
  });
  it("never falls with size", () => {
    ([0, 1, 2, 3] as const).forEach((column) => {
      let last = 0;
      for (const row of TORQUE_ROWS) {
        const value = row.torqueLbfIn[column];
        if (value === null) continue;
        expect(value).toBeGreaterThanOrEqual(last);
        last = value;
      }
    });
  });
  it("I.2 and I.3", () => {
    expect(SOCKET_SCREW_ROWS.map((row) => socketScrewTorqueLbfIn(row.acrossFlatsIn))).toEqual([45, 100, 120, 150, 200, 275, 375, 500, 600]);
    expect(SMALL_SCREW_ROWS.map((row) => smallScrewTorqueLbfIn(row.slotLengthIn, true))).toEqual([9, 12, 12, 12, 12, 15, 20]);
    expect(SMALL_SCREW_ROWS.map((row) => row.narrowLbfIn)).toEqual([7, 7, 7, 7, 9, null, null]);
    expect(() => smallScrewTorqueLbfIn("9/32", false)).toThrow();
  });
});

describe("space, burial, storage", () => {
  it("working space 3, 3, 3 · 3, 3.5, 4 · 3, 4, 5 ft (from memory)", () => {
    expect([120, 240, 800].map((v) => ([1, 2, 3] as const).map((c) => workingSpaceDepthFt(v, c)))).toEqual([[3, 3, 3], [3, 3.5, 4], [3, 4, 5]]);
    expect([workingSpaceDepthFt(150, 3), workingSpaceDepthFt(151, 3), workingSpaceDepthFt(600, 2), workingSpaceDepthFt(601, 2)]).toEqual([3, 4, 3.5, 4]);
    expect(() => workingSpaceDepthFt(1001, 1)).toThrow();
    expect([SPACE.WORKING_SPACE_MIN_WIDTH_IN, SPACE.WORKING_SPACE_MIN_HEIGHT_FT, SPACE.EXISTING_DWELLING_HEADROOM_A]).toEqual([30, 6.5, 200]);
  });
  it("cover 24, 6, 18, 12, 6 in; driveways of dwellings 18; streets 24 (from memory)", () => {
    expect(BURIAL_METHODS.map((method) => burialCoverIn("other", method))).toEqual([24, 6, 18, 12, 6]);
    expect(BURIAL_METHODS.map((method) => burialCoverIn("street-driveway-parking", method))).toEqual([24, 24, 24, 24, 24]);
    expect(BURIAL_METHODS.map((method) => burialCoverIn("dwelling-driveway", method))).toEqual([18, 18, 18, 12, 18]);
    expect(BURIAL_METHODS.map((method) => burialCoverIn("under-concrete-2in", method))).toEqual([18, 6, 12, 6, 6]);
    expect(BURIAL_METHODS.map((method) => burialCoverIn("under-slab-4in", method, true))).toEqual([18, 4, 4, 4, 4]);
    expect(BURIAL_LOCATIONS).toHaveLength(7);
  });
  it("storage 20 kWh a unit, 40 inside, 80 in garages, on walls and on the ground, 3 ft apart (secondary sources)", () => {
    expect([ESS_UNIT_LIMIT_KWH, essLimitKwh("interior utility or storage space"), essLimitKwh("garage or accessory structure"), essLimitKwh("exterior wall"), essLimitKwh("outdoors on the ground"), ESS_SPACING_FT]).toEqual([20, 40, 80, 80, 80, 3]);
  });
});

describe("climate and constants", () => {
  it("stations lie in the fifty states with a cold below their warm", () => {
    expect(CLIMATE_STATIONS).toHaveLength(28);
    for (const row of CLIMATE_STATIONS) {
      expect(row.minC).toBeLessThan(row.high2pctC);
      expect(row.latitude).toBeGreaterThan(18);
      expect(row.latitude).toBeLessThan(72);
    }
    // Denver: the 2021 handbook gives −23.5 °C and 32.0 °C, so the 2009 entry must lie within 1 °C of it.
    const denver = climateStation("725650");
    expect(Math.abs(denver.minC + 23.5)).toBeLessThan(1);
    expect(Math.abs(denver.high2pctC - 32)).toBeLessThan(1);
  });
  it("constants of the source articles (from memory)", () => {
    expect([SOURCE.CONTINUOUS_FACTOR * SOURCE.PV_IRRADIANCE_FACTOR, SOURCE.BUSBAR_OPPOSITE_FACTOR, SOURCE.GENERATOR_CONDUCTOR_FACTOR, SOURCE.PV_ENGINEERED_FLOOR]).toEqual([1.5625, 1.2, 1.15, 0.7]);
    expect(Object.values(SOURCE.PV_BUILDING_VOLTAGE)).toEqual([600, 1000, 1500]);
    expect(Object.values(SOURCE.MOTOR_OCPD_FACTOR)).toEqual([2.5, 1.75, 3]);
  });
  it("dwelling demand: 3 VA/ft², 1500 VA a circuit, 35 % above 3000 VA, 8 kW for a range (worked examples of Annex D)", () => {
    expect([LOAD.LIGHTING_VA_PER_FT2, LOAD.APPLIANCE_CIRCUIT_VA, LOAD.LIGHTING_DEMAND[1]?.share, LOAD.RANGE_DEMAND_KW[0], LOAD.DRYER_MIN_VA, LOAD.OPTIONAL_SHARE]).toEqual([3, 1500, 0.35, 8, 5000, 0.4]);
  });
});

describe("section numbers", () => {
  it("every table names a meaning that the editions know, and 2026 is never called read", () => {
    for (const table of TABLES) {
      expect(MEANINGS, table.title).toContain(table.meaning);
      expect(table.values["2026"]).toBe("preview");
    }
    for (const [meaning, entry] of Object.entries(SECTIONS)) {
      for (const edition of EDITIONS) {
        const place = entry.places[edition];
        if (place === null) expect(() => cite(meaning, edition)).toThrow(/has no rule/);
        else expect(cite(meaning, edition).section.length, meaning).toBeGreaterThan(2);
      }
      if (entry.code === "NEC" && entry.places["2026"] !== null) expect(entry.places["2026"].confirmation).toBe("preview");
    }
  });
  it("follows the renumbering that is known", () => {
    expect([cite("ampacity-table", "2017").section, cite("ampacity-table", "2023").section]).toEqual(["Table 310.15(B)(16)", "Table 310.16"]);
    expect([cite("busbar-opposite-ends", "2017").section, cite("busbar-opposite-ends", "2020").section, cite("busbar-opposite-ends", "2023").section]).toEqual(["705.12(B)(2)(3)(b)", "705.12(B)(3)(2)", "705.12(B)(2)"]);
    expect([cite("ess-conductor", "2017").section, cite("ess-conductor", "2020").section]).toEqual(["706.20(B)", "706.30(B)"]);
    expect(cite("burial-depth", "2023").section).toBe("Table 300.5(A)");
    expect(convert(1, "in", "mm")).toBe(25.4);
  });
});
