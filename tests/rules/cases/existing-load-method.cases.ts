import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "not asked here", source: "nothing of the kind on the drawing", edit: () => undefined },
  { name: "nobody said so", source: "an open question, no pass", edit: (d) => { d.equipment["mm-225"]!.status = "existing"; }, open: ["mm-225"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { d.equipment["mm-225"]!.status = "existing"; state(d, "existing-load-method", "equipment/mm-225", "yes"); }, stated: ["mm-225"] },
  { name: "stated that it is not so", source: "a stated no is a finding", edit: (d) => { d.equipment["mm-225"]!.status = "existing"; state(d, "existing-load-method", "equipment/mm-225", "no"); }, finds: ["mm-225"] },
];
