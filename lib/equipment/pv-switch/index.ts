import { defineKind, flag, number, type PortDefinition } from "../define";
import { identity, lines, withUnit } from "../shared";

/** Load-break switch with one pair of poles a tracker, as built into inverters. */
export const pvSwitch = defineKind({
  kind: "pv-switch", title: "PV switch", tagPrefix: "PVS", railGroup: "switch and protect",
  properties: {
    ...identity,
    channels: number("Circuits switched together", "", 1, 8, { integer: true, group: "construction" }),
    voltageV: number("Dc voltage rating", "V", 10, 1500, { rated: true }),
    ratingA: number("Circuit rating", "A", 0.1, 500, { rated: true }),
    lockable: flag("Lockable open"),
  },
  defaults: { channels: 2 },
  capabilities: { switching: "switch" },
  symbol: () => "pvswitch",
  box: { x: -1, y: 0, width: 6.5, height: 3 },
  ports: (p) => Array.from({ length: p.channels ?? 1 }, (_, i): PortDefinition[] => [
    { id: `line${i + 1}`, label: `Line ${i + 1}`, system: "pv-dc", side: "bottom", x: i * 4, y: 3, poles: ["+", "-"] },
    { id: `load${i + 1}`, label: `Load ${i + 1}`, system: "pv-dc", side: "top", x: i * 4, y: 0, poles: ["+", "-"] },
  ]).flat(),
  joins: (p) => Array.from({ length: p.channels ?? 1 }, (_, i) => ({ a: `line${i + 1}`, b: `load${i + 1}`, by: "switch" as const })),
  annotation: (p) => lines([withUnit(p.voltageV, "V DC"), withUnit(p.ratingA, "A")].filter(Boolean).join(" ") || null),
  scheduleFields: ["make", "model", "voltageV", "ratingA", "channels", "listing"],
});
