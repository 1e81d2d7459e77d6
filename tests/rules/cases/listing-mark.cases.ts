import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "standard named", source: "110.3(C)", edit: () => undefined },
  { name: "words without a standard", source: "110.3(C)", edit: (d) => { set(d, "ds-1", "listing", "safety switch"); }, finds: ["ds-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "ds-1", "listing", null); }, asks: ["ds-1"] },
  { name: "an existing item is judged as found", source: "110.3(C), new work", edit: (d) => { set(d, "ds-1", "listing", null); d.equipment["ds-1"]!.status = "existing"; } },
];
