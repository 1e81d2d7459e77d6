import { describe, expect, it } from "vitest";
import { conductorAmpacity, currentCarryingCount, dwellingServiceConductor, hvacDevice, largestOvercurrentDevice, motorDevice, requiredAmpacity, sufficientSize, type AmpacityInput, type RoutePart } from "@/lib/calc";

const base = { edition: "2023", size: "10 AWG", material: "copper", insulation: "THWN-2", terminalC: 75 } as const;
const part = (change: Partial<RoutePart> = {}): RoutePart => ({ kind: "raceway", lengthFt: 50, ambientC: 30, currentCarryingCount: 3, ...change });
const run = (parts: readonly RoutePart[], change: Partial<AmpacityInput> = {}) => conductorAmpacity({ ...base, parts, ...change });

describe("parts of a route", () => {
  it("takes no adjustment in 24 in, and takes it one inch beyond", () => {
    expect(run([part({ lengthFt: 2, currentCarryingCount: 9 })]).detail.correctedA).toBe(40);
    expect(run([part({ lengthFt: 25 / 12, currentCarryingCount: 9 })]).detail.correctedA).toBe(28);
    for (const kind of ["cable", "nonmetallic wireway", "metal wireway"] as const) expect(run([part({ kind, lengthFt: 2, currentCarryingCount: 40 })]).detail.correctedA).toBe(40);
  });
  it("a short stretch of a long raceway is no nipple", () => {
    const result = run([part({ lengthFt: 2, racewayLengthFt: 22, currentCarryingCount: 9 })]);
    expect(result.detail.correctedA).toBe(28);
    expect(() => run([part({ lengthFt: 30, racewayLengthFt: 22 })])).toThrow("parts.0.racewayLengthFt");
  });
  it("metal wireway to 30, nonmetallic from 4, open never", () => {
    const at = (kind: RoutePart["kind"], currentCarryingCount: number): number => run([part({ kind, currentCarryingCount })]).detail.correctedA;
    expect([at("metal wireway", 30), at("metal wireway", 31), at("nonmetallic wireway", 30), at("nonmetallic wireway", 4), at("open", 31), at("cable", 4)]).toEqual([40, 16, 18, 32, 40, 32]);
  });
  it("a hot part of 10 ft and 10 % may be passed over, not a longer one", () => {
    const hot = (lengthFt: number, restFt: number): number => run([part({ lengthFt: restFt }), part({ lengthFt, ambientC: 54 })], { terminalC: 90 }).value;
    expect(hot(10, 100)).toBe(40);
    expect(hot(10.1, 200)).toBeCloseTo(30.4, 10);
    expect(hot(5.1, 50)).toBeCloseTo(30.4, 10);
    expect(hot(5, 50)).toBe(40);
    // Two short hot parts count together.
    expect(run([part({ lengthFt: 100 }), part({ lengthFt: 6, ambientC: 54 }), part({ lengthFt: 6, ambientC: 54 })], { terminalC: 90 }).value).toBeCloseTo(30.4, 10);
    expect(run([part({ lengthFt: 100 }), part({ lengthFt: 9, ambientC: 54 })]).steps.some((step) => step.citation?.includes("310.14(A)(2)"))).toBe(true);
  });
  it("roof: the adder counts below the height of the edition and not for XHHW-2", () => {
    const roof = (rooftopHeightIn: number, change: Partial<AmpacityInput> = {}): number => run([part({ rooftopHeightIn, ambientC: 33 })], { terminalC: 90, ...change }).value;
    expect([roof(0.8), roof(0.8, { edition: "2020" }), roof(0.5, { insulation: "XHHW-2" }), roof(0.5)]).toEqual([38.4, 40 * 0.58, 38.4, 40 * 0.58]);
  });
  it("wet THHN is refused, dry THHW and wet THHW differ", () => {
    expect(() => run([part()], { insulation: "THHN", wet: true })).toThrow("insulation");
    expect([run([part()], { insulation: "THHW" }).detail.tableA, run([part()], { insulation: "THHW", wet: true }).detail.tableA]).toEqual([40, 35]);
  });
  it("a 60 °C insulation limits the terminal column as well", () => {
    expect(run([part()], { insulation: "TW", terminalC: 90 }).detail.terminalLimitA).toBe(30);
  });
  it("names the part whose ambient no conductor stands", () => {
    expect(() => run([part(), part({ ambientC: 95 })])).toThrow("parts.1.ambientC");
    expect(() => run([])).toThrow("parts");
  });
  it("says where parallel sets are below 1/0", () => {
    expect([run([part()], { sets: 2 }).detail.parallelAllowed, run([part()], { sets: 2, size: "1/0 AWG" }).detail.parallelAllowed]).toEqual([false, true]);
  });
  it("105 °C PV wire uses its own table and factors", () => {
    const result = conductorAmpacity({ ...base, insulation: "PV wire", conductorRatingC: 105, terminalC: 90, edition: "2020", parts: [part({ kind: "open", ambientC: 60 })] });
    expect(result.detail.correctedA).toBeCloseTo(46 * 0.77, 10);
    expect(result.citations.map((item) => item.section)).toContain("Table 690.31(A)(b)");
  });
});

