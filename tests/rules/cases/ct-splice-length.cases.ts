import { sectionOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "16 ft of 33 ft", source: "instruction page H22", edit: () => undefined },
  { name: "120 ft of 33 ft", source: "instruction page H22", edit: (d) => { sectionOf(d, "k-4").lengthFt = 120; }, finds: ["ct-1"] },
  { name: "33 ft is the limit", source: "instruction page H22", edit: (d) => { sectionOf(d, "k-4").lengthFt = 33; } },
  { name: "33.1 ft", source: "instruction page H22", edit: (d) => { sectionOf(d, "k-4").lengthFt = 33.1; }, finds: ["ct-1"] },
  { name: "length not known", source: "what is not known is asked for", edit: (d) => { sectionOf(d, "k-5").lengthFt = null; }, asks: ["k-5"] },
  { name: "neither cable nor length", source: "what is not known is asked for", edit: (d) => { d.sensors["ct-1"]!.lead = null; }, asks: ["ct-1"] },
  { name: "limit not known", source: "what is not known is asked for", edit: (d) => { d.sensors["ct-3"]!.leadLimitFt = null; }, asks: ["ct-3"] },
  { name: "40 ft inside the enclosure", source: "instruction page H22", edit: (d) => { Object.assign(d.sensors["ct-1"]!, { lead: null, leadLengthFt: 40 }); }, finds: ["ct-1"] },
];
