import type { Drawing } from "@/lib/diagram/schema";
import { reroute, sectionOf, set, type RuleCase } from "../support";

const rated = (d: Drawing, id: string, section: string, volts: number | null): void => { const found = sectionOf(d, id, section); found.ungrounded = { ...found.ungrounded!, voltageRatingV: volts }; };

export const cases: readonly RuleCase[] = [
  {
    name: "600 V wire in a string of 18 modules, 783 V in the cold", source: "300.3(C)(1): 18 × 38.6 × (1 + 49 × .0026) = 783 V",
    edit: (d) => { set(d, "pv-1", "modules", 18); },
    finds: ["s1"],
  },
  {
    name: "1000 V wire throughout", source: "300.3(C)(1)",
    edit: (d) => { set(d, "pv-1", "modules", 18); for (const id of ["s1", "s2", "s3", "s4"]) rated(d, id, "s2", 1000); },
  },
  {
    name: "the string in 1000 V wire, the others in its conduit still 600 V", source: "300.3(C)(1): highest voltage in the raceway",
    edit: (d) => { set(d, "pv-1", "modules", 18); rated(d, "s1", "s2", 1000); },
    finds: ["s1"],
  },
  {
    name: "300 V wire on 240 V", source: "300.3(C)(1): 240 V",
    edit: (d) => { rated(d, "p1a", "s1", 300); },
  },
  {
    name: "150 V wire on 240 V", source: "300.3(C)(1): 240 V",
    edit: (d) => { rated(d, "p1a", "s1", 150); },
    finds: ["p1a"],
  },
  {
    name: "48 V lead in 60 V wire", source: "300.3(C)(1): packs to 58 V",
    edit: (d) => { rated(d, "d2", "s1", 60); },
  },
  {
    name: "battery lead of 60 V wire moved in with 240 V", source: "300.3(C)(1): highest voltage in the raceway",
    edit: (d) => { rated(d, "d2", "s1", 60); reroute(d, "d2", ["n-1"]); },
    finds: ["f2"],
  },
  {
    name: "rating not known", source: "a missing rating is asked for",
    edit: (d) => { rated(d, "p1a", "s1", null); },
    asks: ["p1a"],
  },
];
