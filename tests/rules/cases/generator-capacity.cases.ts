import { second, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no automatic switch", source: "702.4(B)(2)", edit: () => undefined },
  { name: "50 A set, 28 A moved", source: "702.4(B)(2)", edit: (d) => { second(d); } },
  { name: "as much as it gives", source: "702.4(B)(2)", edit: (d) => { second(d); set(d, "gen", "ratedA", 28); } },
  { name: "more than it gives", source: "702.4(B)(2)", edit: (d) => { second(d); set(d, "gen", "ratedA", 27.9); }, finds: ["gen"] },
  { name: "manual transfer", source: "702.4(B)(1): the user chooses", edit: (d) => { second(d); set(d, "gen", "ratedA", 20); set(d, "ats", "operation", "manual"); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { second(d); set(d, "gen", "ratedA", null); }, asks: ["gen"] },
];
