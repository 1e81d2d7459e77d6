import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "240 V switch on 240 V", source: "110.4", edit: () => undefined },
  { name: "120 V switch on 240 V", source: "110.4", edit: (d) => { set(d, "ds-1", "voltageV", 120); }, finds: ["ds-1"] },
  { name: "239 V on 240 V", source: "110.4", edit: (d) => { set(d, "ds-1", "voltageV", 239); }, finds: ["ds-1"] },
  { name: "600 V on 240 V", source: "110.4", edit: (d) => { set(d, "ds-1", "voltageV", 600); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "ds-1", "voltageV", null); }, asks: ["ds-1"] },
];
