import { reroute, sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "battery data in the ac nipple", source: "725.136(A)", moved: true,
    edit: (d) => { reroute(d, "k-1", ["n-2"]); },
    finds: ["n-2"],
  },
  {
    name: "battery data in its own conduit", source: "725.136(A)",
    edit: (d) => { reroute(d, "k-1", ["c-1a", "jb-2", "c-1b"]); },
  },
  {
    name: "class not known", source: "a missing class is asked for",
    edit: (d) => { sectionOf(d, "k-1").cable!.class = null; reroute(d, "k-1", ["n-2"]); },
    asks: ["k-1"],
  },
  {
    name: "wired as class 1", source: "725.136: reclassified circuits",
    edit: (d) => { sectionOf(d, "k-1").cable!.class = "class 1"; reroute(d, "k-1", ["n-2"]); },
  },
];
