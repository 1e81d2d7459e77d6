import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "14 modules: 609.2 V on 600 V", source: "690.7(A): 14 × 38.6 × (1 + .0026 × 49)",
    edit: (d) => { set(d, "pv-1", "modules", 14); },
    finds: ["s1"],
  },
  {
    name: "13 modules: 565.7 V", source: "690.7(A)",
    edit: (d) => { set(d, "pv-1", "modules", 13); },
  },
  {
    name: "input of 522 V is just below 522.2 V", source: "12 × 38.6 × 1.1274 = 522.2 V",
    edit: (d) => { set(d, "inv-1", "pvMaximumV", 522); },
    finds: ["s1", "s2"],
  },
  {
    name: "input of 523 V", source: "522.2 V",
    edit: (d) => { set(d, "inv-1", "pvMaximumV", 523); },
  },
  {
    name: "record low not known", source: "a missing value is asked for",
    edit: (d) => { d.site.recordLowC = null; },
    asks: ["pv-1", "pv-2", "pv-3", "pv-4"],
  },
];
