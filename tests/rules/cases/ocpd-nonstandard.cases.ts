import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "65 A", source: "240.6(A): 60, 70",
    edit: (d) => { set(d, "cb-n", "ratingA", 65); },
    finds: ["cb-n"],
  },
  {
    name: "70 A", source: "240.6(A): 70",
    edit: (d) => { set(d, "cb-n", "ratingA", 70); },
  },
  {
    name: "a trip of 65 A that can be set", source: "240.6(B): adjustable trips",
    edit: (d) => { set(d, "cb-n", "ratingA", 65); set(d, "cb-n", "trip", "adjustable"); },
  },
  {
    name: "a fuse of 6 A", source: "240.6(A): additional fuse ratings 1, 3, 6, 10, 601 A",
    edit: (d) => { Object.assign(d.equipment["ds-2"]!.props, { fused: true, fuseA: 6 }); },
  },
  {
    name: "a fuse of 7 A", source: "240.6(A): additional fuse ratings 1, 3, 6, 10, 601 A",
    edit: (d) => { Object.assign(d.equipment["ds-2"]!.props, { fused: true, fuseA: 7 }); },
    finds: ["ds-2"],
  },
  {
    name: "a rating printed on the inverter", source: "110.3(B): rating printed on the equipment",
    edit: (d) => { set(d, "cb-i2", "ratingA", 42); for (const id of ["inv-1", "inv-2"]) set(d, id, "maximumOvercurrentA", 42); },
  },
  {
    name: "a PV fuse of 12 A", source: "690.9(B): fuses listed for PV",
    edit: (d) => { d.equipment["fh-1"] = { ...structuredClone(d.equipment["cb-b1"]!), kind: "fuse-holder", tag: "FH-1", parent: null, spaces: null, ports: {}, props: { current: "PV dc", ratingA: 12, poles: 2, markedDc: true } }; },
  },
  {
    name: "rating not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-n", "ratingA", null); },
    asks: ["cb-n"],
  },
];
