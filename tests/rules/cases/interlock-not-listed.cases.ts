import { type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "listed slide", source: "702.5, 110.3(B)", edit: () => undefined },
  { name: "not listed", source: "702.5, 110.3(B)", edit: (d) => { d.interlocks["il-1"]!.listed = false; }, finds: ["il-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { d.interlocks["il-1"]!.listed = null; }, asks: ["il-1"] },
];
