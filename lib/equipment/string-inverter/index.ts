import { choice, defineKind, flag, number, text, type PortDefinition } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit, withDeviceAhead } from "../shared";

/** Inverter that follows the voltage of another source and stops without it. */
export const stringInverter = defineKind({
  kind: "string-inverter", title: "Interactive inverter", tagPrefix: "INV", railGroup: "convert and distribute",
  properties: {
    ...identity, ...enclosureProperties,
    ambientMostC: number("Rated ambient, largest", "°C", -20, 90, { rated: true }),
    outputKW: number("Ac output", "kW", 0.1, 500, { rated: true }),
    outputV: number("Ac voltage", "V", 100, 600, { rated: true }),
    continuousA: number("Ac output current, continuous", "A", 0.1, 1000, { rated: true }),
    faultA: number("Fault current contribution", "A", 0, 5000, { rated: true }),
    maximumOvercurrentA: number("Largest ac overcurrent device", "A", 1, 1000, { rated: true }),
    shortCircuitKA: number("Ac short-circuit rating", "kA", 0.1, 300, { rated: true }),
    ...withDeviceAhead,
    trackers: number("Trackers", "", 0, 8, { integer: true, rated: true, group: "construction" }),
    pvMaximumV: number("PV input, largest voltage", "V", 10, 1500, { rated: true }),
    pvLeastV: number("PV operating window, low", "V", 0, 1500, { rated: true }),
    pvMostV: number("PV operating window, high", "V", 0, 1500, { rated: true }),
    trackerA: number("Tracker usable current", "A", 0.1, 500, { rated: true }),
    trackerShortCircuitA: number("Tracker largest short-circuit current", "A", 0.1, 500, { rated: true }),
    pvBackfeedA: number("Backfeed from inverter to PV", "A", 0, 500, { rated: true }),
    arrayRatioMost: number("Array to inverter ratio at most", "", 0.1, 5, { rated: true }),
    listedInteractive: flag("Listed interactive", { rated: true }),
    listedGeneratorMode: flag("Listed mode beside a generator, no output toward it", { rated: true }),
    arcFaultProtection: flag("Dc arc-fault protection, listed", { rated: true }),
    groundFaultProtection: flag("Dc ground-fault protection, listed", { rated: true }),
    profile: text("Grid profile", 80, { group: "settings" }),
    outputConductors: choice("Output", ["line to line", "line to neutral", "three-phase"], { rated: true }),
  },
  defaults: { trackers: 2 },
  capabilities: { converter: true, follower: true, enclosure: true },
  symbol: () => "inverter",
  box: { x: 0, y: 0, width: 9.6, height: 11.3 },
  ports: (p) => {
    const trackers: PortDefinition[] = Array.from({ length: p.trackers ?? 0 }, (_, i) => (
      { id: `pv${i + 1}`, label: `Tracker ${i + 1}`, system: "pv-dc", side: "bottom", x: 2.5 + i * 4, y: 8.3, poles: ["+", "-"] }));
    return [
      { id: "ac", label: "Ac", system: "ac", side: "top", x: 4, y: 0, poles: p.outputConductors === "three-phase" ? ["L1", "L2", "L3", "N"] : p.outputConductors === "line to neutral" ? ["L1", "N"] : ["L1", "L2", "N"] },
      ...trackers,
      { id: "data", label: "Data", system: "data", side: "bottom", x: 8.8, y: 11.3, poles: ["D"], many: true },
      groundPort(0.8, 11.3),
    ];
  },
  joins: (p) => Array.from({ length: p.trackers ?? 0 }, (_, i) => ({ a: `pv${i + 1}`, b: "ac", by: "converter" as const })),
  annotation: (p) => lines(p.model, withUnit(p.outputKW, "kW"), withUnit(p.continuousA, "A")),
  scheduleFields: ["make", "model", "outputKW", "continuousA", "maximumOvercurrentA", "listing"],
});
