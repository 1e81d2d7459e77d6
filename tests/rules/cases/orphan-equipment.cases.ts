import { type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "all reached", source: "completeness, common practice, no published source", edit: () => undefined },
  { name: "a load whose circuit is gone", source: "completeness, common practice, no published source", moved: true, edit: (d) => { d.equipment["lost"] = { ...structuredClone(d.equipment["ds-1"]!), tag: "DS-9" }; }, finds: ["lost"] },
];
