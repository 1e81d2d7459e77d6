import { type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "every terminal used", source: "completeness, common practice, no published source", edit: () => undefined },
  { name: "a string taken off its switch", source: "completeness, common practice, no published source", moved: true, edit: (d) => { for (const [id, each] of Object.entries(d.circuits)) if (each.from.equipment === "pv-1") delete d.circuits[id]; }, finds: ["pvs-1"] },
  { name: "the same, marked spare", source: "completeness, common practice, no published source", edit: (d) => { for (const [id, each] of Object.entries(d.circuits)) { if (each.from.equipment !== "pv-1") continue; d.equipment[each.to.equipment]!.ports[each.to.port] = { spare: true }; delete d.circuits[id]; } } },
];
