import { second, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "no transfer equipment", source: "common practice, no published source", edit: () => undefined },
  { name: "2 poles, solid neutral", source: "common practice, no published source", edit: (d) => { second(d); } },
  { name: "2 poles and a switched neutral", source: "common practice, no published source", edit: (d) => { second(d); set(d, "ats", "switchedNeutral", true); }, finds: ["ats"] },
  { name: "3 poles and a switched neutral", source: "common practice, no published source", edit: (d) => { second(d); set(d, "ats", "switchedNeutral", true); set(d, "ats", "poles", 3); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { second(d); set(d, "ats", "switchedNeutral", null); }, asks: ["ats"] },
];
