import { lengthFt, reroute, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "three 8 and one 10 AWG with two Cat 6 in 1/2 in", source: ".229 of .304 in², 75 % above 60 %",
    edit: (d) => { d.raceways["n-2"]!.tradeSize = "1/2"; reroute(d, "k-1", ["n-2"]); reroute(d, "k-2", ["n-2"]); },
    finds: ["n-2"],
  },
  {
    name: "the same in 3/4 in", source: ".229 of .533 in², 43 %",
    edit: (d) => { d.raceways["n-2"]!.tradeSize = "3/4"; reroute(d, "k-1", ["n-2"]); reroute(d, "k-2", ["n-2"]); },
  },
  {
    name: "N-3 in 1-1/4 in", source: ".954 of 1.496 in², 64 %",
    edit: (d) => { d.raceways["n-3"]!.tradeSize = "1-1/4"; },
    finds: ["n-3"],
  },
  {
    name: "N-3 in 1-1/2 in", source: ".954 of 2.036 in², 47 %",
    edit: (d) => { d.raceways["n-3"]!.tradeSize = "1-1/2"; },
  },
  {
    name: "length not known", source: "a missing length is asked for",
    edit: (d) => { lengthFt(d, "n-3", null); },
    asks: ["n-3"],
  },
  {
    name: "25 in is no nipple any more", source: "Chapter 9 Table 1 note 4: 24 in at most",
    edit: (d) => { d.raceways["n-3"]!.tradeSize = "1-1/4"; lengthFt(d, "n-3", 25 / 12); },
  },
  {
    name: "battery leads moved into one nipple", source: "1.97 of 3.356 in², 58.6 %", moved: true,
    edit: (d) => { for (const id of ["b1", "b2", "b3", "b4"]) reroute(d, id, ["n-6", "ww-3", "n-10"]); },
  },
  {
    name: "the creamery feeder moved into N-2", source: ".131 + .519 of .864 in², 75 %", moved: true,
    edit: (d) => { reroute(d, "f4", ["n-2"]); },
    finds: ["n-2"],
  },
];
