import { defineKind, flag, number, text } from "../define";
import { acPoles, identity, linePorts, lines, switched, withUnit, withDeviceAhead } from "../shared";

/** Opened and closed by a control, as the microgrid interconnect device is. */
export const contactor = defineKind({
  kind: "contactor", title: "Interconnect contactor", tagPrefix: "K", railGroup: "switch and protect",
  properties: {
    ...identity,
    ratingA: number("Rating", "A", 1, 6000, { rated: true }),
    poles: number("Poles", "", 1, 4, { integer: true, rated: true }),
    voltageV: number("Voltage rating", "V", 1, 1500, { rated: true }),
    shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }),
    ...withDeviceAhead,
    coil: text("Coil", 40),
    interconnectDevice: flag("Opens on loss of the utility by listed control", { rated: true }),
  },
  defaults: { poles: 2 },
  capabilities: { switching: "contactor" },
  symbol: () => "contactor",
  box: { x: 0, y: -2, width: 3, height: 2.8 },
  ports: (p) => linePorts("ac", acPoles(p.poles)),
  joins: () => switched,
  annotation: (p) => lines(withUnit(p.ratingA, "A"), p.interconnectDevice && "MID"),
  scheduleFields: ["make", "model", "ratingA", "poles", "voltageV", "shortCircuitKA", "listing"],
});
