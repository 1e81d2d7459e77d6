import { randomUUID } from "node:crypto";
import { kindDefinition } from "@/lib/equipment/registry";
import type { Drawing } from "@/lib/diagram/schema";
import type { Person } from "./people";
import { request } from "./server";

/** Equipment as the parts rail places it: every property of its kind, not known yet. */
export function equipment(kind: string, tag: string, change: Partial<Drawing["equipment"][string]> = {}): Drawing["equipment"][string] {
  const props = Object.fromEntries(Object.keys(kindDefinition(kind).properties).map((name) => [name, null]));
  return {
    kind, tag, status: "new", parent: null, integral: false, at: { x: 10, y: 10 }, rotation: 0, mirrored: false, size: null, bus: null, label: null, spaces: null,
    location: { building: null, place: null, exposure: null, ambientC: null }, props, sources: {}, ports: {}, note: "", ...change,
  };
}

export interface Operation { op: "add" | "remove" | "replace" | "test"; path: string; value?: unknown }
export const place = (id: string, tag: string, kind = "disconnect"): Operation[] => [{ op: "add", path: `/equipment/${id}`, value: equipment(kind, tag) }];
export const move = (id: string, x: number, from = 10): Operation[] => [
  { op: "test", path: `/equipment/${id}/at/x`, value: from }, { op: "replace", path: `/equipment/${id}/at/x`, value: x },
];

export const save = (as: Person, drawingId: string, baseSequence: number, patches: unknown, change: Record<string, unknown> = {}) =>
  request("POST", `/api/drawings/${drawingId}/patches`, { as, body: { saveId: randomUUID(), baseSequence, patches, title: "An edit", ...change } });

export const drawingOf = async (as: Person, jobId: string) => (await request("GET", `/api/jobs/${jobId}/drawing`, { as })).body;
