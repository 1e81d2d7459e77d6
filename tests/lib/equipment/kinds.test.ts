import { describe, expect, it } from "vitest";
import { checkDocument, propertyFault } from "@/lib/diagram/check";
import { newEquipment } from "@/lib/diagram/commands";
import { emptyDrawing } from "@/lib/diagram/new";
import { SYSTEMS, type PropertyValue } from "@/lib/equipment/define";
import { isKindId, kindDefinition, KIND_IDS } from "@/lib/equipment/registry";

describe.each(KIND_IDS)("%s", (kind) => {
  const definition = kindDefinition(kind);
  const empty = Object.fromEntries(Object.keys(definition.properties).map((name) => [name, definition.defaults[name] ?? null]));

  it("starts with values that its own properties allow", () => {
    for (const [name, value] of Object.entries(definition.defaults as Record<string, PropertyValue>)) {
      const property = definition.properties[name];
      expect(property, name).toBeDefined();
      if (property) expect(propertyFault(property, value), name).toBeNull();
    }
  });
  it("never invents a rating: what a datasheet says starts as not known", () => {
    // The number of poles, of trackers and of channels and the service voltage are how the symbol is drawn, not ratings.
    const drawn = ["poles", "trackers", "channels", "systemVoltage", "switchedNeutral", "grounded", "bifacialGainPercent", "converters", "cell", "type", "fused"];
    const rated = Object.entries(definition.properties).filter(([name, property]) => property.rated && !drawn.includes(name));
    for (const [name] of rated) expect(empty[name], name).toBeNull();
  });
  it("refuses values beyond the limits of each property", () => {
    for (const [name, property] of Object.entries(definition.properties)) {
      const wrong: PropertyValue[] = property.type === "number" ? [property.min - 1, property.max + 1, Number.NaN, Infinity, "7", ...(property.integer ? [property.min + 0.5] : [])]
        : property.type === "choice" ? ["no such word", 1] : property.type === "flag" ? ["yes", 1] : ["x".repeat(property.maxLength + 1), 3];
      for (const value of wrong) expect(propertyFault(property, value), `${name} ${String(value)}`).not.toBeNull();
      expect(propertyFault(property, null)).toBeNull();
    }
  });
  it("names ports once, in systems that exist, and joins only ports it has", () => {
    const ports = definition.ports(empty as never);
    const ids = ports.map((port) => port.id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const port of ports) expect(SYSTEMS).toContain(port.system);
    for (const join of definition.joins(empty as never)) expect(ids).toEqual(expect.arrayContaining([join.a, join.b]));
    expect(ids.includes("bus")).toBe(definition.capabilities.bus === true);
  });
  it("joins power ports of one system only, except where it converts", () => {
    const system = new Map(definition.ports(empty as never).map((port) => [port.id, port.system]));
    for (const join of definition.joins(empty as never)) {
      if (definition.capabilities.transformer) expect([system.get(join.a), system.get(join.b), join.by]).toEqual(["ac", "ac", "converter"]);
      else if (join.by === "converter") expect(system.get(join.a)).not.toBe(system.get(join.b));
      else expect(system.get(join.a)).toBe(system.get(join.b));
    }
  });
  it("shows fields that it has and prints nothing that is not known", () => {
    for (const field of definition.scheduleFields) expect(Object.keys(definition.properties)).toContain(field);
    const blank = Object.fromEntries(Object.keys(definition.properties).map((name) => [name, null]));
    for (const line of definition.annotation(blank as never)) expect(line).not.toMatch(/null|undefined|NaN/);
  });
  it("placed alone it makes a whole drawing", () => {
    const drawing = emptyDrawing({});
    drawing.equipment["one"] = newEquipment(kind, "T-1", { x: 20, y: 20 });
    expect(checkDocument(drawing)).toEqual([]);
  });
});

it("asks for a kind by its name alone", () => {
  expect(isKindId("__proto__")).toBe(false);
  expect(isKindId("toString")).toBe(false);
  expect(() => kindDefinition("toString")).toThrow(RangeError);
});
