import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "aluminum service on a CU lug", source: "110.14(A): terminals for aluminum so identified",
    edit: (d) => { d.equipment["mtr-1"]!.ports["line"]!.terminal!.metals = "CU"; },
    finds: ["mtr-1"],
  },
  {
    name: "aluminum service on an AL9CU lug", source: "110.14(A): marked AL9CU",
    edit: (d) => { d.equipment["mtr-1"]!.ports["line"]!.terminal!.metals = "AL9CU"; },
  },
  {
    name: "copper leads on a CU lug", source: "110.14(A)",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.metals = "CU"; },
  },
  {
    name: "copper on a lug marked AL alone", source: "110.14(A): identified for the metal",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.metals = "AL"; },
    finds: ["cb-i2"],
  },
  {
    name: "marking not known", source: "a missing marking is asked for",
    edit: (d) => { d.equipment["mtr-1"]!.ports["line"]!.terminal!.metals = null; },
    asks: ["mtr-1"],
  },
  {
    name: "metal of the wire not known on a CU lug", source: "a missing metal is asked for",
    edit: (d) => { sectionOf(d, "b4").ungrounded!.metal = null; },
    asks: ["b4"],
  },
];
