import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing } from "@/lib/diagram/schema";
import { DrawingBuilder } from "./build";
import { addAcCircuits, addDataAndGround, addDcCircuits, addSensors } from "./circuits";
import { addInterconnect, addService } from "./equipmentAc";
import { addArray, addElectrodes, addInverters, addStorage } from "./equipmentDc";
import { addRaceways } from "./raceways";

/** Notes and keynotes lettered on the one-line. */
function addTexts(drawing: DrawingBuilder): void {
  drawing.text("array", [92.4, 1.9], "PV ARRAY", null, "heading");
  drawing.text("array-lines", [92.4, 3.1], "48 × HM-430, 20.64 kW DC\n4 STRINGS OF 12, 522 V MAX");
  drawing.text("breakers-mm", [14.4, 33.3], "BREAKERS 22 kA");
  drawing.text("neutral-ic", [33.6, 31.6], "N BAR ISOLATED, NO BOND\nTERMINALS 75 °C", "3");
  drawing.text("packs", [71.4, 47.9], "4 × BT-12, LFP 51.2 V, 50.0 kWh");
  drawing.text("ww1", [65, 26.8], "AC", null, "compartment");
  drawing.text("ww1-lines", [68, 26.8], "240 V ONLY");
  drawing.text("ww2", [67, 52], "PV", null, "compartment");
  drawing.text("ww2-lines", [70, 52], "PV DC ONLY");
}

/** The demo's one-line as it should be: Teasel Hill Creamery, an invented farm creamery. One rating, of DS-1, is not known on purpose. */
export function cleanDrawing(): Drawing {
  const build = new DrawingBuilder();
  addService(build);
  addInterconnect(build);
  addInverters(build);
  addStorage(build);
  addArray(build);
  addElectrodes(build);
  addRaceways(build);
  addAcCircuits(build);
  addDcCircuits(build);
  addDataAndGround(build);
  addSensors(build);
  addTexts(build);
  const empty = emptyDrawing({
    edition: "2023", occupancy: "accessory building", recordLowC: -24, designHighC: 33, elevationM: 310, utilityName: "Orrin Rural Electric",
    availableFaultCurrentA: 10400, faultCurrentSource: "Letter of Orrin Rural Electric", faultCurrentOn: "2026-03-12", temperatureSource: "Designer's entry, station data on page 1 of the calculation sheet",
    load: { method: "Article 220, calculation sheet E-606", resultA: 146.4, source: "Load schedule, charging at 25 A included" },
    amendments: {
      "oc-2": { rule: "string-over-building-cap", effect: "limit", limit: 600, unit: "V", severity: null, citation: "County ordinance 26-4, OC-2 (PV dc at most 600 V on or in any building)" },
    },
  }, {
    jobName: "Teasel Hill Creamery", jobNumber: "26-031", addressLines: "41 Wicket Lane, Nettlecombe\nOrrin County", parcel: "07-114-022", owner: "Ansel Thorne",
    designedBy: "Ines Okafor-Lund", checkedBy: "T. Wrenfield", preparer: "Lanternfield Electric", contractor: "Owner-builder Ansel Thorne", permitNumber: "BP-26-0417",
    codes: "NEC 2023, IRC 2021, IFC 2021, county ordinance 26-4", scope: "New service, 20.64 kW dc / 15.6 kW ac PV, 50.0 kWh storage, 14 kW standby generator, backed-up creamery panel",
  });
  return {
    ...empty,
    sheet: { ...empty.sheet, subtitle: "AC, DC AND GENERATOR", tables: { states: { x: 2, y: 40 }, interlocks: { x: 2, y: 50 }, "bus-checks": { x: 33, y: 40 }, "fault-current": { x: 33, y: 48 } } },
    equipment: build.equipment, circuits: build.circuits, raceways: build.raceways, bonds: build.bonds, interlocks: build.interlocks, sensors: build.sensors,
    labels: build.labels, texts: build.texts,
  };
}
