/** Published worked examples: ampacity, overcurrent devices, batteries, generators, grounding. Inputs and results as published. */
import { describe, expect } from "vitest";
import {
  bondingJumper, conductorAmpacity, equipmentGroundingConductor, groundingElectrodeConductor, largestOvercurrentDevice, requiredAmpacity, smallestOvercurrentDevice, sufficientSize, voltageDrop,
} from "@/lib/calc";
import { ambientCorrectionFactor, isStandardRatingA, standardRatingAtLeastA, tableAmpacityA } from "@/lib/code";
import { CONDUCTOR_SIZES, convert, type ConductorSize } from "@/lib/units";
import { off, record } from "./record";

const copper = { material: "copper", insulation: "THHN", terminalC: 75 } as const;
const cool = [{ kind: "raceway", lengthFt: 50, ambientC: 30, currentCarryingCount: 3 }] as const;

describe("ampacity and overcurrent devices", () => {
  record("AMP-10AWG-120F", "code-education publisher, article on correction factors", () => {
    const ambientC = convert(120, "°F", "°C");
    const result = conductorAmpacity({ ...copper, edition: "2023", size: "10 AWG", parts: [{ kind: "raceway", lengthFt: 50, ambientC, currentCarryingCount: 3 }] });
    expect(result.detail.tableA).toBe(40);
    expect(result.detail.parts[0]?.correctionFactor).toBe(0.82);
    expect(result.value).toBeCloseTo(32.8, 10);
    // The source corrects for temperature only; four current-carrying conductors would also take 0.80, 26.2 A.
    expect(conductorAmpacity({ ...copper, edition: "2023", size: "10 AWG", parts: [{ kind: "raceway", lengthFt: 50, ambientC, currentCarryingCount: 4 }] }).value).toBeCloseTo(26.24, 10);
    expect(result.detail.smallConductorLimitA).toBe(30);
  });
  record("AMP-OCPD-STD", "practice test with explanations, 2026: 75 A is no standard rating", () => {
    expect(isStandardRatingA(75, "2023")).toBe(false);
    expect([isStandardRatingA(70, "2023"), standardRatingAtLeastA(75, "2023")]).toEqual([true, 80]);
  });
  record("AMP-500-400A", "code users forum of a code-training publisher, 2006", () => {
    const result = largestOvercurrentDevice({ edition: "2023", ampacityA: tableAmpacityA("500 kcmil", "copper", 75), size: "500 kcmil", material: "copper" });
    expect([result.value, result.detail.governedBy]).toEqual([400, "next size up"]);
    expect(largestOvercurrentDevice({ edition: "2023", ampacityA: 810, size: "500 kcmil", material: "copper" }).value).toBe(810);
  });
});

describe("batteries and generators", () => {
  record("BAT-3000W-MANUAL", "maker's installation guide of a 3 kW 12 V inverter, 2008", () => {
    const use = requiredAmpacity({ edition: "2017", use: { kind: "battery input", powerW: 3000, efficiency: 0.85, lowestV: 12 } });
    expect(use.detail.maximumA).toBeCloseTo(294, 0);
    expect(use.value).toBeCloseTo(368, 0);
    expect(smallestOvercurrentDevice({ edition: "2017", requiredA: use.value, fuse: true }).value).toBe(400);
    // The guide takes 4/0 AWG from the free-air table, which is not held here: in a raceway 4/0 carries 230 A and does not do.
    expect(tableAmpacityA("4/0 AWG", "copper", 75)).toBe(230);
  });
  record("BAT-CABLE-12V-2000W", "equipment supplier's note: 2000 W, 12 V, 12 ft, 0.5 V: 2/0 AWG", () => {
    const currentA = 2000 / 0.85 / 12;
    const fits = CONDUCTOR_SIZES.find((size) => voltageDrop({ edition: "2023", system: "dc", currentA, voltageV: 12, lengthFt: 12, size, material: "copper" }).value <= 0.5);
    expect(fits).toBe("2/0 AWG");
    // Its area rule gives 60 mm²; 2/0 AWG is 67.4 mm².
    expect(convert(133100, "cmil", "mm²")).toBeCloseTo(67.4, 1);
    // The current at 11 V asks for 300 kcmil in a raceway, as the doubt beside the record says.
    const required = requiredAmpacity({ edition: "2023", use: { kind: "battery input", powerW: 2000, efficiency: 0.85, lowestV: 11 } }).value;
    expect(sufficientSize({ ...copper, edition: "2023", parts: cool, requiredA: required })).toBe("300 kcmil");
  });
  record("BAT-1200W-12V", "off-grid forum, sentence on inverter circuits", () => {
    const use = requiredAmpacity({ edition: "2023", use: { kind: "battery input", powerW: 1200, efficiency: 0.85, lowestV: 10.5 } });
    expect(use.value).toBeCloseTo(168, 0);
    expect(smallestOvercurrentDevice({ edition: "2023", requiredA: use.value }).value).toBe(175);
  });
  record("BAT-3kW-WRONGEFF", "equipment shop's fuse guide, wrong: multiplies by 1.15; 294 and 147 A are right, not 288 and 144", () => {
    const current = (lowestV: number): number => requiredAmpacity({ edition: "2023", use: { kind: "battery input", powerW: 3000, efficiency: 0.85, lowestV } }).detail.maximumA;
    expect(current(12)).toBeCloseTo(294, 0);
    expect(current(24)).toBeCloseTo(147, 0);
    expect(current(12) * 12).toBeCloseTo(3529, 0);
  });
  record("GEN-60kVA", "code users forum of a code-training publisher, 2004", () => {
    const nameplateA = 60000 / 240;
    const use = (overloadPrevented: boolean): number => requiredAmpacity({ edition: "2023", use: { kind: "generator", nameplateA, overloadPrevented } }).value;
    expect([nameplateA, use(false), use(true)]).toEqual([250, 287.5, 250]);
    const conductor = (requiredA: number): ConductorSize => sufficientSize({ ...copper, edition: "2023", parts: cool, requiredA });
    expect([conductor(use(false)), conductor(use(true)), conductor(200)]).toEqual(["350 kcmil", "250 kcmil", "3/0 AWG"]);
    expect(requiredAmpacity({ edition: "2023", use: { kind: "generator", nameplateA, setOcpdA: 200 } }).value).toBe(200);
  });
});

