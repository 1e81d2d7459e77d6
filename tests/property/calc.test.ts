import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  busbarCheck, conductorAmpacity, equipmentGroundingConductor, faultCurrent, largestOvercurrentDevice, racewayFill, requiredAmpacity, sizeCircuit, stringVoltage, voltageDrop,
  type AmpacityInput, type CircuitToSize, type FillItem, type RoutePart,
} from "@/lib/calc";
import { CALCULATIONS } from "@/lib/calc/registry";
import { CodeLookupError, EDITIONS, insulationRatingC, standardRatingsA, tableAmpacityA, type Edition, type Insulation } from "@/lib/code";
import { circularMils, CONDUCTOR_SIZES, convert, dimensionOf, FieldError, formatQuantity, parseConductorSize, parseIn, UNITS, unitsOf, type ConductorSize, type Unit } from "@/lib/units";

const editions = fc.constantFrom<Edition>(...EDITIONS);
const sizes = fc.constantFrom(...CONDUCTOR_SIZES.slice(2));
const insulations = fc.constantFrom<Insulation>("TW", "THW", "THWN-2", "XHHW-2", "RHW-2", "USE-2");
const materials = fc.constantFrom("copper" as const, "aluminum" as const);
const terminals = fc.constantFrom<60 | 75 | 90>(60, 75, 90);
const part: fc.Arbitrary<RoutePart> = fc.record({
  kind: fc.constantFrom("raceway", "metal wireway", "nonmetallic wireway", "cable", "open"),
  lengthFt: fc.integer({ min: 1, max: 3000 }).map((n) => n / 10),
  ambientC: fc.integer({ min: -30, max: 54 }),
  currentCarryingCount: fc.integer({ min: 1, max: 60 }),
  rooftopHeightIn: fc.option(fc.constantFrom(0.5, 0.8, 4), { nil: null }),
});
const circuit: fc.Arbitrary<AmpacityInput> = fc.record({ edition: editions, size: sizes, material: materials, insulation: insulations, terminalC: terminals, parts: fc.array(part, { minLength: 1, maxLength: 5 }) });

/** The ampacity, or null where a table holds no value (a conductor above its own temperature, a size that is not made). */
function ampacityOrNull(input: AmpacityInput): number | null {
  try {
    return conductorAmpacity(input).value;
  } catch (error) {
    if (error instanceof CodeLookupError) return null;
    throw error;
  }
}

/** Checks an order between two ampacities where both exist; a missing one may only stand on the lower side. */
function notHigher(lower: AmpacityInput, higher: AmpacityInput): void {
  const a = ampacityOrNull(lower);
  const b = ampacityOrNull(higher);
  if (a !== null) expect(b).not.toBeNull();
  if (a !== null && b !== null) expect(a).toBeLessThanOrEqual(b);
}

