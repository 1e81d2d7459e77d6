/**
 * All records of the collection of published examples, so that none is dropped in silence. A record is either worked out
 * in a test of this folder or stands here with the reason why there is nothing for a calculation to reproduce.
 */
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, it } from "vitest";

const WORKED = `
AMP-10AWG-120F AMP-OCPD-STD AMP-500-400A BAT-3000W-MANUAL BAT-CABLE-12V-2000W BAT-1200W-12V BAT-3kW-WRONGEFF ESS-855-LOCATION ESS-855-SPACING
AFC-300kVA-208 AFC-300kVA-240-RES GEN-60kVA EGC-250to350 EGC-150A-350 EGC-3/0to500 EGC-20A-12to6 EGC-350A GEC-350-QUIZ GEC-PARALLEL-1400 GEC-ELECTRODE-CAPS
IC-FEEDER-160A IC-TAP10-160A IC-TAP25-200on600 IC-TAP-TEXT-2023 IC-CENTERFED-200 IC-120-200BUS IC-BRK-7600 IC-BRK-LIST
LOAD-D1b LOAD-D2a LOAD-D2c LOAD-2500 LOAD-CITY1500 PVC-SANDIA-51W PVC-CROSSOVER PVC-PERMIT-MICRO-9.9 PVC-PERMIT-MICRO-16 PVC-MANUAL-9.2 PVC-5PAR-3A
PVV-VMP-35.4 PVV-VMP-36.4 PVV-TRAP-STC20 FILL-NIPPLE-399 FILL-NOTE7 FILL-CHECK-1EMT WIRE-8.85 WIRE-WRONG-40 FILL-DS-EMT FILL-DS-PVC40 FILL-DS-LFNC FILL-DS-RMC24
FILL-WRONG-1/0EMT FILL-WRONG-10THW80 VD-230V-30A-100ft VD-24V-10A-100ft VD-UFC-FORMULA VD-TABLE9-250 VD-TABLE9-65A-1000ft WS-WIDTH-30 WS-DWELLING-200A
VIO-SUMRULE-FEEDTHRU VIO-WORKSPACE-BEAM VIO-WS-CABINETS COM-TORQUE-UNITS COM-TORQUE-DEFAULTS`.trim().split(/\s+/);

/** Nothing to work out: the record is a verdict on an arrangement or a wording. */
const NOT_A_CALCULATION: Readonly<Record<string, string>> = {
  "WS-NOT-BEHIND": "where the depth is measured from; stands in the description of working-space",
  "COM-TORQUE-TEXT": "wording of 110.14(D) by edition",
  "COM-TORQUE-STUDY": "figures of a field study, no requirement",
  "COM-RATED-NOT-MIN": "a torque value is a rating; the tolerance is set by a person in the field record",
  "COM-VOC-5PCT": "comparison of readings in the field record",
  "COM-INS-1MOHM": "test limit of the field record",
  "COM-INS-LV": "test limit of the field record; the two editions in the source disagree",
  "VIO-RACEWAY-MIX-2023TEXT": "what may share a raceway: a rule on the drawing",
  "OK-MICRO-NM-ATTIC": "scope of the PV rules on an ac circuit: a rule on the drawing",
  "VIO-GEN-3POLE-SDS": "count of neutral bonds: a rule on the drawing",
  "VIO-INV-NEUTRAL-ON-PE": "landing of a conductor: a rule on the drawing",
  "VIO-DISC-LINE-LOAD": "line and load side of a switch: a rule on the drawing, poster's opinion",
  "OK-DISC-INSIDE": "place of a disconnect: a rule on the drawing",
  "VIO-FEEDER-TAP-A-TAP": "tap from a tap: a rule on the drawing",
  "VIO-SUBPANEL-3WIRE": "missing equipment ground: a rule on the drawing",
  "OK-CONTINUITY-N-G": "a reading that looks wrong and is right: the field record",
  "VIO-DISC-DOOR90": "site findings with their sections, no figure",
  "VIO-FMC-BROKEN": "site finding",
  "VIO-PANEL-2006-LIST": "site findings with their sections, no figure",
  "VIO-WS-STORAGE": "use of working space: site finding",
  "VIO-BAT-EMERG-DISC": "missing outside disconnect: a rule on the drawing",
  "BOND-INVERTER-AUTO": "neutral relay of one mobile unit: the maker's page",
};

it("has each of the 87 records once: 65 worked out, 22 with a reason", () => {
  const ids = [...WORKED, ...Object.keys(NOT_A_CALCULATION)];
  expect(new Set(ids).size).toBe(ids.length);
  expect([WORKED.length, Object.keys(NOT_A_CALCULATION).length]).toEqual([65, 22]);
});

it("every record called worked out is a test of this folder, and no other", () => {
  const folder = import.meta.dirname;
  const text = readdirSync(folder).filter((name) => name.endsWith(".test.ts") && name !== "index.test.ts").map((name) => readFileSync(path.join(folder, name), "utf8")).join("\n");
  const tested = [...text.matchAll(/record\("([^"]+)"/g)].map((match) => match[1] ?? "");
  expect([...tested].sort()).toEqual([...WORKED].sort());
});
