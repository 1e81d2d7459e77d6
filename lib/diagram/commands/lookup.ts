import type { Draft } from "immer";
import type { Collection, Drawing, ElementRef } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { Refusal } from "./types";

type Map = "equipment" | "circuits" | "raceways" | "bonds" | "interlocks" | "sensors" | "texts" | "labels" | "acceptances";
const NOUN: Record<Map, string> = {
  equipment: "equipment", circuits: "circuit", raceways: "raceway", bonds: "bond", interlocks: "interlock", sensors: "current sensor",
  texts: "text", labels: "label", acceptances: "acceptance",
};

/** Element of a map. @throws Refusal when it is not on the drawing any more */
export function need<M extends Map>(draft: Draft<Drawing>, map: M, id: string): Draft<Drawing>[M][string] {
  const found = Object.hasOwn(draft[map], id) ? (draft[map] as Record<string, unknown>)[id] : undefined;
  if (!found) throw new Refusal(`This ${NOUN[map]} is not on the drawing any more.`);
  return found as Draft<Drawing>[M][string];
}
/** @throws Refusal when the id is taken already */
export function free(draft: Draft<Drawing>, map: Map, id: string): void {
  if (Object.hasOwn(draft[map], id)) throw new Refusal("This id is taken already.", "id");
}
/** Word for an element in titles and messages: its tag, or what it is. */
export function nameOf(drawing: Drawing | Draft<Drawing>, ref: ElementRef): string {
  const element = (drawing[ref.collection] as Record<string, { tag?: string; kind?: string } | undefined>)[ref.id];
  if (!element) return NOUN[ref.collection];
  if (element.tag) return element.tag;
  return ref.collection === "equipment" && element.kind ? kindDefinition(element.kind).title.toLowerCase() : NOUN[ref.collection];
}
/** Every part inside the named equipment, itself included. */
export function withParts(drawing: Drawing | Draft<Drawing>, ids: Iterable<string>): Set<string> {
  const all = new Set(ids);
  for (let before = -1; before !== all.size;) {
    before = all.size;
    for (const [id, equipment] of Object.entries(drawing.equipment)) if (equipment.parent && all.has(equipment.parent)) all.add(id);
  }
  return all;
}
export const idsOf = (refs: readonly ElementRef[], collection: Collection): string[] => refs.filter((ref) => ref.collection === collection).map((ref) => ref.id);
