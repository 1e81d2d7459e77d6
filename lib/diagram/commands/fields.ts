import type { Draft } from "immer";
import { forbiddenKey } from "@/lib/diagram/patch";
import { propertyFault } from "@/lib/diagram/check";
import type { Drawing } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { nameOf, need } from "./lookup";
import { Refusal, type Recipe } from "./types";

export const setProperty: Recipe<"setProperty"> = (draft, { id, name, value, source }) => {
  const each = need(draft, "equipment", id);
  const definition = kindDefinition(each.kind);
  const property = Object.hasOwn(definition.properties, name) ? definition.properties[name] : undefined;
  if (!property) throw new Refusal(`${definition.title} has no such value.`, name);
  const fault = propertyFault(property, value);
  if (fault) throw new Refusal(`${property.label} ${fault}.`, name);
  each.props[name] = value;
  if (source === null) delete each.sources[name];
  else if (source) each.sources[name] = { ...source };
  return `set ${property.label.toLowerCase()} of ${each.tag || definition.title.toLowerCase()}`;
};

export const setPort: Recipe<"setPort"> = (draft, { id, port, change }) => {
  const each = need(draft, "equipment", id);
  const definition = kindDefinition(each.kind).ports(each.props as never).find((one) => one.id === port);
  if (!definition) throw new Refusal(`${each.tag || "This equipment"} has no such port.`, "port");
  each.ports[port] = { ...each.ports[port], ...change };
  return `change ${definition.label.toLowerCase()} of ${each.tag}`;
};

export const setField: Recipe<"setField"> = (draft, { ref, path, value }) => {
  const element = need(draft, ref.collection, ref.id) as unknown as Record<string, unknown>;
  const last = path.at(-1);
  if (last === undefined || path.some((part) => forbiddenKey({ [part]: null })) || forbiddenKey(value)) throw new Refusal("No field of this name.");
  let holder = element;
  for (const part of path.slice(0, -1)) {
    const inner = Object.hasOwn(holder, part) ? holder[part] : undefined;
    if (typeof inner !== "object" || inner === null || Array.isArray(inner)) throw new Refusal("No field of this name.", path.join("."));
    holder = inner as Record<string, unknown>;
  }
  holder[last] = value;
  return `change ${nameOf(draft, ref)}`;
};

export const setTag: Recipe<"setTag"> = (draft, { ref, tag }) => {
  const element = need(draft, ref.collection, ref.id) as { tag?: string };
  if (!("tag" in element)) throw new Refusal("This element has no tag.", "tag");
  const before = element.tag;
  element.tag = tag.trim();
  return `rename ${before || "element"} to ${element.tag}`;
};

export const setSite: Recipe<"setSite"> = (draft, { change }) => { Object.assign(draft.site, change); return "change site data"; };
export const setSheet: Recipe<"setSheet"> = (draft, { change }) => { Object.assign(draft.sheet, change); return "change the sheet"; };
export const setTitleBlock: Recipe<"setTitleBlock"> = (draft, { change }) => { Object.assign(draft.sheet.titleBlock, change); return "change the title block"; };

export const placeText: Recipe<"placeText"> = (draft: Draft<Drawing>, command) => {
  if (Object.hasOwn(draft.texts, command.id)) throw new Refusal("This id is taken already.", "id");
  draft.texts[command.id] = { at: command.at, lines: command.lines, style: command.style ?? "note", keynote: command.keynote ?? null, vertical: false };
  return "place a note";
};
