import { circuitOf, resize, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "60 A on 8 AWG, 50 A at 75 °C", source: "240.4 and Table 310.16: 8 AWG copper 50 A at 75 °C",
    edit: (d) => { set(d, "cb-i2", "ratingA", 60); },
    finds: ["cb-i2"],
  },
  {
    name: "50 A on 8 AWG is the limit", source: "Table 310.16: 50 A",
    edit: (d) => { set(d, "cb-i2", "ratingA", 50); },
  },
  {
    name: "125 A on 2 AWG: 115 A is no standard rating, 125 A is the next", source: "240.4(B), 240.6(A): 110, 125",
    edit: (d) => { resize(d, "f4", "2 AWG"); },
  },
  {
    name: "125 A on 3 AWG: 100 A is itself a standard rating", source: "240.4(B), 240.6(A): 100",
    edit: (d) => { resize(d, "f4", "3 AWG"); },
    finds: ["cb-l"],
  },
  {
    name: "size not known", source: "a missing rating is asked for",
    edit: (d) => { resize(d, "f3", null); },
    asks: ["f3"],
  },
  {
    name: "the inverter circuit moved to the 125 A breaker", source: "Table 310.16: 8 AWG 50 A", moved: true,
    edit: (d) => { delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["cb-l"],
  },
  {
    name: "30 A on a motor circuit follows its own article", source: "240.4(G): motors by Article 430",
    edit: (d) => { set(d, "cb-s", "ratingA", 30); },
  },
];
