import { copyElements, type Fragment } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { ELEMENT_SCHEMAS, type ElementRef } from "@/lib/diagram/schema";
import { pasteContent } from "./elementEdits";
import type { Edit, Refused } from "./edit";

/** Names what was copied, so that text from anywhere else is never taken for it. */
const FORMAT = "ferrule-elements/1";
const MAPS = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors", "texts"] as const;

/** Text for the clipboard: the copied elements, for this or another drawing. */
export const copyText = (graph: DrawingGraph, refs: readonly ElementRef[]): string =>
  JSON.stringify({ format: FORMAT, ...copyElements(graph.drawing, refs) });

/** Reads pasted text. Every element is checked by its schema; foreign text does no harm. */
function readContent(text: string): { content: Fragment; cut: readonly string[] } | null {
  if (!text.includes(FORMAT) || text.length > 4_000_000) return null;
  try {
    const parsed = JSON.parse(text) as { format?: unknown; content?: Record<string, unknown>; cut?: unknown };
    if (parsed.format !== FORMAT) return null;
    const content = Object.fromEntries(MAPS.map((map) => [map, Object.fromEntries(Object.entries(parsed.content?.[map] ?? {}).map(([id, element]) => [id, ELEMENT_SCHEMAS[map].parse(element)]))]));
    return { content: content as unknown as Fragment, cut: Array.isArray(parsed.cut) ? parsed.cut.filter((tag): tag is string => typeof tag === "string") : [] };
  } catch {
    return null;
  }
}

export function pasteEdit(_graph: DrawingGraph, text: string, newId: (prefix: string) => string): Edit | Refused {
  const read = readContent(text);
  if (!read) return { reason: "What is on the clipboard was not copied from a drawing." };
  const edit = pasteContent(read.content, newId, 2);
  return read.cut.length > 0 ? { ...edit, note: `Left out, because one end was not copied: ${read.cut.join(", ")}.` } : edit;
}
