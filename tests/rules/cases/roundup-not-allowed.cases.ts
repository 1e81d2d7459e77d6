import { resize, sectionOf, set, type RuleCase } from "../support";
import type { Drawing } from "@/lib/diagram/schema";

/** The pump circuit turned into receptacles, with so many current-carrying conductors in its conduit at 40 °C. */
function receptacles(d: Drawing, size: string, carrying: number, use = "receptacles"): void {
  set(d, "p-1", "use", use);
  set(d, "p-1", "horsepower", null);
  set(d, "p-1", "continuous", false);
  d.equipment["p-1"]!.props.phaseV = 240;
  for (const id of ["p1a", "p1b"]) resize(d, id, size);
  for (const stretch of Object.values(d.raceways["r-8"]!.stretches)) stretch.ambientC = 40;
  const other = structuredClone(d.circuits["p1a"]!);
  d.circuits["x1"] = { ...other, tag: "X1", from: { equipment: "pnl-n", port: "bus", offset: 0 }, to: { equipment: "pnl-c", port: "bus", offset: 0 } };
  const section = sectionOf(d, "x1");
  section.ungrounded = { ...section.ungrounded!, count: carrying - 4 };
  section.grounded = null;
}

export const cases: readonly RuleCase[] = [
  {
    name: "12 AWG among seven conductors at 40 °C on 20 A", source: "240.4(B)(1): 30 × .91 × .7 = 19.1 A",
    edit: (d) => { receptacles(d, "12 AWG", 7); },
    finds: ["p1a", "p1b"],
  },
  {
    name: "10 AWG in the same place", source: "240.4(B)(1): 40 × .91 × .7 = 25.5 A",
    edit: (d) => { receptacles(d, "10 AWG", 7); },
  },
  {
    name: "12 AWG among six conductors", source: "240.4(B)(1): 30 × .91 × .8 = 21.8 A",
    edit: (d) => { receptacles(d, "12 AWG", 6); },
  },
  {
    name: "seven conductors to a heater: the next size up is open", source: "240.4(B): 19.1 A, next standard size 20 A",
    edit: (d) => { receptacles(d, "12 AWG", 7, "heating"); },
  },
  {
    name: "a 60 A device is above every rounding", source: "240.4(B): 19.1 A, next standard size 20 A; the rule of device and conductor speaks",
    edit: (d) => { receptacles(d, "12 AWG", 7); set(d, "cb-s", "ratingA", 60); },
  },
  {
    name: "size not known", source: "a missing size is asked for",
    edit: (d) => { receptacles(d, "12 AWG", 7); for (const id of ["p1a", "p1b"]) resize(d, id, null); },
    asks: ["p1a", "p1b"],
  },
  {
    name: "receptacles moved into the crowded conduit", source: "240.4(B)(1): 30 × .91 × .7 = 19.1 A", moved: true,
    edit: (d) => { receptacles(d, "12 AWG", 9); sectionOf(d, "p1b").route = []; sectionOf(d, "p1b").ambientC = 30; },
    finds: ["p1a"],
  },
];
