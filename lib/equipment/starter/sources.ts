import { entry, terminal, type StarterEntry } from "./entry";

const inverter = {
  outputV: 240, shortCircuitKA: 10, pvMaximumV: 600, pvLeastV: 120, pvMostV: 500, trackerA: 16, trackerShortCircuitA: 20, pvBackfeedA: 0, arrayRatioMost: 1.5,
  listedInteractive: true, listedStandAlone: true, listedGeneratorMode: true, role: "single" as const, neutralRelay: "disabled" as const, enclosureType: "3R" as const, listing: "UL 1741",
};
const trackers = (count: number) => Object.fromEntries(Array.from({ length: count }, (_, i) => [`pv${i + 1}`, { maximumV: 600, maximumA: 20, ...terminal("14 AWG", "8 AWG", 20, "CU") }]));
const modules = { cell: "monocrystalline" as const, openCircuitPercentPerC: -0.26, maximumPowerPercentPerC: -0.33, bifacialGainPercent: 0, systemVoltageV: 1000, converters: false, listing: "UL 61730" };
const storage = { chemistry: "LFP" as const, listedSystem: false, enclosureType: "1" as const, listing: "UL 9540, UL 1973" };

/*
 * Figures of one entry fit together: output power is voltage times current, the largest device is the next standard size at or above
 * 125 % of the continuous current, module power is voltage times current at maximum power, and the batteries lie in the inverters' windows.
 */

/** Converters, sources, loads, electrodes and what starts a shutdown. */
export const sources: readonly StarterEntry[] = [
  entry("hybrid-inverter", "Hybrid inverter, 7.6 kW, 240 V, 48 V battery", {
    ...inverter, outputKW: 7.6, continuousA: 31.7, faultA: 58, maximumOvercurrentA: 40, trackers: 2, batteryLeastV: 42, batteryMostV: 60, batteryA: 175, batteryShortCircuitKA: 20, parallelMost: 4,
  }, {
    ac: { nominalV: 240, continuousA: 31.7, maximumOvercurrentA: 40, ...terminal("14 AWG", "4 AWG", 35) },
    battery: { maximumV: 60, maximumA: 175, ...terminal("4 AWG", "300 kcmil", 133, "CU") }, ...trackers(2),
  }),
  entry("hybrid-inverter", "Hybrid inverter, 11.4 kW, 240 V", {
    ...inverter, outputKW: 11.4, continuousA: 47.5, faultA: 86, maximumOvercurrentA: 60, trackers: 3, batteryLeastV: 280, batteryMostV: 450, batteryA: 38, batteryShortCircuitKA: 10, parallelMost: 3,
  }, {
    ac: { nominalV: 240, continuousA: 47.5, maximumOvercurrentA: 60, ...terminal("8 AWG", "2 AWG", 45) },
    battery: { maximumV: 450, maximumA: 38, ...terminal("12 AWG", "6 AWG", 30, "CU") }, ...trackers(3),
  }),
  entry("pv-switch", "PV switch, 600 V dc, 2 circuits", { channels: 2, voltageV: 600, ratingA: 25, lockable: true, listing: "UL 98B" }, {
    line1: terminal("14 AWG", "8 AWG", 20, "CU"), line2: terminal("14 AWG", "8 AWG", 20, "CU"),
  }),
  entry("pv-switch", "PV switch, 600 V dc, 3 circuits", { channels: 3, voltageV: 600, ratingA: 25, lockable: true, listing: "UL 98B" }, {
    line1: terminal("14 AWG", "8 AWG", 20, "CU"), line2: terminal("14 AWG", "8 AWG", 20, "CU"), line3: terminal("14 AWG", "8 AWG", 20, "CU"),
  }),
  entry("battery", "Battery unit, 12.8 kWh, 51.2 V", {
    ...storage, energyKWh: 12.8, nominalV: 51.2, leastV: 44.8, mostV: 58.4, continuousA: 100, shortCircuitKA: 3.6,
  }, { dc: { maximumV: 58.4, continuousA: 100, ...terminal("4 AWG", "2/0 AWG", 106, "CU") } }),
  entry("battery", "Battery unit, 13.8 kWh, 345.6 V", {
    ...storage, energyKWh: 13.8, nominalV: 345.6, leastV: 302, mostV: 394, continuousA: 40, shortCircuitKA: 1.8, enclosureType: "3R",
  }, { dc: { maximumV: 394, continuousA: 40, ...terminal("10 AWG", "6 AWG", 30, "CU") } }),
  entry("dc-bus-cabinet", "Dc bus cabinet, 600 A, 80 V", { busA: 600, voltageV: 80, shortCircuitKA: 20, grounded: false, spacesTotal: 6, polesMaximum: 12, enclosureType: "1", listing: "UL 891" }),
  entry("pv-string", "PV string, 12 modules of 410 W", {
    ...modules, modules: 12, moduleW: 410, openCircuitV: 37.3, shortCircuitA: 13.9, maximumPowerV: 31.25, maximumPowerA: 13.12, seriesFuseA: 25,
  }),
  entry("pv-string", "PV string, 10 modules of 550 W", {
    ...modules, modules: 10, moduleW: 550, openCircuitV: 49.8, shortCircuitA: 14, maximumPowerV: 41.7, maximumPowerA: 13.19, seriesFuseA: 25, systemVoltageV: 1500,
  }),
  entry("generator", "Standby generator, 20 kW, propane", { outputKW: 20, outputV: 240, ratedA: 83.3, faultA: 690, fuel: "propane", use: "fixed standby", listedParallelWithUtility: false, enclosureType: "3R", listing: "UL 2200" }, {
    load: { nominalV: 240, continuousA: 83.3, ...terminal("6 AWG", "1/0 AWG", 50) },
  }),
  entry("generator", "Portable generator, 7.2 kW, gasoline", { outputKW: 7.2, outputV: 240, ratedA: 30, faultA: 250, fuel: "gasoline", use: "portable", listedParallelWithUtility: false, listing: "UL 2201" }, {
    load: { nominalV: 240, continuousA: 30 },
  }),
  entry("load", "Lighting and receptacles, 120 V", { description: "Lighting and receptacles", use: "general", powerKW: 1.8, currentA: 15, continuous: false, phaseV: 120 }),
  entry("load", "Pump, 1 hp, 240 V", { description: "Pump, 1 hp", use: "motor", currentA: 8, continuous: true, phaseV: 240 }, { line: terminal("14 AWG", "8 AWG", 25, "CU") }),
  entry("load", "Heat pump, 36 A minimum circuit, 240 V", {
    description: "Heat pump", use: "air conditioning or refrigeration", powerKW: 6.5, currentA: 29, continuous: true, minimumCircuitA: 36, maximumOvercurrentA: 50, phaseV: 240,
  }, { line: terminal("10 AWG", "4 AWG", 35, "CU") }),
  entry("electrode", "Two ground rods, 8 ft", { type: "two ground rods", lengthFt: 8, spacingFt: 8 }),
  entry("electrode", "Concrete-encased electrode", { type: "concrete-encased", lengthFt: 20 }),
  entry("shutdown-initiator", "PV shutdown initiator, 24 V control", { purpose: "PV rapid shutdown", enclosureType: "4X", circuitVoltage: "24 V dc, class 2", listing: "UL 1741" }),
  entry("shutdown-initiator", "Shutdown initiator, PV and storage", { purpose: "both", enclosureType: "4X", circuitVoltage: "24 V dc, class 2", listing: "UL 1741" }),
];
