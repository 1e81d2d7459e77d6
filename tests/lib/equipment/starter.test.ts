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

  it.each(ofKind("hybrid-inverter").map((each) => [each.name, each] as const))("%s: current and largest device follow from its power", (_, entry) => {
    // P = V × I; standard sizes from NEC 240.6(A), of which those near are typed here.
    expect(num(entry, "outputKW") * 1000 / num(entry, "outputV")).toBeCloseTo(num(entry, "continuousA"), 1);
    const least = num(entry, "continuousA") * 1.25;
    expect(num(entry, "maximumOvercurrentA")).toBe([15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80].find((size) => size >= least));
    expect(entry.data.ports["ac"]).toMatchObject({ continuousA: num(entry, "continuousA"), maximumOvercurrentA: num(entry, "maximumOvercurrentA") });
    const fits = ofKind("battery").filter((battery) => num(battery, "leastV") >= num(entry, "batteryLeastV") && num(battery, "mostV") <= num(entry, "batteryMostV"));
    expect(fits).toHaveLength(1);
    // The battery port carries the full output from the lowest voltage of the battery that fits.
    expect(num(fits[0]!, "leastV") * num(entry, "batteryA") / 1000).toBeGreaterThanOrEqual(num(entry, "outputKW"));
  });

  it.each([...ofKind("pv-string")].map((each) => [each.name, each] as const))("%s: module power is voltage times current, and every inverter takes the string", (_, entry) => {
    expect(Math.round(num(entry, "maximumPowerV") * num(entry, "maximumPowerA"))).toBe(num(entry, "moduleW"));
    // Open-circuit voltage at -25 °C by the coefficient per °C below 25 °C, NEC 690.7(A)(1).
    const cold = num(entry, "modules") * num(entry, "openCircuitV") * (1 + (num(entry, "openCircuitPercentPerC") / 100) * (-25 - 25));
    for (const inverter of ofKind("hybrid-inverter")) {
      expect(cold).toBeLessThanOrEqual(num(inverter, "pvMaximumV"));
      expect(num(entry, "shortCircuitA") * 1.25).toBeLessThanOrEqual(num(inverter, "trackerShortCircuitA"));
    }
  });

  it("gives generators the current of their power and batteries the energy of whole ampere hours", () => {
    for (const each of ofKind("generator")) expect(num(each, "outputKW") * 1000 / num(each, "outputV")).toBeCloseTo(num(each, "ratedA"), 1);
    expect(ofKind("battery").map((each) => Math.round(num(each, "energyKWh") * 1000 / num(each, "nominalV")))).toEqual([250, 40]);
  });
});
