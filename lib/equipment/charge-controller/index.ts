import { defineKind, flag, number } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

/** Charges batteries from PV without an inverter. */
export const chargeController = defineKind({
  kind: "charge-controller", title: "Charge controller", tagPrefix: "CC", railGroup: "convert and distribute",
  properties: {
    ...identity, ...enclosureProperties,
    pvMaximumV: number("PV input, largest voltage", "V", 10, 1500, { rated: true }),
    pvLeastV: number("PV operating window, low", "V", 0, 1500, { rated: true }),
    pvMostV: number("PV operating window, high", "V", 0, 1500, { rated: true }),
    trackerA: number("Usable input current", "A", 0.1, 500, { rated: true }),
    trackerShortCircuitA: number("Largest input short-circuit current", "A", 0.1, 500, { rated: true }),
    continuousA: number("Output current, continuous", "A", 0.1, 500, { rated: true }),
    batteryLeastV: number("Battery window, low", "V", 0, 1500, { rated: true }),
    batteryMostV: number("Battery window, high", "V", 0, 1500, { rated: true }),
    batteryA: number("Battery current", "A", 0.1, 500, { rated: true }),
    maximumOvercurrentA: number("Largest overcurrent device, battery side", "A", 1, 1000, { rated: true }),
    groundFaultProtection: flag("Dc ground-fault protection, listed", { rated: true }),
  },
  defaults: {},
  capabilities: { converter: true, follower: true, enclosure: true },
  symbol: () => "inverter",
  box: { x: 0, y: 0, width: 9.6, height: 11.3 },
  ports: () => [
    { id: "battery", label: "Battery", system: "battery-dc", side: "right", x: 9.6, y: 7.3, poles: ["+", "-"] },
    { id: "pv1", label: "PV", system: "pv-dc", side: "bottom", x: 2.5, y: 8.3, poles: ["+", "-"] },
    { id: "data", label: "Data", system: "data", side: "bottom", x: 8.8, y: 11.3, poles: ["D"], many: true },
    groundPort(0.8, 11.3),
  ],
  joins: () => [{ a: "pv1", b: "battery", by: "converter" }],
  annotation: (p) => lines(p.model, withUnit(p.continuousA, "A")),
  scheduleFields: ["make", "model", "pvMaximumV", "continuousA", "batteryMostV", "listing"],
});
