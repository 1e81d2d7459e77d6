import { type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "edition named", source: "plan review, common practice, no published source", edit: () => undefined },
  { name: "no edition", source: "plan review, common practice, no published source", edit: (d) => { d.sheet.titleBlock.codes = "per NEC"; }, finds: ["util"] },
  { name: "empty", source: "plan review, common practice, no published source", edit: (d) => { d.sheet.titleBlock.codes = ""; }, finds: ["util"] },
  { name: "another edition", source: "plan review, common practice, no published source", edit: (d) => { d.sheet.titleBlock.codes = "NEC 2020"; }, finds: ["util"] },
];
