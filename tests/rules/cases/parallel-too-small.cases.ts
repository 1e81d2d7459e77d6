import { circuitOf, resize, sectionOf, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

function sets(d: Drawing, size: string | null, count = 2): void {
  sectionOf(d, "f4").parallelSets = count;
  resize(d, "f4", size);
  for (const [id, port] of [["cb-l", "load"], ["pnl-c", "bus"]] as const) Object.assign(d.equipment[id]!.ports[port]!.terminal!, { conductorsMost: 2, largest: "300 kcmil" });
  d.raceways["r-4"]!.tradeSize = "2-1/2";
}

export const cases: readonly RuleCase[] = [
  {
    name: "2 × 2 AWG a pole", source: "310.10(G)(1): 1/0 AWG",
    edit: (d) => { sets(d, "2 AWG"); },
    finds: ["f4"],
  },
  {
    name: "2 × 1/0 AWG is the limit", source: "310.10(G)(1): 1/0 AWG",
    edit: (d) => { sets(d, "1/0 AWG"); },
  },
  {
    name: "2 × 1 AWG", source: "310.10(G)(1): 1/0 AWG",
    edit: (d) => { sets(d, "1 AWG"); },
    finds: ["f4"],
  },
  {
    name: "one 1 AWG", source: "310.10(G)(1): conductors joined at both ends",
    edit: (d) => { sets(d, "1 AWG", 1); },
  },
  {
    name: "a second run between the same lugs of two panels", source: "310.10(G)(1): joined at both ends", moved: true,
    edit: (d) => { circuitOf(d, "f4").from = { equipment: "ic-200", port: "bus", offset: 4 }; d.circuits["f4b"] = { ...structuredClone(circuitOf(d, "f4")), tag: "F4B" }; },
    finds: ["f4", "f4b"],
  },
  {
    name: "packs with a device of their own", source: "310.10(G): conductors joined at both ends",
    edit: (d) => { for (const id of ["b1", "b2"]) resize(d, id, "2 AWG"); },
  },
  {
    name: "size not known", source: "a missing size is asked for",
    edit: (d) => { sets(d, null); },
    asks: ["f4"],
  },
];
