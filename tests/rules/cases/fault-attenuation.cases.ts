import { circuitOf, set, type RuleCase } from "../support";

const unplaced = (d: Parameters<RuleCase["edit"]>[0]): void => { delete d.sheet.tables["fault-current"]; };
export const cases: readonly RuleCase[] = [
  {
    name: "10 kA gear 46 ft from 10,400 A, the table not on the sheet", source: "common practice, no published source: 6,350 A shown",
    edit: unplaced,
    finds: ["util"],
  },
  {
    name: "the table on the sheet", source: "common practice, no published source",
    edit: () => undefined,
  },
  {
    name: "service current of 9,880 A: with the inverters exactly the 10 kA of the gear", source: "9,880 A + 2 × 60 A = 10,000 A",
    edit: (d) => { unplaced(d); set(d, "util", "availableFaultCurrentA", 9880); d.site.availableFaultCurrentA = 9880; },
  },
  {
    name: "9,881 A: one ampere more", source: "10,001 A > 10 kA",
    edit: (d) => { unplaced(d); set(d, "util", "availableFaultCurrentA", 9881); d.site.availableFaultCurrentA = 9881; },
    finds: ["util"],
  },
  {
    name: "everything beyond the service taken away", source: "nothing leans on conductors", moved: true,
    edit: (d) => { unplaced(d); for (const id of ["f1a", "n1", "p1a"]) delete d.circuits[id]; },
  },
  {
    name: "the pump fed from the barn", source: "gear beyond conductors all the same", moved: true,
    edit: (d) => { unplaced(d); circuitOf(d, "p1a").from = { equipment: "pnl-n", port: "bus", offset: 1 }; },
    finds: ["util"],
  },
  {
    name: "the service current is not known", source: "a missing value is asked for",
    edit: (d) => { unplaced(d); set(d, "util", "availableFaultCurrentA", null); d.site.availableFaultCurrentA = null; },
    asks: ["util"],
  },
];
