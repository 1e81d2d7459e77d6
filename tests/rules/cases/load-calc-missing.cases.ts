import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "146.4 A on a 200 A main", source: "Article 220, calculation of the farm system", edit: () => undefined },
  { name: "as much as the main", source: "Article 220", edit: (d) => { d.site.load!.resultA = 200; } },
  { name: "more than the main", source: "Article 220", edit: (d) => { d.site.load!.resultA = 201; }, finds: ["mm-225"] },
  { name: "not worked out", source: "what is not known is asked for", edit: (d) => { d.site.load = null; }, asks: ["mm-225"] },
  { name: "a smaller main", source: "Article 220", edit: (d) => { set(d, "cb-m", "ratingA", 125); }, finds: ["mm-225"] },
  { name: "nothing to feed", source: "no loads on the drawing", moved: true, edit: (d) => { d.site.load = null; for (const [id, each] of Object.entries(d.equipment)) if (each.kind === "load") { delete d.equipment[id]; for (const [circuit, one] of Object.entries(d.circuits)) if ([one.from.equipment, one.to.equipment].includes(id)) delete d.circuits[circuit]; } } },
];
