import { choice, defineKind, flag, number, text } from "../define";
import { groundPort, identity, linePorts, lines, withUnit } from "../shared";

/** Flanged inlet at which a portable generator's cord lands. */
export const powerInlet = defineKind({
  kind: "power-inlet", title: "Power inlet", tagPrefix: "PI", railGroup: "sources",
  properties: {
    ...identity,
    ratingA: number("Rating", "A", 15, 400, { rated: true }),
    voltageV: number("Voltage rating", "V", 100, 600, { rated: true }),
    poles: number("Poles", "", 1, 3, { integer: true, rated: true }),
    configuration: text("Configuration", 24, { rated: true }),
    neutralMark: choice("Marked for", ["bonded neutral", "floating neutral"], { group: "construction" }),
    interlockedSwitch: flag("With an interlocked disconnect, listed", { rated: true }),
    enclosureType: choice("Enclosure type", ["1", "2", "3R", "3S", "4", "4X", "12"]),
  },
  defaults: { poles: 2 },
  capabilities: {},
  symbol: () => "inlet",
  box: { x: -1, y: -1.2, width: 4, height: 2.4 },
  ports: () => [...linePorts("ac", ["L1", "L2", "N"]), groundPort(1, 1)],
  joins: () => [{ a: "line", b: "load", by: "solid" }],
  annotation: (p) => lines([withUnit(p.ratingA, "A"), p.configuration].filter(Boolean).join(" ") || null),
  scheduleFields: ["make", "model", "ratingA", "voltageV", "configuration", "neutralMark", "listing"],
});
