import { reroute, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "R-S flat on the roof in 33 °C: 33 °C more", source: "310.15(B)(2), 2023: 33 °C adder below 3/4 in; 66 °C gives .58, 8 conductors .70: 16.2 A below 17.56 A",
    edit: (d) => { Object.values(d.raceways["r-s"]!.stretches)[0]!.aboveRoofIn = 0.25; },
    finds: ["s1", "s2", "s3", "s4"],
  },
  {
    name: "R-S on 1 in stand-offs", source: "310.15(B)(2): no adder from 3/4 in",
    edit: (d) => { Object.values(d.raceways["r-s"]!.stretches)[0]!.aboveRoofIn = 1; },
  },
  {
    name: "feeder crowded into the PV conduit", source: "Table 310.15(C)(1): 10 conductors 50 %: 55 × .91 × .5 = 25 A under a 45 A device", moved: true,
    edit: (d) => { reroute(d, "f3", ["r-s"]); },
    finds: ["f3"],
  },
  {
    name: "ambient along the PV conduit not known", source: "a missing value is asked for",
    edit: (d) => { for (const stretch of Object.values(d.raceways["r-s"]!.stretches)) stretch.ambientC = null; d.raceways["r-s"]!.location.ambientC = null; },
    asks: ["r-s"],
  },
];
