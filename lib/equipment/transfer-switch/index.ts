import { choice, defineKind, flag, number } from "../define";
import { acPoles, enclosureProperties, groundPort, identity, lines, withUnit, withDeviceAhead } from "../shared";

/** Joins its common port to source A or source B, never to both. */
export const transferSwitch = defineKind({
  kind: "transfer-switch", title: "Transfer switch", tagPrefix: "TS", railGroup: "switch and protect",
  properties: {
    ...identity, ...enclosureProperties,
    operation: choice("Operation", ["manual", "automatic"]),
    ratingA: number("Rating", "A", 1, 6000, { rated: true }),
    poles: number("Poles", "", 1, 4, { integer: true, rated: true }),
    switchedNeutral: flag("Switches the neutral", { rated: true }),
    centerOff: flag("Has an off position", { rated: true }),
    voltageV: number("Voltage rating", "V", 1, 1500, { rated: true }),
    shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }),
    ...withDeviceAhead,
  },
  defaults: { poles: 2, switchedNeutral: false, operation: "manual" },
  capabilities: { switching: "transfer", neutralBar: true },
  symbol: () => "doublethrow",
  box: { x: 0, y: -1.6, width: 4, height: 3.2 },
  ports: (p) => [
    { id: "a", label: "Source A", system: "ac", side: "left", x: 0, y: -1, poles: [...acPoles(p.poles), "N"] },
    { id: "b", label: "Source B", system: "ac", side: "left", x: 0, y: 1, poles: [...acPoles(p.poles), "N"] },
    { id: "common", label: "Load", system: "ac", side: "right", x: 4, y: 0, poles: [...acPoles(p.poles), "N"] },
    groundPort(2, 2),
  ],
  joins: () => [{ a: "a", b: "common", by: "throw", position: "A" }, { a: "b", b: "common", by: "throw", position: "B" }],
  annotation: (p) => lines([withUnit(p.ratingA, "A"), p.operation?.toUpperCase()].filter(Boolean).join(" ") || null),
  scheduleFields: ["make", "model", "ratingA", "poles", "voltageV", "shortCircuitKA", "listing"],
});
