import { defineKind, number } from "../define";
import { identity, lines, withUnit, withDeviceAhead } from "../shared";

export const meter = defineKind({
  kind: "meter", title: "Utility meter", tagPrefix: "MTR", railGroup: "sources",
  properties: { ...identity, ratingA: number("Continuous rating", "A", 1, 6000, { rated: true }), voltageV: number("Voltage", "V", 1, 40000, { rated: true }), shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }), ...withDeviceAhead },
  defaults: {},
  capabilities: { service: true },
  symbol: () => "meter",
  box: { x: -1.5, y: -2, width: 3, height: 4 },
  ports: () => [
    { id: "line", label: "Line", system: "ac", side: "top", x: 0, y: -2, poles: ["L1", "L2", "N"] },
    { id: "load", label: "Load", system: "ac", side: "bottom", x: 0, y: 2, poles: ["L1", "L2", "N"] },
  ],
  joins: () => [{ a: "line", b: "load", by: "solid" }],
  annotation: (p) => lines(p.ratingA !== null && `${withUnit(p.ratingA, "A")} SOCKET`),
  scheduleFields: ["make", "model", "ratingA", "voltageV", "shortCircuitKA", "listing"],
});
