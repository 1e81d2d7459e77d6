import { circuitOf, ground, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "12 AWG with 45 A", source: "Table 250.122: 60 A column 10 AWG",
    edit: (d) => { ground(d, "f3", "12 AWG"); },
    finds: ["f3"],
  },
  {
    name: "10 AWG with 60 A is the limit", source: "Table 250.122: 60 A 10 AWG",
    edit: (d) => { ground(d, "f5", "10 AWG"); },
  },
  {
    name: "12 AWG with 60 A", source: "Table 250.122: 60 A 10 AWG",
    edit: (d) => { ground(d, "f5", "12 AWG"); },
    finds: ["f5"],
  },
  {
    name: "8 AWG with 125 A", source: "Table 250.122: 200 A column 6 AWG",
    edit: (d) => { ground(d, "f4", "8 AWG"); },
    finds: ["f4"],
  },
  {
    name: "size not known", source: "a missing size is asked for",
    edit: (d) => { ground(d, "f4", null); },
    asks: ["f4"],
  },
  {
    name: "10 AWG ground moved under a 125 A breaker", source: "Table 250.122: 6 AWG, never above the circuit conductors", moved: true,
    edit: (d) => { delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["f3"],
  },
];
