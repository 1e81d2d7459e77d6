import { set, thirdUnit, type RuleCase } from "../support";

const most = (d: Parameters<RuleCase["edit"]>[0], units: number | null): void => { for (const id of ["inv-1", "inv-2"]) set(d, id, "parallelMost", units); };
export const cases: readonly RuleCase[] = [
  { name: "2 units where 4 are allowed", source: "instruction page H30", edit: () => undefined },
  { name: "2 units where 2 are allowed", source: "instruction page H30", edit: (d) => { most(d, 2); } },
  { name: "2 units where one is allowed", source: "instruction page H30", edit: (d) => { most(d, 1); }, finds: ["inv-1"] },
  { name: "a third unit where 2 are allowed", source: "instruction page H30", edit: (d) => { most(d, 2); thirdUnit(d); }, finds: ["inv-1"] },
  { name: "the unit that allows fewest decides", source: "instruction page H30", edit: (d) => { set(d, "inv-2", "parallelMost", 1); }, finds: ["inv-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-2", "parallelMost", null); }, asks: ["inv-2"] },
  { name: "one of two taken off the bus", source: "not in parallel any more", edit: (d) => { most(d, 1); delete d.circuits["f3"]; } },
];
