import { home, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "14 kW", source: "445.19(B): above 15 kW", edit: () => undefined },
  { name: "15 kW", source: "445.19(B): above 15 kW", edit: (d) => { set(d, "g-1", "outputKW", 15); set(d, "g-1", "stopOnEnclosure", false); } },
  { name: "15.1 kW without a stop", source: "445.19(B)", edit: (d) => { set(d, "g-1", "outputKW", 15.1); set(d, "g-1", "stopOnEnclosure", false); }, finds: ["g-1"] },
  { name: "22 kW with a stop", source: "445.19(B)", edit: (d) => { set(d, "g-1", "outputKW", 22); set(d, "g-1", "stopOnEnclosure", true); } },
  { name: "at a dwelling", source: "445.19(B): not one- and two-family dwellings", edit: (d) => { home(d); set(d, "g-1", "outputKW", 22); set(d, "g-1", "stopOnEnclosure", false); } },
  { name: "stop not known", source: "what is not known is asked for", edit: (d) => { set(d, "g-1", "outputKW", 22); set(d, "g-1", "stopOnEnclosure", null); }, asks: ["g-1"] },
  { name: "output not known", source: "what is not known is asked for", edit: (d) => { set(d, "g-1", "outputKW", null); }, asks: ["g-1"] },
];
