import { place, terminal, type DrawingBuilder } from "./build";

const OUTSIDE = place("A", "outside east wall", "outdoor", 33);
const PLANT = place("A", "plant room", "indoor dry", 40);
const WORKSHOP = place("A", "plant room east wall", "indoor dry", 40);

const acBreaker = (ratingA: number, interruptingKA: number, mount: string, position: "main" | "branch" = "branch") => ({
  current: "ac", ratingA, poles: 2, interruptingKA, voltageV: 240, mount, position, family: "LK", slashRated: true, lineLoadMarked: false, listedHundredPercent: false,
  trip: "fixed", lockable: false, auxiliaryContact: false,
});
/** Both ports of a breaker or switch with the same terminal. */
function both(drawing: DrawingBuilder, id: string, data: ReturnType<typeof terminal>): void {
  drawing.port(id, "line", data);
  drawing.port(id, "load", data);
}

/** Utility, meter-main with its breakers, the utility's ac switch and what hangs on the service. */
export function addService(drawing: DrawingBuilder): void {
  drawing.add("utility", "UTIL", [8, 2], { name: "Orrin Rural Electric", systemVoltage: "120/240 V 1-ph 3-W", service: "overhead", availableFaultCurrentA: 10400 }, { page: "March 12, 2026", book: "Utility letter", location: place("A", "pole", "outdoor", 33) });
  drawing.add("meter-main", "MM-225", [2, 13], {
    make: "Halden", model: "MM-225", listing: "UL 67", busA: 225, shortCircuitKA: 22, breakerFamily: "LK", spacesTotal: 8, polesMaximum: 8, enclosureType: "3R",
    handleHeightIn: 66, clearDepthIn: 60, clearWidthIn: 36, clearHeightIn: 80, serviceEquipment: true, suitableAsServiceEquipment: true, busEnds: "top",
  }, { page: "M1", location: OUTSIDE, size: { width: 20, height: 21 }, bus: { x: 6, y: 5, length: 13, vertical: true }, label: { x: 8.6, y: 1.7, anchor: "start" } });
  drawing.add("meter", "MTR-1", [8, 10], { ratingA: 200, voltageV: 240, shortCircuitKA: 22, listing: "UL 414" }, { page: "M1", location: OUTSIDE, parent: "mm-225" });
  drawing.port("mtr-1", "line", terminal(250, ["4 AWG", "250 kcmil"], "M1, marking"));
  drawing.add("breaker", "CB-M", [8, 14], acBreaker(200, 22, "bolt-on", "main"), { page: "M2", parent: "mm-225", rotation: 90, spaces: [], location: OUTSIDE, label: { x: -1.6, y: 1.4, anchor: "end" } });
  both(drawing, "cb-m", terminal(250, ["4 AWG", "250 kcmil"], "M2, marking"));
  const branches = [["CB-F1", 20, 125, "bolt-on", [1, 3], 50, ["4 AWG", "2/0 AWG"]], ["CB-N", 24, 80, "plug-on", [2, 4], 50, ["8 AWG", "1/0 AWG"]], ["CB-S", 30, 20, "plug-on", [5, 7], 36, ["14 AWG", "8 AWG"]]] as const;
  for (const [tag, y, ratingA, mount, spaces, torque, range] of branches) {
    const id = drawing.add("breaker", tag, [10, y], acBreaker(ratingA, 22, mount), { page: "M2", parent: "mm-225", spaces: [...spaces], location: OUTSIDE });
    both(drawing, id, terminal(torque, range, "M2, marking"));
    drawing.join(`MM-225.bus@${y - 18}`, `${tag}.line`, [[8, y], [10, y]]);
  }
  drawing.join("MTR-1.load", "CB-M.line", [[8, 12], [8, 14]]);
  drawing.join("CB-M.load", "MM-225.bus@0", [[8, 17], [8, 18]]);
  drawing.add("surge-protector", "SPD-1", [6.2, 28.6], { type: "2", shortCircuitKA: 22, voltageV: 240, listing: "UL 1449" }, { page: "M3", parent: "mm-225", location: OUTSIDE, label: { x: 1.4, y: 4.05, anchor: "start" } });
  drawing.join("MM-225.bus@10.6", "SPD-1.line", [[8, 28.6], [6.2, 28.6]]);

  const ds1 = drawing.add("disconnect", "DS-1", [26, 20], {
    model: "VB-200", listing: "UL 98", current: "ac", ratingA: 200, poles: 2, voltageV: 240, shortCircuitKA: null, visibleBlade: true, lockable: true, loadBreak: true, fused: false,
    enclosureType: "3R", handleHeightIn: 60, clearDepthIn: 60, clearWidthIn: 30, clearHeightIn: 80, serviceEquipment: false,
  }, { page: "M5", location: OUTSIDE });
  both(drawing, ds1, terminal(250, ["6 AWG", "250 kcmil"], "M5, marking"));

  drawing.add("panelboard", "PNL-N", [26, 22.8], {
    model: "existing", listing: "UL 67", busA: 125, shortCircuitKA: 10, breakerFamily: "LK", spacesTotal: 12, polesMaximum: 12, enclosureType: "1", handleHeightIn: 65,
    clearDepthIn: 48, clearWidthIn: 30, clearHeightIn: 80, mainType: "main breaker", serviceEquipment: false, suitableAsServiceEquipment: true, busEnds: "top",
  }, { page: "Rating plate", status: "existing", location: place("B", "inside barn entry", "indoor dry", 40), size: { width: 4.4, height: 2.4 }, bus: { x: 3.7, y: 0.4, length: 1.6, vertical: true }, label: { x: -2.4, y: 3.7, anchor: "start" } });
  const cbNm = drawing.add("breaker", "CB-NM", [26, 24], acBreaker(100, 10, "bolt-on", "main"), { page: "Rating plate", status: "existing", parent: "pnl-n", integral: true, spaces: [], location: place("B", "inside barn entry", "indoor dry", 40) });
  both(drawing, cbNm, terminal(50, ["8 AWG", "1/0 AWG"], "marking"));
  drawing.join("CB-NM.load", "PNL-N.bus@0.8");

  const ds2 = drawing.add("disconnect", "DS-2", [24.4, 30], {
    model: "MS-30", listing: "UL 98", current: "ac", ratingA: 30, poles: 2, voltageV: 240, shortCircuitKA: 10, visibleBlade: false, lockable: true, loadBreak: true, fused: false,
    enclosureType: "3R", handleHeightIn: 48, clearDepthIn: 48, clearWidthIn: 30, clearHeightIn: 80, serviceEquipment: false,
  }, { page: "M6", location: place("A", "pump house", "outdoor", 33), label: { x: -1.2, y: 5.7, anchor: "start" } });
  both(drawing, ds2, terminal(25, ["14 AWG", "8 AWG"], "M6, marking"));
  const pump = drawing.add("load", "P-1", [29.2, 36.4], { description: "Yard pump 1 hp", use: "motor", powerKW: null, horsepower: 1, currentA: 8, continuous: true, phaseV: 240 }, { page: "Nameplate", status: "existing", rotation: 90, label: { x: 1.7, y: 0, anchor: "start" }, location: place("A", "pump house", "outdoor", 33) });
  drawing.port(pump, "line", terminal(25, ["14 AWG", "8 AWG"], "marking"));
  drawing.add("shutdown-initiator", "RSD-1", [39.4, 36.6], { purpose: "PV rapid shutdown", enclosureType: "4X", circuitVoltage: "24 V, Class 2", listing: "UL 1741" }, { page: "R2", location: OUTSIDE });
  drawing.add("shutdown-initiator", "ESD-1", [47.6, 36.6], { purpose: "storage emergency stop", listing: "UL 9540, with BT-12", enclosureType: "4X", circuitVoltage: "24 V, Class 2" }, { page: "B7", location: OUTSIDE });
}

