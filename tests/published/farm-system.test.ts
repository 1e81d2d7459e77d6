/**
 * Figures of one whole system, a creamery with 20.64 kW of PV, 50 kWh of storage and a standby generator, worked out by
 * hand and by an independent script from the printed tables before the calculations were written.
 * The expected values are those of that calculation sheet; its inputs are typed here.
 */
import { describe, expect, it } from "vitest";
import {
  busbarCheck, conductorAmpacity, dcFaultCurrent, equipmentGroundingConductor, faultCurrent, largestOvercurrentDevice, racewayFill, requiredAmpacity,
  smallestOvercurrentDevice, stringCurrent, stringVoltage, sufficientSize, voltageDrop, type FaultSegment, type FillItem, type FilledRaceway, type RoutePart,
} from "@/lib/calc";
import type { ConductorSize } from "@/lib/units";

const edition = "2023";
const copper = { edition, material: "copper", insulation: "THWN-2", terminalC: 75 } as const;
const part = (kind: RoutePart["kind"], lengthFt: number, ambientC: number, currentCarryingCount: number, rooftopHeightIn: number | null = null): RoutePart => ({ kind, lengthFt, ambientC, currentCarryingCount, rooftopHeightIn });

describe("conductors of the circuits", () => {
  it("service, 250 kcmil aluminum XHHW-2: 205 A on a 200 A main", () => {
    const result = conductorAmpacity({ edition, size: "250 kcmil", material: "aluminum", insulation: "XHHW-2", terminalC: 75, parts: [part("raceway", 14, 33, 2)] });
    expect(result.value).toBe(205);
  });

  it("feeder of 1 AWG in 40 °C: 145 × 0.91 = 131.95, the terminals govern at 130", () => {
    const result = conductorAmpacity({ ...copper, size: "1 AWG", parts: [part("raceway", 46, 40, 2)] });
    expect(result.detail.correctedA).toBeCloseTo(131.95, 10);
    expect(result.value).toBe(130);
    expect(largestOvercurrentDevice({ edition, ampacityA: 130, size: "1 AWG", material: "copper" }).value).toBe(150);
    expect(largestOvercurrentDevice({ edition, ampacityA: 125, size: "1 AWG", material: "copper" }).value).toBe(125);
  });

  it("inverter output, 8 AWG through a wireway with 8 current-carrying conductors: no adjustment, 55 × 0.91 = 50.05", () => {
    const parts = [part("raceway", 10 / 12, 40, 2), part("metal wireway", 5, 40, 8), part("raceway", 10 / 12, 40, 8)];
    const result = conductorAmpacity({ ...copper, size: "8 AWG", parts });
    expect(result.detail.correctedA).toBeCloseTo(50.05, 10);
    expect(result.value).toBe(50);
    const required = requiredAmpacity({ edition, use: { kind: "inverter output", outputA: 32.5 } });
    expect(required.value).toBeCloseTo(40.625, 10);
    expect(smallestOvercurrentDevice({ edition, requiredA: required.value }).value).toBe(45);
    // A 60 A device on the same wire is above the 50 A that is itself a standard rating.
    expect(largestOvercurrentDevice({ edition, ampacityA: result.value, size: "8 AWG", material: "copper", nameplateMaxA: 50 }).value).toBe(50);
  });

  it("strings, 10 AWG: Imax 17.56, 21.95 before and 25.5 after factors in the plant room, 16.2 flat on the roof", () => {
    const required = requiredAmpacity({ edition, use: { kind: "pv", currentA: 14.05 } });
    expect(required.detail.maximumA).toBeCloseTo(17.5625, 10);
    expect(required.value).toBeCloseTo(21.953, 3);
    const roof = part("raceway", 8, 33, 8, 1);
    const inside = part("raceway", 54, 40, 8);
    const result = conductorAmpacity({ ...copper, size: "10 AWG", parts: [roof, inside, part("metal wireway", 5, 40, 8), part("raceway", 10 / 12, 40, 4)] });
    expect(result.detail.parts[0]?.ampacityA).toBeCloseTo(26.88, 10);
    expect(result.detail.parts[1]?.ampacityA).toBeCloseTo(25.48, 10);
    expect(result.value).toBeCloseTo(25.48, 10);
    const flat = conductorAmpacity({ ...copper, size: "10 AWG", parts: [{ ...roof, rooftopHeightIn: 0.5, lengthFt: 20 }, inside] });
    expect(flat.value).toBeCloseTo(16.24, 10);
    expect(conductorAmpacity({ edition, size: "10 AWG", material: "copper", insulation: "PV wire", terminalC: 75, wet: true, parts: [part("open", 13.5, 60, 2)] }).value).toBeCloseTo(28.4, 10);
  });

  it("battery leads of 1 AWG and 250 kcmil RHW-2", () => {
    expect(conductorAmpacity({ edition, size: "1 AWG", material: "copper", insulation: "RHW-2", terminalC: 75, parts: [part("metal wireway", 5, 40, 8)] }).value).toBe(130);
    const lead = conductorAmpacity({ edition, size: "250 kcmil", material: "copper", insulation: "RHW-2", terminalC: 75, parts: [part("raceway", 5, 40, 2)] });
    expect(lead.detail.correctedA).toBeCloseTo(263.9, 10);
    expect(lead.value).toBe(255);
    expect(requiredAmpacity({ edition, use: { kind: "battery input", ratedA: 175 } }).value).toBe(218.75);
  });

  it("generator with a listed breaker on the set: 60 A, not 115 % of 58.3 A = 67.1 A", () => {
    expect(requiredAmpacity({ edition, use: { kind: "generator", nameplateA: 58.3, setOcpdA: 60 } }).value).toBe(60);
    expect(requiredAmpacity({ edition, use: { kind: "generator", nameplateA: 58.3 } }).value).toBeCloseTo(67.045, 10);
  });

  it("barn feeder, 3 AWG for voltage drop: base 4 AWG, ratio 1.261, 20,814 cmil, equipment ground 6 AWG", () => {
    const parts = [part("raceway", 110, 20, 2)];
    const minimumSize = sufficientSize({ ...copper, parts, requiredA: 80 });
    expect(minimumSize).toBe("4 AWG");
    const egc = equipmentGroundingConductor({ edition, ocpdA: 80, material: "copper", ungroundedSize: "3 AWG", ungroundedMaterial: "copper", minimumSize });
    expect(egc.detail.ratio).toBeCloseTo(1.261, 3);
    expect(egc.detail.requiredCmil).toBeCloseTo(20814, 0);
    expect(egc.value).toBe("6 AWG");
  });

  it.each<[string, number, ConductorSize]>([["feeder", 125, "6 AWG"], ["inverter", 45, "10 AWG"], ["generator", 60, "10 AWG"], ["battery", 125, "6 AWG"], ["inverter battery lead", 250, "4 AWG"], ["pump", 20, "12 AWG"], ["string at 1.25 × Imax", 21.95, "10 AWG"]])(
    "equipment ground of the %s at %d A",
    (_, ocpdA, size) => {
      const egc = equipmentGroundingConductor({ edition, ocpdA, material: "copper", ungroundedSize: "250 kcmil", ungroundedMaterial: "copper" });
      expect(egc.value).toBe(size);
    },
  );
});

