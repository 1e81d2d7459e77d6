import type { RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "“tighten firmly” in place of a value", source: "110.14(D): a torque value as marked or instructed",
    edit: (d) => { Object.assign(d.equipment["cb-i2"]!.ports["load"]!.terminal!, { torqueLbfIn: null, torqueSource: "tighten firmly" }); },
    finds: ["cb-i2"],
  },
  {
    name: "a value of which nobody says where it stands", source: "110.14(D): as indicated on the equipment or in the instructions",
    edit: (d) => { d.equipment["cb-i2"]!.ports["load"]!.terminal!.torqueSource = " "; },
    finds: ["cb-i2"],
  },
  {
    name: "a value from the default table, named as such", source: "Informative Annex I, Table I.1: 8 AWG 40 lbf·in",
    edit: (d) => { Object.assign(d.equipment["cb-i2"]!.ports["load"]!.terminal!, { torqueLbfIn: 40, torqueSource: "default, Annex I" }); },
  },
  {
    name: "nothing read yet", source: "a missing value is asked for",
    edit: (d) => { Object.assign(d.equipment["cb-i2"]!.ports["load"]!.terminal!, { torqueLbfIn: null, torqueSource: null }); },
    asks: ["cb-i2"],
  },
];
