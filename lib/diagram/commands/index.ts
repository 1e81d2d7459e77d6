import { checkDocument, connectionFaults, propertyFault } from "@/lib/diagram/check";
import { applyPatches, edit, PatchError, pointerParts, type PatchOperation } from "@/lib/diagram/patch";
import { ELEMENT_SCHEMAS, sheetSchema, siteSchema, type Collection, type Drawing } from "@/lib/diagram/schema";
import { canonicalJson } from "@/lib/diagram/canonical";
import { kindDefinition } from "@/lib/equipment/registry";
import { moveElements, resizeElement, setParent, turnElements } from "./arrange";
import { addBond, addInterlock, placeSensor, setBond, setInterlock, setSensor } from "./attached";
import { addToRoute, joinPorts, removeFromRoute, removeSection, routeCircuit, setEnd, setSection, splitSection } from "./circuits";
import { placeText, removeUnderlay, setField, setPort, setProperty, setSheet, setSite, setTag, setTitleBlock, setUnderlay, takeFromLibrary } from "./fields";
import { paste } from "./paste";
import { placeEquipment } from "./place";
import { placeRaceway, removeCompartment, removeStretch, setCompartment, setRaceway, setStretch } from "./raceways";
import { deleteElements } from "./remove";
import { Refusal, type Command, type CommandOf, type CommandResult, type CommandType, type Recipe } from "./types";

export type { Command, CommandDone, CommandOf, CommandRefused, CommandResult, CommandType, Fragment, SourceNote } from "./types";
export { copyElements, idsIn } from "./paste";
export { freeSpaces, newEquipment } from "./place";
export { defaultSection, newCircuit } from "./circuits";
export { circuitPrefix, equipmentPrefix, nextTag, racewayPrefix } from "./tags";
export { nameOf, withParts } from "./lookup";

const recipes: { readonly [T in Exclude<CommandType, "applySuggestion">]: Recipe<T> } = {
  placeEquipment, moveElements, turnElements, resizeElement, setParent, deleteElements, setProperty, takeFromLibrary, setPort, setField, setTag, joinPorts, setEnd,
  routeCircuit, setSection, splitSection, removeSection, addToRoute, removeFromRoute, placeRaceway, setRaceway, setStretch, removeStretch,
  setCompartment, removeCompartment, placeSensor, setSensor, addBond, setBond, addInterlock, setInterlock, placeText, setSite, setSheet,
  setUnderlay, removeUnderlay, setTitleBlock, paste,
};

/** Commands that change places on the sheet only. They run while something is dragged and cannot break a reference. */
const PLACES: ReadonlySet<CommandType> = new Set(["moveElements", "turnElements", "resizeElement", "routeCircuit", "placeText", "setSite", "setSheet", "setUnderlay", "removeUnderlay", "setTitleBlock"]);

/** First fault in what the operations touched. Only touched elements are read again, so that a drag stays cheap on a large drawing. */
function touchedFault(drawing: Drawing, patches: readonly PatchOperation[], type: CommandType): { reason: string; field: string } | null {
  const done = new Set<string>();
  for (const patch of patches) {
    const [map, id] = pointerParts(patch.path);
    const key = `${map}/${id}`;
    if (patch.op === "test" || done.has(key)) continue;
    done.add(key);
    if (map === "site" || map === "sheet") {
      const parsed = (map === "site" ? siteSchema : sheetSchema).safeParse(drawing[map]);
      if (!parsed.success) return { field: parsed.error.issues[0]?.path.join(".") ?? map, reason: `${parsed.error.issues[0]?.path.join(" ") ?? map}: ${parsed.error.issues[0]?.message}.` };
      continue;
    }
    if (map === undefined || id === undefined || !Object.hasOwn(ELEMENT_SCHEMAS, map)) continue;
    const element = (drawing[map as Collection] as Record<string, unknown>)[id];
    if (element === undefined) continue;
    const parsed = ELEMENT_SCHEMAS[map as Collection].safeParse(element);
    if (!parsed.success) {
      const issue = parsed.error.issues[0];
      return { field: issue?.path.join(".") ?? "", reason: `${issue?.path.join(" ") || map}: ${issue?.message ?? "is not allowed"}.` };
    }
    if (map === "equipment") {
      const equipment = drawing.equipment[id] as Drawing["equipment"][string];
      for (const [name, property] of Object.entries(kindDefinition(equipment.kind).properties)) {
        const fault = propertyFault(property, equipment.props[name] ?? null);
        if (fault) return { field: `props.${name}`, reason: `${property.label} ${fault}.` };
      }
    }
  }
  if (PLACES.has(type)) return null;
  const broken = connectionFaults(drawing).find(({ path }) => done.has(pointerParts(path).slice(0, 2).join("/")));
  return broken ? { field: pointerParts(broken.path).slice(2).join("."), reason: `${pointerParts(broken.path).at(-1)} ${broken.message}.` } : null;
}

const named = (also: readonly string[], title: string, result: { drawing: Drawing; patches: PatchOperation[]; inverse: PatchOperation[] }): CommandResult =>
  ({ ok: true, ...result, title, also });

/**
 * Runs one command on a drawing and answers the new drawing with the operations both ways, or says why not. The drawing handed in
 * is never changed, and nothing half-done is ever answered. Whether the person may edit at all is asked before, by the caller.
 */
export function applyCommand(drawing: Drawing, command: Command): CommandResult {
  const also: string[] = [];
  try {
    if (command.type === "applySuggestion") return applySuggestion(drawing, command);
    if (!Object.hasOwn(recipes, command.type)) return { ok: false, reason: "There is no such command.", field: "type" };
    let title = "";
    const result = edit(drawing, (draft) => {
      title = (recipes[command.type] as (...args: unknown[]) => string)(draft, command, (sentence: string) => also.push(sentence));
    });
    const fault = touchedFault(result.drawing, result.patches, command.type);
    return fault ? { ok: false, ...fault } : named(also, title, result);
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, reason: error.message, ...(error.field ? { field: error.field } : {}) };
    throw error;
  }
}

/** A suggestion comes as operations; what it makes must be a whole drawing again. */
function applySuggestion(drawing: Drawing, { label, patches }: CommandOf<"applySuggestion">): CommandResult {
  let made: Drawing;
  try {
    made = applyPatches(drawing, patches);
  } catch (error) {
    if (error instanceof PatchError) return { ok: false, reason: "The drawing has changed since this was suggested." };
    throw error;
  }
  const fault = checkDocument(made)[0];
  if (fault) return { ok: false, reason: `${fault.path}: ${fault.message}`, field: fault.path };
  // Written as an edit, so that it can be taken back like any other.
  const result = edit(drawing, (draft) => {
    for (const map of Object.keys(made) as (keyof Drawing)[]) {
      if (map === "schemaVersion") continue;
      const before = draft[map] as Record<string, unknown>;
      const after = made[map] as unknown as Record<string, unknown>;
      for (const id of Object.keys(before)) if (!Object.hasOwn(after, id)) delete before[id];
      for (const [id, value] of Object.entries(after)) if (canonicalJson(before[id] ?? null) !== canonicalJson(value)) before[id] = value;
    }
  });
  return named([], label.charAt(0).toLowerCase() + label.slice(1), result);
}
