import { both, entry, terminal, type StarterEntry } from "./entry";

const panel = { breakerFamily: "invented family", suitableAsServiceEquipment: true, busEnds: "top" as const };
const ac = { current: "ac" as const, voltageV: 240, trip: "fixed" as const, lineLoadMarked: false, listedHundredPercent: false, lockable: false, auxiliaryContact: false, listing: "UL 489" };
const dc = { current: "battery dc" as const, poles: 2, mount: "stud" as const, trip: "fixed" as const, lineLoadMarked: false, listedHundredPercent: false, listing: "UL 489" };
const blades = { current: "ac" as const, poles: 2, voltageV: 240, visibleBlade: true, lockable: true, loadBreak: true, enclosureType: "3R" as const, listing: "UL 98" };

/** Service, distribution, and what switches and protects. The fault current of a service is the utility's to state, so it stays open. */
export const service: readonly StarterEntry[] = [
  entry("utility", "Overhead service, 120/240 V", { systemVoltage: "120/240 V 1-ph 3-W", service: "overhead" }),
  entry("utility", "Underground service, 120/240 V", { systemVoltage: "120/240 V 1-ph 3-W", service: "underground" }),
  entry("meter", "Meter socket, 200 A", { ratingA: 200, voltageV: 240, shortCircuitKA: 22, listing: "UL 414" }, both(terminal("6 AWG", "250 kcmil", 250))),
  entry("meter", "Meter socket, 320 A continuous", { ratingA: 320, voltageV: 240, shortCircuitKA: 22, listing: "UL 414" }, both(terminal("4 AWG", "350 kcmil", 275))),
  entry("meter-main", "Meter-main, 200 A bus, 8 spaces", { ...panel, busA: 200, shortCircuitKA: 22, spacesTotal: 8, polesMaximum: 8, enclosureType: "3R", listing: "UL 67" }),
  entry("meter-main", "Meter-main, 225 A bus, 30 spaces", { ...panel, busA: 225, shortCircuitKA: 22, spacesTotal: 30, polesMaximum: 40, enclosureType: "3R", listing: "UL 67" }),
  entry("panelboard", "Panelboard, 125 A, main lugs, 12 spaces", { ...panel, busA: 125, shortCircuitKA: 10, spacesTotal: 12, polesMaximum: 24, enclosureType: "1", mainType: "main lugs only", listing: "UL 67" }),
  entry("panelboard", "Panelboard, 200 A, main breaker, 40 spaces", { ...panel, busA: 200, shortCircuitKA: 22, spacesTotal: 40, polesMaximum: 60, enclosureType: "1", mainType: "main breaker", listing: "UL 67" }),
  entry("panelboard", "Panelboard, 225 A, main breaker, 42 spaces, outdoor", { ...panel, busA: 225, shortCircuitKA: 22, spacesTotal: 42, polesMaximum: 60, enclosureType: "3R", mainType: "main breaker", listing: "UL 67" }),
  entry("interconnect-cabinet", "Interconnect cabinet, 200 A bus", {
    ...panel, busA: 200, neutralBusA: 200, shortCircuitKA: 22, spacesTotal: 12, polesMaximum: 12, generatorPositionA: 100, listedForIsland: true, enclosureType: "3R", listing: "UL 1741",
  }),
  entry("breaker", "Breaker, 20 A, 1 pole, plug-on", { ...ac, ratingA: 20, poles: 1, voltageV: 120, interruptingKA: 10, mount: "plug-on", position: "branch" }, both(terminal("14 AWG", "8 AWG", 36))),
  entry("breaker", "Breaker, 40 A, 2 poles, plug-on", { ...ac, ratingA: 40, poles: 2, interruptingKA: 22, mount: "plug-on", position: "branch" }, both(terminal("14 AWG", "2 AWG", 45))),
  entry("breaker", "Breaker, 60 A, 2 poles, plug-on with hold-down", { ...ac, ratingA: 60, poles: 2, interruptingKA: 22, mount: "plug-on with hold-down", position: "branch" }, both(terminal("14 AWG", "2 AWG", 45))),
  entry("breaker", "Main breaker, 200 A, 2 poles, bolt-on", { ...ac, ratingA: 200, poles: 2, interruptingKA: 22, mount: "bolt-on", position: "main" }, both(terminal("4 AWG", "250 kcmil", 250))),
  entry("breaker", "Battery breaker, 125 A, 80 V dc, 2 poles", { ...dc, ratingA: 125, voltageV: 80, interruptingKA: 20, position: "branch" }, both(terminal("4 AWG", "2/0 AWG", 106, "CU"))),
  entry("disconnect", "Disconnect, 60 A, fused, visible blade", { ...blades, fused: true, ratingA: 60, fuseA: 60, shortCircuitKA: 100 }, both(terminal("14 AWG", "2 AWG", 35))),
  entry("disconnect", "Disconnect, 100 A, not fused, visible blade", { ...blades, fused: false, ratingA: 100, shortCircuitKA: 10 }, both(terminal("8 AWG", "1/0 AWG", 50))),
  entry("disconnect", "Disconnect, 200 A, not fused, visible blade", { ...blades, fused: false, ratingA: 200, shortCircuitKA: 10 }, both(terminal("6 AWG", "250 kcmil", 250))),
  entry("contactor", "Interconnect contactor, 200 A", { ratingA: 200, poles: 2, voltageV: 240, shortCircuitKA: 22, coil: "24 V dc", interconnectDevice: true, listing: "UL 1741" }, both(terminal("4 AWG", "250 kcmil", 250))),
  entry("transfer-switch", "Transfer switch, manual, 200 A, neutral not switched", {
    operation: "manual", ratingA: 200, poles: 2, switchedNeutral: false, centerOff: true, voltageV: 240, shortCircuitKA: 22, enclosureType: "3R", listing: "UL 1008",
  }, { a: terminal("4 AWG", "250 kcmil", 250), b: terminal("4 AWG", "250 kcmil", 250), common: terminal("4 AWG", "250 kcmil", 250) }),
  entry("transfer-switch", "Transfer switch, automatic, 100 A, neutral switched", {
    operation: "automatic", ratingA: 100, poles: 2, switchedNeutral: true, centerOff: false, voltageV: 240, shortCircuitKA: 10, enclosureType: "3R", listing: "UL 1008",
  }, { a: terminal("8 AWG", "1/0 AWG", 50), b: terminal("8 AWG", "1/0 AWG", 50), common: terminal("8 AWG", "1/0 AWG", 50) }),
  entry("surge-protector", "Surge protective device, type 1, 240 V", { type: "1", shortCircuitKA: 100, voltageV: 240, listing: "UL 1449" }),
  entry("surge-protector", "Surge protective device, type 2, 240 V", { type: "2", shortCircuitKA: 22, voltageV: 240, listing: "UL 1449" }),
];
