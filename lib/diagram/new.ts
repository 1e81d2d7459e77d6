import { SCHEMA_VERSION, type Drawing, type Sheet, type Site } from "@/lib/diagram/schema";

const EMPTY_TITLE_BLOCK: Sheet["titleBlock"] = {
  jobName: "", jobNumber: "", addressLines: "", parcel: "", owner: "", designedBy: "", checkedBy: "", preparer: "", contractor: "",
  permitNumber: "", codes: "", scope: "",
};

/** An empty ANSI D sheet for a job. What is not handed in starts as not known. */
export function emptyDrawing(site: Partial<Site>, titleBlock: Partial<Sheet["titleBlock"]> = {}): Drawing {
  return {
    schemaVersion: SCHEMA_VERSION,
    site: {
      edition: "2023", occupancy: null, recordLowC: null, designHighC: null, elevationM: null, utilityName: null,
      availableFaultCurrentA: null, temperatureSource: null, amendments: {}, ...site,
    },
    sheet: {
      size: "ANSI D", title: "ONE-LINE DIAGRAM", subtitle: "", number: "E-601",
      titleBlock: { ...EMPTY_TITLE_BLOCK, ...titleBlock },
      tables: {},
    },
    equipment: {}, circuits: {}, raceways: {}, bonds: {}, interlocks: {}, sensors: {}, labels: {}, acceptances: {}, texts: {},
  };
}
