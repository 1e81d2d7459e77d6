import { circuitOf, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

/** Strings joined at a combiner without fuses, each on its own leads. */
function combine(d: Drawing, strings: readonly string[]): void {
  const like = structuredClone(d.equipment["pv-1"]!);
  d.equipment["box"] = { ...structuredClone(d.equipment["db-1"]!), kind: "combiner", tag: "CX-1", props: { busA: 100, voltageV: 1000, shortCircuitKA: 10 }, ports: {} };
  for (const [i, circuit] of strings.entries()) {
    if (!d.equipment[`pv-${i + 1}`]) d.equipment[`pv-${i + 1}`] = { ...like };
    circuitOf(d, circuit).to = { equipment: "box", port: "bus", offset: i };
  }
}

export const cases: readonly RuleCase[] = [
  {
    name: "inverter cable landed on the dc bus without its breaker", source: "240.21(H), 706.31(A): four packs of 125 A, 250 kcmil permits 300 A at most", moved: true,
    edit: (d) => { circuitOf(d, "d2").from = { equipment: "db-1", port: "bus", offset: 1 }; },
    finds: ["d2"],
  },
  {
    name: "three packs of 125 A behind the same cable", source: "Table 310.16: 250 kcmil copper 255 A at 75 °C, next standard size 300 A; 3 × 125 = 375 A",
    edit: (d) => { circuitOf(d, "d2").from = { equipment: "db-1", port: "bus", offset: 1 }; for (const id of ["b4", "d1"]) delete d.circuits[id]; },
    finds: ["d2"],
  },
  {
    name: "two packs of 125 A behind the same cable", source: "Table 310.16: 250 kcmil copper 255 A at 75 °C; 2 × 125 = 250 A",
    edit: (d) => { circuitOf(d, "d2").from = { equipment: "db-1", port: "bus", offset: 1 }; for (const id of ["b3", "b4", "d1"]) delete d.circuits[id]; },
  },
  {
    name: "pack lead landed on the dc bus: the other three feed it", source: "706.31(A): sources at both ends, 3 × 125 A on 1 AWG", moved: true,
    edit: (d) => { circuitOf(d, "b4").to = { equipment: "db-1", port: "bus", offset: 5 }; },
    finds: ["b4"],
  },
  {
    name: "inverter output landed on the cabinet's bus without a breaker", source: "705.30: 125 A, 60 A and 45 A devices feed the bus, 8 AWG permits 50 A", moved: true,
    edit: (d) => { circuitOf(d, "f3").to = { equipment: "ic-200", port: "bus", offset: 10 }; },
    finds: ["f3"],
  },
  {
    name: "rating of a feeding breaker not known", source: "a missing rating is asked for",
    edit: (d) => { circuitOf(d, "d2").from = { equipment: "db-1", port: "bus", offset: 1 }; set(d, "cb-b1", "ratingA", null); },
    asks: ["cb-b1"],
  },
  {
    name: "inverter end of a cable protected at the bus", source: "690.9(A), 705.30: the end limited by the converter needs none",
    edit: (d) => { set(d, "cb-d2", "ratingA", 225); },
  },
  {
    name: "conductors of a set landed on the bus: its own breaker protects them", source: "445.12: generator terminals",
    edit: (d) => { circuitOf(d, "f5").to = { equipment: "ic-200", port: "bus", offset: 3 }; },
  },
  {
    name: "service conductors from the utility to the meter", source: "705.11, 230.90: supply side",
    edit: (d) => { set(d, "cb-m", "ratingA", 175); },
  },
  {
    name: "a panel fed by lugs from a breaker of its own", source: "240.21(B): a feeder protected where it gets its supply",
    edit: (d) => { set(d, "cb-l", "ratingA", 110); },
  },
  {
    name: "two strings together without fuses", source: "690.9(A): one other string, 17.6 A on 10 AWG",
    edit: (d) => { combine(d, ["s1", "s2"]); },
  },
  {
    name: "four strings together: the module fuse rating is the rule of strings", source: "690.9(A)(1): 3 × 17.6 = 52.7 A above 25 A is string-ocpd-missing",
    edit: (d) => { combine(d, ["s1", "s2", "s4", "s3"]); },
  },
  {
    name: "three other strings above the conductors, within a large module fuse", source: "690.9(A)(1): 3 × 1.25 × 14.05 = 52.7 A on 10 AWG, 35 A",
    edit: (d) => { combine(d, ["s1", "s2", "s4", "s3"]); for (const id of ["pv-1", "pv-2", "pv-3", "pv-4"]) set(d, id, "seriesFuseA", 60); },
    finds: ["s1", "s2", "s3", "s4"],
  },
  {
    name: "three other strings of small modules", source: "690.9(A)(1): 3 × 1.25 × 9 = 33.8 A on 10 AWG, 35 A",
    edit: (d) => { combine(d, ["s1", "s2", "s4", "s3"]); for (const id of ["pv-1", "pv-2", "pv-3", "pv-4"]) { set(d, id, "seriesFuseA", 60); set(d, id, "shortCircuitA", 9); } },
  },
];