describe("ampacity", () => {
  it("a larger conductor never has a lower ampacity", () => {
    fc.assert(fc.property(circuit, sizes, (input, other) => {
      const [small, large] = circularMils(input.size) < circularMils(other) ? [input.size, other] : [other, input.size];
      const a = ampacityOrNull({ ...input, size: small });
      const b = ampacityOrNull({ ...input, size: large });
      if (a !== null && b !== null) expect(a).toBeLessThanOrEqual(b);
    }), { numRuns: 500 });
  });
  it("a hotter part never raises it", () => {
    fc.assert(fc.property(circuit, fc.nat(4), fc.integer({ min: 1, max: 30 }), (input, which, degrees) => {
      const index = which % input.parts.length;
      const hotter = input.parts.map((item, i) => (i === index ? { ...item, ambientC: item.ambientC + degrees } : item));
      notHigher({ ...input, parts: hotter }, input);
    }), { numRuns: 500 });
  });
  it("more current-carrying conductors never raise it", () => {
    fc.assert(fc.property(circuit, fc.nat(4), fc.integer({ min: 1, max: 40 }), (input, which, more) => {
      const index = which % input.parts.length;
      const fuller = input.parts.map((item, i) => (i === index ? { ...item, currentCarryingCount: item.currentCarryingCount + more } : item));
      notHigher({ ...input, parts: fuller }, input);
    }), { numRuns: 500 });
  });
  it("never exceeds the column of the terminals or of the insulation", () => {
    fc.assert(fc.property(circuit, (input) => {
      const value = ampacityOrNull(input);
      if (value === null) return;
      const ratingC = insulationRatingC(input.insulation, false);
      expect(value).toBeLessThanOrEqual(tableAmpacityA(input.size, input.material, Math.min(input.terminalC, ratingC) as 60 | 75 | 90));
    }), { numRuns: 300 });
  });
  it("the order of the parts does not matter", () => {
    fc.assert(fc.property(circuit, (input) => {
      expect(ampacityOrNull({ ...input, parts: [...input.parts].reverse() })).toBe(ampacityOrNull(input));
    }), { numRuns: 300 });
  });
  it("n sets carry n times one", () => {
    fc.assert(fc.property(circuit, fc.integer({ min: 2, max: 6 }), (input, sets) => {
      const one = ampacityOrNull(input);
      if (one !== null) expect(ampacityOrNull({ ...input, sets })).toBeCloseTo(sets * one, 9);
    }), { numRuns: 200 });
  });
});

describe("units", () => {
  const unitPair = fc.constantFrom<Unit>(...UNITS).chain((from) => fc.tuple(fc.constant(from), fc.constantFrom<Unit>(...unitsOf(dimensionOf(from)))));
  it("round trips", () => {
    fc.assert(fc.property(unitPair, fc.double({ min: -1e6, max: 1e6, noNaN: true }), ([from, to], value) => {
      const back = convert(convert(value, from, to), to, from);
      expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
    }));
  });
  it("what is printed is read back", () => {
    fc.assert(fc.property(fc.constantFrom<Unit>(...UNITS), fc.integer({ min: -9999999, max: 9999999 }), (unit, cents) => {
      expect(parseIn(formatQuantity(cents / 100, unit), unit)).toBeCloseTo(cents / 100, 9);
    }));
  });
  it("sizes survive their spellings", () => {
    fc.assert(fc.property(fc.constantFrom(...CONDUCTOR_SIZES), fc.constantFrom("", "#", " "), (size, prefix) => {
      expect(parseConductorSize(size)).toBe(size);
      expect(parseConductorSize(prefix + size.replace(/ .*/, ""))).toBe(size);
    }));
  });
});

describe("fill", () => {
  const item: fc.Arbitrary<FillItem> = fc.oneof(
    fc.record({ count: fc.integer({ min: 1, max: 6 }), size: fc.constantFrom(...CONDUCTOR_SIZES.slice(2, 20)), insulation: fc.constantFrom<Insulation>("THWN-2", "XHHW-2", "THW") }),
    fc.record({ count: fc.integer({ min: 1, max: 6 }), outsideDiameterIn: fc.integer({ min: 10, max: 100 }).map((n) => n / 100) }),
  );
  const items = fc.array(item, { minLength: 1, maxLength: 6 });
  const fill = (list: readonly FillItem[]) => racewayFill({ edition: "2023", raceway: { kind: "RMC", tradeSize: "4", lengthIn: 120 }, items: list });
  it("is additive, in any order", () => {
    fc.assert(fc.property(items, items, (a, b) => {
      expect(fill([...a, ...b]).value).toBeCloseTo(fill(a).value + fill(b).value, 9);
      expect(fill([...b, ...a]).value).toBeCloseTo(fill([...a, ...b]).value, 9);
    }));
  });
  it("a raceway that is full stays full with one more; room and fit agree", () => {
    fc.assert(fc.property(items, item, (a, more) => {
      const before = fill(a).detail;
      const after = fill([...a, more]).detail;
      // Only the step from two to three conductors raises the limit.
      if (!before.fits && before.conductorCount > 2) expect(after.usedIn2).toBeGreaterThan(before.usedIn2);
      if (before.largestCountEqual === null) expect(before.fits).toBe(before.roomLeftIn2 >= -1e-12 * before.allowedIn2);
    }));
  });
  it("the number of later cables is exact: that many fit, one more does not", () => {
    fc.assert(fc.property(items, fc.integer({ min: 15, max: 60 }).map((n) => n / 100), (a, outsideDiameterIn) => {
      const later = { count: 1, outsideDiameterIn };
      const count = racewayFill({ edition: "2023", raceway: { kind: "RMC", tradeSize: "4", lengthIn: 120 }, items: a, later }).detail.laterCount ?? -1;
      if (count > 0) expect(fill([...a, { ...later, count }]).detail.fits).toBe(true);
      expect(fill([...a, { ...later, count: count + 1 }]).detail.fits).toBe(false);
    }));
  });
});

