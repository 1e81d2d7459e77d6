import { resize, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "250 kcmil into a lug to 2/0 AWG", source: "110.3(B), 110.14: marked range",
    edit: (d) => { resize(d, "b4", "250 kcmil"); },
    finds: ["bb-4", "cb-b4"],
  },
  {
    name: "2/0 AWG is the upper limit", source: "marked range 4 AWG to 2/0 AWG",
    edit: (d) => { resize(d, "b4", "2/0 AWG"); },
  },
  {
    name: "4 AWG is the lower limit", source: "marked range 4 AWG to 2/0 AWG",
    edit: (d) => { resize(d, "b4", "4 AWG"); },
  },
  {
    name: "6 AWG is below it", source: "marked range 4 AWG to 2/0 AWG",
    edit: (d) => { resize(d, "b4", "6 AWG"); },
    finds: ["bb-4", "cb-b4"],
  },
  {
    name: "range not known", source: "a missing marking is asked for",
    edit: (d) => { d.equipment["cb-b4"]!.ports["load"]!.terminal!.largest = null; },
    asks: ["cb-b4"],
  },
  {
    name: "a conductor below the range of a terminal whose upper end is not known", source: "marked range from 4 AWG",
    edit: (d) => { d.equipment["cb-b4"]!.ports["load"]!.terminal!.largest = null; resize(d, "b4", "6 AWG"); },
    finds: ["bb-4", "cb-b4"],
  },
  {
    name: "size not known", source: "a missing size is asked for",
    edit: (d) => { resize(d, "b4", null); },
    asks: ["b4"],
  },
  {
    name: "array leads have connectors, not terminals", source: "110.14 speaks of terminals",
    edit: (d) => { set(d, "pv-1", "modules", 11); },
  },
];
