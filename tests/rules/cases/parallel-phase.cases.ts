import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "208 V beside 240 V", source: "instruction page H30", edit: (d) => { set(d, "inv-2", "outputV", 208); }, finds: ["inv-2"] },
  { name: "another grid profile", source: "instruction page H30", edit: (d) => { set(d, "inv-2", "profile", "120/240 V split phase, 60 Hz, ORE-1"); }, finds: ["inv-2"] },
  { name: "240 V and one profile", source: "instruction page H30", edit: () => undefined },
  { name: "profile not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-2", "profile", null); }, asks: ["inv-2"] },
  { name: "voltage not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-1", "outputV", null); }, asks: ["inv-1"] },
  { name: "units on separate buses", source: "not in parallel any more", edit: (d) => { set(d, "inv-2", "outputV", 208); delete d.circuits["f3"]; } },
];
