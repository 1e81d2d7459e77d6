import { circuitOf, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "two 45 A breakers on one bus", source: "705.30, section to be verified", edit: () => undefined },
  { name: "unit 2 wired through the terminals of unit 1", source: "705.30, section to be verified", moved: true, edit: (d) => { circuitOf(d, "f3").to = { equipment: "inv-1", port: "ac", offset: 0 }; }, finds: ["inv-1"] },
  { name: "both on one breaker", source: "705.30, section to be verified", moved: true, edit: (d) => { circuitOf(d, "f3").to = { equipment: "cb-i1", port: "load", offset: 0 }; }, finds: ["inv-1"] },
  { name: "straight on the bus", source: "705.30, section to be verified", moved: true, edit: (d) => { circuitOf(d, "f3").to = { equipment: "ic-200", port: "bus", offset: 9 }; }, finds: ["inv-2"] },
  {
    name: "on another panel", source: "common practice, no published source", moved: true,
    edit: (d) => {
      d.equipment["cb-c"] = { ...structuredClone(d.equipment["cb-i2"]!), tag: "CB-C", parent: "pnl-c" };
      d.circuits["j-cb-c"] = { ...structuredClone(Object.values(d.circuits).find((each) => each.wiring === "factory" && each.to.equipment === "cb-i2")!), from: { equipment: "pnl-c", port: "bus", offset: 8 }, to: { equipment: "cb-c", port: "line", offset: 0 } };
      circuitOf(d, "f3").to = { equipment: "cb-c", port: "load", offset: 0 };
    },
    finds: ["inv-2"],
  },
  { name: "a switch without fuses on the way", source: "the breaker still is the unit's own", moved: true, edit: (d) => {
    d.equipment["ds-3"] = { ...structuredClone(d.equipment["ds-2"]!), tag: "DS-3", at: { x: 58, y: 70 } };
    d.circuits["f3b"] = { ...structuredClone(circuitOf(d, "f3")), tag: "F3b", from: { equipment: "ds-3", port: "load", offset: 0 } };
    circuitOf(d, "f3").to = { equipment: "ds-3", port: "line", offset: 0 };
  } },
  { name: "one unit alone", source: "not in parallel", moved: true, edit: (d) => { delete d.circuits["f3"]; } },
];
