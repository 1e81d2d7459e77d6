import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "200 A ahead of 200 A", source: "110.3(B)", edit: () => undefined },
  { name: "199 A ahead of 200 A", source: "110.3(B)", edit: (d) => { set(d, "mtr-1", "ratingA", 199); }, finds: ["mtr-1"] },
  { name: "320 A class", source: "110.3(B)", edit: (d) => { set(d, "mtr-1", "ratingA", 320); } },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "mtr-1", "ratingA", null); }, asks: ["mtr-1"] },
];
