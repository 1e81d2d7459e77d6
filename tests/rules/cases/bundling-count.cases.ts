import { reroute, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "clean", source: "conditions of 310.15(C)(1) are worked into the ampacity",
    edit: () => undefined,
  },
  {
    name: "feeder crowded into the PV conduit", source: "Table 310.15(C)(1): 10 current-carrying conductors", moved: true,
    edit: (d) => { reroute(d, "f3", ["r-s"]); },
    finds: ["f3"],
  },
];
