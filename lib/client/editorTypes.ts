import type { ElementRef } from "@/lib/diagram/schema";
import type { KindId } from "@/lib/equipment/registry";

/** What the parts rail can put on the sheet. */
export const RACEWAY_PARTS = ["wireway", "conduit", "nipple", "box"] as const;
export type RacewayPart = (typeof RACEWAY_PARTS)[number];
export type PartId = KindId | RacewayPart | "circuit" | "sensor" | "bond" | "interlock" | "text";

/** One port of one piece of equipment; `offset` is the place along a bus, grid units. */
export interface PortRef { readonly equipment: string; readonly port: string; readonly offset: number }

export type Tool =
  | { readonly kind: "select" }
  | { readonly kind: "place"; readonly part: PartId }
  | { readonly kind: "join"; readonly from: PortRef | null }
  /** The picture under the drawing is moved and sized; nothing else is. */
  | { readonly kind: "underlay" };

export const SELECT: Tool = { kind: "select" };

export const sameRef = (a: ElementRef, b: ElementRef): boolean => a.collection === b.collection && a.id === b.id;

/** A sentence for the person and for a screen reader; `id` makes a repeated sentence new. */
export interface Notice { readonly id: number; readonly text: string; readonly tone: "plain" | "refused" }
