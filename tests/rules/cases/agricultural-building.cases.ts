import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "not asked here", source: "nothing of the kind on the drawing", edit: () => undefined },
  { name: "nobody said so", source: "an open question, no pass", edit: (d) => { d.site.occupancy = "farm building"; }, open: ["util"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { d.site.occupancy = "farm building"; state(d, "agricultural-building", "equipment/util", "yes"); }, stated: ["util"] },
  { name: "stated that it is not so", source: "a stated no is a finding", edit: (d) => { d.site.occupancy = "farm building"; state(d, "agricultural-building", "equipment/util", "no"); }, finds: ["util"] },
];
