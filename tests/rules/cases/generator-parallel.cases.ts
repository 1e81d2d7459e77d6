import { set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  { name: "a listed generator mode", source: "705.40, datasheet H27", edit: () => undefined },
  { name: "not listed", source: "705.40, 110.3(B)", edit: (d) => { set(d, "inv-1", "listedGeneratorMode", false); }, finds: ["inv-1"] },
  { name: "not known", source: "what is not known is asked for", edit: (d) => { set(d, "inv-1", "listedGeneratorMode", null); }, asks: ["inv-1"] },
  { name: "the set taken off the bus", source: "nothing runs beside it", edit: (d) => { set(d, "inv-1", "listedGeneratorMode", false); for (const [id, each] of Object.entries(d.circuits)) if ([each.from.equipment, each.to.equipment].includes("cb-gs") && each.wiring === "field") delete d.circuits[id]; } },
];
