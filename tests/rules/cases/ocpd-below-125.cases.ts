import { circuitOf, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "40 A on an output of 32.5 A", source: "705.30(B): 1.25 × 32.5 = 40.6 A",
    edit: (d) => { set(d, "cb-i2", "ratingA", 40); },
    finds: ["cb-i2"],
  },
  {
    name: "40 A on an output of 32 A is the limit", source: "1.25 × 32 = 40 A, listed values of inverter breakers",
    edit: (d) => { set(d, "cb-i2", "ratingA", 40); set(d, "inv-2", "continuousA", 32); d.equipment["inv-2"]!.ports["ac"]!.continuousA = 32; },
  },
  {
    name: "7.6 kW at 240 V on 40 A", source: "published example of an inverter breaker: 31.66 A × 1.25 = 39.58 A, 40 A",
    edit: (d) => { set(d, "cb-i2", "ratingA", 40); set(d, "inv-2", "continuousA", 31.66); d.equipment["inv-2"]!.ports["ac"]!.continuousA = 31.66; },
  },
  {
    name: "22 A on a 25 A breaker", source: "published list of inverter breakers: 22 A × 1.25 = 27.5 A",
    edit: (d) => { set(d, "cb-i2", "ratingA", 25); set(d, "inv-2", "continuousA", 22); d.equipment["inv-2"]!.ports["ac"]!.continuousA = 22; },
    finds: ["cb-i2"],
  },
  {
    name: "40 A listed for 100 % on 32.5 A", source: "210.20(A) exception: listed assembly at 100 %",
    edit: (d) => { set(d, "cb-i2", "ratingA", 40); set(d, "cb-i2", "listedHundredPercent", true); },
  },
  {
    name: "pack lead of 100 A on 110 A", source: "706.31(B): 1.25 × 100 = 125 A",
    edit: (d) => { set(d, "cb-b4", "ratingA", 110); },
    finds: ["cb-b4"],
  },
  {
    name: "breaker of a set below 125 % of its current", source: "445.12: other than generator systems, 705.30(B)",
    edit: (d) => { set(d, "g-1", "ratedA", 60); },
  },
  {
    name: "the pump motor on its 20 A breaker", source: "240.4(G): motors by Article 430",
    edit: (d) => { set(d, "p-1", "currentA", 18); },
  },
  {
    name: "rating not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-i2", "ratingA", null); },
    asks: ["cb-i2"],
  },
  {
    name: "output not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "inv-2", "continuousA", null); delete d.equipment["inv-2"]!.ports["ac"]!.continuousA; },
    asks: ["inv-2"],
  },
  {
    name: "the creamery feeder moved to the 60 A breaker", source: "215.3: 1.25 × 36 + 22.3 = 67.3 A", moved: true,
    edit: (d) => { delete d.circuits["f5"]; d.sensors = {}; circuitOf(d, "f4").from = { equipment: "cb-g", port: "load", offset: 0 }; },
    finds: ["cb-g"],
  },
];
