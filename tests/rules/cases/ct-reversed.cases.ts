import { state, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "asked once for the sensors of one exchange", source: "instruction pages H22, H23", edit: () => undefined, open: ["ct-1", "ct-3"] },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "ct-reversed", "sensors/ct-1", "yes"); }, open: ["ct-3"], stated: ["ct-1"] },
  { name: "stated for the whole site", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "ct-reversed", "site", "yes"); }, stated: ["ct-1", "ct-3"] },
  { name: "a reversed sign was read", source: "instruction page H22", edit: (d) => { state(d, "ct-reversed", "sensors/ct-1", "no"); }, open: ["ct-3"], finds: ["ct-1"] },
  { name: "turned since: the latest statement counts", source: "the later day", edit: (d) => { state(d, "ct-reversed", "sensors/ct-1", "no", "2026-05-01"); state(d, "ct-reversed", "sensors/ct-1", "yes", "2026-05-02"); }, open: ["ct-3"], stated: ["ct-1"] },
  { name: "sensors that nothing reads", source: "no sign to read", edit: (d) => { for (const id of ["ct-3", "ct-4"]) d.sensors[id]!.reads = null; }, open: ["ct-1"] },
];
