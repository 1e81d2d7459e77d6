import { choice, defineKind, flag, number, text } from "../define";
import { acPoles, identity, linePorts, lines, switched, withUnit } from "../shared";

export const breaker = defineKind({
  kind: "breaker", title: "Circuit breaker", tagPrefix: "CB", railGroup: "switch and protect",
  properties: {
    ...identity,
    current: choice("Used on", ["ac", "battery dc", "PV dc"]),
    ratingA: number("Trip rating", "A", 1, 6000, { rated: true }),
    poles: number("Poles", "", 1, 4, { integer: true, rated: true }),
    interruptingKA: number("Interrupting rating", "kA", 0.1, 300, { rated: true }),
    seriesKA: number("Series rating with the device ahead", "kA", 0.1, 300, { rated: true }),
    seriesWith: text("Device ahead in the series rating: family, fuse class or model", 40, { group: "construction", rated: true }),
    seriesMarked: flag("Series rating marked on the equipment"),
    voltageV: number("Voltage rating", "V", 1, 1500, { rated: true }),
    markedDc: flag("Marked for dc", { rated: true }),
    mount: choice("Mounting", ["bolt-on", "plug-on", "plug-on with hold-down", "stud"]),
    position: choice("Place", ["main", "branch"]),
    family: text("Family", 20),
    lineLoadMarked: flag("Marked line and load", { rated: true }),
    listedHundredPercent: flag("Listed for 100 % continuous duty", { rated: true }),
    lockable: flag("Lockable open"),
    auxiliaryContact: flag("Auxiliary contact"),
    trip: choice("Trip", ["fixed", "adjustable"], { rated: true }),
  },
  defaults: { current: "ac", poles: 2, position: "branch", mount: "plug-on" },
  capabilities: { switching: "breaker", overcurrent: true },
  symbol: (p) => (p.mount === "plug-on with hold-down" ? "plugon" : "breaker"),
  box: { x: 0, y: -1.2, width: 3, height: 1.8 },
  ports: (p) => linePorts(p.current === "battery dc" ? "battery-dc" : p.current === "PV dc" ? "pv-dc" : "ac", p.current === "battery dc" || p.current === "PV dc" ? ["+", "-"] : acPoles(p.poles)),
  joins: () => switched,
  annotation: (p) => lines([withUnit(p.ratingA, "A"), p.poles === null ? null : `${p.poles}P`].filter(Boolean).join(" ") || null),
  scheduleFields: ["ratingA", "poles", "interruptingKA", "voltageV", "mount", "family", "listing"],
});
