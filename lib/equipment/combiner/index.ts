import { defineKind, number } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

/** Joins PV strings on one bus; fuse holders and a switch may stand inside. */
export const combiner = defineKind({
  kind: "combiner", title: "PV combiner", tagPrefix: "CMB", railGroup: "convert and distribute",
  properties: {
    ...identity, ...enclosureProperties,
    busA: number("Bus rating", "A", 1, 1000, { rated: true }),
    voltageV: number("Dc voltage rating", "V", 30, 2000, { rated: true }),
    shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }),
  },
  defaults: {},
  capabilities: { bus: true, enclosure: true },
  symbol: () => null,
  box: { x: 0, y: 0, width: 12, height: 8 },
  ports: () => [
    { id: "bus", label: "Bus", system: "pv-dc", side: "bottom", x: 6, y: 2, poles: ["+", "-"], many: true },
    groundPort(1, 8),
  ],
  joins: () => [],
  annotation: (p) => lines([withUnit(p.busA, "A"), withUnit(p.voltageV, "V DC")].filter(Boolean).join(" ") || null),
  scheduleFields: ["make", "model", "busA", "voltageV", "enclosureType", "listing"],
});
