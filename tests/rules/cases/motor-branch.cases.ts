import { circuitOf, ground, resize, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

function motor(d: Drawing, horsepower: number | null, size: string, ratingA: number): void {
  set(d, "p-1", "horsepower", horsepower);
  set(d, "cb-s", "ratingA", ratingA);
  for (const id of ["p1a", "p1b"]) { resize(d, id, size); ground(d, id, "10 AWG"); }
}

export const cases: readonly RuleCase[] = [
  {
    name: "5 hp at 230 V on 12 AWG", source: "430.22, Table 430.248: 28 A, 35 A needed, 12 AWG 25 A at 75 °C",
    edit: (d) => { motor(d, 5, "12 AWG", 60); },
    finds: ["p1a", "p1b"],
  },
  {
    name: "5 hp on 8 AWG behind 60 A", source: "430.22, 430.52: 35 A needed; 2.5 × 28 = 70 A",
    edit: (d) => { motor(d, 5, "8 AWG", 60); },
  },
  {
    name: "5 hp on 10 AWG is the limit", source: "430.22: 35 A; 10 AWG 35 A at 75 °C",
    edit: (d) => { motor(d, 5, "10 AWG", 70); },
  },
  {
    name: "80 A on 5 hp", source: "430.52: 2.5 × 28 = 70 A is a standard size",
    edit: (d) => { motor(d, 5, "8 AWG", 80); },
    finds: ["cb-s"],
  },
  {
    name: "3 hp: 42.5 A, next standard size 45 A", source: "430.52(C)(1): 2.5 × 17 = 42.5 A",
    edit: (d) => { motor(d, 3, "10 AWG", 45); },
  },
  {
    name: "current as stated where the table has no row", source: "430.6: 1.25 × 24 = 30 A, 12 AWG 25 A",
    edit: (d) => { motor(d, 4, "12 AWG", 50); set(d, "p-1", "currentA", 24); },
    finds: ["p1a", "p1b"],
  },
  {
    name: "neither power nor current known", source: "a missing rating is asked for",
    edit: (d) => { motor(d, null, "12 AWG", 20); set(d, "p-1", "currentA", null); },
    asks: ["p-1"],
  },
  {
    name: "the pump moved to the barn's 80 A breaker", source: "430.52: 2.5 × 8 = 20 A", moved: true,
    edit: (d) => { delete d.circuits["n1"]; circuitOf(d, "p1a").from = { equipment: "cb-n", port: "load", offset: 0 }; },
    finds: ["cb-n"],
  },
];
