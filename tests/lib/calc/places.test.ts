import { describe, expect, it } from "vitest";
import {
  boxFill, burialDepth, busbarCheck, chargeCurrent, batteryRunTime, dwellingLoadExisting, dwellingLoadStandard, existingLoadMeasured, faultCurrent, inverterVoltageRise, pullBox, racewayFill, smallestRaceway, stringCurrent,
  supplySideConnection, voltageDrop, wireBendingSpace, type FillItem,
} from "@/lib/calc";

const edition = "2023";

describe("raceways", () => {
  const emt = (tradeSize: "1/2" | "3/4" | "1-1/4" | "2", lengthIn: number) => ({ kind: "EMT", tradeSize, lengthIn }) as const;
  it("a 1-1/4 in nipple full of ac conductors has no room for data cables, 2 in has (common practice, no published source)", () => {
    const ac: FillItem[] = [{ count: 6, size: "6 AWG", insulation: "THWN-2" }, { count: 4, size: "3 AWG", insulation: "THWN-2" }, { count: 3, size: "8 AWG", insulation: "THWN-2" }, { count: 4, size: "10 AWG", insulation: "THWN-2" }];
    const later = { label: "Cat 6", count: 1, outsideDiameterIn: 0.25 };
    expect(racewayFill({ edition, raceway: emt("1-1/4", 10), items: ac, later }).detail).toMatchObject({ fits: true, laterCount: 0 });
    expect(racewayFill({ edition, raceway: emt("2", 10), items: ac, later }).detail.laterCount).toBeGreaterThan(10);
  });
  it("keeps a reserve and says both fills", () => {
    const items: FillItem[] = [{ count: 3, size: "8 AWG", insulation: "THWN-2" }, { count: 1, size: "10 AWG", insulation: "THWN-2" }];
    const without = smallestRaceway({ edition, kind: "EMT", lengthIn: 240, items });
    const reserved = smallestRaceway({ edition, kind: "EMT", lengthIn: 240, items, reserve: [{ count: 3, size: "8 AWG", insulation: "THWN-2" }] });
    expect([without.value, reserved.value]).toEqual(["3/4", "1"]);
    expect(reserved.detail.fillWithReservePct).toBeGreaterThan(reserved.detail.fillPct);
    expect(() => smallestRaceway({ edition, kind: "ENT", lengthIn: 240, items: [{ count: 20, size: "500 kcmil", insulation: "THWN-2" }] })).toThrow("items");
  });
  it("two conductors take 31 %, one 53 %, and a wireway has no 0.8 rule", () => {
    const cable = (count: number): FillItem[] => [{ count, outsideDiameterIn: 0.35 }];
    expect([1, 2, 3].map((count) => racewayFill({ edition, raceway: emt("3/4", 60), items: cable(count) }).detail.limitPct)).toEqual([53, 31, 40]);
    expect(racewayFill({ edition, raceway: { kind: "metal wireway", widthIn: 4, heightIn: 4 }, items: cable(3) }).detail.largestCountEqual).toBeNull();
  });
  it("rounds up from 0.8 for equal conductors only", () => {
    // EMT 1/2: 0.4 × 0.304 = 0.1216 in²; area for 9.85 equal conductors.
    const outsideDiameterIn = Math.sqrt((4 * 0.1216) / (9.85 * Math.PI));
    const equal = racewayFill({ edition, raceway: emt("1/2", 60), items: [{ count: 10, outsideDiameterIn }] }).detail;
    expect([equal.largestCountEqual, equal.fits]).toEqual([10, true]);
    expect(racewayFill({ edition, raceway: emt("1/2", 60), items: [{ count: 9, outsideDiameterIn }, { count: 1, outsideDiameterIn: outsideDiameterIn + 1e-6 }] }).detail.fits).toBe(false);
  });
  it("warns of three conductors that may wedge", () => {
    const jam = racewayFill({ edition, raceway: emt("2", 600), items: [{ count: 3, size: "4/0 AWG", insulation: "THWN-2" }] }).detail;
    expect(jam.jamRatio).toBeCloseTo(2.067 / 0.642, 6);
    expect([jam.jamLikely, racewayFill({ edition, raceway: emt("2", 600), items: [{ count: 3, size: "250 kcmil", insulation: "THWN-2" }] }).detail.jamLikely]).toEqual([false, true]);
  });
  it("takes bare conductors from their own table and asks for what no table holds", () => {
    expect(racewayFill({ edition, raceway: emt("3/4", 60), items: [{ count: 1, size: "6 AWG", bare: true }] }).detail.usedIn2).toBe(0.027);
    expect(() => racewayFill({ edition, raceway: emt("3/4", 60), items: [{ count: 1, size: "10 AWG", insulation: "PV wire" }] })).toThrow(/outside diameter/);
    expect(() => racewayFill({ edition, raceway: emt("3/4", 60), items: [{ count: 1, size: "10 AWG" }] })).toThrow("items.0.insulation");
    expect(() => racewayFill({ edition, raceway: emt("3/4", 60), items: [{ count: 1, size: "1250 kcmil", insulation: "THHN" }] })).toThrow("items.0.size");
  });
});

