import { reroute, sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "strings cross into the ac trough", source: "690.31(B)", moved: true,
    edit: (d) => { reroute(d, "s3", ["jb-1", "r-s", "ww-2", "ww-1", "n-5"], "s2"); },
    finds: ["ww-1"],
  },
  {
    name: "a fixed divider parts them", source: "690.31(B): partition",
    edit: (d) => { d.raceways["ww-1"]!.compartments = { c1: { order: 0, name: "A", widthIn: 3 }, c2: { order: 1, name: "B", widthIn: 3 } }; reroute(d, "s3", ["jb-1", "r-s", "ww-2", "ww-1", "n-5"], "s2"); sectionOf(d, "s3", "s2").route = sectionOf(d, "s3", "s2").route.map((step) => (step.raceway === "ww-1" ? { ...step, compartment: "c2" } : step)); },
  },
  {
    name: "compartment of a string in a divided trough not said", source: "what is not known is asked for",
    edit: (d) => { d.raceways["ww-1"]!.compartments = { c1: { order: 0, name: "A", widthIn: 3 }, c2: { order: 1, name: "B", widthIn: 3 } }; sectionOf(d, "s3", "s2").route = [{ raceway: "ww-1", compartment: null }]; },
    asks: ["s3"],
  },
];
