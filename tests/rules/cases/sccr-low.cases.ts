import { circuitOf, sectionOf, set, type RuleCase } from "../support";

/** The farm system has one switch whose rating nobody read; here it is given, so that only the case speaks. */
const known = (d: Parameters<RuleCase["edit"]>[0]): void => set(d, "ds-1", "shortCircuitKA", 10);

export const cases: readonly RuleCase[] = [
  {
    name: "5 kA cabinet", source: "110.10, 408.6: 6,350 A + 2 × 60 A",
    edit: (d) => { known(d); set(d, "ic-200", "shortCircuitKA", 5); },
    finds: ["ic-200"],
  },
  {
    name: "6.47 kA is the limit", source: "6,350 A + 120 A",
    edit: (d) => { known(d); set(d, "ic-200", "shortCircuitKA", 6.47); },
  },
  {
    name: "6.46 kA is too little", source: "6,350 A + 120 A",
    edit: (d) => { known(d); set(d, "ic-200", "shortCircuitKA", 6.46); },
    finds: ["ic-200"],
  },
  {
    name: "the switch at 5 kA", source: "240 V / (240/10,400 + 2 × 6 ft × .16/1000 Ω) = 9,601 A",
    edit: (d) => { set(d, "ds-1", "shortCircuitKA", 5); },
    finds: ["ds-1"],
  },
  {
    name: "its rating was not read", source: "a missing rating is asked for",
    edit: () => undefined,
    asks: ["ds-1"],
  },
  {
    name: "meter and panel of one enclosure are one finding", source: "one fault, one finding",
    edit: (d) => { known(d); for (const id of ["mm-225", "mtr-1", "spd-1"]) set(d, id, "shortCircuitKA", 10); },
    finds: ["mm-225"],
  },
  {
    name: "an inverter's own share flows out of it", source: "4,974 A + 60 A of the other unit",
    edit: (d) => { known(d); set(d, "inv-1", "shortCircuitKA", 5.04); },
  },
  {
    name: "an inverter below what the others can drive", source: "4,974 A + 60 A of the other unit",
    edit: (d) => { known(d); set(d, "inv-1", "shortCircuitKA", 5.03); },
    finds: ["inv-1"],
  },
  {
    name: "rated behind the device that stands ahead", source: "rating stated with the installed device",
    edit: (d) => { known(d); set(d, "pnl-n", "shortCircuitKA", 2); Object.assign(d.equipment["pnl-n"]!.props, { shortCircuitWithKA: 10, shortCircuitWith: "LK" }); },
  },
  {
    name: "rated behind another device", source: "the marking names the device",
    edit: (d) => { known(d); set(d, "pnl-n", "shortCircuitKA", 2); Object.assign(d.equipment["pnl-n"]!.props, { shortCircuitWithKA: 10, shortCircuitWith: "class T" }); },
    finds: ["pnl-n"],
  },
  {
    name: "the creamery panel fed from the service bus", source: "240 V / (240/10,400 + 2 × 35.8 ft × .16/1000 Ω) = 6,948 A", moved: true,
    edit: (d) => { known(d); set(d, "pnl-c", "shortCircuitKA", 6); circuitOf(d, "f4").from = { equipment: "cb-f1", port: "load", offset: 0 }; delete d.circuits["f1a"]; },
    finds: ["pnl-c"],
  },
  {
    name: "the same panel where it stands", source: "4,873 A + 120 A",
    edit: (d) => { known(d); set(d, "pnl-c", "shortCircuitKA", 6); },
  },
  {
    name: "a size is missing and matters", source: "upper bound without that stretch",
    edit: (d) => { known(d); set(d, "pnl-c", "shortCircuitKA", 6); sectionOf(d, "f4").ungrounded!.size = null; },
    asks: ["f4"],
  },
];
