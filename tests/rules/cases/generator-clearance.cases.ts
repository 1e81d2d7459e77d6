import { set, state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no generator", source: "nothing to keep away", edit: (d) => { set(d, "g-1", "use", "portable"); } },
  { name: "nobody said so", source: "an open question, no pass", edit: () => undefined, open: ["g-1"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "generator-clearance", "equipment/g-1", "yes"); }, stated: ["g-1"] },
  { name: "stated that it is not so", source: "a stated no is a finding", edit: (d) => { state(d, "generator-clearance", "equipment/g-1", "no"); }, finds: ["g-1"] },
];
