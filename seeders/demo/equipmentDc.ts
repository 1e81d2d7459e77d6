import { place, terminal, type DrawingBuilder } from "./build";

const PLANT = place("A", "plant room", "indoor dry", 40);
const BAY = place("A", "battery bay", "indoor dry", 40);
const ROOF = place("A", "roof", "roof", 33);

/** Hybrid inverters with their built-in PV switches. The second one mirrors the first, so that both face the dc bus. */
export function addInverters(drawing: DrawingBuilder): void {
  const units = [["INV-1", 97.6, true, "primary", 1], ["INV-2", 58, false, "secondary", 2]] as const;
  for (const [tag, x, mirrored, role, address] of units) {
    const id = drawing.add("hybrid-inverter", tag, [x, 30], {
      make: "Brackwater", model: "HB-78", listing: "UL 1741 SB, UL 1998", ambientMostC: 45, outputKW: 7.8, outputV: 240, continuousA: 32.5, faultA: 60, maximumOvercurrentA: 50, shortCircuitKA: 10,
      trackers: 2, pvMaximumV: 600, pvLeastV: 130, pvMostV: 500, trackerA: 20, trackerShortCircuitA: 26, pvBackfeedA: 0, arrayRatioMost: 1.5,
      batteryLeastV: 42, batteryMostV: 60, batteryA: 175, batteryShortCircuitKA: 20, listedInteractive: true, listedStandAlone: true, listedGeneratorMode: true, parallelMost: 4,
      role, address, firmware: "4.2.1", firmwareInstruction: "H33", parallelInstruction: "H30", parallelMixed: false, parallelLink: "chain", terminator: true, parallelBank: "one common bank", leadInstruction: "H34", leadTolerancePercent: 5,
      neutralRelay: "disabled", profile: "120/240 V split phase, 60 Hz, ORE-2", dischargeLimitA: 175,
      enclosureType: "3R", handleHeightIn: 55, clearDepthIn: 48, clearWidthIn: 36, clearHeightIn: 80,
    }, { page: "H1", book: "HB-78 data sheet", location: PLANT, mirrored, ...(mirrored ? { label: { x: -9, y: 2, anchor: "start" as const } } : {}) });
    const page = { firmware: "H33", maximumOvercurrentA: "H3", pvMaximumV: "H6", trackerA: "H7", batteryA: "H10", neutralRelay: "H31" };
    for (const [name, at] of Object.entries(page)) drawing.equipment[id]!.sources[name] = { document: "HB-78 data sheet", page: at };
    drawing.port(id, "ac", { continuousA: 32.5, maximumOvercurrentA: 50, ...terminal(35, ["14 AWG", "4 AWG"], "H16, instruction") });
    drawing.port(id, "battery", { maximumA: 175, ...terminal(133, ["4 AWG", "300 kcmil"], "H18, instruction", "AL9CU", true) });
    const sw = tag.replace("INV", "PVS");
    const left = mirrored ? x - 2.5 : x + 2.5;
    const pvs = drawing.add("pv-switch", sw, [left, 38.3], { channels: 2, voltageV: 600, ratingA: 26, lockable: true, listing: "UL 98B" }, { page: "H9", book: "HB-78 data sheet", parent: id, integral: true, mirrored, location: PLANT });
    for (const n of [1, 2]) {
      drawing.join(`${sw}.load${n}`, `${tag}.pv${n}`);
      drawing.port(pvs, `line${n}`, terminal(20, ["16 AWG", "8 AWG"], "H17, instruction"));
    }
  }
}

