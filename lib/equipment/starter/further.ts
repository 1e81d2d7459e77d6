import { both, entry, terminal, type StarterEntry } from "./entry";

const tracker = { maximumV: 600, maximumA: 20, ...terminal("14 AWG", "8 AWG", 20, "CU") };

/** Inverters that follow, what feeds and joins their circuits, further sources and loads. */
export const further: readonly StarterEntry[] = [
  entry("string-inverter", "Interactive inverter, 7.6 kW, 240 V", {
    outputKW: 7.6, outputV: 240, continuousA: 31.7, faultA: 58, maximumOvercurrentA: 40, shortCircuitKA: 10, trackers: 2, pvMaximumV: 600, pvLeastV: 120, pvMostV: 500, trackerA: 16,
    trackerShortCircuitA: 20, pvBackfeedA: 0, arrayRatioMost: 1.5, listedInteractive: true, listedGeneratorMode: false, arcFaultProtection: true, groundFaultProtection: true,
    outputConductors: "line to line", enclosureType: "4X", listing: "UL 1741",
  }, { ac: { nominalV: 240, continuousA: 31.7, maximumOvercurrentA: 40, ...terminal("14 AWG", "4 AWG", 35) }, pv1: tracker, pv2: tracker }),
  entry("microinverter-branch", "Microinverter branch, 10 units of 384 VA, 240 V", {
    units: 10, unitsMost: 10, unitVA: 384, unitA: 1.6, continuousA: 16, outputV: 240, faultA: 25, maximumOvercurrentA: 20, listedInteractive: true, listedGeneratorMode: false,
    outputConductors: "line to line", listing: "UL 1741",
  }, { ac: { nominalV: 240, continuousA: 16, maximumOvercurrentA: 20 } }),
  entry("charge-controller", "Charge controller, 80 A, 48 V battery", {
    pvMaximumV: 250, pvLeastV: 65, pvMostV: 200, trackerA: 30, trackerShortCircuitA: 40, continuousA: 80, batteryLeastV: 42, batteryMostV: 60, batteryA: 80, maximumOvercurrentA: 100,
    groundFaultProtection: true, enclosureType: "1", listing: "UL 1741",
  }, { battery: { maximumV: 60, continuousA: 80, maximumOvercurrentA: 100, ...terminal("6 AWG", "2 AWG", 50, "CU") }, pv1: { maximumV: 250, maximumA: 40, ...terminal("10 AWG", "6 AWG", 35, "CU") } }),
  entry("combiner", "PV combiner, 100 A, 1000 V dc", { busA: 100, voltageV: 1000, shortCircuitKA: 10, enclosureType: "3R", listing: "UL 1741" }),
  entry("fuse-holder", "PV fuse holder, 20 A, 1000 V dc", { current: "PV dc", ratingA: 20, poles: 1, interruptingKA: 30, voltageV: 1000, fuseClass: "PV", fingerSafe: true, listing: "UL 248-19" }, both(terminal("14 AWG", "6 AWG", 25, "CU"))),
  entry("fuse-holder", "Battery fuse holder, 125 A, 125 V dc", { current: "battery dc", ratingA: 125, poles: 1, interruptingKA: 20, voltageV: 125, fuseClass: "T", fingerSafe: true, listing: "UL 248-15" }, both(terminal("4 AWG", "2/0 AWG", 106, "CU"))),
  entry("vehicle-charger", "Vehicle charger, 48 A, 240 V", {
    currentA: 48, powerKW: 11.5, phaseV: 240, continuous: true, managed: false, exportKW: 0, exportA: 0, minimumCircuitA: 60, maximumOvercurrentA: 60, listing: "UL 2594",
  }, { line: { maximumOvercurrentA: 60, ...terminal("10 AWG", "4 AWG", 35, "CU") } }),
  entry("vehicle-charger", "Vehicle charger, 48 A, gives back 9.6 kW", {
    currentA: 48, powerKW: 11.5, phaseV: 240, continuous: true, managed: true, exportKW: 9.6, exportA: 40, minimumCircuitA: 60, maximumOvercurrentA: 60, listing: "UL 9741",
  }, { line: { maximumOvercurrentA: 60, ...terminal("10 AWG", "4 AWG", 35, "CU") } }),
  entry("power-inlet", "Power inlet, 30 A, L14-30", { ratingA: 30, voltageV: 240, poles: 2, configuration: "L14-30", neutralMark: "bonded neutral", interlockedSwitch: false, enclosureType: "3R", listing: "UL 498" }, { load: terminal("10 AWG", "6 AWG", 20, "CU") }),
  entry("power-inlet", "Power inlet, 50 A, CS63-65", { ratingA: 50, voltageV: 240, poles: 2, configuration: "CS63-65", neutralMark: "floating neutral", interlockedSwitch: false, enclosureType: "3R", listing: "UL 498" }, { load: terminal("8 AWG", "4 AWG", 25, "CU") }),
  entry("transformer", "Transformer, 10 kVA, 480 to 120/240 V", {
    ratedKVA: 10, primaryV: 480, secondaryV: 240, primaryA: 20.8, secondaryA: 41.7, impedancePercent: 3, construction: "two windings", secondary: "3-wire, 120/240 V", enclosureType: "3R", listing: "UL 1561",
  }, { primary: { nominalV: 480, ...terminal("14 AWG", "6 AWG", 35) }, secondary: { nominalV: 240, ...terminal("8 AWG", "2 AWG", 45) } }),
  entry("gateway", "Monitoring gateway", { purpose: "monitoring", enclosureType: "1", listing: "UL 61010-1" }),
  entry("gateway", "Power control gateway", { purpose: "power control system", enclosureType: "3R", listing: "UL 3141" }),
];
