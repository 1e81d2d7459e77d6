import { choice, defineKind, flag, number, text } from "../define";
import { acPoles, enclosureProperties, groundPort, identity, linePorts, lines, switched, withUnit, withDeviceAhead } from "../shared";

export const disconnect = defineKind({
  kind: "disconnect", title: "Disconnect switch", tagPrefix: "DS", railGroup: "switch and protect",
  properties: {
    ...identity, ...enclosureProperties,
    current: choice("Used on", ["ac", "battery dc", "PV dc"]),
    ratingA: number("Rating", "A", 1, 6000, { rated: true }),
    fuseA: number("Fuse", "A", 0.5, 6000, { rated: true }),
    fused: flag("Fused"),
    fuseClass: text("Fuse class", 20),
    poles: number("Poles", "", 1, 4, { integer: true, rated: true }),
    voltageV: number("Voltage rating", "V", 1, 1500, { rated: true }),
    markedDc: flag("Marked for dc", { rated: true }),
    shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }),
    ...withDeviceAhead,
    visibleBlade: flag("Visible blade", { rated: true }),
    lockable: flag("Lockable open", { rated: true }),
    loadBreak: flag("Load break", { rated: true }),
    serviceEquipment: flag("Used as service equipment"),
  },
  defaults: { current: "ac", poles: 2, fused: false },
  capabilities: { switching: "switch", neutralBar: true, service: true },
  symbol: (p) => (p.fused ? "fusedswitch" : "switch"),
  box: { x: -0.8, y: -2.1, width: 4.6, height: 4.2 },
  ports: (p) => [
    ...linePorts(p.current === "battery dc" ? "battery-dc" : p.current === "PV dc" ? "pv-dc" : "ac", p.current === "battery dc" || p.current === "PV dc" ? ["+", "-"] : [...acPoles(p.poles), "N"], p.fused ? 5 : 3),
    groundPort(1, 2),
  ],
  joins: () => switched,
  annotation: (p) => lines([withUnit(p.ratingA, "A"), withUnit(p.voltageV, "V")].filter(Boolean).join(" ") || null, p.lockable && "LOCKABLE"),
  scheduleFields: ["make", "model", "ratingA", "fuseA", "poles", "voltageV", "shortCircuitKA", "enclosureType", "listing"],
});
