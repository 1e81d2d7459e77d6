import { describe, expect, it } from "vitest";
import { equipmentDataFaults } from "@/lib/equipment/libraryData";
import { KIND_IDS, kindDefinition } from "@/lib/equipment/registry";
import { STARTER_SET, STARTER_SOURCE } from "@/lib/equipment/starter";

const named = STARTER_SET.map((each) => [each.name, each] as const);
const num = (entry: (typeof STARTER_SET)[number], name: string): number => {
  const value = entry.data.props[name];
  if (typeof value !== "number") throw new Error(`${entry.name} states no ${name}`);
  return value;
};
const ofKind = (kind: string) => STARTER_SET.filter((each) => each.kind === kind);

/** Standard sizes of overcurrent devices, NEC 240.6(A), of which those near are typed here. */
const nextSize = (least: number) => [15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 90, 100, 110].find((size) => size >= least);

describe("the starter set", () => {
  it("has an entry for every kind, each name once in its kind", () => {
    expect([...new Set(STARTER_SET.map((each) => each.kind))].sort()).toEqual([...KIND_IDS].sort());
    const names = STARTER_SET.map((each) => `${each.kind} ${each.name.toLowerCase()}`);
    expect(new Set(names).size).toBe(names.length);
  });

  it.each(named)("%s passes the check of its kind and names no maker", (_, { kind, data, name }) => {
    expect(equipmentDataFaults(kindDefinition(kind), data)).toEqual([]);
    expect([data.props["make"] ?? null, data.props["model"] ?? null]).toEqual([null, null]);
    expect(name.length).toBeLessThanOrEqual(120);
  });

  it.each(named)("%s says of every rated value and every port that it is invented", (_, { kind, data }) => {
    const rated = Object.entries(kindDefinition(kind).properties).filter(([key, property]) => property.rated && data.props[key] !== null).map(([key]) => key);
    const ports = Object.keys(data.ports).map((port) => `ports.${port}`);
    expect(Object.keys(data.sources).sort()).toEqual([...rated, ...ports].sort());
    expect(Object.values(data.sources).every((source) => source.document === "Starter example, invented values" && source.page === "")).toBe(true);
    expect(STARTER_SOURCE.document).toContain("invented");
  });

  it.each([...ofKind("hybrid-inverter"), ...ofKind("string-inverter")].map((each) => [each.name, each] as const))("%s: current and largest device follow from its power", (_, entry) => {
    // P = V × I; the largest device is the next standard size at or above 125 %.
    expect(num(entry, "outputKW") * 1000 / num(entry, "outputV")).toBeCloseTo(num(entry, "continuousA"), 1);
    expect(num(entry, "maximumOvercurrentA")).toBe(nextSize(num(entry, "continuousA") * 1.25));
    expect(entry.data.ports["ac"]).toMatchObject({ continuousA: num(entry, "continuousA"), maximumOvercurrentA: num(entry, "maximumOvercurrentA") });
  });

  it.each(ofKind("hybrid-inverter").map((each) => [each.name, each] as const))("%s has one battery in the set, which carries its full output down to the least voltage", (_, entry) => {
    const fits = ofKind("battery").filter((battery) => num(battery, "leastV") >= num(entry, "batteryLeastV") && num(battery, "mostV") <= num(entry, "batteryMostV"));
    expect(fits).toHaveLength(1);
    expect(num(fits[0]!, "leastV") * num(entry, "batteryA") / 1000).toBeGreaterThanOrEqual(num(entry, "outputKW"));
  });

  it.each([...ofKind("pv-string")].map((each) => [each.name, each] as const))("%s: module power is voltage times current, and every inverter takes the string", (_, entry) => {
    expect(Math.round(num(entry, "maximumPowerV") * num(entry, "maximumPowerA"))).toBe(num(entry, "moduleW"));
    // Open-circuit voltage at -25 °C by the coefficient per °C below 25 °C, NEC 690.7(A)(1).
    const cold = num(entry, "modules") * num(entry, "openCircuitV") * (1 + (num(entry, "openCircuitPercentPerC") / 100) * (-25 - 25));
    for (const inverter of [...ofKind("hybrid-inverter"), ...ofKind("string-inverter")]) {
      expect(cold).toBeLessThanOrEqual(num(inverter, "pvMaximumV"));
      expect(num(entry, "shortCircuitA") * 1.25).toBeLessThanOrEqual(num(inverter, "trackerShortCircuitA"));
    }
  });

  it("gives generators, transformers, branches and chargers the current of their power, and batteries the energy of whole ampere hours", () => {
    const amperes = (entry: (typeof STARTER_SET)[number], power: string, voltage: string) => num(entry, power) * 1000 / num(entry, voltage);
    for (const each of ofKind("generator")) expect(amperes(each, "outputKW", "outputV")).toBeCloseTo(num(each, "ratedA"), 1);
    for (const each of ofKind("transformer")) {
      expect(amperes(each, "ratedKVA", "primaryV")).toBeCloseTo(num(each, "primaryA"), 1);
      expect(amperes(each, "ratedKVA", "secondaryV")).toBeCloseTo(num(each, "secondaryA"), 1);
    }
    for (const each of ofKind("microinverter-branch")) {
      expect(num(each, "unitVA") / num(each, "outputV")).toBeCloseTo(num(each, "unitA"), 2);
      expect(num(each, "units") * num(each, "unitA")).toBeCloseTo(num(each, "continuousA"), 1);
      expect(num(each, "maximumOvercurrentA")).toBe(nextSize(num(each, "continuousA") * 1.25));
      expect(num(each, "units")).toBeLessThanOrEqual(num(each, "unitsMost"));
    }
    for (const each of ofKind("vehicle-charger")) {
      expect(amperes(each, "powerKW", "phaseV")).toBeCloseTo(num(each, "currentA"), 0);
      expect(amperes(each, "exportKW", "phaseV")).toBe(num(each, "exportA"));
      // Devices of charging equipment are sized for continuous duty, 125 %: NEC 625.41, section number from memory.
      expect(num(each, "minimumCircuitA")).toBe(num(each, "currentA") * 1.25);
    }
    for (const each of ofKind("charge-controller")) expect(num(each, "maximumOvercurrentA")).toBe(nextSize(num(each, "continuousA") * 1.25));
    expect(ofKind("battery").map((each) => Math.round(num(each, "energyKWh") * 1000 / num(each, "nominalV")))).toEqual([250, 40]);
  });
});
