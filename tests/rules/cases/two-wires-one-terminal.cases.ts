import { circuitOf, sectionOf, set, type RuleCase } from "../support";

export const cases: readonly RuleCase[] = [
  {
    name: "two sets of the feeder under the screws of a breaker for one conductor", source: "110.14(A): one conductor unless identified for more",
    edit: (d) => { sectionOf(d, "f4").parallelSets = 2; d.equipment["cb-l"]!.ports["load"]!.terminal!.conductorsMost = 1; d.equipment["pnl-c"]!.ports["bus"]!.terminal!.conductorsMost = 2; },
    finds: ["cb-l"],
  },
  {
    name: "two in lugs marked for two", source: "110.14(A): identified for more",
    edit: (d) => { sectionOf(d, "f4").parallelSets = 2; d.equipment["cb-l"]!.ports["load"]!.terminal!.conductorsMost = 2; d.equipment["pnl-c"]!.ports["bus"]!.terminal!.conductorsMost = 2; },
  },
  {
    name: "three in lugs marked for two", source: "110.14(A): identified for more",
    edit: (d) => { sectionOf(d, "f4").parallelSets = 3; for (const [id, port] of [["cb-l", "load"], ["pnl-c", "bus"]] as const) d.equipment[id]!.ports[port]!.terminal!.conductorsMost = 2; },
    finds: ["cb-l", "pnl-c"],
  },
  {
    name: "nobody read what the lugs are for", source: "a missing marking is asked for",
    edit: (d) => { sectionOf(d, "f4").parallelSets = 2; },
    asks: ["cb-l", "pnl-c"],
  },
  {
    name: "one conductor needs no marking", source: "110.14(A): one conductor",
    edit: (d) => { d.equipment["cb-l"]!.ports["load"]!.terminal!.conductorsMost = 1; },
  },
  {
    name: "two circuits on the lugs of one bus stand at terminals of their own", source: "110.14(A): each terminal by itself",
    edit: (d) => { d.equipment["db-1"]!.ports["bus"] = structuredClone(d.equipment["cb-d1"]!.ports["load"]!); for (const id of ["d1", "d2"]) circuitOf(d, id).from = { equipment: "db-1", port: "bus", offset: 2 }; set(d, "cb-d1", "ratingA", 250); },
  },
];
