import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "nobody said so", source: "plan review, common practice, no published source", edit: () => undefined, open: ["util"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "existing-new-unmarked", "equipment/util", "yes"); }, stated: ["util"] },
  { name: "stated that it was not", source: "plan review, common practice, no published source", edit: (d) => { state(d, "existing-new-unmarked", "equipment/util", "no"); }, finds: ["util"] },
  { name: "an empty sheet", source: "nothing to mark", edit: (d) => { Object.assign(d, { equipment: {}, circuits: {}, bonds: {}, interlocks: {}, sensors: {}, labels: {} }); } },
];
