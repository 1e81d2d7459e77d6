import { copyElements, idsIn, type Fragment } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Collection, ElementRef } from "@/lib/diagram/schema";
import { withRoutes, type Edit, type Refused } from "./edit";

/** Deletes elements with what cannot stand without them. */
export const deleteEdit = (_graph: DrawingGraph, refs: readonly ElementRef[]): Edit => ({ commands: [{ type: "deleteElements", refs }] });

/** Turns what can be turned by a quarter. */
export function rotateEdit(graph: DrawingGraph, refs: readonly ElementRef[]): Edit | Refused {
  const turned = refs.filter((ref) => ref.collection === "equipment" || ref.collection === "raceways" || ref.collection === "sensors");
  if (turned.length === 0) return { reason: "Select a symbol, a raceway or a sensor to turn it." };
  return { commands: withRoutes(graph, [{ type: "turnElements", refs: turned, turn: "clockwise" }]) };
}

/** Puts copied content on the sheet with new ids; the top ones are selected. */
export function pasteContent(content: Fragment, newId: (prefix: string) => string, shift: number): Edit {
  const ids = Object.fromEntries(idsIn(content).map((id) => [id, newId("e")]));
  const top = (["equipment", "raceways", "texts"] as const).flatMap((collection: Collection & keyof Fragment) =>
    Object.entries(content[collection]).filter(([, element]) => !("parent" in element && element.parent !== null && Object.hasOwn(content.equipment, element.parent)))
      .map(([id]): ElementRef => ({ collection, id: ids[id] as string })));
  return { commands: [{ type: "paste", content, ids, dx: shift, dy: shift }], selectAll: top };
}

/** Copies the selection beside itself, with the circuits between its parts. */
export function duplicateEdit(graph: DrawingGraph, refs: readonly ElementRef[], newId: (prefix: string) => string): Edit | Refused {
  const { content, cut } = copyElements(graph.drawing, refs);
  if (idsIn(content).length === 0) return { reason: "Select equipment, a raceway or a note to duplicate it." };
  const edit = pasteContent(content, newId, 3);
  return cut.length > 0 ? { ...edit, note: `Left out, because one end was not copied: ${cut.join(", ")}.` } : edit;
}