/** Batteries with their integral breakers and the dc bus between the inverters. */
export function addStorage(drawing: DrawingBuilder): void {
  drawing.add("dc-bus-cabinet", "DB-1", [68, 29.4], {
    make: "Halden", model: "DB-600", listing: "UL 891", busA: 600, voltageV: 80, shortCircuitKA: 20, grounded: false, enclosureType: "1", handleHeightIn: 68, clearDepthIn: 48, clearWidthIn: 30, clearHeightIn: 80,
  }, { page: "D1", location: PLANT, size: { width: 19.4, height: 8.8 }, bus: { x: 1, y: 4.2, length: 17.4, vertical: false }, label: { x: 0.6, y: -0.5, anchor: "start" } });
  const dc = (ratingA: number) => ({ current: "battery dc", ratingA, poles: 2, interruptingKA: 20, voltageV: 80, markedDc: true, mount: "stud", position: "branch", lineLoadMarked: false, listedHundredPercent: false, trip: "fixed" });
  const bolts = [["CB-D2", 70, 250], ["CB-B4", 74, 125], ["CB-B3", 77, 125], ["CB-B2", 80, 125], ["CB-B1", 83, 125], ["CB-D1", 86, 250]] as const;
  for (const [tag, x, ratingA] of bolts) {
    const id = drawing.add("breaker", tag, [x, 33.6], dc(ratingA), { page: "D2", parent: "db-1", rotation: 90, location: PLANT, label: { x: 0, y: -1.75, anchor: "middle" } });
    const lug = ratingA === 250 ? terminal(221, ["1/0 AWG", "300 kcmil"], "D6, instruction", "CU", true) : terminal(106, ["4 AWG", "2/0 AWG"], "D6, instruction", "CU", true);
    drawing.port(id, "load", lug);
    drawing.join(`DB-1.bus@${x - 69}`, `${tag}.line`, [[x, 33.6], [x, 33.6]]);
  }
  for (const [n, x] of [[1, 83], [2, 80], [3, 77], [4, 74]] as const) {
    drawing.add("battery", `BT-${n}`, [x, 43.4], {
      make: "Cindle", model: "BT-12", listing: "UL 9540, UL 1973", ambientMostC: 50, chemistry: "LFP", energyKWh: 12.5, nominalV: 51.2, leastV: 44, mostV: 58, continuousA: 100, shortCircuitKA: 3.6, firmware: "2.06",
      leadInstruction: "B8", listedSystem: true, enclosureType: "1", handleHeightIn: 72, clearDepthIn: 48, clearWidthIn: 30, clearHeightIn: 80,
    }, { page: "B1", book: "BT-12 data sheet", location: BAY });
    const bb = drawing.add("breaker", `BB-${n}`, [x, 43.4], { ...dc(125), lockable: true }, { page: "B4", book: "BT-12 data sheet", parent: `bt-${n}`, integral: true, rotation: 270, location: BAY });
    drawing.port(bb, "load", terminal(106, ["4 AWG", "2/0 AWG"], "B6, instruction", "CU", true));
    drawing.join(`BT-${n}.dc`, `BB-${n}.line`);
    // The lead lands at the pack's own terminal: the integral breaker has no length on the sheet.
    drawing.equipment[bb]!.at = { x, y: 46.4 };
  }
}

/** Four strings of twelve on the roof. */
export function addArray(drawing: DrawingBuilder): void {
  for (const [tag, x] of [["PV-1", 93.8], ["PV-2", 96.9], ["PV-4", 100], ["PV-3", 103.1]] as const) {
    drawing.add("pv-string", tag, [x, 6.2], {
      make: "Halvard", model: "HM-430", listing: "UL 61730, UL 2703", modules: 12, moduleW: 430, cell: "monocrystalline", openCircuitV: 38.6, shortCircuitA: 14.05, maximumPowerV: 32.3, maximumPowerA: 13.31,
      openCircuitPercentPerC: -0.26, maximumPowerPercentPerC: -0.33, seriesFuseA: 25, systemVoltageV: 1000, bifacialGainPercent: 0, mounting: "roof of a building", azimuthDegrees: 180, tiltDegrees: 30,
      moduleShutdown: true, converters: false,
    }, { page: "P1", book: "HM-430 data sheet", location: ROOF });
  }
}

/** Electrodes of both buildings. */
export function addElectrodes(drawing: DrawingBuilder): void {
  drawing.add("electrode", "GE-A", [3.2, 35.2], { type: "two ground rods", spacingFt: 8, lengthFt: 8 }, { location: place("A", "east wall", "underground", 20), label: { x: 1.4, y: 1.1, anchor: "start" } });
  drawing.add("electrode", "GE-B", [12, 40], { type: "two ground rods", spacingFt: 8, lengthFt: 8 }, { location: place("B", "barn", "underground", 20), offSheet: true });
}
