import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "120/240 V breakers with the bonding jumper left out", source: "240.85: solidly grounded systems", moved: true,
    edit: (d) => { delete d.bonds["mbj"]; },
    finds: ["util"],
  },
  {
    name: "straight-rated breakers without a bond", source: "240.85: slash ratings alone",
    edit: (d) => { delete d.bonds["mbj"]; for (const one of Object.values(d.equipment)) if (Object.hasOwn(one.props, "slashRated")) one.props.slashRated = false; },
  },
  {
    name: "the bond in place: generator and island are grounded through it", source: "240.85: neutral bonded in every state",
    edit: (d) => { set(d, "cb-n", "slashRated", true); },
  },
  {
    name: "240/120 V delta with a high leg", source: "240.85: 208 V to ground above 120 V",
    edit: (d) => { d.site.serviceSystem = "240/120 V, 4-wire delta with high leg"; for (const one of Object.values(d.equipment)) if (one.props.slashRated === true) one.props.slashRated = one.tag === "CB-S"; },
    finds: ["cb-s"],
  },
  {
    name: "marking not known", source: "a missing marking is asked for",
    edit: (d) => { set(d, "cb-n", "slashRated", null); },
    asks: ["cb-n"],
  },
];