describe("voltage drop in percent", () => {
  const ac = { edition, system: "ac 1-phase", voltageV: 240, material: "copper" } as const;
  it.each<[string, number, number, ConductorSize, "steel" | "pvc", number]>([
    ["service feeder", 65, 46, "1 AWG", "steel", 0.4],
    ["inverter output", 32.5, 6.7, "8 AWG", "steel", 0.14],
    ["creamery panel", 58.3, 35.8, "1 AWG", "steel", 0.28],
    ["generator", 58.3, 90.8, "6 AWG", "pvc", 2.16],
    ["barn", 40, 110, "3 AWG", "pvc", 0.92],
    ["pump", 8, 60, "12 AWG", "pvc", 0.8],
  ])("%s", (_, currentA, lengthFt, size, conduit, expected) => {
    expect(voltageDrop({ ...ac, currentA, lengthFt, size, conduit }).detail.dropPct).toBeCloseTo(expected, 2);
  });
  it("string", () => {
    expect(voltageDrop({ edition, system: "dc", voltageV: 12 * 32.3, currentA: 13.31, lengthFt: 78, size: "10 AWG", material: "copper" }).detail.dropPct).toBeCloseTo(0.66, 2);
  });
});

describe("raceway fill", () => {
  const thwn = (count: number, size: ConductorSize): FillItem => ({ count, size, insulation: "THWN-2" });
  const od = (count: number, outsideDiameterIn: number): FillItem => ({ count, outsideDiameterIn });
  const emt = (tradeSize: "1/2" | "3/4" | "1" | "1-1/2" | "2", lengthIn: number): FilledRaceway => ({ kind: "EMT", tradeSize, lengthIn });
  const battery = [od(2, 0.53), thwn(1, "6 AWG")];
  const lead = [od(2, 0.82), thwn(1, "4 AWG")];
  const ac = [thwn(6, "8 AWG"), thwn(2, "10 AWG"), thwn(3, "1 AWG"), thwn(1, "6 AWG"), thwn(3, "6 AWG"), thwn(1, "10 AWG")];
  it.each<[string, FilledRaceway, FillItem[], number, number]>([
    ["mast", { kind: "RMC", tradeSize: "2-1/2", lengthIn: 168 }, [{ count: 3, size: "250 kcmil", insulation: "XHHW-2" }], 24.1, 40],
    ["service feeder", emt("1-1/2", 480), [thwn(3, "1 AWG"), thwn(1, "6 AWG")], 25.5, 40],
    ["generator", { kind: "PVC 40", tradeSize: "1", lengthIn: 1020 }, [thwn(3, "6 AWG"), thwn(1, "10 AWG")], 20.8, 40],
    ["barn", { kind: "PVC 40", tradeSize: "1-1/4", lengthIn: 1320 }, [thwn(3, "3 AWG"), thwn(1, "6 AWG")], 23.6, 40],
    ["pump", { kind: "PVC 40", tradeSize: "3/4", lengthIn: 720 }, [thwn(3, "12 AWG")], 7.9, 40],
    ["strings", emt("1", 744), [thwn(9, "10 AWG")], 22.0, 40],
    ["inverter nipple", emt("1", 10), [thwn(3, "8 AWG"), thwn(1, "10 AWG")], 15.2, 60],
    ["ac nipple", emt("2", 10), ac, 28.4, 60],
    ["string nipple", emt("1", 10), [thwn(5, "10 AWG")], 12.2, 60],
    ["battery nipple", emt("2", 15), battery, 14.7, 60],
    ["two batteries", emt("2", 10), [...battery, ...battery], 29.3, 60],
    ["inverter battery lead", emt("2", 4), lead, 33.9, 60],
    ["ac wireway", { kind: "metal wireway", widthIn: 6, heightIn: 6 }, ac, 2.7, 20],
    ["battery wireway", { kind: "metal wireway", widthIn: 6, heightIn: 6 }, [...battery, ...battery], 2.7, 20],
    ["one data cable", emt("3/4", 144), [od(1, 0.25)], 9.2, 53],
    ["two data cables", emt("3/4", 96), [od(2, 0.25)], 18.4, 31],
    ["control cables", emt("3/4", 72), [od(2, 0.25), od(1, 0.28), od(1, 0.2)], 35.9, 40],
    ["shutdown cables", emt("3/4", 96), [od(2, 0.25), od(1, 0.2)], 24.3, 40],
    ["data nipple", emt("3/4", 6), [od(1, 0.25), od(2, 0.2)], 21.0, 60],
    ["crowded nipple", emt("1/2", 10), [thwn(3, "8 AWG"), thwn(1, "10 AWG"), od(2, 0.25)], 75.4, 60],
    ["same in 1 in", emt("1", 10), [thwn(3, "8 AWG"), thwn(1, "10 AWG"), od(2, 0.25)], 26.5, 60],
  ])("%s", (_, raceway, items, percent, limit) => {
    const result = racewayFill({ edition, raceway, items });
    expect(Math.abs(result.value - percent)).toBeLessThanOrEqual(0.06);
    expect(result.detail.limitPct).toBeCloseTo(limit, 10);
    expect(result.detail.fits).toBe(percent <= limit);
  });
  it("has room for two more data cables beside two", () => {
    expect(racewayFill({ edition, raceway: emt("3/4", 96), items: [od(2, 0.25)], later: { ...od(1, 0.25), label: "Cat 6" } }).detail.laterCount).toBe(2);
  });
});