/** Interconnect cabinet, generator and the creamery panel. */
export function addInterconnect(drawing: DrawingBuilder): void {
  drawing.add("interconnect-cabinet", "IC-200", [31, 10], {
    make: "Halden", model: "IC-200", listing: "UL 67, UL 1741", busA: 200, shortCircuitKA: 10, breakerFamily: "LK", spacesTotal: 12, polesMaximum: 12, enclosureType: "1", handleHeightIn: 71,
    clearDepthIn: 48, clearWidthIn: 36, clearHeightIn: 80, serviceEquipment: false, suitableAsServiceEquipment: false, busEnds: "top", listedForIsland: true, generatorPositionA: 60, neutralBusA: 200,
  }, { page: "I1", location: PLANT, size: { width: 23, height: 23.5 }, bus: { x: 14, y: 9, length: 11, vertical: true } });
  const breakers = [["CB-U", 36, 20, 125, "bolt-on", [1, 3], 50, ["6 AWG", "2/0 AWG"]], ["CB-G", 47, 20, 60, "bolt-on", [2, 4], 45, ["14 AWG", "4 AWG"]],
    ["CB-L", 47, 23, 125, "plug-on", [5, 7], 50, ["6 AWG", "2/0 AWG"]], ["CB-I1", 47, 26, 45, "plug-on with hold-down", [9, 11], 45, ["14 AWG", "4 AWG"]],
    ["CB-I2", 47, 29, 45, "plug-on with hold-down", [10, 12], 45, ["14 AWG", "4 AWG"]]] as const;
  for (const [tag, x, y, ratingA, mount, spaces, torque, range] of breakers) {
    const id = drawing.add("breaker", tag, [x, y], { ...acBreaker(ratingA, 10, mount), auxiliaryContact: tag === "CB-G" }, {
      page: "I3", parent: "ic-200", spaces: [...spaces], location: PLANT, ...(tag === "CB-U" ? { label: { x: 0, y: 1.7, anchor: "start" as const } } : {}),
    });
    both(drawing, id, terminal(torque, range, "I3, marking"));
    if (tag !== "CB-U") drawing.join(`IC-200.bus@${y - 19}`, `${tag}.line`, [[45, y], [47, y]]);
  }
  drawing.add("contactor", "K1", [40, 20], { ratingA: 200, poles: 2, voltageV: 240, shortCircuitKA: 10, coil: "24 V dc, Class 2", interconnectDevice: true, listing: "as IC-200" }, { page: "I2", parent: "ic-200", location: PLANT, label: { x: 0.6, y: 3.4, anchor: "start" } });
  drawing.join("CB-U.load", "K1.line", [[39, 20], [40, 20]]);
  drawing.join("K1.load", "IC-200.bus@1", [[43, 20], [45, 20]]);
  drawing.interlock("IL-1", { kind: "mechanical slide", listed: true, switches: { "cb-u": true, "cb-g": true }, at: { x: 43, y: 16.4 }, note: "LISTED SLIDE" });

  drawing.add("generator", "G-1", [58, 1], {
    make: "Corran", model: "S-14P", listing: "UL 2200", outputKW: 14, outputV: 240, ratedA: 58.3, faultA: 480, fuel: "propane", use: "fixed standby", listedParallelWithUtility: false,
    handleHeightIn: 40, clearDepthIn: 48, clearWidthIn: 36, clearHeightIn: 80, enclosureType: "3R",
  }, { page: "G1", location: place("A", "pad 85 ft north", "outdoor", 33), size: { width: 14, height: 12.2 } });
  const gs = drawing.add("breaker", "CB-GS", [61, 8.6], { ...acBreaker(60, 10, "bolt-on", "main"), family: null, lockable: true }, { page: "G3", parent: "g-1", rotation: 90, spaces: [], location: place("A", "pad 85 ft north", "outdoor", 33) });
  both(drawing, gs, terminal(45, ["14 AWG", "4 AWG"], "G5, instruction"));
  drawing.join("G-1.load", "CB-GS.line", [[61, 7.6], [61, 8.6]]);

  drawing.add("panelboard", "PNL-C", [74, 1], {
    make: "Halden", model: "ML-225", listing: "UL 67", busA: 225, shortCircuitKA: 10, breakerFamily: "LK", spacesTotal: 24, polesMaximum: 24, enclosureType: "1", handleHeightIn: 72,
    clearDepthIn: 48, clearWidthIn: 36, clearHeightIn: 80, mainType: "main lugs only", serviceEquipment: false, suitableAsServiceEquipment: false, busEnds: "top",
  }, { page: "C1", location: WORKSHOP, size: { width: 16.4, height: 13.8 }, bus: { x: 1.4, y: 11.2, length: 13.6, vertical: false } });
  drawing.port("pnl-c", "bus", terminal(250, ["6 AWG", "300 kcmil"], "C1, marking"));
  const loads = [["L-1", "Vat heater", "heating", 5.5, 22.9, true, 2.5], ["L-2", "Chiller", "air conditioning or refrigeration", 3, 12.5, true, 6], ["L-3", "Pumps", "general", 1.5, 6.9, false, 9.2], ["L-4", "Ltg, rec", "general", 4, 16.7, false, 12.4]] as const;
  for (const [tag, description, use, powerKW, currentA, continuous, x] of loads) {
    drawing.add("load", tag, [75.4 + x, 12.2 - 1], { description, use, powerKW, currentA, continuous, phaseV: 240, ...(tag === "L-2" ? { minimumCircuitA: 17, maximumOvercurrentA: 25 } : {}) }, { parent: "pnl-c", location: WORKSHOP });
    drawing.join(`PNL-C.bus@${x}`, `${tag}.line`, [[75.4 + x, 12.2], [75.4 + x, 11.2]]);
  }
}
