import { circuitOf, resize, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

/** Vehicle supply equipment in the place of the pump, its circuit on the breaker named. */
function charger(d: Drawing, setA: number | null, ratingA: number | null, breaker = "cb-s"): void {
  const pump = d.equipment["p-1"]!;
  d.equipment["p-1"] = { ...pump, kind: "vehicle-charger", tag: "EV-1", props: { currentA: setA, phaseV: 240, continuous: true, managed: false }, sources: {} };
  set(d, breaker, "ratingA", ratingA);
  for (const id of ["p1a", "p1b"]) resize(d, id, "6 AWG");
}

export const cases: readonly RuleCase[] = [
  {
    name: "48 A on 50 A", source: "625.41: 1.25 × 48 = 60 A",
    edit: (d) => { charger(d, 48, 50); },
    finds: ["cb-s"],
  },
  {
    name: "48 A on 60 A", source: "625.41: 60 A",
    edit: (d) => { charger(d, 48, 60); },
  },
  {
    name: "set to 40 A on 50 A", source: "625.41: 1.25 × 40 = 50 A",
    edit: (d) => { charger(d, 40, 50); },
  },
  {
    name: "set to 41 A on 50 A", source: "625.41: 1.25 × 41 = 51.3 A",
    edit: (d) => { charger(d, 41, 50); },
    finds: ["cb-s"],
  },
  {
    name: "setting not known", source: "a missing setting is asked for",
    edit: (d) => { charger(d, null, 50); },
    asks: ["p-1"],
  },
  {
    name: "rating of the breaker not known", source: "a missing rating is asked for",
    edit: (d) => { charger(d, 48, null); },
    asks: ["cb-s"],
  },
  {
    name: "the unit moved to the 80 A breaker of the barn, set to 65 A", source: "625.41: 1.25 × 65 = 81.3 A", moved: true,
    edit: (d) => { charger(d, 65, 20); delete d.circuits["n1"]; circuitOf(d, "p1a").from = { equipment: "cb-n", port: "load", offset: 0 }; },
    finds: ["cb-n"],
  },
];
