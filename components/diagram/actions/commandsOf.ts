import type { Command } from "@/lib/diagram/commands";
import type { Drawing, ElementRef, Sheet, Site } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";

/** Command that sets one field of an element, named as in findings: `props.ratingA`, `sections.s1.lengthFt`, `tag`. `undefined` takes an entry out. */
export function setFieldCommand(drawing: Drawing, ref: ElementRef, field: string, value: unknown): Command {
  const path = field.split(".");
  const [head, name = ""] = path;
  if (field === "tag") return { type: "setTag", ref, tag: String(value) };
  if (ref.collection === "equipment" && head === "props") return { type: "setProperty", id: ref.id, name, value: value as PropertyValue };
  if (ref.collection === "equipment" && head === "sources") {
    return { type: "setProperty", id: ref.id, name, value: drawing.equipment[ref.id]?.props[name] ?? null, source: value as { document: string; page: string } | null };
  }
  if (ref.collection === "raceways" && head === "stretches" && value === undefined) return { type: "removeStretch", raceway: ref.id, stretch: name };
  return { type: "setField", ref, path, value };
}

/** Command that sets a value of the site, the sheet or its title block, for example `sheet.titleBlock.codes`. */
export function setSheetCommand(field: string, value: unknown): Command {
  const [map, ...rest] = field.split(".");
  if (map === "site") return { type: "setSite", change: { [rest[0] as string]: value } as Partial<Site> };
  if (rest[0] === "titleBlock") return { type: "setTitleBlock", change: { [rest[1] as string]: value } as Partial<Sheet["titleBlock"]> };
  return { type: "setSheet", change: { [rest[0] as string]: value } as Partial<Omit<Sheet, "titleBlock">> };
}
