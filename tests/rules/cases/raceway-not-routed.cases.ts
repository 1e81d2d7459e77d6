import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "the creamery feeder in no raceway", source: "plan-review item: wiring method of each run", moved: true,
    edit: (d) => { sectionOf(d, "f4").route = []; },
    finds: ["f4"],
  },
  {
    name: "PV wire runs exposed by its kind", source: "690.31(C): single-conductor PV wire in the array",
    edit: () => undefined,
  },
  {
    name: "a jacketed power cable", source: "a cable is a wiring method of its own",
    edit: (d) => { sectionOf(d, "f4").route = []; sectionOf(d, "f4").cable = { type: "MC", class: "power", count: 1, outerDiameterIn: 1.2, voltageRatingV: 600, wetListed: false }; },
  },
];
