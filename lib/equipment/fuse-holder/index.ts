import { choice, defineKind, flag, number, text } from "../define";
import { identity, linePorts, lines, withUnit } from "../shared";

/** Fuse in a holder that is no switch: it is drawn out with the circuit dead. */
export const fuseHolder = defineKind({
  kind: "fuse-holder", title: "Fuse holder", tagPrefix: "FU", railGroup: "switch and protect",
  properties: {
    ...identity,
    current: choice("Used on", ["ac", "battery dc", "PV dc"]),
    ratingA: number("Fuse rating", "A", 0.5, 6000, { rated: true }),
    poles: number("Poles", "", 1, 4, { integer: true, rated: true }),
    interruptingKA: number("Interrupting rating", "kA", 0.1, 300, { rated: true }),
    voltageV: number("Voltage rating", "V", 1, 2000, { rated: true }),
    markedDc: flag("Marked for dc", { rated: true }),
    fuseClass: text("Fuse class", 20),
    fingerSafe: flag("Finger-safe holder", { rated: true }),
  },
  defaults: { current: "PV dc", poles: 1 },
  capabilities: { overcurrent: true },
  symbol: () => "fuse",
  box: { x: 0, y: -1.2, width: 3, height: 1.8 },
  ports: (p) => linePorts(p.current === "battery dc" ? "battery-dc" : p.current === "PV dc" ? "pv-dc" : "ac", p.current === "ac" ? ["L1", "L2"] : ["+", "-"]),
  joins: () => [{ a: "line", b: "load", by: "switch" }],
  annotation: (p) => lines([withUnit(p.ratingA, "A"), p.fuseClass].filter(Boolean).join(" ") || null),
  scheduleFields: ["ratingA", "poles", "interruptingKA", "voltageV", "fuseClass", "listing"],
});
