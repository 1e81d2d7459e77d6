import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, set, type RuleCase } from "../support";

/** Puts a fuse holder into the first string. */
function fuse(d: Drawing, markedDc: boolean | null): void {
  const like = d.equipment["cb-b1"]!;
  d.equipment["fh-1"] = { ...structuredClone(like), kind: "fuse-holder", tag: "FH-1", parent: null, spaces: null, ports: {}, props: { current: "PV dc", ratingA: 25, poles: 2, interruptingKA: 20, voltageV: 600, markedDc } };
  const lead = circuitOf(d, "s2");
  d.circuits["s2b"] = { ...structuredClone(lead), tag: "S2b", from: { equipment: "fh-1", port: "load", offset: 0 } };
  lead.to = { equipment: "fh-1", port: "line", offset: 0 };
}

export const cases: readonly RuleCase[] = [
  {
    name: "a 240 V ac device in the place of a dc breaker", source: "110.3(B): marking for dc",
    edit: (d) => { set(d, "cb-d2", "markedDc", false); set(d, "cb-d2", "voltageV", 240); },
    finds: ["cb-d2"],
  },
  {
    name: "48 V dc on a bank of 58 V", source: "110.3(B), 706.31(C): largest voltage of the packs 58 V",
    edit: (d) => { set(d, "cb-d2", "voltageV", 48); },
    finds: ["cb-d2"],
  },
  {
    name: "58 V dc is the limit", source: "largest voltage of the packs 58 V",
    edit: (d) => { set(d, "cb-d2", "voltageV", 58); },
  },
  {
    name: "no pack on the bus: the inverter's window decides", source: "110.3(B): battery window to 60 V",
    edit: (d) => { for (const id of ["b1", "b2", "b3", "b4"]) delete d.circuits[id]; set(d, "cb-d2", "voltageV", 58); },
    finds: ["cb-d2"],
  },
  {
    name: "marking not known", source: "a missing marking is asked for",
    edit: (d) => { set(d, "cb-d2", "markedDc", null); },
    asks: ["cb-d2"],
  },
  {
    name: "voltage not known", source: "a missing rating is asked for",
    edit: (d) => { set(d, "cb-d2", "voltageV", null); },
    asks: ["cb-d2"],
  },
  {
    name: "ac breakers need no dc marking", source: "110.3(B): dc circuits alone",
    edit: (d) => { set(d, "cb-i2", "markedDc", false); },
  },
  {
    name: "an ac fuse in a string", source: "690.9(B): listed for PV dc",
    edit: (d) => { fuse(d, false); },
    finds: ["fh-1"],
  },
  {
    name: "a dc fuse in a string", source: "690.9(B): listed for PV dc",
    edit: (d) => { fuse(d, true); },
  },
];
