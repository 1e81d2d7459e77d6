import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "100 A for the barn: 245 A of breakers on 225 A", source: "705.12(B): 281.25 > 270, 245 > 225",
    edit: (d) => { set(d, "cb-n", "ratingA", 100); },
    finds: ["mm-225"],
  },
  {
    name: "80 A: exactly 225 A", source: "705.12(B): 225 ≤ 225",
    edit: (d) => { set(d, "cb-n", "ratingA", 80); },
  },
  {
    name: "81 A is above it", source: "226 > 225",
    edit: (d) => { set(d, "cb-n", "ratingA", 81); },
    finds: ["mm-225"],
  },
  {
    name: "inverter breaker moved beside the supply", source: "705.12(B): 206.25 A is above 200 A where the source is not at the opposite end", moved: true,
    edit: (d) => { d.equipment["cb-i1"]!.spaces = [6, 8]; d.equipment["cb-l"]!.spaces = [9, 11]; },
    finds: ["ic-200"],
  },
  {
    name: "bus rating not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "ic-200", "busA", null); },
    asks: ["ic-200"],
  },
  {
    name: "spaces of the inverter breakers not known", source: "the 120 percent path asks for the place",
    edit: (d) => { d.equipment["cb-i1"]!.spaces = null; },
    asks: ["cb-i1"],
  },
];
