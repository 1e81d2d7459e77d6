import type { CheckContext, Outcome, Suggestion } from "@/lib/rules/engine/types";
import { compareFault, faultRows, type FaultRow } from "./faultCurrent";
import { equipmentRef, nameOf, names, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "./outcome";

/** Ratings in which devices and equipment are offered, kA: common practice, no published source. */
const OFFERED_KA = [5, 10, 14, 18, 22, 25, 42, 65, 100, 200];

/** What a rule says of one piece of equipment: `fails` leaves the words to the rule. */
export type FaultVerdict = { row: FaultRow; outcome: "fails" } | { row: FaultRow; outcome: Outcome };

/** True where an installed device is of the family, fuse class or model that a marking names. */
export function isOfMarking(context: CheckContext, device: string, marking: string): boolean {
  const same = (words: string | null): boolean => words !== null && words.trim().toLowerCase() === marking.trim().toLowerCase();
  return (["family", "fuseClass", "model"] as const).some((key) => same(textOf(context, device, key)));
}

/** Compares the rating of every piece of equipment of one rating field with its fault current, once a run. */
export function judgeFault(context: CheckContext, field: FaultRow["ratingField"], lawful: (row: FaultRow, reader: Reader) => boolean): ReadonlyMap<string, FaultVerdict> {
  return context.once(`fault current against ${field}`, () => new Map(faultRows(context).filter((row) => row.ratingField === field).map((row) => [row.equipment, judge(context, row, lawful)])));
}
function judge(context: CheckContext, row: FaultRow, lawful: (row: FaultRow, reader: Reader) => boolean): FaultVerdict {
  const reader = new Reader(context);
  if (lawful(row, reader)) return { row, outcome: reader.complete ? PASS : reader.outcome() };
  const { equipment, point, ratingField, ratingKA } = row;
  if (ratingKA === null) {
    reader.ask(equipmentRef(equipment), `props.${ratingField}`, propertyLabel(context, equipment, ratingField));
    return { row, outcome: reader.outcome() };
  }
  // What a converter gives flows out of it, not into a fault inside.
  const own = point.inverters.includes(equipment) ? numberOf(context, equipment, "faultA") ?? 0 : 0;
  const verdict = compareFault(context, point, ratingKA, reader, own);
  return { row, outcome: verdict === "fails" ? "fails" : verdict === "holds" ? PASS : reader.outcome() };
}

/** Equipment that fails beside one other: the first of an enclosure speaks for all parts in it. */
export function failingTogether(context: CheckContext, verdicts: ReadonlyMap<string, FaultVerdict>, id: string): readonly string[] {
  const groups = context.once(`fault current groups ${verdicts.get(id)?.row.ratingField}`, () => {
    const map = new Map<string, string[]>();
    for (const [each, { outcome }] of verdicts) {
      if (outcome !== "fails") continue;
      const place = enclosureOf(context, verdicts, each);
      map.set(place, [...(map.get(place) ?? []), each]);
    }
    // The enclosure itself comes before its parts.
    for (const [place, list] of map) list.sort((a, b) => Number(b === place) - Number(a === place) || (a < b ? -1 : 1));
    return map;
  });
  return groups.get(enclosureOf(context, verdicts, id)) ?? [];
}
function enclosureOf(context: CheckContext, verdicts: ReadonlyMap<string, FaultVerdict>, id: string): string {
  const parent = context.drawing.equipment[id]?.parent ?? null;
  const own = verdicts.get(id)?.row;
  // Parts of one enclosure stand together only while the same current reaches them.
  return parent === null ? id : own && own.ratingField === "interruptingKA" ? `${parent} ${Math.round(own.point.sourceA ?? 0)}` : verdicts.get(parent)?.outcome === "fails" ? parent : id;
}

/** The smallest offered rating for every piece of a group. */
export function higherRating(context: CheckContext, rows: readonly FaultRow[], kA: number, what: string, also: string): readonly Suggestion[] {
  const rating = OFFERED_KA.find((one) => one >= kA - 1e-9);
  const list = rows.filter((row) => (row.ratingKA ?? 0) < kA);
  const [first] = list;
  if (rating === undefined || !first) return [];
  const where = list.length === 1 ? nameOf(context, equipmentRef(first.equipment)) : `${nameOf(context, equipmentRef(first.equipment))} and ${list.length - 1} more`;
  return [{ label: `Use ${what} of ${rating} kA for ${where}`, also, patches: list.map((row) => ({ op: "replace" as const, path: `/equipment/${row.equipment}/props/${row.ratingField}`, value: rating })) }];
}
/** Names of a few, or the first and how many more: a panel may hold dozens of devices. */
export function fewNames(context: CheckContext, ids: readonly string[]): string {
  return ids.length > 4 ? `${nameOf(context, equipmentRef(ids[0] ?? ""))} and ${ids.length - 1} others` : names(context, ids.map(equipmentRef));
}
export const answerOf = (verdict: FaultVerdict | undefined): Outcome | null => (verdict === undefined ? NOT_APPLICABLE : verdict.outcome === "fails" ? null : verdict.outcome);
