import { choice, defineKind, flag, number, text, type PortDefinition } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit, withDeviceAhead } from "../shared";

/** Multimode inverter with PV trackers and a battery port. Ratings of single ports (continuous current, largest device) stand at the ports. */
export const hybridInverter = defineKind({
  kind: "hybrid-inverter", title: "Hybrid inverter", tagPrefix: "INV", railGroup: "convert and distribute",
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
    batteryLeastV: number("Battery window, low", "V", 0, 1500, { rated: true }),
    batteryMostV: number("Battery window, high", "V", 0, 1500, { rated: true }),
    batteryA: number("Battery current, largest dc input", "A", 0.1, 2000, { rated: true }),
    batteryShortCircuitKA: number("Battery port short-circuit rating", "kA", 0.1, 300, { rated: true }),
    listedInteractive: flag("Listed interactive", { rated: true }),
    listedStandAlone: flag("Listed stand-alone", { rated: true }),
    listedGeneratorMode: flag("Listed mode beside a generator, no output toward it", { rated: true }),
    parallelMost: number("Units in parallel at most", "", 1, 32, { rated: true, integer: true }),
    role: choice("Parallel role", ["single", "primary", "secondary"], { group: "settings" }),
    address: number("Address", "", 0, 64, { integer: true, group: "settings" }),
    firmware: text("Firmware", 24, { group: "settings" }),
    firmwareInstruction: text("Instruction page: equal firmware", 40, { group: "settings" }),
    parallelInstruction: text("Instruction page: roles in parallel", 40, { group: "settings" }),
    parallelMixed: flag("Instruction allows other models in parallel", { rated: true, group: "settings" }),
    parallelLink: choice("Data link of units in parallel, by the instruction", ["chain", "chain without terminators", "ring", "star", "none"], { rated: true, group: "settings" }),
    terminator: flag("Terminator of the data link on", { group: "settings" }),
    parallelBank: choice("Battery bank of units in parallel, by the instruction", ["one common bank", "separate banks", "either"], { rated: true, group: "settings" }),
    leadInstruction: text("Instruction page: equal battery leads", 40, { group: "settings" }),
    leadTolerancePercent: number("Lead length tolerance", "%", 0, 100, { rated: true, group: "settings" }),
    neutralRelay: choice("Neutral relay", ["none", "disabled", "closes in island"], { group: "settings" }),
    profile: text("Grid profile", 80, { group: "settings" }),
    dischargeLimitA: number("Discharge limit", "A", 0, 2000, { group: "settings" }),
  },
  defaults: { trackers: 2, role: "single" },
  capabilities: { converter: true, enclosure: true, neutralBar: true },
  symbol: () => "inverter",
  box: { x: 0, y: 0, width: 9.6, height: 11.3 },
  ports: (p) => {
    const trackers: PortDefinition[] = Array.from({ length: p.trackers ?? 0 }, (_, i) => (
      { id: `pv${i + 1}`, label: `Tracker ${i + 1}`, system: "pv-dc", side: "bottom", x: 2.5 + i * 4, y: 8.3, poles: ["+", "-"] }));
    return [
      { id: "ac", label: "Ac", system: "ac", side: "top", x: 4, y: 0, poles: ["L1", "L2", "N"] },
      { id: "battery", label: "Battery", system: "battery-dc", side: "right", x: 9.6, y: 7.3, poles: ["+", "-"] },
      ...trackers,
      { id: "data", label: "Data", system: "data", side: "bottom", x: 8.8, y: 11.3, poles: ["D"], many: true },
      groundPort(0.8, 11.3),
    ];
  },
  joins: (p) => [
    { a: "ac", b: "battery", by: "converter" },
    ...Array.from({ length: p.trackers ?? 0 }, (_, i) => ({ a: `pv${i + 1}`, b: "ac", by: "converter" as const })),
  ],
  annotation: (p) => lines(p.model, withUnit(p.outputKW, "kW"), [withUnit(p.continuousA, "A"), p.role === "single" ? null : p.role?.toUpperCase()].filter(Boolean).join(", ") || null, p.firmware && `FW ${p.firmware}`),
  scheduleFields: ["make", "model", "outputKW", "continuousA", "maximumOvercurrentA", "role", "firmware", "listing"],
});
