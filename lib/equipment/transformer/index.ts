import { choice, defineKind, flag, number } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

/** Two-winding transformer or autotransformer. The path inside carries power and ends a conductor's run: each side has its own current. */
export const transformer = defineKind({
  kind: "transformer", title: "Transformer", tagPrefix: "T", railGroup: "convert and distribute",
  properties: {
    ...identity, ...enclosureProperties,
    ratedKVA: number("Rating", "kVA", 0.1, 5000, { rated: true }),
    primaryV: number("Primary voltage", "V", 100, 35000, { rated: true }),
    secondaryV: number("Secondary voltage", "V", 100, 1000, { rated: true }),
    primaryA: number("Primary current", "A", 0.1, 8000, { rated: true }),
    secondaryA: number("Secondary current", "A", 0.1, 8000, { rated: true }),
    impedancePercent: number("Impedance", "%", 0.5, 15, { rated: true }),
    construction: choice("Windings", ["two windings", "autotransformer", "neutral forming"], { rated: true }),
    secondary: choice("Secondary", ["2-wire", "3-wire, 120/240 V", "4-wire, wye", "4-wire, delta with high leg", "3-wire, delta"], { rated: true }),
    protectedTogether: flag("Opens with the loads it forms the neutral for", { rated: true }),
  },
  defaults: {},
  capabilities: { transformer: true, enclosure: true, neutralBar: true },
  symbol: () => "transformer",
  box: { x: 0, y: -1, width: 4, height: 2 },
  ports: () => [
    { id: "primary", label: "Primary", system: "ac", side: "left", x: 0, y: 0, poles: ["L1", "L2"] },
    { id: "secondary", label: "Secondary", system: "ac", side: "right", x: 4, y: 0, poles: ["L1", "L2", "N"] },
    groundPort(2, 1),
  ],
  joins: () => [{ a: "primary", b: "secondary", by: "converter" }],
  annotation: (p) => lines(withUnit(p.ratedKVA, "kVA"), p.primaryV !== null && p.secondaryV !== null && `${p.primaryV} : ${p.secondaryV} V`),
  scheduleFields: ["make", "model", "ratedKVA", "primaryV", "secondaryV", "impedancePercent", "listing"],
});
