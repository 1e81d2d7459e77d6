import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "type 3R outdoors", source: "Table 110.28", edit: () => undefined },
  { name: "type 1 outdoors", source: "Table 110.28", edit: (d) => { set(d, "ds-1", "enclosureType", "1"); }, finds: ["ds-1"] },
  { name: "type 12 outdoors", source: "Table 110.28", edit: (d) => { set(d, "ds-1", "enclosureType", "12"); }, finds: ["ds-1"] },
  { name: "type 4X outdoors", source: "Table 110.28", edit: (d) => { set(d, "ds-1", "enclosureType", "4X"); } },
  { name: "type 3R where it is corrosive", source: "Table 110.28: 3R stands no corrosion", edit: (d) => { d.equipment["ds-1"]!.location.corrosive = true; }, finds: ["ds-1"] },
  { name: "type 4X where it is corrosive", source: "Table 110.28", edit: (d) => { d.equipment["ds-1"]!.location.corrosive = true; set(d, "ds-1", "enclosureType", "4X"); } },
  { name: "type 1 moved indoors", source: "Table 110.28: indoor types", edit: (d) => { set(d, "ds-1", "enclosureType", "1"); d.equipment["ds-1"]!.location.exposure = "indoor dry"; } },
  { name: "a panel of type 1 carried outside", source: "Table 110.28", edit: (d) => { d.equipment["pnl-c"]!.location.exposure = "outdoor"; }, finds: ["pnl-c"] },
  { name: "exposure not known", source: "what is not known is asked for", edit: (d) => { d.equipment["ds-1"]!.location.exposure = null; }, asks: ["ds-1"] },
  { name: "type not known", source: "what is not known is asked for", edit: (d) => { set(d, "ds-1", "enclosureType", null); }, asks: ["ds-1"] },
];
