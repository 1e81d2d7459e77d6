import { circuitOf, resize, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "10 AWG on 32.5 A", source: "705.28(B): 1.25 × 32.5 = 40.6 A above 35 A",
    edit: (d) => { resize(d, "f3", "10 AWG"); },
    finds: ["f3"],
  },
  {
    name: "8 AWG on 32.5 A", source: "Table 310.16: 50 A",
    edit: (d) => { resize(d, "f3", "8 AWG"); },
  },
  {
    name: "40 A of output needs exactly 50 A", source: "1.25 × 40 = 50 A, 8 AWG 50 A",
    edit: (d) => { set(d, "inv-2", "continuousA", 40); d.equipment["inv-2"]!.ports["ac"]!.continuousA = 40; },
  },
  {
    name: "40.1 A of output is above it", source: "1.25 × 40.1 = 50.1 A",
    edit: (d) => { set(d, "inv-2", "continuousA", 40.1); d.equipment["inv-2"]!.ports["ac"]!.continuousA = 40.1; },
    finds: ["f3"],
  },
  {
    name: "output not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "inv-2", "continuousA", null); delete d.equipment["inv-2"]!.ports["ac"]!.continuousA; },
    asks: ["inv-2"],
  },
  {
    name: "the vat heater moved behind a small wire", source: "67.2 A required, 8 AWG 50 A",
    edit: (d) => { resize(d, "f4", "8 AWG"); },
    finds: ["f4"],
  },
  {
    name: "the same circuit landed on another breaker", source: "1.25 × 32.5 = 40.6 A, 8 AWG 50 A", moved: true,
    edit: (d) => { delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
  },
  {
    name: "a small feeder between both inverters and the service", source: "1.25 × 65 = 81.25 A, 4 AWG 85 A, 6 AWG 65 A",
    edit: (d) => { resize(d, "f1b", "6 AWG"); },
    finds: ["f1b"],
  },
];
