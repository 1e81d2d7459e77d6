import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "lengths given", source: "plan review, common practice, no published source", edit: () => undefined },
  { name: "no length", source: "plan review, common practice, no published source", edit: (d) => { sectionOf(d, "f1a").lengthFt = null; }, finds: ["f1a"] },
  { name: "zero", source: "plan review, common practice, no published source", edit: (d) => { sectionOf(d, "f1a").lengthFt = 0; }, finds: ["f1a"] },
  { name: "a foot", source: "plan review, common practice, no published source", edit: (d) => { sectionOf(d, "f1a").lengthFt = 1; } },
];
