import { set, type RuleCase } from "../support";

const rated = (d: Parameters<RuleCase["edit"]>[0], ratingA: number | null, settingA: number | null = ratingA): void => { for (const id of ["ct-1", "ct-2"]) Object.assign(d.sensors[id]!, { ratingA, settingA }); };
export const cases: readonly RuleCase[] = [
  { name: "200 A on a feeder of 125 A", source: "instruction page H22", edit: () => undefined },
  { name: "100 A on a feeder of 125 A", source: "common practice, no published source", edit: (d) => { rated(d, 100); }, finds: ["ct-1"] },
  { name: "125 A is the limit", source: "device of 125 A", edit: (d) => { rated(d, 125); } },
  { name: "124 A is below it", source: "device of 125 A", edit: (d) => { rated(d, 124); }, finds: ["ct-1"] },
  { name: "moved to the 45 A output of an inverter", source: "device of 45 A", edit: (d) => { rated(d, 50); for (const id of ["ct-1", "ct-2"]) d.sensors[id]!.circuit = "f2"; } },
  { name: "the instrument is set to another sensor", source: "instruction page H22", edit: (d) => { rated(d, 200, 100); }, finds: ["ct-1"] },
  { name: "rating not known", source: "what is not known is asked for", edit: (d) => { rated(d, null, 200); }, asks: ["ct-1", "ct-2"] },
  { name: "setting not known", source: "what is not known is asked for", edit: (d) => { rated(d, 200, null); }, asks: ["ct-1", "ct-2"] },
  { name: "nothing reads it yet: no setting", source: "no instrument", edit: (d) => { rated(d, 200, null); for (const id of ["ct-1", "ct-2"]) d.sensors[id]!.reads = null; } },
  { name: "one device of the feeder is not rated yet", source: "what is not known is asked for", edit: (d) => { set(d, "cb-u", "ratingA", null); }, asks: ["cb-u"] },
];
