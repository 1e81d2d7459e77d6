import { ground, resize, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

/** An outdoor unit in the place of the pump. */
function unit(d: Drawing, minimumCircuitA: number | null, size: string): void {
  set(d, "p-1", "use", "air conditioning or refrigeration");
  Object.assign(d.equipment["p-1"]!.props, { minimumCircuitA, maximumOvercurrentA: 45 });
  set(d, "cb-s", "ratingA", 40);
  for (const id of ["p1a", "p1b"]) { resize(d, id, size); ground(d, id, "10 AWG"); }
}

export const cases: readonly RuleCase[] = [
  {
    name: "28 A minimum on 14 AWG", source: "440.4(B), 440.35: 14 AWG 20 A at 75 °C",
    edit: (d) => { unit(d, 28, "14 AWG"); },
    finds: ["p1a", "p1b"],
  },
  {
    name: "28 A minimum on 10 AWG behind 40 A, 45 A maximum", source: "440.4(B), 240.4(G): 35 A at 75 °C",
    edit: (d) => { unit(d, 28, "10 AWG"); },
  },
  {
    name: "25 A on 12 AWG is the limit", source: "440.4(B): 12 AWG 25 A at 75 °C",
    edit: (d) => { unit(d, 25, "12 AWG"); },
  },
  {
    name: "25.1 A is above it", source: "440.4(B): 12 AWG 25 A at 75 °C",
    edit: (d) => { unit(d, 25.1, "12 AWG"); },
    finds: ["p1a", "p1b"],
  },
  {
    name: "marking not known", source: "a missing marking is asked for",
    edit: (d) => { unit(d, null, "12 AWG"); },
    asks: ["p-1"],
  },
  {
    name: "wired at the factory inside its panel", source: "440.4(B): field conductors alone",
    edit: (d) => { set(d, "l-2", "minimumCircuitA", null); },
  },
];
