import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "not asked here", source: "nothing of the kind on the drawing", edit: () => undefined },
  { name: "nobody said so", source: "an open question, no pass", edit: (d) => { d.equipment["inv-1"]!.status = "existing"; }, open: ["pnl-n"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { d.equipment["inv-1"]!.status = "existing"; state(d, "load-record-with-pv", "equipment/pnl-n", "yes"); }, stated: ["pnl-n"] },
  { name: "stated that it is not so", source: "a stated no is a finding", edit: (d) => { d.equipment["inv-1"]!.status = "existing"; state(d, "load-record-with-pv", "equipment/pnl-n", "no"); }, finds: ["pnl-n"] },
];
