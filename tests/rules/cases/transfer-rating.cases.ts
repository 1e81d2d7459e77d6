import { second, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no transfer equipment", source: "702.5", edit: () => undefined },
  { name: "100 A behind 100 A", source: "702.5, 110.3(B)", edit: (d) => { second(d); } },
  { name: "99 A behind 100 A", source: "702.5, 110.3(B)", edit: (d) => { second(d); set(d, "ats", "ratingA", 99); }, finds: ["ats"] },
  { name: "a larger device ahead of it", source: "702.5, 110.3(B)", edit: (d) => { second(d); set(d, "q1", "ratingA", 125); }, finds: ["ats"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { second(d); set(d, "ats", "ratingA", null); }, asks: ["ats"] },
];
