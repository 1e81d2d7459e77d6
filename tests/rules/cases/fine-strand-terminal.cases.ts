import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "flexible cable in a box lug", source: "110.14: conductors more finely stranded than class B and C",
    edit: (d) => { d.equipment["cb-d2"]!.ports["load"]!.terminal!.fineStrand = false; },
    finds: ["cb-d2"],
  },
  {
    name: "the same cable on lugs listed for it", source: "110.14: identified for the class of strands",
    edit: (d) => { d.equipment["cb-d2"]!.ports["load"]!.terminal!.fineStrand = true; },
  },
  {
    name: "class C in the same box lug", source: "110.14: more finely stranded than class B and C",
    edit: (d) => { d.equipment["cb-d2"]!.ports["load"]!.terminal!.fineStrand = false; sectionOf(d, "d2").ungrounded!.strands = "class C"; },
  },
  {
    name: "nobody read what the lug is for", source: "a missing marking is asked for",
    edit: (d) => { d.equipment["cb-d2"]!.ports["load"]!.terminal!.fineStrand = null; },
    asks: ["cb-d2"],
  },
  {
    name: "strands of a battery lead not known", source: "a missing fact is asked for",
    edit: (d) => { d.equipment["cb-d2"]!.ports["load"]!.terminal!.fineStrand = false; sectionOf(d, "d2").ungrounded!.strands = null; },
    asks: ["d2"],
  },
  {
    name: "building wire in a breaker", source: "110.14: class B strands",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.fineStrand = false; },
  },
];
