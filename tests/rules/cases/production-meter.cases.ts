import { state, type RuleCase } from "../support";

const asked = (d: Parameters<RuleCase["edit"]>[0], separateMeter: "yes" | "no" | null): void => { d.site.requirements = { lockableVisibleSwitch: null, separateMeter, notes: "" }; };
export const cases: readonly RuleCase[] = [
  { name: "not known what the utility asks", source: "utility requirement", edit: (d) => { asked(d, null); }, open: ["util"] },
  { name: "the utility asks for one", source: "utility requirement", edit: (d) => { asked(d, "yes"); }, open: ["util"] },
  { name: "none is wanted", source: "utility requirement", edit: (d) => { asked(d, "no"); } },
  { name: "stated", source: "a statement is repeated, never a pass", edit: (d) => { asked(d, "yes"); state(d, "production-meter", "equipment/util", "yes"); }, stated: ["util"] },
  { name: "not applicable", source: "a statement is repeated, never a pass", edit: (d) => { state(d, "production-meter", "site", "not applicable"); }, stated: ["util"] },
  { name: "asked for and not drawn", source: "utility requirement", edit: (d) => { asked(d, "yes"); state(d, "production-meter", "equipment/util", "no"); }, finds: ["util"] },
  { name: "nothing produces", source: "no inverter on the drawing", edit: (d) => { for (const id of ["inv-1", "inv-2"]) delete d.equipment[id]; for (const [id, each] of Object.entries(d.circuits)) if ([each.from.equipment, each.to.equipment].some((end) => end.startsWith("inv-"))) delete d.circuits[id]; for (const id of ["pvs-1", "pvs-2"]) d.equipment[id]!.parent = null; for (const each of Object.values(d.sensors)) each.reads = null; } },
];
