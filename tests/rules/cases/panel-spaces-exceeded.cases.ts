import { set, type RuleCase } from "../support";

const poles = (d: Parameters<RuleCase["edit"]>[0], panel: string): number =>
  Object.values(d.equipment).filter((each) => each.parent === panel && each.kind === "breaker" && each.spaces?.length !== 0).reduce((sum, each) => sum + Number(each.props["poles"]), 0);
export const cases: readonly RuleCase[] = [
  { name: "10 of 24 spaces", source: "408.54", edit: () => undefined },
  { name: "as many poles as marked", source: "408.54", edit: (d) => { set(d, "ic-200", "polesMaximum", poles(d, "ic-200")); } },
  { name: "one pole too many", source: "408.54", edit: (d) => { set(d, "ic-200", "polesMaximum", poles(d, "ic-200") - 1); }, finds: ["ic-200"] },
  { name: "two breakers in one space", source: "110.3(B)", moved: true, edit: (d) => { d.equipment["cb-i2"]!.spaces = [...(d.equipment["cb-i1"]!.spaces ?? [])]; }, finds: ["cb-i2"] },
  { name: "a space that is not there", source: "110.3(B)", moved: true, edit: (d) => { d.equipment["cb-i1"]!.spaces = [13, 15]; }, finds: ["cb-i1", "cb-i1"].slice(1) },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "ic-200", "polesMaximum", null); set(d, "ic-200", "spacesTotal", null); }, asks: ["ic-200"] },
];