describe("boxes", () => {
  it("roof box of 16 ends of 10 AWG and two grounds: 42.5 in³", () => {
    const result = boxFill({ edition, conductors: [{ size: "10 AWG", count: 16 }], groundCount: 2, largestGround: "10 AWG", boxVolumeIn3: 720 });
    expect([result.value, result.detail.fits]).toEqual([42.5, true]);
  });
  it("counts clamps, fittings, yokes and the fifth ground", () => {
    const box = { conductors: [{ size: "12 AWG", count: 4 }], groundCount: 6, largestGround: "12 AWG", internalClamps: true, supportFittings: 1, deviceYokes: ["12 AWG"] } as const;
    expect(boxFill({ ...box, edition: "2020" }).value).toBeCloseTo(2.25 * (4 + 1.5 + 1 + 1 + 2), 10);
    expect(boxFill({ ...box, edition: "2017" }).value).toBeCloseTo(2.25 * (4 + 1 + 1 + 1 + 2), 10);
  });
  it("pull boxes 8 and 6 times, wireway entries 12 in apart for 2 in, bending space 3 in for 1 AWG", () => {
    expect(pullBox({ edition, pull: "straight", largestTradeSize: "2" }).value).toBe(16);
    const angle = pullBox({ edition, pull: "angle or U", largestTradeSize: "2", otherTradeSizes: ["1-1/2", "1"] });
    expect([angle.value, angle.detail.betweenEntriesIn]).toEqual([14.5, 12]);
    expect([wireBendingSpace({ edition, size: "1 AWG", place: "wireway" }).value, wireBendingSpace({ edition, size: "4/0 AWG", place: "wireway", compactAluminum: true }).value, wireBendingSpace({ edition, size: "4/0 AWG", place: "terminal", compactAluminum: true }).value]).toEqual([3, 4, 3.5]);
    expect(burialDepth({ edition, location: "other", method: "nonmetallic-raceway" }).value).toBe(18);
  });
});

