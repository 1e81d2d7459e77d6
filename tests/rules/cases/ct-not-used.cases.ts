import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "the second unit reads none while the first reads for both", source: "instruction page H22", edit: () => undefined, open: ["inv-2"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "ct-not-used", "equipment/inv-2", "yes"); }, stated: ["inv-2"] },
  { name: "a loose lead", source: "instruction page H22", edit: (d) => { state(d, "ct-not-used", "equipment/inv-2", "no"); }, finds: ["inv-2"] },
  { name: "both units read sensors", source: "nothing is unused", edit: (d) => { for (const id of ["ct-3", "ct-4"]) d.sensors[id]!.reads = "inv-2"; } },
  { name: "no sensors at all", source: "nothing reads for the group", edit: (d) => { d.sensors = {}; } },
];
