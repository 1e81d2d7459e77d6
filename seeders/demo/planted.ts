import type { Circuit, Drawing, Raceway, RouteStep } from "@/lib/diagram/schema";
import { cleanDrawing } from "./cleanDrawing";

/** One mistake as its owner drew it. The words say what was done, not what is wrong with it. */
export interface Planted { number: number; title: string; edit: (drawing: Drawing) => void }

const step = (raceway: string): RouteStep => ({ raceway, compartment: raceway.startsWith("ww-") ? "c1" : null });
const circuit = (drawing: Drawing, id: string): Circuit => drawing.circuits[id] as Circuit;
function reroute(drawing: Drawing, id: string, section: string, raceways: readonly string[]): void {
  const found = circuit(drawing, id).sections[section];
  if (found) found.route = raceways.map(step);
}
function set(drawing: Drawing, equipment: string, name: string, value: number | string): void {
  const found = drawing.equipment[equipment];
  if (found) found.props[name] = value;
}
const POWER_WAY = ["n-2", "ww-1", "n-1"] as const;
function dataByPower(drawing: Drawing): void {
  reroute(drawing, "k-1", "s1", ["c-1a", "jb-2", "c-6", ...POWER_WAY]);
  reroute(drawing, "k-2", "s1", [...POWER_WAY]);
}

export const PLANTED: readonly Planted[] = [
  { number: 1, title: "S3 and S4 cross from the PV wireway into the ac wireway", edit: (drawing) => {
    const like = drawing.raceways["n-5"] as Raceway;
    drawing.raceways["n-14"] = { ...structuredClone(like), tag: "N-14", from: "ww-2", to: "ww-1", offSheet: true };
    like.from = "ww-1";
    for (const id of ["s3", "s4"]) reroute(drawing, id, "s2", ["jb-1", "r-s", "ww-2", "n-14", "ww-1", "n-5"]);
  } },
  { number: 2, title: "N-2 is 1/2 in and the data cables go by it", edit: (drawing) => {
    (drawing.raceways["n-2"] as Raceway).tradeSize = "1/2";
    dataByPower(drawing);
  } },
  { number: 3, title: "K-1 and K-2 run with the inverter output", edit: dataByPower },
  { number: 4, title: "CB-I2 is 60 A", edit: (drawing) => set(drawing, "cb-i2", "ratingA", 60) },
  { number: 5, title: "IL-1 is left out", edit: (drawing) => { delete drawing.interlocks["il-1"]; } },
  { number: 6, title: "CB-N is 100 A", edit: (drawing) => set(drawing, "cb-n", "ratingA", 100) },
  { number: 7, title: "String 1 has 14 modules", edit: (drawing) => set(drawing, "pv-1", "modules", 14) },
  { number: 8, title: "INV-2 runs firmware 4.1.8", edit: (drawing) => set(drawing, "inv-2", "firmware", "4.1.8") },
  { number: 9, title: "B4 is 11.5 ft", edit: (drawing) => { const s1 = circuit(drawing, "b4").sections["s1"]; if (s1) s1.lengthFt = 11.5; } },
  { number: 10, title: "CB-D2 interrupts 10 kA", edit: (drawing) => set(drawing, "cb-d2", "interruptingKA", 10) },
  { number: 11, title: "The strap of G-1 is left in", edit: (drawing) => { const strap = drawing.bonds["ns-1"]; if (strap) strap.fitted = true; } },
  { number: 12, title: "CT-1 and CT-2 are drawn on F4", edit: (drawing) => {
    for (const id of ["ct-1", "ct-2"]) { const sensor = drawing.sensors[id]; if (sensor) { sensor.circuit = "f4"; sensor.at = { x: 70, y: 23 }; } }
  } },
];

/** A copy of a drawing with the mistakes of the given numbers. @throws RangeError for a number that is not in the list */
export function plant(drawing: Drawing, numbers: readonly number[]): Drawing {
  const copy = structuredClone(drawing);
  for (const number of numbers) {
    const found = PLANTED.find((each) => each.number === number);
    if (!found) throw new RangeError(`no mistake has number ${number}`);
    found.edit(copy);
  }
  return copy;
}

/** The demo as its owner first drew it: all twelve. With the second mistake in it, the third adds nothing. */
export const plantedDrawing = (): Drawing => plant(cleanDrawing(), PLANTED.map((each) => each.number));