describe("other calculations keep their direction", () => {
  it("a longer, thinner or hotter-loaded circuit never drops less", () => {
    fc.assert(fc.property(fc.constantFrom(...CONDUCTOR_SIZES.slice(2, 17)), fc.integer({ min: 1, max: 400 }), fc.integer({ min: 1, max: 500 }), fc.integer({ min: 1, max: 100 }), (size, currentA, lengthFt, more) => {
      const drop = (change: { size?: ConductorSize; currentA?: number; lengthFt?: number }): number => voltageDrop({ edition: "2023", system: "ac 1-phase", voltageV: 240, material: "copper", conduit: "steel", size, currentA, lengthFt, ...change }).value;
      expect(drop({ currentA: currentA + more })).toBeGreaterThan(drop({}));
      expect(drop({ lengthFt: lengthFt + more })).toBeGreaterThan(drop({}));
      expect(drop({ size: CONDUCTOR_SIZES[CONDUCTOR_SIZES.indexOf(size) + 1] })).toBeLessThanOrEqual(drop({}));
    }));
  });
  it("fault current falls along the way, and the vector sum is never below the arithmetic one", () => {
    const segments = fc.array(fc.record({ label: fc.constant("run"), lengthFt: fc.integer({ min: 0, max: 300 }), size: fc.constantFrom<ConductorSize>("8 AWG", "1 AWG", "250 kcmil"), material: fc.constant("copper" as const), conduit: fc.constantFrom("pvc" as const, "steel" as const) }), { minLength: 1, maxLength: 4 });
    fc.assert(fc.property(segments, fc.integer({ min: 1000, max: 60000 }), fc.double({ min: 0, max: 10, noNaN: true }), (list, availableA, sourceXOverR) => {
      const base = { edition: "2023", phases: 1, lineToLineV: 240, source: { kind: "stated", availableA }, segments: list } as const;
      const arithmetic = faultCurrent({ ...base, method: "arithmetic" });
      const vector = faultCurrent({ ...base, method: "vector", sourceXOverR });
      let last = availableA;
      for (const node of arithmetic.detail.nodes) {
        expect(node.boltedA).toBeLessThanOrEqual(last * (1 + 1e-12));
        last = node.boltedA;
      }
      expect(vector.value).toBeGreaterThanOrEqual(arithmetic.value * (1 - 1e-9));
    }));
  });
  it("a colder morning never lowers the string voltage", () => {
    fc.assert(fc.property(fc.integer({ min: -40, max: 40 }), fc.integer({ min: 0, max: 20 }), fc.constantFrom({ pctPerC: -0.26 }, { voltPerC: -0.1 }, "table" as const), (lowestC, colder, vocCoefficient) => {
      fc.pre(lowestC - colder >= -40);
      const cold = (t: number): number => stringVoltage({ edition: "2023", modulesInSeries: 10, vocV: 40, vocCoefficient, lowestC: t }).value;
      expect(cold(lowestC - colder)).toBeGreaterThanOrEqual(cold(lowestC));
    }));
  });
  it("a busbar that complies still does with less output or a larger bus", () => {
    const panel = fc.record({ busbarA: fc.integer({ min: 60, max: 600 }), mainDeviceA: fc.integer({ min: 30, max: 600 }), sourceOutputsA: fc.array(fc.integer({ min: 1, max: 100 }), { maxLength: 4 }), branchDevicesA: fc.array(fc.integer({ min: 15, max: 100 }), { maxLength: 8 }), oppositeEnds: fc.boolean() });
    fc.assert(fc.property(panel, fc.integer({ min: 1, max: 100 }), (input, more) => {
      const complies = (change: object): boolean => busbarCheck({ edition: "2023", ...input, ...change }).detail.complies;
      if (!complies({})) return;
      expect(complies({ busbarA: input.busbarA + more })).toBe(true);
      expect(complies({ sourceOutputsA: input.sourceOutputsA.slice(1) })).toBe(true);
    }));
  });
  it("an equipment ground never shrinks with the device or the increase, nor exceeds the circuit conductors", () => {
    fc.assert(fc.property(fc.integer({ min: 15, max: 400 }), sizes, sizes, (ocpdA, ungroundedSize, minimumSize) => {
      const run = (device: number): number => circularMils(equipmentGroundingConductor({ edition: "2023", ocpdA: device, material: "copper", ungroundedSize, ungroundedMaterial: "copper", minimumSize }).value);
      expect(run(ocpdA + 50)).toBeGreaterThanOrEqual(run(ocpdA));
      expect(run(ocpdA)).toBeLessThanOrEqual(circularMils(ungroundedSize));
    }));
  });
  it("no calculation answers NaN or Infinity, whatever numbers come in", () => {
    const wild = fc.oneof(fc.double(), fc.constantFrom(0, -0, Number.NaN, Infinity, -Infinity, 1e308, -1e9, 1e9, 5e-324));
    const numbersOf = (value: unknown): number[] => (typeof value === "number" ? [value] : typeof value === "object" && value !== null ? Object.values(value).flatMap(numbersOf) : []);
    let answered = 0;
    fc.assert(fc.property(fc.constantFrom(...CALCULATIONS), fc.array(fc.option(wild, { freq: 2, nil: null }), { minLength: 12, maxLength: 12 }), (entry, replacements) => {
      let next = 0;
      const replace = (value: unknown): unknown => {
        if (typeof value === "number") return replacements[next++ % replacements.length] ?? value;
        if (Array.isArray(value)) return value.map(replace);
        return typeof value === "object" && value !== null ? Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, replace(inner)])) : value;
      };
      try {
        expect(numbersOf(entry.run(replace(entry.sample))).every(Number.isFinite)).toBe(true);
        answered += 1;
      } catch (error) {
        if (!(error instanceof FieldError)) throw error;
        expect(error.field.length).toBeGreaterThan(0);
      }
    }), { numRuns: 3000 });
    expect(answered).toBeGreaterThan(100);
  });
});

