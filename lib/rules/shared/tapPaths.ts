import { shown, type Step } from "@/lib/calc";
import { stretchesOf, type End } from "@/lib/diagram/graph";
import type { CheckContext } from "@/lib/rules/engine/types";
import { correctedAmpacity, deviceRatingA, terminalsOf, wireOf } from "./conductors";
import { circuitRef, nameOf, racewayRef, type Reader } from "./outcome";
import { topology } from "./topology";

/** What the tap ends in: one device, equipment with devices of its own, or neither. */
export interface TapEnd { kind: "device" | "equipment" | "none"; id: string; ratingA: number | null }
function tapEnd(context: CheckContext, id: string, other: End, reader: Reader): TapEnd {
  const [run, more] = topology(context.graph).runs(id, other);
  if (!run || more) return { kind: "none", id: "", ratingA: null };
  if (run.device !== null) {
    const ratingA = deviceRatingA(context, run.device);
    if (ratingA === null) reader.number(run.device, topology(context.graph).ratingField(run.device) ?? "ratingA");
    return { kind: "device", id: run.device, ratingA };
  }
  const at = run.node.split("/")[0] ?? "";
  return run.stop === "bus" ? { kind: "equipment", id: at, ratingA: reader.number(at, "busA") } : { kind: "none", id: at, ratingA: null };
}
function isOutdoors(context: CheckContext, id: string, reader: Reader): boolean {
  const exposures = context.graph.sections(id).flatMap((section) => section.route.flatMap((step) => {
    const raceway = context.drawing.raceways[step.raceway];
    return raceway ? stretchesOf(raceway).map((stretch) => ({ step: step.raceway, at: stretch.id, exposure: stretch.exposure ?? raceway.location.exposure })) : [];
  }));
  for (const one of exposures) if (one.exposure === null) reader.ask(racewayRef(one.step), `stretches.${one.at}.exposure`, `surroundings of ${nameOf(context, racewayRef(one.step))}`);
  return exposures.length > 0 && exposures.every((one) => one.exposure === "outdoor" || one.exposure === "underground" || one.exposure === "roof");
}

const outermost = (context: CheckContext, equipment: string): string => context.graph.enclosures(equipment).at(-1) ?? equipment;
/** Answer to the lengths and shares of 240.21(B) or (C). `neededA`: ampacity that would do, where the size is what is wrong. */
export interface Judged { ok: boolean; variant: string; says: string; steps: Step[]; neededA: number | null }
/** What a tap or a secondary starts from: the end at which it runs on, a third and a tenth of the device ahead as they count at its own voltage, and whether it is taken from a tap. */
export interface TapStart { other: End; thirdA: number; tenthA: number; shortFt: number; longFt: number; fromTap: boolean }
export function judgeTap(context: CheckContext, id: string, start: TapStart, amperes: number, reader: Reader): Judged | null {
  const end = tapEnd(context, id, start.other, reader);
  const sections = context.graph.sections(id);
  for (const section of sections) if (section.lengthFt === null) reader.ask(circuitRef(id), `sections.${section.id}.lengthFt`, `length of ${nameOf(context, circuitRef(id))}`);
  const outside = isOutdoors(context, id, reader);
  if (!reader.complete) return null;
  const feet = sections.reduce((sum, section) => sum + (section.lengthFt ?? 0), 0);
  // The tenth and the raceway are asked for only where the tap leaves the enclosure it starts in.
  const circuit = context.drawing.circuits[id];
  const leaves = !circuit || outermost(context, circuit.from.equipment) !== outermost(context, circuit.to.equipment);
  const enclosed = !leaves || sections.every((section) => section.route.length > 0 || section.cable !== null);
  const [third, tenth] = [start.thirdA, leaves ? start.tenthA : 0];
  const line = (symbol: string, expression: string, substituted: string, holds: boolean): Step => ({ symbol, expression, substituted, result: holds ? "passes" : "fails", unit: "" });
  const toEnd = end.ratingA !== null && amperes >= end.ratingA - 1e-9;
  const single = end.kind === "device" && toEnd;
  const ten = feet <= start.shortFt && end.kind !== "none" && toEnd && enclosed && amperes >= tenth - 1e-9;
  const twentyFive = feet <= start.longFt && single && enclosed && amperes >= third - 1e-9;
  const steps = [
    line("10 ft", "length to 10 ft, ampacity not below the rating at the end and 1/10 of the device", `${feet} ft; ${shown(amperes, 1)} A, ${end.ratingA ?? "no"} A at the end, ${shown(tenth, 1)} A`, ten),
    line("25 ft", "length to 25 ft, one device at the end, ampacity not below 1/3 of the device", `${feet} ft; ${shown(amperes, 1)} A, ${shown(third, 1)} A`, twentyFive),
    line("outside", "outdoors throughout, one device at the end within the ampacity", outside ? "outdoors" : "not outdoors throughout", outside && single),
  ];
  if (start.fromTap) return { ok: false, variant: "tap-from-tap", says: "it is taken from conductors that are a tap themselves", steps, neededA: null };
  if (ten || twentyFive || (outside && single)) return { ok: true, variant: "", says: "", steps, neededA: null };
  if (end.kind === "none" || (end.kind === "equipment" && feet > start.shortFt)) return { ok: false, variant: "no-single-device", says: `it is ${feet} ft long and does not end in one device`, steps, neededA: null };
  if (!enclosed) return { ok: false, variant: "not-in-raceway", says: "it must run in a raceway", steps, neededA: null };
  if (feet > start.longFt) return { ok: false, variant: "too-long", says: `it is ${feet} ft long, above ${start.longFt} ft, and not outdoors throughout`, steps, neededA: null };
  const neededA = Math.max(end.ratingA ?? 0, feet > start.shortFt ? third : tenth);
  return { ok: false, variant: "too-small", says: `at ${feet} ft its ${shown(amperes, 1)} A must not be below ${shown(neededA, 1)} A`, steps, neededA };
}
/** Smallest ampacity of a circuit after factors, at its weaker terminals; null while data are missing. */
export function circuitAmpacityA(context: CheckContext, id: string, reader: Reader): number | null {
  const column = terminalsOf(context, id, null, 75).lowest;
  const values = context.graph.sections(id).map((section) => { const wire = wireOf(context, id, section, reader); return wire && (correctedAmpacity(context, id, section, wire, column, reader)?.value ?? null); });
  return values.length === 0 || values.some((value) => value === null) ? null : Math.min(...values.map((value) => value ?? 0));
}
