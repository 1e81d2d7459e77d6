import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "two models", source: "instruction page H30", edit: (d) => { set(d, "inv-2", "model", "HB-60"); }, finds: ["inv-2"] },
  { name: "one model", source: "instruction page H30", edit: () => undefined },
  {
    name: "the instruction allows other models", source: "some makers allow it",
    edit: (d) => { set(d, "inv-2", "model", "HB-60"); for (const id of ["inv-1", "inv-2"]) set(d, id, "parallelMixed", true); },
  },
  { name: "model not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-2", "model", null); }, asks: ["inv-2"] },
  {
    name: "units on separate buses", source: "not in parallel any more",
    edit: (d) => { set(d, "inv-2", "model", "HB-60"); delete d.circuits["f3"]; },
  },
];