describe("grounding conductors", () => {
  const egc = (ocpdA: number, ungroundedSize: ConductorSize, minimumSize: ConductorSize | null): ReturnType<typeof equipmentGroundingConductor> =>
    equipmentGroundingConductor({ edition: "2017", ocpdA, material: "copper", ungroundedSize, ungroundedMaterial: "copper", minimumSize });
  record("EGC-250to350", "industrial training provider, notes on grounding and bonding", () => {
    const result = egc(300, "350 kcmil", "250 kcmil");
    expect(result.detail.tableSize).toBe("4 AWG");
    expect(result.detail.ratio).toBeCloseTo(1.4, 10);
    expect(result.detail.requiredCmil).toBeCloseTo(58436, 6);
    expect(result.value).toBe("2 AWG");
  });
  record("EGC-150A-350", "practice-exam publisher, 2025", () => {
    const result = egc(150, "350 kcmil", "1/0 AWG");
    expect(result.detail.ratio).toBeCloseTo(3.314, 3);
    // The source rounds the ratio first and prints 86,959; unrounded it is 86,970.
    expect(result.detail.requiredCmil).toBeCloseTo(86969.7, 1);
    expect(result.value).toBe("1/0 AWG");
  });
  record("EGC-3/0to500", "engineers' question-and-answer site, 2015", () => {
    const result = egc(200, "500 kcmil", "3/0 AWG");
    // Printed 77,932.8 with the ratio cut to 2.97; exactly 78,188, same size.
    expect(result.detail.requiredCmil).toBeCloseTo(78188.3, 1);
    expect(result.value).toBe("1 AWG");
  });
  record("EGC-20A-12to6", "trade association magazine, questions of 2013 and 2021", () => {
    expect(egc(20, "6 AWG", "12 AWG").value).toBe("6 AWG");
  });
  record("EGC-350A", "apprenticeship exam preparation", () => {
    expect(egc(350, "500 kcmil", null).value).toBe("3 AWG");
  });
  record("GEC-350-QUIZ", "trade magazine, code quiz 106, NEC 2011", () => {
    expect(groundingElectrodeConductor({ edition: "2017", supplySize: "350 kcmil", supplyMaterial: "copper", material: "copper" }).value).toBe("2 AWG");
  });
  record("GEC-PARALLEL-1400", "electrical learning site, quick quiz", () => {
    const result = groundingElectrodeConductor({ edition: "2023", supplySize: "350 kcmil", supplyMaterial: "copper", sets: 4, material: "copper" });
    expect(result.detail.supplyAreaCmil).toBe(1400e3);
    expect(result.value).toBe("3/0 AWG");
    expect(off(bondingJumper({ edition: "2023", supplySize: "350 kcmil", supplyMaterial: "copper", sets: 4, material: "copper" }).detail.supplyAreaCmil, 1400e3)).toBe(0);
  });
  record("GEC-ELECTRODE-CAPS", "home inspectors' forum, November 2019", () => {
    const to = (electrode: "rod, pipe or plate" | "concrete-encased" | "other"): ConductorSize => groundingElectrodeConductor({ edition: "2023", supplySize: "500 kcmil", supplyMaterial: "copper", material: "copper", electrode }).value;
    expect([to("rod, pipe or plate"), to("concrete-encased"), to("other")]).toEqual(["6 AWG", "4 AWG", "1/0 AWG"]);
    expect(groundingElectrodeConductor({ edition: "2023", supplySize: "2 AWG", supplyMaterial: "copper", material: "copper", electrode: "rod, pipe or plate" }).value).toBe("8 AWG");
  });
});

