import { circuitOf, resize, sectionOf, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

/** Two runs of 1/0 AWG between the lugs of the cabinet and of the panel. */
function two(d: Drawing): void {
  circuitOf(d, "f4").from = { equipment: "ic-200", port: "bus", offset: 4 };
  resize(d, "f4", "1/0 AWG");
  sectionOf(d, "f4").lengthFt = 8;
  d.circuits["f4b"] = { ...structuredClone(circuitOf(d, "f4")), tag: "F4B" };
}

export const cases: readonly RuleCase[] = [
  {
    name: "8 ft and 11 ft", source: "310.10(G)(2)(1): same length", moved: true,
    edit: (d) => { two(d); sectionOf(d, "f4b").lengthFt = 11; },
    finds: ["f4"],
  },
  {
    name: "both 8 ft", source: "310.10(G)(2)",
    edit: (d) => { two(d); },
  },
  {
    name: "another size", source: "310.10(G)(2)(3): same size",
    edit: (d) => { two(d); resize(d, "f4b", "2/0 AWG"); },
    finds: ["f4"],
  },
  {
    name: "copper and aluminum", source: "310.10(G)(2)(2): same material",
    edit: (d) => { two(d); sectionOf(d, "f4b").ungrounded!.metal = "Al"; },
    finds: ["f4"],
  },
  {
    name: "another insulation", source: "310.10(G)(2)(4): same insulation",
    edit: (d) => { two(d); sectionOf(d, "f4b").ungrounded!.insulation = "XHHW-2"; },
    finds: ["f4"],
  },
  {
    name: "leads of packs with devices of their own", source: "310.10(G): conductors joined at both ends",
    edit: (d) => { sectionOf(d, "b4").lengthFt = 11; },
  },
  {
    name: "length not known", source: "a missing length is asked for",
    edit: (d) => { two(d); sectionOf(d, "f4b").lengthFt = null; },
    asks: ["f4b"],
  },
];
