import { direct, resize, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "a breaker on the set", source: "445.13(A)", edit: () => undefined },
  { name: "50 A set on 50 A wire without a device", source: "445.13(A): 115 %", moved: true, edit: (d) => { direct(d); resize(d, "c3", "8 AWG"); }, finds: ["c3"] },
  { name: "the same on 65 A wire", source: "445.13(A): 115 %", moved: true, edit: (d) => { direct(d); resize(d, "c3", "6 AWG"); } },
  { name: "just within 115 %", source: "445.13(A): 115 %", edit: (d) => { direct(d); resize(d, "c3", "8 AWG"); set(d, "gen", "ratedA", 43.4); } },
  { name: "just beyond 115 %", source: "445.13(A): 115 %", edit: (d) => { direct(d); resize(d, "c3", "8 AWG"); set(d, "gen", "ratedA", 43.5); }, finds: ["c3"] },
  { name: "built so that it cannot be overloaded", source: "445.13(A): 100 %", edit: (d) => { direct(d); resize(d, "c3", "8 AWG"); set(d, "gen", "overloadPrevented", true); } },
  { name: "current not known", source: "what is not known is asked for", edit: (d) => { direct(d); set(d, "gen", "ratedA", null); }, asks: ["gen"] },
];
