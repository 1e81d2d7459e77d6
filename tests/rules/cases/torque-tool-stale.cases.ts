import type { Drawing, Torque } from "@/lib/diagram/schema";
import type { RuleCase } from "../support";

function record(d: Drawing, change: Partial<Torque>): void {
  d.torques = { "t1": { equipment: "cb-b4", port: "load", specifiedLbfIn: 106, achievedLbfIn: 106, tolerancePercent: null, tool: "wrench 3", toolDueOn: "2026-12-01", on: "2026-05-02", by: "field crew", ...change } };
}

export const cases: readonly RuleCase[] = [
  {
    name: "due on March 1, used on May 2", source: "common practice, no published source: the tool is in date on the day of use",
    edit: (d) => { record(d, { toolDueOn: "2026-03-01" }); },
    finds: ["cb-b4"],
  },
  {
    name: "used on the last day", source: "common practice, no published source",
    edit: (d) => { record(d, { toolDueOn: "2026-05-02" }); },
  },
  {
    name: "used on the day after", source: "common practice, no published source",
    edit: (d) => { record(d, { toolDueOn: "2026-05-01" }); },
    finds: ["cb-b4"],
  },
  {
    name: "no tool named: another approved means", source: "110.14(D), 2020 on: an approved means",
    edit: (d) => { record(d, { tool: "", toolDueOn: null }); },
  },
  {
    name: "end of the calibration not written down", source: "a missing date is asked for",
    edit: (d) => { record(d, { toolDueOn: null }); },
    asks: ["cb-b4"],
  },
];
