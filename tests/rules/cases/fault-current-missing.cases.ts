import { set, type RuleCase } from "../support";

/** Source and date in both places where they may stand. */
const without = (d: Parameters<RuleCase["edit"]>[0], source: string | null, on: string | null): void => {
  delete d.equipment["util"]!.sources["availableFaultCurrentA"];
  Object.assign(d.site, { faultCurrentSource: source, faultCurrentOn: on });
};
export const cases: readonly RuleCase[] = [
  {
    name: "10.4 kA, letter of March 12", source: "110.24(A): date of the calculation",
    edit: () => undefined,
  },
  {
    name: "neither source nor date", source: "110.24(A)",
    edit: (d) => { without(d, null, null); },
    finds: ["util"],
  },
  {
    name: "a source without date", source: "110.24(A): date of the calculation",
    edit: (d) => { without(d, "letter", null); },
    finds: ["util"],
  },
  {
    name: "a date without source", source: "common practice, no published source",
    edit: (d) => { without(d, " ", "2026-03-12"); },
    finds: ["util"],
  },
  {
    name: "the letter named at the utility", source: "either place will do",
    edit: (d) => { d.site.faultCurrentSource = null; },
  },
  {
    name: "blank", source: "a missing value is asked for",
    edit: (d) => { set(d, "util", "availableFaultCurrentA", null); d.site.availableFaultCurrentA = null; },
    asks: ["util"],
  },
  {
    name: "the service taken off the utility", source: "no service is drawn", moved: true,
    edit: (d) => { without(d, null, null); delete d.circuits["svc"]; },
  },
];
