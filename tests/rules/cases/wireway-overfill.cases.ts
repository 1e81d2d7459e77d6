import { reroute, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "all into a 2 × 2 in trough", source: "376.22(A): .954 of 4 in², 23.9 % above 20 %",
    edit: (d) => { d.raceways["ww-1"]!.widthIn = 2; d.raceways["ww-1"]!.heightIn = 2; },
    finds: ["ww-1"],
  },
  {
    name: "2 × 2.5 in", source: ".954 of 5 in², 19.1 %",
    edit: (d) => { d.raceways["ww-1"]!.widthIn = 2; d.raceways["ww-1"]!.heightIn = 2.5; },
  },
  {
    name: "width not known", source: "a missing size is asked for",
    edit: (d) => { d.raceways["ww-1"]!.widthIn = null; },
    asks: ["ww-1"],
  },
  {
    name: "battery leads moved into a small ac trough", source: ".954 + .492 of 5 in², 29 %", moved: true,
    edit: (d) => { d.raceways["ww-1"]!.widthIn = 2; d.raceways["ww-1"]!.heightIn = 2.5; reroute(d, "b1", ["ww-1"]); },
    finds: ["ww-1"],
  },
];
