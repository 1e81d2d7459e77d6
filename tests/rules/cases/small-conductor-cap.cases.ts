import { circuitOf, resize, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "40 A on 10 AWG", source: "240.4(D): 10 AWG copper 30 A",
    edit: (d) => { resize(d, "f3", "10 AWG"); set(d, "cb-i2", "ratingA", 40); },
    finds: ["cb-i2"],
  },
  {
    name: "30 A on 10 AWG is the limit", source: "240.4(D): 30 A",
    edit: (d) => { resize(d, "f3", "10 AWG"); set(d, "cb-i2", "ratingA", 30); },
  },
  {
    name: "25 A on 12 AWG", source: "240.4(D): 12 AWG copper 20 A",
    edit: (d) => { resize(d, "f3", "12 AWG"); set(d, "cb-i2", "ratingA", 25); },
    finds: ["cb-i2"],
  },
  {
    name: "rating not known", source: "a missing rating is asked for",
    edit: (d) => { resize(d, "f3", "10 AWG"); set(d, "cb-i2", "ratingA", null); },
    asks: ["cb-i2"],
  },
  {
    name: "strings have no device", source: "690.9(A): no device needed",
    edit: (d) => { set(d, "pv-1", "modules", 12); },
  },
  {
    name: "a small branch moved to a larger breaker", source: "240.4(D): 10 AWG 30 A", moved: true,
    edit: (d) => { resize(d, "f3", "10 AWG"); delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["cb-l"],
  },
];
