import { circuitOf, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "source breaker marked line and load", source: "110.3(B), 705.12(D) of 2020: suitable for backfeed",
    edit: (d) => { set(d, "cb-i2", "lineLoadMarked", true); },
    finds: ["cb-i2"],
  },
  {
    name: "source breaker without the marks", source: "705.12(D) of 2020: breakers not marked line and load",
    edit: (d) => { set(d, "cb-i2", "lineLoadMarked", false); },
  },
  {
    name: "branch breaker with the marks", source: "110.3(B): fed from the bus",
    edit: (d) => { set(d, "cb-s", "lineLoadMarked", true); },
  },
  {
    name: "breaker of a set, fed from its line terminals", source: "110.3(B): line to load",
    edit: (d) => { set(d, "cb-gs", "lineLoadMarked", true); },
  },
  {
    name: "service main through which inverters send power out", source: "705.12(D) of 2020: suitable for backfeed",
    edit: (d) => { set(d, "cb-m", "lineLoadMarked", true); },
    finds: ["cb-m"],
  },
  {
    name: "an inverter landed on a breaker with the marks", source: "110.3(B), 710.15(E)",
    edit: (d) => { set(d, "cb-l", "lineLoadMarked", true); delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["cb-l"],
  },
  {
    name: "feeder breaker with only the set behind its interlock", source: "110.3(B): nothing feeds back past the interlock",
    edit: (d) => { set(d, "cb-f1", "lineLoadMarked", true); for (const id of ["f2", "f3"]) delete d.circuits[id]; },
  },
  {
    name: "marks not known", source: "a missing marking is asked for",
    edit: (d) => { set(d, "cb-i2", "lineLoadMarked", null); },
    asks: ["cb-i2"],
  },
];
