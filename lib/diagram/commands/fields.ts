import type { Draft } from "immer";
import { forbiddenKey } from "@/lib/diagram/patch";
import { propertyFault } from "@/lib/diagram/check";
import type { Drawing } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";
import { kindDefinition } from "@/lib/equipment/registry";
import { newCircuit } from "./circuits";
import { nameOf, need } from "./lookup";
import { Refusal, type Recipe } from "./types";

/** The built-in PV switch has one circuit a tracker, so it follows. */
function syncTrackers(draft: Draft<Drawing>, id: string, value: PropertyValue): void {
  const found = Object.entries(draft.equipment).find(([, each]) => each.parent === id && each.integral && each.kind === "pv-switch");
  if (!found || typeof value !== "number" || value < 1) return;
  const [switchId, pvSwitch] = found;
  pvSwitch.props.channels = value;
  for (const [key, circuit] of Object.entries(draft.circuits)) {
    const number = /^load(\d+)$/.exec(circuit.from.equipment === switchId ? circuit.from.port : circuit.to.equipment === switchId ? circuit.to.port : "")?.[1];
    if (circuit.wiring === "factory" && number && Number(number) > value) delete draft.circuits[key];
  }
  for (let n = 1; n <= value; n++) {
    const joined = Object.values(draft.circuits).some((each) => [each.from, each.to].some((end) => end.equipment === id && end.port === `pv${n}`));
    if (!joined) draft.circuits[`${id}-pv${n}`] = { ...newCircuit("pv-dc", "", { equipment: switchId, port: `load${n}`, offset: 0 }, { equipment: id, port: `pv${n}`, offset: 0 }), wiring: "factory" };
  }
  portsStillFit(draft, switchId);
}

/** A value may change which ports there are; a circuit never loses its landing in silence. */
function portsStillFit(draft: Draft<Drawing>, id: string): void {
  const equipment = need(draft, "equipment", id);
  const ports = new Map(kindDefinition(equipment.kind).ports(equipment.props as never).map((port) => [port.id, port.system]));
  for (const circuit of Object.values(draft.circuits)) {
    for (const end of [circuit.from, circuit.to]) {
      if (end.equipment !== id || ports.get(end.port) === circuit.system) continue;
      throw new Refusal(`${circuit.tag || "A circuit"} lands where ${equipment.tag || "this equipment"} would have no place for it. Move or delete it first.`);
    }
  }
}

export const takeFromLibrary: Recipe<"takeFromLibrary"> = (draft, { id, from }, say) => {
  const each = need(draft, "equipment", id);
  if (!from) {
    delete each.library;
    return `let go of the library entry of ${nameOf(draft, { collection: "equipment", id })}`;
  }
  const definition = kindDefinition(each.kind);
  for (const [name, value] of Object.entries(from.data.props)) {
    const property = Object.hasOwn(definition.properties, name) ? definition.properties[name] : undefined;
    if (!property) throw new Refusal(`${definition.title} has no such value.`, name);
    const fault = propertyFault(property, value);
    if (fault) throw new Refusal(`${property.label} ${fault}.`, name);
    // What the entry does not know, the drawing may: roles, addresses, what was read on site.
    if (value === null) continue;
    const before = each.props[name];
    if (before !== null && before !== undefined && before !== value) say(`${property.label}: ${String(before)} becomes ${String(value)}.`);
    each.props[name] = value;
    const source = from.data.sources[name];
    if (source) each.sources[name] = { ...source };
    if (each.kind === "hybrid-inverter" && name === "trackers") syncTrackers(draft, id, value);
  }
  const ports = new Set(definition.ports(each.props as never).map((port) => port.id));
  for (const [port, data] of Object.entries(from.data.ports)) if (ports.has(port)) each.ports[port] = { ...each.ports[port], ...data };
  portsStillFit(draft, id);
  each.library = { ...from.ref };
  return `take ${from.name}, version ${from.ref.version}, for ${nameOf(draft, { collection: "equipment", id })}`;
};

export const setProperty: Recipe<"setProperty"> = (draft, { id, name, value, source }) => {
  const each = need(draft, "equipment", id);
  const definition = kindDefinition(each.kind);
  const property = Object.hasOwn(definition.properties, name) ? definition.properties[name] : undefined;
  if (!property) throw new Refusal(`${definition.title} has no such value.`, name);
  const fault = propertyFault(property, value);
  if (fault) throw new Refusal(`${property.label} ${fault}.`, name);
  each.props[name] = value;
  if (each.kind === "hybrid-inverter" && name === "trackers") syncTrackers(draft, id, value);
  portsStillFit(draft, id);
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
/** Dimmed to this where nothing else is said. */
const UNDERLAY_OPACITY = 0.35;
export const setUnderlay: Recipe<"setUnderlay"> = (draft, { change }) => {
  const before = draft.sheet.underlay;
  const made = { at: { x: 4, y: 4 }, width: 60, height: 40, opacity: UNDERLAY_OPACITY, hidden: false, ...before, ...change };
  if (!made.file) throw new Refusal("Choose a picture first.", "file");
  draft.sheet.underlay = { ...made, file: made.file };
  return before ? "change the background" : "place a background";
};
export const removeUnderlay: Recipe<"removeUnderlay"> = (draft) => {
  if (!draft.sheet.underlay) throw new Refusal("There is no background.");
  delete draft.sheet.underlay;
  return "remove the background";
};
export const setTitleBlock: Recipe<"setTitleBlock"> = (draft, { change }) => { Object.assign(draft.sheet.titleBlock, change); return "change the title block"; };

export const placeText: Recipe<"placeText"> = (draft: Draft<Drawing>, command) => {
  if (Object.hasOwn(draft.texts, command.id)) throw new Refusal("This id is taken already.", "id");
  draft.texts[command.id] = { at: command.at, lines: command.lines, style: command.style ?? "note", keynote: command.keynote ?? null, vertical: false };
  return "place a note";
};
