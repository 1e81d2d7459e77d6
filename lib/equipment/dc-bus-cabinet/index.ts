import { defineKind, flag, number } from "../define";
import { busProperties, enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

export const dcBusCabinet = defineKind({
  kind: "dc-bus-cabinet", title: "Dc bus cabinet", tagPrefix: "DB", railGroup: "convert and distribute",
  properties: { ...identity, ...busProperties, ...enclosureProperties, voltageV: number("Dc voltage rating", "V", 1, 1500, { rated: true }), grounded: flag("One pole grounded") },
  defaults: { grounded: false },
  capabilities: { bus: true, enclosure: true },
  symbol: () => null,
  box: { x: 0, y: 0, width: 20, height: 9 },
  ports: () => [
    { id: "bus", label: "Dc bus", system: "battery-dc", side: "bottom", x: 1, y: 4, poles: ["+", "-"], many: true },
    groundPort(1, 8),
  ],
  joins: () => [],
  annotation: (p) => lines(withUnit(p.busA, "A DC BUS")),
  scheduleFields: ["make", "model", "busA", "voltageV", "shortCircuitKA", "enclosureType", "listing"],
});
