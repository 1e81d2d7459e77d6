import { circuitOf, set, type RuleCase } from "../support";

type Edit = Parameters<RuleCase["edit"]>[0];
/** The barn breaker leans on the main: 10 kA at 10,520 A, series rating 22 kA behind family LK. */
function leaning(d: Edit, change: Record<string, string | number | boolean | null> = {}): void {
  set(d, "cb-n", "interruptingKA", 10);
  Object.assign(d.equipment["cb-n"]!.props, { seriesKA: 22, seriesWith: "LK", seriesMarked: true, ...change });
}
export const cases: readonly RuleCase[] = [
  {
    name: "tested pair, marked; a pump and a chiller between them", source: "240.86, 110.22(C); 8 A + 12.5 A ≤ 1 % of 10 kA = 100 A",
    edit: (d) => { leaning(d); },
  },
  {
    name: "the marking names another family", source: "240.86(B): tested combination",
    edit: (d) => { leaning(d, { seriesWith: "RS" }); },
    finds: ["cb-n"],
  },
  {
    name: "not marked on the equipment", source: "110.22(C)",
    edit: (d) => { leaning(d, { seriesMarked: false }); },
    finds: ["cb-n"],
  },
  {
    name: "motors of exactly 1 %", source: "240.86(C): 1 % of 10 kA = 100 A",
    edit: (d) => { leaning(d); set(d, "p-1", "currentA", 87.5); },
  },
  {
    name: "motors above 1 %: the pump and the chiller of 12.5 A", source: "240.86(C): 87.6 A + 12.5 A > 100 A",
    edit: (d) => { leaning(d); set(d, "p-1", "currentA", 87.6); },
    finds: ["cb-n"],
  },
  {
    name: "the pump moved beyond the leaning breaker", source: "240.86(C): motors on the line side of the lower-rated breaker", moved: true,
    edit: (d) => { leaning(d); set(d, "p-1", "currentA", 120); circuitOf(d, "p1b").from = { equipment: "pnl-n", port: "bus", offset: 1 }; },
  },
  {
    name: "a motor's current is not known", source: "what is not known is asked for",
    edit: (d) => { leaning(d); set(d, "p-1", "currentA", null); },
    asks: ["p-1"],
  },
  {
    name: "whether it is marked is not known", source: "what is not known is asked for",
    edit: (d) => { leaning(d, { seriesMarked: null }); },
    asks: ["cb-n"],
  },
  {
    name: "nobody said behind which device", source: "what is not known is asked for",
    edit: (d) => { leaning(d, { seriesWith: null }); },
    asks: ["cb-n"],
  },
  {
    name: "the full rating carries the current: the series rating is not used", source: "240.86 applies to devices below the current",
    edit: (d) => { leaning(d, { seriesWith: "RS", seriesMarked: false, interruptingKA: 10.52 }); },
  },
];
