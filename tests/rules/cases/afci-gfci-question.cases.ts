import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no dwelling", source: "210.8, 210.12: dwellings and others named", edit: () => undefined },
  { name: "nobody said so", source: "an open question, no pass", edit: (d) => { d.site.occupancy = "one- or two-family dwelling"; }, open: ["ic-200", "mm-225", "pnl-c"] },
  { name: "stated for one", source: "a statement is repeated, never a pass", edit: (d) => { d.site.occupancy = "one- or two-family dwelling"; state(d, "afci-gfci-question", "equipment/pnl-c", "yes"); }, open: ["ic-200", "mm-225"], stated: ["pnl-c"] },
  { name: "stated that it was not", source: "a stated no is a finding", edit: (d) => { d.site.occupancy = "one- or two-family dwelling"; state(d, "afci-gfci-question", "site", "no"); }, finds: ["ic-200", "mm-225", "pnl-c"] },
];
