import { describe, expect, it } from "vitest";
import { equipmentGroundingConductor, sizeCircuit, sufficientSize, type CircuitToSize } from "@/lib/calc";

const parts = [{ kind: "raceway", lengthFt: 50, ambientC: 30, currentCarryingCount: 2 }] as const;
const base = { edition: "2023", material: "copper", insulation: "THWN-2", terminalC: 75, parts } as const;
const size = (input: Omit<CircuitToSize, keyof typeof base> & Partial<CircuitToSize>) => sizeCircuit({ ...base, ...input }).detail;

describe("sizing by the article of the circuit", () => {
  it("an inverter of 32.5 A: 8 AWG, 45 A, 10 AWG ground, 3/4 in EMT, and why 10 AWG fails", () => {
    const detail = size({ use: { kind: "inverter output", outputA: 32.5 }, device: { nameplateMaxA: 50 }, raceway: { kind: "EMT", lengthIn: 480, conductorsPerSet: 3 } });
    expect(detail).toMatchObject({ size: "8 AWG", sets: 1, deviceA: 45, groundSize: "10 AWG", tradeSize: "3/4", ampacityA: 50, dropPct: null });
    expect(detail.rejected.at(-1)).toEqual({ size: "10 AWG", sets: 1, reason: "35 A at the terminals, 40.63 A needed" });
  });
  it("the nameplate of the equipment may allow no device at all", () => {
    expect(() => size({ use: { kind: "inverter output", outputA: 32.5 }, device: { nameplateMaxA: 40 } })).toThrow(/device 45 A above 40 A \(nameplate\)/);
  });
  it("a device that stays sets the conductor", () => {
    expect(size({ use: { kind: "inverter output", outputA: 32.5 }, device: { ratingA: 60 } }).size).toBe("6 AWG");
    expect(() => size({ use: { kind: "inverter output", outputA: 32.5 }, device: { ratingA: 40 } })).toThrow(/device 40 A below 40.63 A/);
  });
  it("a small conductor waits for its device: 22 A of load on 12 AWG fails at 25 A", () => {
    const detail = size({ use: { kind: "load", continuousA: 0, noncontinuousA: 22 } });
    expect([detail.size, detail.deviceA]).toEqual(["10 AWG", 25]);
    expect(detail.rejected.at(-1)?.reason).toBe("device 25 A above 20 A (small conductor)");
  });
  it("a string alone has no device and no increase of its ground", () => {
    const detail = size({ use: { kind: "pv", currentA: 14.05 }, device: { needed: false }, drop: { system: "dc", voltageV: 387, currentA: 13.31, lengthFt: 300, limitPct: 1 } });
    expect([detail.deviceA, detail.groundSize]).toEqual([null, "10 AWG"]);
    expect(detail.size).toBe("4 AWG");
    // The same increase on an ac circuit takes the ground along.
    const ac = size({ use: { kind: "inverter output", outputA: 17 }, drop: { system: "ac 1-phase", voltageV: 240, currentA: 17, lengthFt: 300, limitPct: 2 } });
    expect([ac.size, ac.groundSize]).toEqual(["4 AWG", "4 AWG"]);
  });
  it("storage takes no round-up: 125 A on 1 AWG, 130 A", () => {
    expect(size({ use: { kind: "storage", nameplateA: 100, ocpdA: 125 } })).toMatchObject({ size: "1 AWG", deviceA: 125 });
    expect(() => size({ use: { kind: "storage", nameplateA: 110, ocpdA: 125 } })).toThrow(/below 137.5 A/);
  });
  it("motors and conditioning units by their own articles", () => {
    expect(size({ use: { kind: "motor", largestA: 8 } })).toMatchObject({ size: "14 AWG", deviceA: 20, groundSize: "14 AWG" });
    expect(size({ use: { kind: "hvac", minimumCircuitA: 17 }, device: { nameplateMaxA: 25 } })).toMatchObject({ size: "14 AWG", deviceA: 25 });
    expect(() => size({ use: { kind: "hvac", minimumCircuitA: 17 } })).toThrow("device.nameplateMaxA");
    expect(() => size({ use: { kind: "motor", largestA: 8 }, device: { ratingA: 25 } })).toThrow(/device 25 A above 20 A for the motor/);
  });
  it("generators at 115 % or by the device on the set", () => {
    expect(size({ use: { kind: "generator", nameplateA: 58.3 } })).toMatchObject({ size: "4 AWG", deviceA: 60 });
    expect(size({ use: { kind: "generator", nameplateA: 58.3, setOcpdA: 60 } })).toMatchObject({ size: "6 AWG", deviceA: 60 });
  });
  it("a raceway that no size fits is named", () => {
    expect(() => size({ use: { kind: "load", continuousA: 200, noncontinuousA: 0 }, raceway: { kind: "ENT", lengthIn: 480, conductorsPerSet: 40 } })).toThrow(/no ENT of the table holds/);
    expect(() => size({ use: { kind: "load", continuousA: 20, noncontinuousA: 0 }, raceway: { kind: "EMT", lengthIn: 480, conductorsPerSet: 0 } })).toThrow("raceway.conductorsPerSet");
  });
  it("is deterministic", () => {
    const input: CircuitToSize = { ...base, use: { kind: "load", continuousA: 90, noncontinuousA: 10 } };
    expect(JSON.stringify(sizeCircuit(input))).toBe(JSON.stringify(sizeCircuit(input)));
  });
});

