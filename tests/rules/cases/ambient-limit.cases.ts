import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "45 °C unit at 40 °C", source: "datasheet H2, 110.3(B)", edit: () => undefined },
  { name: "at the limit", source: "datasheet H2, 110.3(B)", edit: (d) => { d.equipment["inv-1"]!.location.ambientC = 45; } },
  { name: "above it", source: "datasheet H2, 110.3(B)", edit: (d) => { d.equipment["inv-1"]!.location.ambientC = 46; }, finds: ["inv-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-1", "ambientMostC", null); }, asks: ["inv-1"] },
  { name: "place not known", source: "the derating rules ask for it", edit: (d) => { d.equipment["inv-1"]!.location.ambientC = null; } },
];
