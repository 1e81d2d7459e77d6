import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "60 A on a 50 A nameplate", source: "110.3(B): nameplate 50 A",
    edit: (d) => { set(d, "cb-i2", "ratingA", 60); },
    finds: ["cb-i2"],
  },
  {
    name: "50 A on a 50 A nameplate", source: "110.3(B)",
    edit: (d) => { set(d, "cb-i2", "ratingA", 50); },
  },
  {
    name: "nameplate not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "inv-2", "maximumOvercurrentA", null); delete d.equipment["inv-2"]!.ports["ac"]!.maximumOvercurrentA; },
    asks: ["inv-2"],
  },
];
