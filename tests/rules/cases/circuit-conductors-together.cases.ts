import { reroute, sectionOf, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

function share(d: Drawing, id: string, owner: string): void { Object.assign(sectionOf(d, id), { equipmentGround: null, sharesGroundOf: owner }); }

export const cases: readonly RuleCase[] = [
  {
    name: "inverter circuits share a ground that lies in one of two nipples", source: "300.3(B): all conductors of a circuit together",
    edit: (d) => { share(d, "f3", "f2"); },
    finds: ["f3"],
  },
  {
    name: "both inverter circuits in the same raceways share a ground", source: "250.122(C), 300.3(B)",
    edit: (d) => { share(d, "f3", "f2"); reroute(d, "f3", ["ww-1", "n-3"]); },
  },
  {
    name: "the circuit that holds the ground moved into another raceway", source: "300.3(B)", moved: true,
    edit: (d) => { share(d, "p1b", "p1a"); reroute(d, "p1a", ["r-7"]); },
    finds: ["p1b"],
  },
  {
    name: "two parts of one run share the ground in their conduit", source: "300.3(B)",
    edit: (d) => { share(d, "p1b", "p1a"); },
  },
  {
    name: "the ground of a dc circuit runs apart", source: "250.134 exception: dc circuits",
    edit: (d) => { share(d, "d2", "d1"); },
  },
];
