import type { Drawing } from "@/lib/diagram/schema";
import { circuitOf, lengthFt, resize, sectionOf, set, type RuleCase } from "../support";

/** Takes the feeder to the barn from the bus of the meter-main, behind its 200 A device. */
function tap(d: Drawing, size: string, feet: number, endA: number, exposure: "indoor dry" | "outdoor" = "indoor dry"): void {
  circuitOf(d, "n1").from = { equipment: "mm-225", port: "bus", offset: 6 };
  resize(d, "n1", size);
  sectionOf(d, "n1").lengthFt = feet;
  lengthFt(d, "r-7", feet);
  for (const stretch of Object.values(d.raceways["r-7"]!.stretches)) stretch.exposure = exposure;
  set(d, "cb-nm", "ratingA", endA);
}

export const cases: readonly RuleCase[] = [
  {
    name: "6 AWG of 22 ft behind 200 A", source: "240.21(B)(2): 65 A below 200 / 3 = 66.7 A", moved: true,
    edit: (d) => { tap(d, "6 AWG", 22, 60); },
    finds: ["n1"],
  },
  {
    name: "4 AWG of 22 ft behind 200 A", source: "240.21(B)(2): 85 A above 66.7 A",
    edit: (d) => { tap(d, "4 AWG", 22, 80); },
  },
  {
    name: "25 ft is the limit", source: "240.21(B)(2): 25 ft",
    edit: (d) => { tap(d, "4 AWG", 25, 80); },
  },
  {
    name: "26 ft indoors", source: "240.21(B)(2): 25 ft",
    edit: (d) => { tap(d, "4 AWG", 26, 80); },
    finds: ["n1"],
  },
  {
    name: "26 ft outdoors throughout", source: "240.21(B)(5): no limit of length",
    edit: (d) => { tap(d, "4 AWG", 26, 80, "outdoor"); },
  },
  {
    name: "no next size up: 4 AWG to a 90 A device", source: "240.4(E), 240.21(B): 85 A below 90 A",
    edit: (d) => { tap(d, "4 AWG", 22, 90); },
    finds: ["n1"],
  },
  {
    name: "10 ft with a tenth of the device", source: "240.21(B)(1): 8 AWG 50 A, 200 / 10 = 20 A",
    edit: (d) => { tap(d, "8 AWG", 10, 50); },
  },
  {
    name: "100 A device at the end of 3 AWG, 10 ft behind 200 A", source: "published feeder-tap example: 100 A device, 3 AWG copper 100 A at 75 °C",
    edit: (d) => { tap(d, "3 AWG", 10, 100); },
  },
  {
    name: "11 ft is no short tap", source: "240.21(B)(1): 10 ft; 50 A below 66.7 A",
    edit: (d) => { tap(d, "8 AWG", 11, 50); },
    finds: ["n1"],
  },
  {
    name: "20 ft to a panel without a main device", source: "240.21(B)(2): must end in one device", moved: true,
    edit: (d) => { tap(d, "4 AWG", 20, 80); circuitOf(d, "n1").to = { equipment: "pnl-n", port: "bus", offset: 0 }; },
    finds: ["n1"],
  },
  {
    name: "a tap taken from a tap", source: "published example of a second tap from tap conductors; 240.21(B)", moved: true,
    edit: (d) => {
      tap(d, "1/0 AWG", 9, 80);
      circuitOf(d, "n1").to = { equipment: "pnl-n", port: "bus", offset: 0 };
      delete d.circuits["p1b"];
      circuitOf(d, "p1a").from = { equipment: "pnl-n", port: "bus", offset: 1 };
      circuitOf(d, "p1a").to = { equipment: "cb-s", port: "load", offset: 0 };
      d.equipment["l-5"] = { ...structuredClone(d.equipment["l-1"]!), parent: null };
      for (const joint of Object.values(d.circuits)) if (joint.to.equipment === "cb-s" && joint.wiring === "factory") { joint.from = { equipment: "cb-s", port: "line", offset: 0 }; joint.to = { equipment: "l-5", port: "line", offset: 0 }; }
    },
    finds: ["p1a"],
  },
  {
    name: "taken from the bus ahead of every device", source: "230.90, 705.11: supply-side conductors have distances of their own",
    edit: (d) => { tap(d, "6 AWG", 22, 60); set(d, "cb-f1", "ratingA", 60); for (const id of ["f1a", "cb-m", "j-mtr-1-load-cb-m-line", "j-cb-m-load-mm-225-bus"]) { delete d.circuits[id]; delete d.equipment[id]; } d.circuits["j-main"] = { ...structuredClone(circuitOf(d, "svc")), wiring: "factory", sections: {}, from: { equipment: "mtr-1", port: "load", offset: 0 }, to: { equipment: "mm-225", port: "bus", offset: 0 } }; },
  },
  {
    name: "motors tapped from the bus follow their own article", source: "430.28: motor taps",
    edit: (d) => { circuitOf(d, "p1a").from = { equipment: "mm-225", port: "bus", offset: 6 }; },
  },
  {
    name: "length not known", source: "a missing length is asked for",
    edit: (d) => { tap(d, "4 AWG", 22, 80); sectionOf(d, "n1").lengthFt = null; },
    asks: ["n1"],
  },
  {
    name: "conductors of the feeder's own ampacity", source: "240.21(B)(1): 3/0 AWG 200 A is protected by the device ahead",
    edit: (d) => { tap(d, "600 kcmil", 110, 100); },
  },
];