describe("voltages, currents, busbars and fault currents", () => {
  const strings = { edition, vocV: 38.6, vmpV: 32.3, vocCoefficient: { pctPerC: -0.26 }, vmpCoefficient: { pctPerC: -0.33 }, lowestC: -24, highestCellC: 68, limitV: 600 } as const;
  it("12 modules: 522.2 V cold, 332.6 V hot, 450.3 V cold operating; 14 modules 609.2 V", () => {
    const result = stringVoltage({ ...strings, modulesInSeries: 12 });
    expect(result.value).toBeCloseTo(522.2, 1);
    expect(result.detail.hotVmpV).toBeCloseTo(332.6, 1);
    expect(result.detail.coldVmpV).toBeCloseTo(450.3, 1);
    expect(result.detail.largestModuleCount).toBe(13);
    expect(stringVoltage({ ...strings, modulesInSeries: 14 }).value).toBeCloseTo(609.2, 1);
  });
  it("one string a tracker needs no fuse", () => {
    expect(stringCurrent({ edition, iscA: 14.05, impA: 13.31, parallelStrings: 1, moduleFuseA: 25 }).detail.stringFuseNeeded).toBe(false);
  });
  it("interconnect cabinet: 206.25 A, open by the opposite-ends path only", () => {
    const result = busbarCheck({ edition, busbarA: 200, mainDeviceA: 125, sourceOutputsA: [32.5, 32.5], branchDevicesA: [125, 45, 45], oppositeEnds: true });
    expect(result.detail.paths[0]).toMatchObject({ name: "sum", passes: false, sumA: 206.25, limitA: 200 });
    expect(result.detail.paths[1]).toMatchObject({ name: "opposite ends", passes: true, limitA: 240 });
    expect(busbarCheck({ edition, busbarA: 200, mainDeviceA: 60, sourceOutputsA: [32.5, 32.5], branchDevicesA: [], oppositeEnds: false }).detail.paths[0]?.sumA).toBe(141.25);
  });
  it("meter-main: 281.25 A fails both sums, 225 of 225 passes; 245 fails all", () => {
    const panel = { edition, busbarA: 225, mainDeviceA: 200, sourceOutputsA: [65], oppositeEnds: true } as const;
    const result = busbarCheck({ ...panel, branchDevicesA: [125, 80, 20] });
    expect(result.detail.paths.slice(0, 3).map((path) => [path.sumA, path.limitA, path.passes])).toEqual([[281.25, 225, false], [281.25, 270, false], [225, 225, true]]);
    expect(result.value).toBe("all devices");
    expect(busbarCheck({ ...panel, branchDevicesA: [125, 100, 20] }).value).toBe("none");
  });
  it("available fault current on the way from 10,400 A", () => {
    const run = (label: string, lengthFt: number, size: ConductorSize): FaultSegment => ({ label, lengthFt, size, material: "copper", conduit: "steel" });
    const chain = (segments: FaultSegment[]): number => faultCurrent({ edition, phases: 1, lineToLineV: 240, source: { kind: "stated", availableA: 10400 }, method: "arithmetic", resistanceOnly: true, segments }).value;
    const toSwitch = run("switch", 6, "1 AWG");
    const toCabinet = run("cabinet", 40, "1 AWG");
    expect(chain([toSwitch])).toBeCloseTo(9601, 0);
    expect(chain([toSwitch, toCabinet])).toBeCloseTo(6350, 0);
    expect(chain([toSwitch, { ...toCabinet, contributionA: 120 }])).toBeCloseTo(6470, 0);
    expect(chain([toSwitch, toCabinet, run("panel", 35.8, "1 AWG")])).toBeCloseTo(4873, 0);
    expect(chain([run("barn", 110, "3 AWG")])).toBeCloseTo(3074, 0);
    expect(dcFaultCurrent({ edition, voltageV: 51.2, sources: Array.from({ length: 4 }, () => ({ label: "battery", shortCircuitA: 3600 })) }).value).toBeCloseTo(14400, 6);
  });
});
