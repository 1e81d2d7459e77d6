import { ROOMS, type ElementRef } from "@/lib/diagram/schema";
import type { CheckContext, Outcome, Rule, RuleMeta } from "@/lib/rules/engine/types";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";

export type Room = (typeof ROOMS)[number];

/** One row of the family "may not stand in such a room". */
export interface RoomRow {
  meta: RuleMeta;
  subjects: (context: CheckContext) => readonly ElementRef[];
  /** Rooms that are barred for this element; null where the adopted codes say nothing about it. */
  barred: (ref: ElementRef, context: CheckContext) => readonly Room[] | null;
  /** What may not stand there, for the sentence. */
  what: string;
  examples: Rule["examples"];
}

/** Room of an element: its own, or that of the nearest enclosure that names one. */
export function roomOf(context: Pick<CheckContext, "drawing" | "graph">, id: string): Room | null {
  for (const at of context.graph.enclosures(id)) {
    const room = context.drawing.equipment[at]?.location.room ?? null;
    if (room !== null) return room;
  }
  return null;
}

/** Compares the room with those that the codes bar. */
export function roomRule(row: RoomRow): Rule {
  const evaluate = (ref: ElementRef, context: CheckContext): Outcome => {
    const barred = row.barred(ref, context);
    if (barred === null) return NOT_APPLICABLE;
    const room = roomOf(context, ref.id);
    const outer = context.graph.enclosures(ref.id).at(-1) ?? ref.id;
    if (room === null) return { outcome: "needs-data", fields: [{ ref: equipmentRef(outer), field: "location.room", label: "Room" }] };
    if (!barred.includes(room)) return PASS;
    return found({ variant: "barred-room", anchor: ref, field: "location.room", related: outer === ref.id ? [] : [equipmentRef(outer)], message: `${nameOf(context, ref)} stands in a ${room}; ${row.what} may not.`, steps: [] });
  };
  return { meta: row.meta, subjects: row.subjects, evaluate, examples: row.examples };
}