describe("photovoltaic circuits", () => {
  const pv = (currentA: number, parallelStrings = 1) => requiredAmpacity({ edition: "2017", use: { kind: "pv", currentA, parallelStrings } });
  record("PVC-SANDIA-51W", "national laboratory's suggested practices, appendix E, 1996 (12 V stand-alone system)", () => {
    expect(pv(3.25).detail.maximumA).toBeCloseTo(4.06, 2);
    expect(pv(3.25).value).toBeCloseTo(5.08, 2);
    expect(ambientCorrectionFactor(68, 90)).toBe(0.58);
    // The free-air ampacities of the source (14, 12, 10, 8 AWG: 35, 40, 55, 80 A) are of a table not held here.
    expect([35, 40, 55, 80].map((a) => Math.round(a * ambientCorrectionFactor(68, 90) * 10) / 10)).toEqual([20.3, 23.2, 31.9, 46.4]);
    expect(pv(3.25, 5).detail.maximumA).toBeCloseTo(20.3, 1);
    expect(tableAmpacityA("10 AWG", "copper", 75)).toBe(35);
    expect(smallestOvercurrentDevice({ edition: "2017", requiredA: pv(3.25, 5).value, fuse: true }).value).toBe(30);
  });
  record("PVC-CROSSOVER", "PV course, questions and answers, 2016", () => {
    const governs = (factor: number): string => (pv(10).value >= pv(10).detail.afterFactorsA / factor ? "before" : "after");
    expect([governs(ambientCorrectionFactor(50, 90)), governs(ambientCorrectionFactor(51, 90)), governs(0.8)]).toEqual(["before", "after", "before"]);
    expect(pv(10).detail.afterFactorsA / pv(10).value).toBeCloseTo(0.8, 12);
  });
  record("PVC-PERMIT-MICRO-9.9", "permit calculation sheet in city public records, 2014 (NEC 2011)", () => {
    const use = requiredAmpacity({ edition: "2017", use: { kind: "inverter output", outputA: 9.9 } });
    expect(use.value).toBeCloseTo(12.375, 10);
    expect(smallestOvercurrentDevice({ edition: "2017", requiredA: use.value }).value).toBe(15);
    // The sheet takes 0.58 for 62.9 °C from an edition with wider bands and gets 26.67 A; today's band gives 0.65 and 23.8 A.
    const needed = (factor: number): number => use.value / factor / 0.8;
    expect(needed(0.58)).toBeCloseTo(26.67, 2);
    expect(needed(ambientCorrectionFactor(62.9, 90))).toBeCloseTo(23.8, 1);
    expect(tableAmpacityA("12 AWG", "copper", 90)).toBeGreaterThanOrEqual(needed(0.58));
  });
  record("PVC-PERMIT-MICRO-16", "conductor sizing sheet in town public records, 2014 (NEC 2011)", () => {
    const branch = requiredAmpacity({ edition: "2017", use: { kind: "inverter output", outputA: 1, count: 16 } });
    const feeder = requiredAmpacity({ edition: "2017", use: { kind: "inverter output", outputA: 1, count: 50 } });
    expect([branch.value, feeder.value]).toEqual([20, 62.5]);
    const wire = conductorAmpacity({ ...copper, insulation: "THWN-2", edition: "2017", size: "10 AWG", parts: [{ kind: "raceway", lengthFt: 50, ambientC: 30, currentCarryingCount: 8 }] });
    expect([wire.detail.tableA, wire.value]).toEqual([40, 28]);
    // 0.77 of the sheet is in no band of the 90 °C column; its 21.56 A is 28 × 0.77.
    expect(28 * 0.77).toBeCloseTo(21.56, 10);
    expect([smallestOvercurrentDevice({ edition: "2017", requiredA: 20 }).value, smallestOvercurrentDevice({ edition: "2017", requiredA: 62.5 }).value, tableAmpacityA("6 AWG", "copper", 75)]).toEqual([20, 70, 65]);
  });
  record("PVC-MANUAL-9.2", "equipment maker's power system manual, pages 39 and 40", () => {
    expect(pv(9.2).detail.maximumA).toBeCloseTo(11.5, 10);
    expect(pv(9.2).value).toBeCloseTo(14.4, 1);
    expect(smallestOvercurrentDevice({ edition: "2017", requiredA: pv(9.2).value }).value).toBe(15);
    // A device listed for 100 % needs the first factor only; 12 A is sold for dc but is no standard rating.
    expect(isStandardRatingA(12, "2017")).toBe(false);
  });
  record("PVC-5PAR-3A", "equipment shop forum, May 5, 2008", () => {
    const use = pv(3, 5);
    expect(off(use.value, 23.4)).toBeLessThan(0.002);
    const device = smallestOvercurrentDevice({ edition: "2017", requiredA: use.value }).value;
    const largest = largestOvercurrentDevice({ edition: "2017", ampacityA: tableAmpacityA("12 AWG", "copper", 75), size: "12 AWG", material: "copper" });
    expect([device, largest.value, device <= largest.value]).toEqual([25, 20, false]);
  });
});