describe("sources", () => {
  it("an unknown branch device leaves the busbar undecided, a known one decides it", () => {
    const panel = { edition, busbarA: 200, mainDeviceA: 200, sourceOutputsA: [40], oppositeEnds: false } as const;
    expect(busbarCheck({ ...panel, branchDevicesA: null }).detail).toMatchObject({ complies: false, undecided: true });
    expect(busbarCheck({ ...panel, branchDevicesA: [100, 100] }).value).toBe("all devices");
    expect(busbarCheck({ ...panel, mainDeviceA: 225, branchDevicesA: [100] }).value).toBe("none");
    expect(busbarCheck({ ...panel, branchDevicesA: [150, 100], powerControlA: 180 }).value).toBe("power control");
    expect(busbarCheck({ ...panel, edition: "2017", branchDevicesA: [150, 100], powerControlA: 180 }).value).toBe("none");
    expect(busbarCheck({ ...panel, branchDevicesA: [150, 100] }).detail.paths.find((path) => path.name === "engineered")?.passes).toBeNull();
  });
  it("three strings in parallel need fuses that the module permits", () => {
    const result = stringCurrent({ edition, iscA: 14.05, parallelStrings: 3, moduleFuseA: 25 });
    expect(result.detail).toMatchObject({ stringFuseNeeded: true, stringFuseA: 25, fuseWithinModule: true });
    expect(result.detail.reverseA).toBeCloseTo(35.125, 10);
    expect(stringCurrent({ edition, iscA: 10, parallelStrings: 2, moduleFuseA: 15 }).detail.stringFuseNeeded).toBe(false);
    expect(stringCurrent({ edition, iscA: 10, parallelStrings: 2, moduleFuseA: 15, conductorAmpacityA: 12 }).detail.stringFuseNeeded).toBe(true);
    expect(stringCurrent({ edition, iscA: 10, parallelStrings: 1, backfeedA: 20, moduleFuseA: 15 }).detail.stringFuseNeeded).toBe(true);
    expect(stringCurrent({ edition, iscA: 18, parallelStrings: 3, moduleFuseA: 25 }).detail.fuseWithinModule).toBe(false);
  });
  it("supply side counts devices in 2017 and currents from 2020", () => {
    const connection = { serviceRatingA: 200, serviceAmpacityA: 180, sourceOcpdsA: [100, 110], sourceOutputsA: [80, 88], size: "8 AWG", material: "copper" } as const;
    expect(supplySideConnection({ ...connection, edition: "2017" })).toMatchObject({ value: 210, detail: { complies: false, limitA: 200 } });
    expect(supplySideConnection({ ...connection, edition: "2020" })).toMatchObject({ value: 168, detail: { complies: false, limitA: 180, leastSize: "6 AWG" } });
    expect(supplySideConnection({ ...connection, edition: "2020", size: "6 AWG" }).detail.complies).toBe(true);
  });
  it("fault current: vectors by hand, three-phase and line to neutral", () => {
    // 10,000 A at 240 V, X/R 1: R = X = 0.016971 Ω; 100 ft of 1 AWG copper in steel: 0.032 and 0.0114 Ω both ways.
    const vector = faultCurrent({ edition, phases: 1, lineToLineV: 240, source: { kind: "stated", availableA: 10000 }, method: "vector", sourceXOverR: 1, segments: [{ label: "run", lengthFt: 100, size: "1 AWG", material: "copper", conduit: "steel" }] });
    expect(vector.value).toBeCloseTo(240 / Math.hypot(0.0169706 + 0.032, 0.0169706 + 0.0114), -1);
    const wye = faultCurrent({ edition, phases: 3, lineToLineV: 208, source: { kind: "stated", availableA: 20000 }, method: "arithmetic", lineToNeutral: { multiplier: 1, enters: "before the first stretch" }, segments: [{ label: "run", lengthFt: 100, size: "1 AWG", material: "copper", conduit: "steel", neutralSize: "1 AWG" }] });
    const node = wye.detail.nodes[0];
    expect(node?.lineToLineA).toBeCloseTo(((node?.boltedA ?? 0) * Math.sqrt(3)) / 2, 6);
    expect(node?.lineToNeutralA).toBeLessThan(node?.boltedA ?? 0);
    expect(() => faultCurrent({ edition, phases: 1, lineToLineV: 240, source: { kind: "stated", availableA: 10000 }, method: "vector", segments: [] })).toThrow("sourceXOverR");
  });
  it("names its method and halves with two sets", () => {
    const circuit = { edition, system: "ac 1-phase", currentA: 100, voltageV: 240, lengthFt: 100, size: "1/0 AWG", material: "copper" } as const;
    expect([voltageDrop(circuit).detail.method, voltageDrop({ ...circuit, system: "dc" }).detail.method, voltageDrop({ ...circuit, method: "K" }).steps[0]?.expression]).toEqual(["table 9", "table 8", "1000 × K / area (common practice, no published source)"]);
    expect(voltageDrop({ ...circuit, sets: 2 }).value).toBeCloseTo(voltageDrop(circuit).value / 2, 12);
    expect(() => voltageDrop({ ...circuit, system: "dc", method: "table 9" })).toThrow("method");
    const rise = inverterVoltageRise({ ...circuit });
    expect(rise.detail.inverterV).toBeCloseTo(240 + rise.value, 12);
  });
  it("batteries: 50 kWh at 80 % and 94 % run 2 kW for 18.8 h; 3 kW charges at 55 A", () => {
    expect(batteryRunTime({ edition, energyKwh: 50, usableShare: 0.8, efficiency: 0.94, loadW: 2000 }).value).toBeCloseTo(18.8, 10);
    const charge = chargeCurrent({ edition, powerW: 3000, efficiency: 0.94, batteryV: 51.2, limitA: 50, energyKwh: 12.5 });
    expect(charge.value).toBeCloseTo(55.08, 2);
    expect(charge.detail.withinLimit).toBe(false);
    expect(charge.detail.hours).toBeCloseTo(12500 / 2820, 6);
  });
});

describe("dwelling loads", () => {
  const home = { floorAreaFt2: 1500, smallApplianceCircuits: 2, laundryCircuits: 1 } as const;
  it("names the article of the edition", () => {
    const sections = (year: "2017" | "2023" | "2026"): string[] => dwellingLoadStandard({ edition: year, ...home }).citations.map((item) => item.section);
    expect(sections("2017")).toContain("Table 220.12");
    expect(sections("2023")).toContain("220.41");
    expect(sections("2026")).toContain("Article 120");
  });
  it("takes 75 % from four appliances, 5 % a kW above 12, the larger of heat and cooling", () => {
    const appliances = Array.from({ length: 4 }, (_, i) => ({ label: `${i}`, va: 1000 }));
    expect(dwellingLoadStandard({ edition, ...home, appliances }).value).toBe(5100 + 3000);
    expect(dwellingLoadStandard({ edition, ...home, appliances: appliances.slice(1) }).value).toBe(5100 + 3000);
    expect(dwellingLoadStandard({ edition, ...home, rangesVa: [16000] }).value).toBe(5100 + 8000 * 1.2);
    expect(dwellingLoadStandard({ edition, ...home, heatVa: 5000, coolingVa: 6000 }).detail.heatOrCoolingVa).toBe(6000);
    expect(() => dwellingLoadStandard({ edition, ...home, smallApplianceCircuits: 1 })).toThrow("smallApplianceCircuits");
  });
  it("existing dwelling: 8 kVA and 40 %; measured: 125 % plus the new load", () => {
    expect(dwellingLoadExisting({ edition, ...home, nameplatesVa: [12000, 5000], coolingVa: 4000 }).value).toBe(8000 + 0.4 * 18000 + 4000);
    expect(existingLoadMeasured({ edition, maximumDemandA: 100, newLoadA: 76, serviceRatingA: 200 })).toMatchObject({ value: 201, detail: { fits: false } });
  });
});
