import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "two primaries", source: "instruction page H30",
    edit: (d) => { set(d, "inv-2", "role", "primary"); },
    finds: ["inv-2"],
  },
  {
    name: "no primary", source: "instruction page H30",
    edit: (d) => { set(d, "inv-1", "role", "secondary"); },
    finds: ["inv-1"],
  },
  {
    name: "same address", source: "instruction page H30",
    edit: (d) => { set(d, "inv-2", "address", 1); },
    finds: ["inv-2"],
  },
  {
    name: "not known", source: "what is not known is asked for",
    edit: (d) => { set(d, "inv-2", "role", null); },
    asks: ["inv-2"],
  },
  {
    name: "two primaries on separate buses", source: "not in parallel any more", moved: true,
    edit: (d) => { set(d, "inv-2", "role", "primary"); delete d.circuits["f3"]; },
  },
];
