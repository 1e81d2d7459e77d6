import type { RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "one jumper at the service, strap out", source: "250.24: one bond", edit: () => undefined },
  {
    name: "strap of the generator left in", source: "250.30(A), 250.142: two bonds", moved: true,
    edit: (d) => { d.bonds["ns-1"]!.fitted = true; },
    finds: ["g-1"],
  },
  {
    name: "bonding jumper left out", source: "250.24: no bond", moved: true,
    edit: (d) => { d.bonds["mbj"]!.fitted = false; },
    finds: ["util"],
  },
  {
    name: "nobody looked at the strap", source: "what is not known is asked for",
    edit: (d) => { d.bonds["ns-1"]!.fitted = null; },
    asks: ["ns-1"],
  },
  {
    name: "a bonding screw in the interconnect cabinet", source: "250.142(B): load side of the service", moved: true,
    edit: (d) => { d.bonds["screw"] = { ...d.bonds["mbj"]!, tag: "BS-1", kind: "bonding screw", equipment: "ic-200" }; },
    finds: ["ic-200"],
  },
];
