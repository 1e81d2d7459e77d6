import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "clean: only the switch whose plate nobody read", source: "short-circuit rating of DS-1",
    edit: () => undefined,
    asks: ["ds-1"],
  },
  {
    name: "all given", source: "nothing is missing",
    edit: (d) => { set(d, "ds-1", "shortCircuitKA", 22); },
  },
  {
    name: "one more missing", source: "two values are missing",
    edit: (d) => { set(d, "cb-n", "ratingA", null); },
    asks: ["cb-n", "ds-1"],
  },
  {
    name: "a switch nobody is connected to asks nothing", source: "not on a power path", moved: true,
    edit: (d) => { d.equipment["spare"] = { ...structuredClone(d.equipment["ds-1"]!), tag: "DS-9" }; },
    asks: ["ds-1"],
  },
];
