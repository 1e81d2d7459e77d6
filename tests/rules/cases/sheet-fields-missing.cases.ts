import { type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "filled in", source: "plan review, common practice, no published source", edit: () => undefined },
  { name: "no designer", source: "plan review, common practice, no published source", edit: (d) => { d.sheet.titleBlock.designedBy = " "; }, finds: ["util"] },
  { name: "no permit number yet", source: "the office gives it", edit: (d) => { d.sheet.titleBlock.permitNumber = ""; } },
];
