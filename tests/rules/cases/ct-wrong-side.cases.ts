import type { RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "exchange sensors on the loads feeder", source: "instruction page H22", moved: true,
    edit: (d) => { for (const id of ["ct-1", "ct-2"]) d.sensors[id]!.circuit = "f4"; },
    finds: ["ct-1"],
  },
  {
    name: "generator sensors on the utility side", source: "instruction page H23", moved: true,
    edit: (d) => { for (const id of ["ct-3", "ct-4"]) d.sensors[id]!.circuit = "f1b"; },
    finds: ["ct-3"],
  },
  {
    name: "arrow turned", source: "instruction page H22",
    edit: (d) => { d.sensors["ct-1"]!.arrow = "to"; },
    finds: ["ct-1"],
  },
  {
    name: "purpose not said", source: "what is not known is asked for",
    edit: (d) => { d.sensors["ct-1"]!.purpose = null; },
    asks: ["ct-1"],
  },
  {
    name: "in place", source: "instruction pages H22, H23",
    edit: () => undefined,
  },
];
