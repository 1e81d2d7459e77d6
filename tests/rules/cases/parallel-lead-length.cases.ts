import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "8, 8, 8 and 11.5 ft", source: "instruction page B8",
    edit: (d) => { sectionOf(d, "b4").lengthFt = 11.5; },
    finds: ["b4"],
  },
  {
    name: "8.4 ft is within 5 percent", source: "tolerance 5 % of 8 ft",
    edit: (d) => { sectionOf(d, "b4").lengthFt = 8.4; },
  },
  {
    name: "8.41 ft is not", source: "tolerance 5 % of 8 ft",
    edit: (d) => { sectionOf(d, "b4").lengthFt = 8.41; },
    finds: ["b4"],
  },
  {
    name: "not known", source: "what is not known is asked for",
    edit: (d) => { sectionOf(d, "b4").lengthFt = null; },
    asks: ["b4"],
  },
  {
    name: "the longer lead lands elsewhere", source: "not on this bus any more", moved: true,
    edit: (d) => { sectionOf(d, "b4").lengthFt = 11.5; delete d.circuits[Object.keys(d.circuits).find((id) => id.includes("cb-b4"))!]; },
  },
];
