import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "no interlock", source: "702.5", moved: true,
    edit: (d) => { delete d.interlocks["il-1"]; },
    finds: ["cb-u"],
  },
  {
    name: "interlock on other breakers", source: "702.5: the utility breaker is free", moved: true,
    edit: (d) => { d.interlocks["il-1"]!.switches = { "cb-l": true, "cb-g": true }; },
    finds: ["cb-u"],
  },
  {
    name: "listed for parallel operation", source: "702.5, 705: set for parallel operation",
    edit: (d) => { delete d.interlocks["il-1"]; set(d, "g-1", "listedParallelWithUtility", true); },
  },
  {
    name: "interlock in place", source: "702.5",
    edit: () => undefined,
  },
];
