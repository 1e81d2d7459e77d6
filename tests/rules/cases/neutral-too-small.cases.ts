import { circuitOf, sectionOf, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

const neutral = (d: Drawing, id: string, size: string | null): void => { sectionOf(d, id).grounded = { ...sectionOf(d, id).grounded!, size }; };
/** Two 120 V loads in the panel of the creamery. */
function loads120(d: Drawing, first: number | null, second: number): void {
  for (const [id, amperes] of [["l-3", first], ["l-4", second]] as const) { set(d, id, "phaseV", 120); set(d, id, "powerKW", null); set(d, id, "currentA", amperes); }
}

export const cases: readonly RuleCase[] = [
  {
    name: "14 AWG neutral on the 60 A generator feeder", source: "215.2(A)(1), Table 250.122: 60 A asks for 10 AWG",
    edit: (d) => { neutral(d, "f5", "14 AWG"); },
    finds: ["f5"],
  },
  {
    name: "10 AWG is the floor", source: "Table 250.122: 60 A 10 AWG",
    edit: (d) => { neutral(d, "f5", "10 AWG"); },
  },
  {
    name: "service on 250 kcmil aluminum with a 4 AWG neutral", source: "Table 250.102(C)(1): over 1/0 to 3/0 copper or 250 kcmil aluminum, 2 AWG aluminum",
    edit: (d) => { neutral(d, "svc", "4 AWG"); },
    finds: ["svc"],
  },
  {
    name: "service with a 2 AWG aluminum neutral", source: "Table 250.102(C)(1): 2 AWG aluminum",
    edit: (d) => { neutral(d, "svc", "2 AWG"); },
  },
  {
    name: "120 V loads of 80 and 60 A behind a 6 AWG neutral", source: "220.61: 80 A on one leg at least, 6 AWG 65 A",
    edit: (d) => { loads120(d, 80, 60); neutral(d, "f4", "6 AWG"); },
    finds: ["f4"],
  },
  {
    name: "120 V loads of 65 and 65 A behind a 6 AWG neutral", source: "220.61: 65 A a leg, 6 AWG 65 A",
    edit: (d) => { loads120(d, 65, 65); neutral(d, "f4", "6 AWG"); },
  },
  {
    name: "current of a 120 V load not known", source: "a missing value is asked for",
    edit: (d) => { loads120(d, null, 60); },
    asks: ["l-3"],
  },
  {
    name: "size of the neutral not known", source: "a missing size is asked for",
    edit: (d) => { neutral(d, "f5", null); },
    asks: ["f5"],
  },
  {
    name: "the inverter's small neutral moved under a 125 A device", source: "Table 250.122: 125 A asks for 6 AWG, not above the circuit's 8 AWG", moved: true,
    edit: (d) => { neutral(d, "f3", "10 AWG"); delete d.circuits["f4"]; circuitOf(d, "f3").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["f3"],
  },
];
