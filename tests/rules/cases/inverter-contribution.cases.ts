import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "60 A stated for an inverter of 32.5 A", source: "data sheet; 1.1 to 2 times the output, common practice, no published source",
    edit: () => undefined,
  },
  {
    name: "10 A stated", source: "an inverter feeds its output, 32.5 A, in service",
    edit: (d) => { set(d, "inv-1", "faultA", 10); },
    finds: ["inv-1"],
  },
  {
    name: "exactly its output", source: "32.5 A",
    edit: (d) => { set(d, "inv-1", "faultA", 32.5); },
  },
  {
    name: "just below it", source: "32.4 A < 32.5 A",
    edit: (d) => { set(d, "inv-1", "faultA", 32.4); },
    finds: ["inv-1"],
  },
  {
    name: "not stated", source: "705.16 of 2017, 110.9: all sources",
    edit: (d) => { set(d, "inv-2", "faultA", null); },
    asks: ["inv-2"],
  },
  {
    name: "no utility and no set on its bus", source: "nothing to add to",
    edit: (d) => { set(d, "inv-2", "faultA", null); delete d.circuits["f3"]; },
  },
];
