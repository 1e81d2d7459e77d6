import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, lengthFt, resize, sectionOf, set, type RuleCase } from "../support";

interface Change { feet: number; size: string; endA: number; secondary?: string | null; secondaryV?: number; exposure?: "indoor dry" | "outdoor" }
/** A transformer at the end of the barn feeder, with conductors from its secondary to the barn's main breaker. */
function transform(d: Drawing, { feet, size, endA, secondary = "3-wire, 120/240 V", secondaryV = 240, exposure = "indoor dry" }: Change): void {
  d.equipment["t-1"] = {
    ...structuredClone(d.equipment["ds-1"]!), kind: "transformer", tag: "T-1", ports: {}, sources: {},
    props: { ratedKVA: 25, primaryV: 240, secondaryV, construction: "two windings", secondary },
  };
  circuitOf(d, "n1").to = { equipment: "t-1", port: "primary", offset: 0 };
  d.raceways["r-9"] = { ...structuredClone(d.raceways["r-7"]!), tag: "R-9" };
  d.circuits["n2"] = { ...structuredClone(circuitOf(d, "n1")), tag: "N2", load: null, from: { equipment: "t-1", port: "secondary", offset: 0 }, to: { equipment: "cb-nm", port: "line", offset: 0 } };
  const section = sectionOf(d, "n2");
  section.route = [{ raceway: "r-9", compartment: null }];
  section.lengthFt = feet;
  resize(d, "n2", size);
  lengthFt(d, "r-9", feet);
  for (const stretch of Object.values(d.raceways["r-9"]!.stretches)) stretch.exposure = exposure;
  set(d, "cb-nm", "ratingA", endA);
}

export const cases: readonly RuleCase[] = [
  {
    name: "30 ft of secondary before the first device", source: "240.21(C)(6): 25 ft", moved: true,
    edit: (d) => { transform(d, { feet: 30, size: "3 AWG", endA: 100 }); },
    finds: ["n2"],
  },
  {
    name: "25 ft to one breaker of 100 A", source: "240.21(C)(6): 100 A above 80 / 3, device 100 A",
    edit: (d) => { transform(d, { feet: 25, size: "3 AWG", endA: 100 }); },
  },
  {
    name: "26 ft", source: "240.21(C)(6): 25 ft",
    edit: (d) => { transform(d, { feet: 26, size: "3 AWG", endA: 100 }); },
    finds: ["n2"],
  },
  {
    name: "no next size up: 4 AWG to 90 A", source: "240.21(C): 85 A below 90 A",
    edit: (d) => { transform(d, { feet: 10, size: "4 AWG", endA: 90 }); },
    finds: ["n2"],
  },
  {
    name: "10 ft to one breaker of 50 A", source: "240.21(C)(2): 8 AWG 50 A, 80 / 10 = 8 A",
    edit: (d) => { transform(d, { feet: 10, size: "8 AWG", endA: 50 }); },
  },
  {
    name: "80 A at 240 V count as 160 A at 120 V: a third is 53.3 A", source: "240.21(C)(6)(1): ratio of secondary to primary voltage; 8 AWG 50 A",
    edit: (d) => { transform(d, { feet: 20, size: "8 AWG", endA: 50, secondaryV: 120 }); },
    finds: ["n2"],
  },
  {
    name: "30 ft of a 2-wire secondary within the primary device", source: "240.4(F), 240.21(C)(1): 80 A × 240 / 240 = 80 A, 4 AWG 85 A",
    edit: (d) => { transform(d, { feet: 30, size: "4 AWG", endA: 80, secondary: "2-wire" }); },
  },
  {
    name: "30 ft of a 2-wire secondary above its ampacity", source: "240.21(C)(1): 80 A on 6 AWG, 65 A",
    edit: (d) => { transform(d, { feet: 30, size: "6 AWG", endA: 60, secondary: "2-wire" }); },
    finds: ["n2"],
  },
  {
    name: "30 ft outdoors throughout to one breaker", source: "240.21(C)(4): no limit of length outdoors",
    edit: (d) => { transform(d, { feet: 30, size: "3 AWG", endA: 100, exposure: "outdoor" }); },
  },
  {
    name: "kind of secondary not known", source: "a missing fact is asked for",
    edit: (d) => { transform(d, { feet: 30, size: "3 AWG", endA: 100, secondary: null }); },
    asks: ["t-1"],
  },
];
