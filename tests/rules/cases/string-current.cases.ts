import { circuitOf, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "stated with the plain short-circuit current", source: "690.8(A): 1.25 × 14.05 = 17.56 A",
    edit: (d) => { circuitOf(d, "s1").load = { continuousA: 14.05, otherA: 0, basis: "module data" }; },
    finds: ["s1"],
  },
  {
    name: "stated with 125 percent", source: "690.8(A)",
    edit: (d) => { circuitOf(d, "s1").load = { continuousA: 17.5625, otherA: 0, basis: "690.8(A)" }; },
  },
  {
    name: "a hundredth of an ampere is rounding", source: "690.8(A)",
    edit: (d) => { circuitOf(d, "s1").load = { continuousA: 17.56, otherA: 0, basis: "690.8(A)" }; },
  },
  {
    name: "17.5 A is below it", source: "690.8(A)",
    edit: (d) => { circuitOf(d, "s1").load = { continuousA: 17.5, otherA: 0, basis: "rounded down" }; },
    finds: ["s1"],
  },
  {
    name: "not stated: worked out from the strings", source: "690.8(A)",
    edit: () => undefined,
  },
  {
    name: "short-circuit current not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "pv-1", "shortCircuitA", null); },
    asks: ["pv-1"],
  },
  {
    name: "stated for one string, lead moved to another with more current", source: "690.8(A): 1.25 × 18 = 22.5 A", moved: true,
    edit: (d) => { set(d, "pv-2", "shortCircuitA", 18); circuitOf(d, "s1").load = { continuousA: 17.5625, otherA: 0, basis: "690.8(A)" }; delete d.circuits["s2"]; circuitOf(d, "s1").from = { equipment: "pv-2", port: "dc", offset: 0 }; },
    finds: ["s1"],
  },
];
