import type { RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "two breakers of one name", source: "unique reference designations, common practice",
    edit: (d) => { d.equipment["cb-l"]!.tag = "CB-G"; },
    finds: ["cb-l"],
  },
  {
    name: "case and blanks do not part them", source: "unique reference designations, common practice",
    edit: (d) => { d.equipment["cb-l"]!.tag = " cb-g "; },
    finds: ["cb-l"],
  },
  {
    name: "unlike", source: "unique reference designations, common practice",
    edit: () => undefined,
  },
];