describe("counting", () => {
  it("leaves out neutrals of unbalance and counts one of two that exclude each other", () => {
    const circuits = [{ ungroundedCount: 2, neutral: "unbalance" }, { ungroundedCount: 1, neutral: "two-wire" }, { ungroundedCount: 3, neutral: "nonlinear" }, { ungroundedCount: 2, neutral: "none", alternative: "source" }, { ungroundedCount: 3, neutral: "none", alternative: "source" }] as const;
    expect(currentCarryingCount({ edition: "2023", circuits }).value).toBe(2 + 2 + 4 + 3);
  });
});

describe("devices", () => {
  const largest = (ampacityA: number, change: object = {}): number => largestOvercurrentDevice({ edition: "2023", ampacityA, size: "1/0 AWG", material: "copper", ...change }).value;
  it("rounds up only from a non-standard ampacity, to 800 A, and not for taps", () => {
    expect([largest(130), largest(150), largest(130, { roundUp: false }), largest(760), largest(800), largest(801), largest(8, { size: "14 AWG" })]).toEqual([150, 150, 130, 800, 800, 801, 10]);
  });
  it("holds small conductors unless the circuit is a motor's", () => {
    expect([largest(35, { size: "10 AWG" }), largest(35, { size: "10 AWG", smallConductorLimit: false })]).toEqual([30, 35]);
  });
  it("dwelling service: 4/0 aluminum, 180 A, on 200 A", () => {
    const result = largestOvercurrentDevice({ edition: "2023", ampacityA: 180, size: "4/0 AWG", material: "aluminum", dwelling83: true });
    expect([result.detail.standardA, result.detail.governedBy]).toEqual([200, "83 % rule"]);
    expect(dwellingServiceConductor({ edition: "2023", ratingA: 200, material: "aluminum" }).value).toBe("4/0 AWG");
    const route = { insulation: "XHHW-2", terminalC: 75, parts: [part({ ambientC: 50 })] } as const;
    // 205 A × 0.82 = 168.1 A is enough for 166 A.
    expect(dwellingServiceConductor({ edition: "2017", ratingA: 200, material: "aluminum", route }).value).toBe("4/0 AWG");
    expect(dwellingServiceConductor({ edition: "2017", ratingA: 200, material: "aluminum", route: { ...route, parts: [part({ ambientC: 55 })] } }).value).toBe("250 kcmil");
    expect(() => dwellingServiceConductor({ edition: "2017", ratingA: 200, material: "aluminum" })).toThrow("route");
  });
  it("motors 250 % and the next rating, conditioning units the marked maximum", () => {
    expect([motorDevice({ edition: "2023", fullLoadA: 6.9 }).value, motorDevice({ edition: "2023", fullLoadA: 8 }).value, motorDevice({ edition: "2023", fullLoadA: 8, device: "dual element fuse" }).value]).toEqual([20, 20, 15]);
    expect(hvacDevice({ edition: "2023", minimumCircuitA: 17, maximumDeviceA: 28 }).value).toBe(25);
    expect(() => hvacDevice({ edition: "2023", minimumCircuitA: 1, maximumDeviceA: 5 })).toThrow("maximumDeviceA");
  });
});