describe("equipment ground", () => {
  const egc = (change: Partial<Parameters<typeof equipmentGroundingConductor>[0]>) => equipmentGroundingConductor({ edition: "2023", ocpdA: 80, material: "copper", ungroundedSize: "3 AWG", ungroundedMaterial: "copper", ...change });
  it("the round-up of the device is no increase", () => {
    // 125 A on 1 AWG (130 A): the base for 125 A is 1 AWG itself.
    expect(sufficientSize({ ...base, requiredA: 125 })).toBe("1 AWG");
    expect(egc({ ocpdA: 125, ungroundedSize: "1 AWG", minimumSize: "1 AWG" })).toMatchObject({ value: "6 AWG", detail: { ratio: 1 } });
    // 150 A by round-up on the same wire: the base is larger than the wire, and nothing was increased.
    expect(egc({ ocpdA: 150, ungroundedSize: "1 AWG", minimumSize: "1/0 AWG" }).detail.ratio).toBe(1);
  });
  it("never larger than the circuit conductors, in one metal", () => {
    expect(egc({ ocpdA: 20, ungroundedSize: "14 AWG" })).toMatchObject({ value: "14 AWG", detail: { limitedToUngrounded: true } });
    expect(egc({ ocpdA: 200, material: "copper", ungroundedSize: "4/0 AWG", ungroundedMaterial: "aluminum" }).value).toBe("6 AWG");
  });
  it("the working ends with the size picked for the increased area, and only there", () => {
    const words = (steps: readonly { expression: string }[]): boolean => steps.some((step) => step.expression === "next size with that area");
    expect([words(egc({ minimumSize: "4 AWG" }).steps), words(egc({}).steps), words(egc({ ocpdA: 20, ungroundedSize: "12 AWG", minimumSize: "14 AWG" }).steps)]).toEqual([true, false, false]);
  });
  it("PV circuits are not increased and parallel raceways each take a full conductor", () => {
    expect(egc({ minimumSize: "4 AWG", pvCircuit: true })).toMatchObject({ value: "8 AWG", detail: { ratio: 1 } });
    expect(egc({ ocpdA: 800, ungroundedSize: "600 kcmil", sets: 2 })).toMatchObject({ value: "1/0 AWG", detail: { perRaceway: true } });
  });
  it("a fault of the input is not taken for a missing size", () => {
    expect(() => sufficientSize({ ...base, requiredA: 80, parts: [{ ...parts[0], ambientC: 95 }] })).toThrow("parts.0.ambientC");
    expect(() => sufficientSize({ ...base, requiredA: 5000 })).toThrow("requiredA");
  });
});
