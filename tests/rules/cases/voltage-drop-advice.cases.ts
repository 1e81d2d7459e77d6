import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, reroute, resize, sectionOf, type RuleCase } from "../support";

/** The barn feeder in nonmetallic conduit: 40 A at 240 V. */
function feeder(d: Drawing, size: string, feet: number | null): void { resize(d, "n1", size); sectionOf(d, "n1").lengthFt = feet; }

export const cases: readonly RuleCase[] = [
  {
    name: "40 A over 130 ft of 8 AWG", source: "Chapter 9 Table 9: 0.78 Ω/kft, 2 × .78 × 40 × .13 = 8.1 V, 3.4 %",
    edit: (d) => { feeder(d, "8 AWG", 130); },
    finds: ["n1"],
  },
  {
    name: "40 A over 130 ft of 6 AWG", source: "Chapter 9 Table 9: 0.49 Ω/kft, 5.1 V, 2.1 %",
    edit: (d) => { feeder(d, "6 AWG", 130); },
  },
  {
    name: "115 ft of 8 AWG", source: "2 × .78 × 40 × .115 = 7.18 V, 2.99 %",
    edit: (d) => { feeder(d, "8 AWG", 115); },
  },
  {
    name: "116 ft of 8 AWG", source: "2 × .78 × 40 × .116 = 7.24 V, 3.02 %",
    edit: (d) => { feeder(d, "8 AWG", 116); },
    finds: ["n1"],
  },
  {
    name: "rise toward an inverter of 32.5 A over 120 ft of 8 AWG", source: "2 × .78 × 32.5 × .12 = 6.1 V, 2.5 %; 2 % is common practice, no published source",
    edit: (d) => { sectionOf(d, "f3").lengthFt = 120; },
    finds: ["f3"],
  },
  {
    name: "length not known", source: "a missing length is asked for",
    edit: (d) => { feeder(d, "8 AWG", null); },
    asks: ["n1"],
  },
  {
    name: "feeder and pump circuit within 3 % each, above 5 % in all", source: "informational notes: 5 % in all; 2.99 % and 2 × 2 × 8 × .2 = 6.4 V, 2.67 %", moved: true,
    edit: (d) => {
      feeder(d, "8 AWG", 115);
      const pump = circuitOf(d, "p1a");
      d.equipment["cb-p"] = { ...structuredClone(d.equipment["cb-s"]!), tag: "CB-P", parent: "pnl-n", spaces: [1, 3] };
      d.circuits["j-cb-p"] = { ...structuredClone(circuitOf(d, "n1")), tag: "", wiring: "factory", sections: {}, load: null, from: { equipment: "pnl-n", port: "bus", offset: 1 }, to: { equipment: "cb-p", port: "line", offset: 0 } };
      // With another load behind it the feeder is no motor circuit and carries what was stated.
      d.equipment["l-5"] = { ...structuredClone(d.equipment["l-3"]!), tag: "L-5", parent: "pnl-n" };
      d.circuits["j-l-5"] = { ...structuredClone(d.circuits["j-cb-p"]!), to: { equipment: "l-5", port: "line", offset: 0 } };
      pump.from = { equipment: "cb-p", port: "load", offset: 0 };
      sectionOf(d, "p1a").lengthFt = 196;
      reroute(d, "p1a", ["r-8"]);
    },
    finds: ["p1a"],
  },
];