describe("what a circuit asks for", () => {
  const ask = (use: Parameters<typeof requiredAmpacity>[0]["use"], edition: "2017" | "2020" = "2020") => requiredAmpacity({ edition, use }).detail;
  it("continuous and other load, with and without a listing for 100 %", () => {
    expect(ask({ kind: "load", continuousA: 40, noncontinuousA: 10 }).beforeFactorsA).toBe(60);
    expect(ask({ kind: "load", continuousA: 40, noncontinuousA: 10, hundredPercentRated: true }).beforeFactorsA).toBe(50);
  });
  it("converter bases carry no irradiance factor; the input basis starts in 2020", () => {
    expect(ask({ kind: "pv", basis: "converter output", currentA: 15 })).toMatchObject({ maximumA: 15, beforeFactorsA: 18.75 });
    expect(ask({ kind: "pv", basis: "converter input", currentA: 20 }).maximumA).toBe(20);
    expect(() => ask({ kind: "pv", basis: "converter input", currentA: 20 }, "2017")).toThrow("use.basis");
    const sections = (basis: "converter output" | "converter input"): string[] => requiredAmpacity({ edition: "2020", use: { kind: "pv", basis, currentA: 15 } }).citations.map((item) => item.section);
    expect([sections("converter output")[0], sections("converter input")[0]]).toEqual(["690.8(A)(1)(c)", "690.8(A)(2)"]);
    expect(ask({ kind: "pv", currentA: 10, bifacialGain: 0.1 }).maximumA).toBeCloseTo(13.75, 10);
    expect(ask({ kind: "pv", basis: "engineered", currentA: 10, engineeredA: 5, systemKw: 120 }).maximumA).toBeCloseTo(8.75, 10);
    expect(() => ask({ kind: "pv", basis: "engineered", currentA: 10, engineeredA: 5, systemKw: 50 })).toThrow("use.systemKw");
  });
  it("storage follows the larger of nameplate and device; motors 125 % of the largest", () => {
    expect(ask({ kind: "storage", nameplateA: 100, ocpdA: 125 })).toMatchObject({ beforeFactorsA: 125, afterFactorsA: 100, minimumOcpdA: 125 });
    expect(ask({ kind: "motor", largestA: 8, otherMotorsA: 4, otherLoadA: 3 }).beforeFactorsA).toBe(17);
    const motor = requiredAmpacity({ edition: "2020", use: { kind: "motor", largestA: 8, otherMotorsA: 4 } });
    expect([motor.value, motor.steps[0]?.substituted, motor.citations[0]?.section]).toEqual([14, "1.25 × 8 A + 4 A + 0 A", "430.24"]);
    const alone = requiredAmpacity({ edition: "2020", use: { kind: "motor", largestA: 8 } });
    expect([alone.value, alone.steps[0]?.expression, alone.citations[0]?.section]).toEqual([10, "1.25 × full-load current", "430.22"]);
    expect(() => ask({ kind: "battery input" })).toThrow("use.powerW");
  });
  it("the base of an increase holds heat from 2020 on and not in 2017", () => {
    const input = { material: "copper", insulation: "THWN-2", terminalC: 75, requiredA: 80, parts: [part({ ambientC: 54, currentCarryingCount: 9 })] } as const;
    expect([sufficientSize({ ...input, edition: "2017" }), sufficientSize({ ...input, edition: "2020" })]).toEqual(["4 AWG", "1/0 AWG"]);
  });
});
