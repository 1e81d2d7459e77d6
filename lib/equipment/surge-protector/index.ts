import { choice, defineKind, number } from "../define";
import { groundPort, identity, lines } from "../shared";

export const surgeProtector = defineKind({
  kind: "surge-protector", title: "Surge protective device", tagPrefix: "SPD", railGroup: "switch and protect",
  properties: { ...identity, type: choice("Type", ["1", "2", "3"], { rated: true }), shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }), voltageV: number("Voltage", "V", 1, 1500, { rated: true }) },
  defaults: { type: "2" },
  capabilities: {},
  symbol: () => "spd",
  box: { x: -1, y: 0, width: 2, height: 4 },
  ports: () => [
    { id: "line", label: "Line", system: "ac", side: "top", x: 0, y: 0, poles: ["L1", "L2", "N"] },
    groundPort(0, 4),
  ],
  joins: () => [],
  annotation: (p) => lines(p.type && `TYPE ${p.type}`),
  scheduleFields: ["make", "model", "type", "shortCircuitKA", "listing"],
});
