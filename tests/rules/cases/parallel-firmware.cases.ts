import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "4.1.8 beside 4.2.1", source: "instruction page H33",
    edit: (d) => { set(d, "inv-2", "firmware", "4.1.8"); },
    finds: ["inv-2"],
  },
  {
    name: "equal", source: "instruction page H33",
    edit: () => undefined,
  },
  {
    name: "not known", source: "what is not known is asked for",
    edit: (d) => { set(d, "inv-2", "firmware", null); },
    asks: ["inv-2"],
  },
  {
    name: "different levels on separate buses", source: "not in parallel any more", moved: true,
    edit: (d) => { set(d, "inv-2", "firmware", "4.1.8"); delete d.circuits["f3"]; },
  },
];
