import { circuitOf, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "10 kA at 14.4 kA", source: "110.9: 4 × 3.6 kA",
    edit: (d) => { set(d, "cb-d2", "interruptingKA", 10); },
    finds: ["cb-d2"],
  },
  {
    name: "14.4 kA is the limit", source: "4 × 3.6 kA",
    edit: (d) => { set(d, "cb-d2", "interruptingKA", 14.4); },
  },
  {
    name: "rating not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-d2", "interruptingKA", null); },
    asks: ["cb-d2"],
  },
  {
    name: "a pack taken off the bus", source: "3 × 3.6 = 10.8 kA", moved: true,
    edit: (d) => { set(d, "cb-d2", "interruptingKA", 11); delete d.circuits["b4"]; },
  },
  {
    name: "a pack moved onto the bus of a 14.4 kA device", source: "5 × 3.6 = 18 kA", moved: true,
    edit: (d) => { set(d, "cb-d2", "interruptingKA", 14.4); d.equipment["bt-5"] = { ...structuredClone(d.equipment["bt-4"]!), tag: "BT-5" }; d.circuits["b5"] = { ...structuredClone(circuitOf(d, "b4")), tag: "B5", from: { equipment: "bt-5", port: "dc", offset: 0 }, to: { equipment: "db-1", port: "bus", offset: 3 } }; },
    finds: ["cb-d2"],
  },
];
