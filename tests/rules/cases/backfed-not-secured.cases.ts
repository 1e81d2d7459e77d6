import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, set, type RuleCase } from "../support";

/** Lands the inverter on the service panel, where no switch holds an island, in place of the barn feeder. */
function onService(d: Drawing): void {
  delete d.circuits["n1"];
  circuitOf(d, "f3").to = { equipment: "cb-n", port: "load", offset: 0 };
}

export const cases: readonly RuleCase[] = [
  {
    name: "plug-on breaker of an inverter that goes on in island, no clip", source: "408.36(D), 710.15(E)",
    edit: (d) => { set(d, "cb-i2", "mount", "plug-on"); },
    finds: ["cb-i2"],
  },
  {
    name: "with its hold-down kit", source: "408.36(D): an additional fastener",
    edit: (d) => { set(d, "cb-i2", "mount", "plug-on with hold-down"); },
  },
  {
    name: "bolted on", source: "408.36(D): more than a pull",
    edit: (d) => { set(d, "cb-i2", "mount", "bolt-on"); },
  },
  {
    name: "inverter listed interactive only", source: "705.12: waiver for listed interactive sources",
    edit: (d) => { set(d, "cb-i2", "mount", "plug-on"); set(d, "inv-2", "listedStandAlone", false); },
  },
  {
    name: "inverter that follows the voltage of another source", source: "705.12: waiver for listed interactive sources",
    edit: (d) => { set(d, "cb-i2", "mount", "plug-on"); const inverter = d.equipment["inv-2"]!; inverter.kind = "string-inverter"; inverter.props = { continuousA: 32.5, outputV: 240, maximumOvercurrentA: 50, trackers: 2 }; delete inverter.ports["battery"]; delete d.circuits["d2"]; inverter.sources = {}; },
  },
  {
    name: "plug-on breaker fed from the bus", source: "408.36(D): back-fed devices alone",
    edit: (d) => { set(d, "cb-l", "mount", "plug-on"); },
  },
  {
    name: "set on a plug-on breaker", source: "408.36(D): supply conductors of a generator", moved: true,
    edit: (d) => { circuitOf(d, "f4").from = { equipment: "cb-g", port: "load", offset: 0 }; circuitOf(d, "f5").to = { equipment: "cb-l", port: "load", offset: 0 }; },
    finds: ["cb-l"],
  },
  {
    name: "the same inverter on the service panel goes dark with the utility", source: "705.12: waiver; no island there", moved: true,
    edit: onService,
  },
  {
    name: "plug-on main of the barn panel", source: "408.36(D): back-fed main terminating the supply conductors",
    edit: (d) => { set(d, "cb-nm", "mount", "plug-on"); const main = circuitOf(d, "n1"); main.to = { equipment: "cb-nm", port: "load", offset: 0 }; for (const joint of Object.values(d.circuits)) if (joint.wiring === "factory" && joint.from.equipment === "cb-nm") joint.from.port = "line"; },
    finds: ["cb-nm"],
  },
  {
    name: "the feeder breaker of the service, with the set behind the interlock and the inverters behind the contactor", source: "705.12: waiver; the interlock keeps the set away",
    edit: (d) => { set(d, "cb-f1", "mount", "plug-on"); },
  },
  {
    name: "mounting not known", source: "a missing fact is asked for",
    edit: (d) => { set(d, "cb-i2", "mount", null); },
    asks: ["cb-i2"],
  },
  {
    name: "not known whether the inverter goes on in island", source: "a missing listing is asked for",
    edit: (d) => { set(d, "cb-i2", "mount", "plug-on"); set(d, "inv-2", "listedStandAlone", null); },
    asks: ["inv-2"],
  },
];