describe("sizing a circuit", () => {
  const toSize: fc.Arbitrary<CircuitToSize> = fc.record({
    edition: editions,
    use: fc.oneof(
      fc.record({ kind: fc.constant("inverter output" as const), outputA: fc.integer({ min: 5, max: 300 }) }),
      fc.record({ kind: fc.constant("load" as const), continuousA: fc.integer({ min: 1, max: 200 }), noncontinuousA: fc.integer({ min: 0, max: 100 }) }),
      fc.record({ kind: fc.constant("battery input" as const), ratedA: fc.integer({ min: 20, max: 300 }) }),
    ),
    material: materials,
    insulation: fc.constantFrom<Insulation>("THWN-2", "XHHW-2"),
    terminalC: fc.constantFrom<60 | 75>(60, 75),
    parts: fc.array(part, { minLength: 1, maxLength: 3 }),
    drop: fc.option(fc.record({ system: fc.constant("ac 1-phase" as const), voltageV: fc.constant(240), currentA: fc.integer({ min: 5, max: 200 }), lengthFt: fc.integer({ min: 1, max: 300 }), limitPct: fc.constantFrom(2, 3, 5) }), { nil: undefined }),
    raceway: fc.option(fc.record({ kind: fc.constantFrom("EMT" as const, "PVC 40" as const), lengthIn: fc.constant(480), conductorsPerSet: fc.integer({ min: 2, max: 4 }) }), { nil: undefined }),
  });

  /** Every test of a candidate, written out apart from the implementation. */
  function passes(input: CircuitToSize, size: ConductorSize): boolean {
    try {
      const required = requiredAmpacity({ edition: input.edition, use: input.use }).detail;
      const ampacity = conductorAmpacity({ ...input, size });
      const device = standardRatingsA(input.edition).find((rating) => rating >= (required.minimumOcpdA ?? 0) - 1e-9) ?? Infinity;
      const drop = input.drop === undefined ? 0 : voltageDrop({ edition: input.edition, size, material: input.material, ...input.drop }).detail.dropPct;
      return ampacity.detail.terminalLimitA >= required.beforeFactorsA - 1e-9 && ampacity.value >= required.afterFactorsA - 1e-9
        && device <= largestOvercurrentDevice({ edition: input.edition, ampacityA: ampacity.value, size, material: input.material }).value && drop <= (input.drop?.limitPct ?? 100);
    } catch (error) {
      if (error instanceof CodeLookupError) return false;
      throw error;
    }
  }

  it("the result passes every check and no smaller size does", () => {
    let sized = 0;
    fc.assert(fc.property(toSize, (input) => {
      let result: ReturnType<typeof sizeCircuit>;
      try {
        result = sizeCircuit(input);
      } catch (error) {
        if (!(error instanceof FieldError)) throw error;
        // Nothing passes: then no size passes the tests written out here either, or no raceway holds the large ones.
        if (input.raceway === undefined) expect(CONDUCTOR_SIZES.some((size) => passes(input, size))).toBe(false);
        return;
      }
      sized += 1;
      const { detail } = result;
      expect(passes(input, detail.size)).toBe(true);
      expect(detail.rejected.map((item) => item.size)).toEqual(CONDUCTOR_SIZES.slice(0, CONDUCTOR_SIZES.indexOf(detail.size)));
      for (const smaller of detail.rejected) expect(passes(input, smaller.size), smaller.reason).toBe(false);
      if (input.raceway !== undefined && detail.tradeSize !== null) {
        const items = [{ count: input.raceway.conductorsPerSet, size: detail.size, insulation: input.insulation }, { count: 1, size: detail.groundSize, insulation: input.insulation }];
        expect(racewayFill({ edition: input.edition, raceway: { kind: input.raceway.kind, tradeSize: detail.tradeSize, lengthIn: 480 }, items }).detail.fits).toBe(true);
      }
    }), { numRuns: 300 });
    expect(sized).toBeGreaterThan(100);
  });
  it("takes more sets only when one set cannot do", () => {
    const input: CircuitToSize = { edition: "2023", use: { kind: "load", continuousA: 640, noncontinuousA: 0 }, material: "copper", insulation: "THWN-2", terminalC: 75, maxSets: 4, parts: [{ kind: "raceway", lengthFt: 50, ambientC: 30, currentCarryingCount: 3 }] };
    const result = sizeCircuit(input);
    expect([result.value, result.detail.deviceA, result.detail.groundSize]).toEqual(["2 × 600 kcmil", 800, "1/0 AWG"]);
    expect(() => sizeCircuit({ ...input, maxSets: 1 })).toThrow(/no conductor of the tables passes/);
  });
});
