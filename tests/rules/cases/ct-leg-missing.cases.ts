import type { RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "a sensor on each leg", source: "instruction pages H22, H23", edit: () => undefined },
  { name: "L1 alone", source: "instruction page H22", edit: (d) => { delete d.sensors["ct-2"]; }, finds: ["ct-1"] },
  { name: "both on L1", source: "instruction page H22", edit: (d) => { d.sensors["ct-2"]!.pole = "L1"; }, finds: ["ct-1"] },
  { name: "the instruction lets one sensor measure all", source: "some products measure 240 V with one sensor", edit: (d) => { delete d.sensors["ct-2"]; d.sensors["ct-1"]!.covers = "all conductors"; } },
  { name: "not known what one sensor measures", source: "what is not known is asked for", edit: (d) => { delete d.sensors["ct-2"]; d.sensors["ct-1"]!.covers = null; }, asks: ["ct-1"] },
  { name: "the leg is not known", source: "what is not known is asked for", edit: (d) => { d.sensors["ct-2"]!.pole = null; }, asks: ["ct-2"] },
  { name: "the two legs of one feeder measured at two places", source: "one exchange, the same current", moved: true, edit: (d) => { d.sensors["ct-2"]!.circuit = "f1a"; } },
  { name: "the second sensor moved to the generator", source: "instruction page H22", moved: true, edit: (d) => { Object.assign(d.sensors["ct-2"]!, { circuit: "f5", purpose: "generator exchange" }); }, finds: ["ct-1"] },
  {
    name: "a 120 V branch has one leg", source: "one ungrounded conductor",
    edit: (d) => { delete d.sensors["ct-2"]; d.equipment["l-4"]!.props.phaseV = 120; Object.assign(d.sensors["ct-1"]!, { purpose: "load", circuit: Object.keys(d.circuits).find((id) => d.circuits[id]?.to.equipment === "l-4") }); },
  },
];
