import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, resize, set, type RuleCase } from "../support";

/** The service stands at a dwelling; the barn feeder feeds a part of it. */
function dwelling(d: Drawing, size: string, ratingA: number): void {
  d.site.occupancy = "one- or two-family dwelling";
  resize(d, "n1", size);
  set(d, "cb-n", "ratingA", ratingA);
}

export const cases: readonly RuleCase[] = [
  {
    name: "200 A to a part of the load on 2/0 AWG, service on 400 kcmil", source: "310.12(B): entire load of one dwelling; 2/0 copper 175 A",
    edit: (d) => { dwelling(d, "2/0 AWG", 200); resize(d, "svc", "400 kcmil"); },
    finds: ["cb-n"],
  },
  {
    name: "200 A on 3/0 AWG", source: "Table 310.16: 3/0 copper 200 A",
    edit: (d) => { dwelling(d, "3/0 AWG", 200); resize(d, "svc", "400 kcmil"); },
  },
  {
    name: "a feeder as large as the service conductors", source: "310.12(C): need not be larger than the service conductors; 250 kcmil aluminum 205 A, 4/0 copper 230 A",
    edit: (d) => { dwelling(d, "4/0 AWG", 250); resize(d, "svc", "250 kcmil"); },
  },
  {
    name: "90 A is below the 83 % rule's range", source: "310.12: 100 through 400 A",
    edit: (d) => { dwelling(d, "4 AWG", 90); },
  },
  {
    name: "no dwelling", source: "310.12: dwellings alone",
    edit: (d) => { dwelling(d, "2/0 AWG", 200); resize(d, "svc", "400 kcmil"); d.site.occupancy = "commercial building"; },
  },
  {
    name: "size not known", source: "a missing size is asked for",
    edit: (d) => { dwelling(d, "2/0 AWG", 200); resize(d, "n1", null); },
    asks: ["n1"],
  },
  {
    name: "the feeder to a part moved under the 200 A breaker of the interconnect feeder", source: "310.12(B): 2/0 copper 175 A", moved: true,
    edit: (d) => { dwelling(d, "2/0 AWG", 80); resize(d, "svc", "400 kcmil"); set(d, "cb-f1", "ratingA", 200); for (const id of ["f1a", "f1b"]) resize(d, id, "4/0 AWG"); d.equipment["cb-f1"]!.ports["load"]!.terminal!.largest = "250 kcmil"; d.equipment["cb-nm"]!.ports["line"]!.terminal!.largest = "250 kcmil"; const end = circuitOf(d, "n1").from; circuitOf(d, "n1").from = circuitOf(d, "f1a").from; circuitOf(d, "f1a").from = end; },
    finds: ["cb-f1"],
  },
];
