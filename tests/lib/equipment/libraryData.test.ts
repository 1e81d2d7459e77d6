import { describe, expect, it } from "vitest";
import { equipmentDataFaults, keyRating, ratedCounts, wholeEquipmentData, type EquipmentData } from "@/lib/equipment/libraryData";
import { kindDefinition } from "@/lib/equipment/registry";

const inverter = kindDefinition("hybrid-inverter");
const breaker = kindDefinition("breaker");
const data = (props: EquipmentData["props"], more: Partial<EquipmentData> = {}): EquipmentData => ({ props, sources: {}, ports: {}, ...more });

describe("values of a library entry", () => {
  it("are taken when they fit, known or not", () => {
    expect(equipmentDataFaults(inverter, data({ outputKW: 11.4, listedInteractive: true, neutralRelay: "disabled", make: null }))).toEqual([]);
    expect(equipmentDataFaults(inverter, data({}))).toEqual([]);
  });

  it.each([
    ["outputKw", 11.4, "Hybrid inverter has no property of this name"],
    ["toString", 1, "Hybrid inverter has no property of this name"],
    ["outputKW", 501, "must lie between 0.1 and 500 kW"],
    ["outputKW", 0, "must lie between 0.1 and 500 kW"],
    ["outputKW", "11.4", "must be a number"],
    ["trackers", 1.5, "must be a whole number"],
    ["listedInteractive", "yes", "must be yes or no"],
    ["neutralRelay", "open", "must be one of: none, disabled, closes in island"],
    ["make", "m".repeat(61), "must be at most 60 characters"],
  ])("%s = %s is refused by name", (name, value, message) => {
    expect(equipmentDataFaults(inverter, data({ [name]: value }))).toEqual([{ path: `/props/${name}`, message }]);
  });

  it("name a port the kind lacks, also where the ports follow from a property", () => {
    const port = { pv3: { maximumA: 20 } };
    expect(equipmentDataFaults(inverter, data({ trackers: 3 }, { ports: port }))).toEqual([]);
    expect(equipmentDataFaults(inverter, data({ trackers: 2 }, { ports: port }))).toEqual([{ path: "/ports/pv3", message: "Hybrid inverter has no port of this name" }]);
  });

  it("name a wrong value at a port", () => {
    const [fault, ...more] = equipmentDataFaults(breaker, data({}, { ports: { line: { continuousA: -1 } } }));
    expect(fault?.path).toBe("/ports/line/continuousA");
    expect(more).toEqual([]);
    expect(equipmentDataFaults(breaker, data({}, { ports: { line: { amps: 1 } as never } }))).toEqual([{ path: "/ports/line", message: "has no amps" }]);
  });

  it("take sources of properties and ports, and none of anything else", () => {
    const sources = { ratingA: { document: "Sheet", page: "2" }, "ports.line": { document: "Sheet", page: "3" } };
    expect(equipmentDataFaults(breaker, data({ ratingA: 60 }, { sources }))).toEqual([]);
    for (const name of ["rating", "ports.nowhere"]) {
      expect(equipmentDataFaults(breaker, data({}, { sources: { [name]: { document: "Sheet", page: "" } } }))).toEqual([{ path: `/sources/${name}`, message: "is the source of no property" }]);
    }
  });

  it("become whole: what is not stated is not known", () => {
    const whole = wholeEquipmentData(breaker, data({ ratingA: 60 }));
    expect(Object.keys(whole.props)).toEqual(Object.keys(breaker.properties));
    expect(whole.props).toMatchObject({ ratingA: 60, poles: null, trip: null });
  });

  it("count the rated ones and those with a source", () => {
    // Trip rating, poles and interrupting rating are rated, the mounting is not; one source names no document.
    const given = data({ ratingA: 60, poles: 2, interruptingKA: 22, mount: "stud", voltageV: null }, {
      sources: { ratingA: { document: "Sheet", page: "2" }, poles: { document: "", page: "2" }, mount: { document: "Sheet", page: "2" } },
    });
    expect(ratedCounts(breaker.properties, given)).toEqual({ rated: 3, sourced: 1 });
  });

  it("say their key rating as a drawing prints it, without maker and model, and nothing while nothing is known", () => {
    expect(keyRating(breaker, data({ ratingA: 60, poles: 2, make: "Oddfellow" }))).toBe("60 A 2P");
    expect(keyRating(kindDefinition("string-inverter"), data({ model: "OX-76", outputKW: 7.6, continuousA: 32 }))).toBe("7.6 kW, 32 A");
    expect(keyRating(kindDefinition("string-inverter"), data({}))).toBe("");
  });
});
