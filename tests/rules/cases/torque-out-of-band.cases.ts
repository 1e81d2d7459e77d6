import type { Drawing, Torque } from "@/lib/diagram/schema";
import type { RuleCase } from "../support";

function record(d: Drawing, change: Partial<Torque>): void {
  d.torques = { "t1": { equipment: "cb-b4", port: "load", specifiedLbfIn: 106, achievedLbfIn: 106, tolerancePercent: null, tool: "wrench 3", toolDueOn: "2026-12-01", on: "2026-05-02", by: "field crew", ...change } };
}

export const cases: readonly RuleCase[] = [
  {
    name: "106 lbf·in asked for, 35 recorded", source: "110.14(D): value as instructed",
    edit: (d) => { record(d, { achievedLbfIn: 35 }); },
    finds: ["cb-b4"],
  },
  {
    name: "106 recorded", source: "110.14(D)",
    edit: (d) => { record(d, { achievedLbfIn: 106 }); },
  },
  {
    name: "116.6 is 10 % above", source: "common practice, no published source: 10 %",
    edit: (d) => { record(d, { achievedLbfIn: 116.6 }); },
  },
  {
    name: "116.7 is more", source: "common practice, no published source: 10 %",
    edit: (d) => { record(d, { achievedLbfIn: 116.7 }); },
    finds: ["cb-b4"],
  },
  {
    name: "112 outside the 5 % that the maker states", source: "110.14(D): 106 ± 5.3 lbf·in",
    edit: (d) => { record(d, { achievedLbfIn: 112, tolerancePercent: 5 }); },
    finds: ["cb-b4"],
  },
  {
    name: "value reached not written down", source: "a missing value is asked for",
    edit: (d) => { record(d, { achievedLbfIn: null }); },
    asks: ["cb-b4"],
  },
  {
    name: "nothing recorded yet", source: "110.14(D): the record of the field alone is judged",
    edit: (d) => { d.torques = {}; },
  },
];
