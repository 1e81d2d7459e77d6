import { defineKind, flag, number, choice, text } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

export const battery = defineKind({
  kind: "battery", title: "Battery unit", tagPrefix: "BT", railGroup: "sources",
  properties: {
    ...identity, ...enclosureProperties,
    ambientMostC: number("Rated ambient, largest", "°C", -20, 90, { rated: true }),
    chemistry: choice("Chemistry", ["LFP", "NMC", "lead-acid", "other"]),
    energyKWh: number("Energy", "kWh", 0.1, 2000, { rated: true }),
    nominalV: number("Nominal voltage", "V", 1, 1500, { rated: true }),
    leastV: number("Least voltage", "V", 1, 1500, { rated: true }),
    mostV: number("Largest voltage", "V", 1, 1500, { rated: true }),
    continuousA: number("Continuous charge and discharge current", "A", 0.1, 5000, { rated: true }),
    shortCircuitKA: number("Short-circuit current", "kA", 0.01, 300, { rated: true }),
    firmware: text("Firmware", 24, { group: "settings" }),
    leadInstruction: text("Instruction page: equal leads", 40, { group: "settings" }),
    listedSystem: flag("Listed as one system with the inverter", { rated: true }),
  },
  defaults: { chemistry: "LFP" },
  capabilities: { source: "battery", enclosure: true },
  symbol: () => "battery",
  box: { x: -1.5, y: 0, width: 3, height: 2.2 },
  ports: () => [
    { id: "dc", label: "Dc terminals", system: "battery-dc", side: "top", x: 0, y: 0, poles: ["+", "-"] },
    { id: "data", label: "Data", system: "data", side: "right", x: 1.5, y: 1, poles: ["D"], many: true },
    groundPort(-1.5, 1),
  ],
  joins: () => [],
  annotation: (p) => lines([withUnit(p.energyKWh, "kWh"), withUnit(p.nominalV, "V")].filter(Boolean).join(", ") || null),
  scheduleFields: ["make", "model", "energyKWh", "nominalV", "continuousA", "shortCircuitKA", "firmware", "listing"],
});
