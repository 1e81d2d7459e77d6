import { reroute, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "nine 10 AWG in 1/2 in EMT", source: "Chapter 9 Tables 4, 5: .190 of .304 in², 62 %",
    edit: (d) => { d.raceways["r-s"]!.tradeSize = "1/2"; },
    finds: ["r-s"],
  },
  {
    name: "nine 10 AWG in 3/4 in EMT", source: ".190 of .533 in², 36 % of 40 %",
    edit: (d) => { d.raceways["r-s"]!.tradeSize = "3/4"; },
  },
  {
    name: "trade size not known", source: "a missing size is asked for",
    edit: (d) => { d.raceways["r-s"]!.tradeSize = null; },
    asks: ["r-s"],
  },
  {
    name: "the creamery feeder moved into R-5", source: ".519 + .173 of .832 in², 83 %", moved: true,
    edit: (d) => { reroute(d, "f4", ["r-5"]); },
    finds: ["r-5"],
  },
];
