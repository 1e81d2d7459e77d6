import { describe, expect, it } from "vitest";
import { shape } from "@/lib/sheets/oneline/shape";
import { bodyOf } from "@/lib/sheets/oneline/appearance";
import { kindDefinition, KIND_IDS, type KindId } from "@/lib/equipment/registry";
import type { KindDefinition, PropertyValue } from "@/lib/equipment/define";
import { SYMBOL_IDS, symbol } from "@/lib/symbols";

const UNIT = 12;
const defaults = (definition: KindDefinition, change: Record<string, PropertyValue> = {}): never =>
  ({ ...Object.fromEntries(Object.keys(definition.properties).map((name) => [name, definition.defaults[name] ?? null])), ...change }) as never;

/** Every set of choices that a kind's symbol may depend on. */
function variants(kind: KindId): Record<string, PropertyValue>[] {
  const { properties } = kindDefinition(kind);
  const each = Object.entries(properties).flatMap(([name, property]): Record<string, PropertyValue>[] =>
    property.type === "choice" ? property.options.map((value) => ({ [name]: value })) : property.type === "flag" ? [{ [name]: true }, { [name]: false }] : []);
  return [{}, ...each];
}

describe("symbols", () => {
  it.each(SYMBOL_IDS)("%s holds well-formed path data inside a bounded area and lands on grid points", (id) => {
    const { paths, ports } = symbol(id);
    expect(Object.keys(paths).length).toBeGreaterThan(0);
    for (const data of Object.values(paths)) {
      expect(data).toMatch(/^M/);
      // SVG 1.1, 8.3.9: commands and numbers only. Renderers without full path support are spared S, Q and T.
      expect(data.replace(/-?(\d+\.?\d*|\.\d+)/g, "").replace(/[MLHVACZmlhvacsz\s,]/g, "")).toBe("");
    }
    for (const port of ports) expect([port.x % UNIT, port.y % UNIT].map(Math.abs)).toEqual([0, 0]);
  });
  it("names what it does not know", () => {
    expect(() => symbol("toString")).toThrow(RangeError);
    expect(() => shape("nothing")).toThrow("no symbol is named nothing");
  });
});

describe("kinds and their symbols", () => {
  it.each(KIND_IDS)("%s has a symbol for every choice that may be made", (kind) => {
    const definition = kindDefinition(kind);
    for (const change of variants(kind)) {
      const id = definition.symbol(defaults(definition, change));
      if (id === null) expect(definition.capabilities.enclosure).toBe(true);
      else expect(SYMBOL_IDS).toContain(id);
    }
  });
  it.each(KIND_IDS)("%s lands its power conductors where its symbol has its ports", (kind) => {
    const definition = kindDefinition(kind);
    for (const change of variants(kind)) {
      const props = defaults(definition, kind === "pv-switch" ? { ...change, channels: 1 } : change);
      const id = definition.symbol(props);
      // An outlined body reaches its ports by conductors of its own; a box has no symbol.
      if (id === null || (bodyOf(id).outline !== null && bodyOf(id).symbolAt.x !== 0)) continue;
      const wanted = definition.ports(props).filter((port) => (port.system !== "ground" && port.system !== "data") || definition.capabilities.electrode);
      const places = symbol(id).ports.map((port) => `${port.x} ${port.y}`).sort();
      expect(wanted.map((port) => `${port.x * UNIT} ${port.y * UNIT}`).sort(), `${kind} ${JSON.stringify(change)}`).toEqual(wanted.length ? places : []);
    }
  });
  it("gives each further channel of a PV switch the same pole beside the first", () => {
    const definition = kindDefinition("pv-switch");
    const ports = definition.ports(defaults(definition, { channels: 3 }));
    const pole = symbol("pvswitch").ports;
    for (const n of [1, 2, 3]) {
      const own = ports.filter((port) => port.id.endsWith(String(n)));
      expect(own.map((port) => [(port.x - 4 * (n - 1)) * UNIT, port.y * UNIT])).toEqual(pole.map((port) => [port.x, port.y]));
    }
  });
});
