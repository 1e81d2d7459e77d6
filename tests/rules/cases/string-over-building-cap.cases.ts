import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "14 modules: 609.2 V over the local 600 V", source: "county ordinance OC-2: 600 V",
    edit: (d) => { set(d, "pv-1", "modules", 14); },
    finds: ["s1"],
  },
  {
    name: "the same without the amendment in an accessory building", source: "690.7: 1,000 V in other buildings",
    edit: (d) => { d.site.amendments = {}; set(d, "pv-1", "modules", 14); },
  },
  {
    name: "the same in a dwelling", source: "690.7: 600 V",
    edit: (d) => { d.site.amendments = {}; d.site.occupancy = "one- or two-family dwelling"; set(d, "pv-1", "modules", 14); },
    finds: ["s1"],
  },
  {
    name: "not on a building", source: "690.7: off buildings no such limit",
    edit: (d) => { for (const id of ["pv-1", "pv-2", "pv-3", "pv-4"]) set(d, id, "mounting", "ground, no building"); set(d, "pv-1", "modules", 14); d.site.amendments = {}; d.site.occupancy = "ground-mounted, no building"; },
  },
  {
    name: "609.2 V and the occupancy not known", source: "600 V or 1,000 V: the occupancy decides",
    edit: (d) => { d.site.amendments = {}; d.site.occupancy = null; set(d, "pv-1", "modules", 14); },
    asks: ["pv-1"],
  },
  {
    name: "the string moved off its circuit", source: "a string that is not connected reaches no building circuit", moved: true,
    edit: (d) => { d.site.amendments = {}; d.site.occupancy = "one- or two-family dwelling"; set(d, "pv-1", "modules", 14); delete d.circuits["s1"]; },
  },
];
