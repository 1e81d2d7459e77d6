import { produceWithPatches, enablePatches, type Draft, type Patch } from "immer";
import type { Drawing } from "@/lib/diagram/schema";
import { canonicalJson } from "@/lib/diagram/canonical";

enablePatches();

/** One RFC 6902 operation. `move` and `copy` are not used: a copy of the whole tree would be a small message with a large effect. */
export interface PatchOperation { op: "add" | "remove" | "replace" | "test"; path: string; value?: unknown }

/** A patch that does not fit the drawing. `index` is the operation, `path` its place. */
export class PatchError extends Error {
  override readonly name = "PatchError";
  constructor(readonly index: number, readonly path: string, message: string) { super(message); }
}

const FORBIDDEN_KEYS = new Set(["__proto__", "constructor", "prototype"]);
const MOST_OPERATIONS = 5000;
const escape = (part: string | number): string => String(part).replace(/~/g, "~0").replace(/\//g, "~1");
const unescape = (part: string): string => part.replace(/~1/g, "/").replace(/~0/g, "~");

/** Splits a JSON pointer (RFC 6901). */
export const pointerParts = (pointer: string): string[] => pointer.split("/").slice(1).map(unescape);
export const pointer = (...parts: readonly (string | number)[]): string => parts.map((part) => `/${escape(part)}`).join("");

function valueAt(document: unknown, parts: readonly string[]): unknown {
  let value: unknown = document;
  for (const part of parts) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return undefined;
    value = (value as Record<string, unknown>)[part];
  }
  return value;
}

/** A key that would reach an object's prototype, anywhere in a value. */
export function forbiddenKey(value: unknown): string | null {
  if (typeof value !== "object" || value === null) return null;
  for (const key of Object.keys(value)) {
    if (FORBIDDEN_KEYS.has(key)) return key;
    const inside = forbiddenKey((value as Record<string, unknown>)[key]);
    if (inside) return inside;
  }
  return null;
}

function toOperations(document: unknown, patches: readonly Patch[]): PatchOperation[] {
  return patches.flatMap((patch): PatchOperation[] => {
    const path = pointer(...patch.path);
    if (patch.op === "add") return [{ op: "add", path, value: patch.value }];
    // The old value goes along, so that a stale edit is refused and never overwrites.
    const before = valueAt(document, patch.path.map(String));
    return [{ op: "test", path, value: before }, patch.op === "remove" ? { op: "remove", path } : { op: "replace", path, value: patch.value }];
  });
}

export interface Edit { drawing: Drawing; patches: PatchOperation[]; inverse: PatchOperation[] }

/** Runs a recipe on a copy and returns the new drawing with RFC 6902 operations both ways. The input stays as it is. */
export function edit(drawing: Drawing, recipe: (draft: Draft<Drawing>) => void): Edit {
  const [next, patches, inverse] = produceWithPatches(drawing, (draft) => { recipe(draft); });
  return { drawing: next, patches: toOperations(drawing, patches), inverse: toOperations(next, inverse) };
}

/**
 * Applies operations to a copy; the input is never touched, also when one fails half way.
 * Arrays are replaced whole: an operation inside one is refused, since its place means nothing after another person's edit.
 * @throws PatchError naming the operation and the place
 */
export function applyPatches(drawing: Drawing, operations: readonly PatchOperation[]): Drawing {
  if (operations.length > MOST_OPERATIONS) throw new PatchError(MOST_OPERATIONS, "", `holds more than ${MOST_OPERATIONS} operations`);
  const copied = new WeakSet<object>();
  const copy = <T extends object>(value: T): T => {
    const made = (Array.isArray(value) ? [...value] : { ...value }) as T;
    copied.add(made);
    return made;
  };
  const root: Record<string, unknown> = copy(drawing as unknown as Record<string, unknown>);
  operations.forEach((operation, index) => {
    const fail = (message: string): never => { throw new PatchError(index, operation.path, `${operation.path}: ${message}`); };
    if (!["add", "remove", "replace", "test"].includes(operation.op)) fail(`operation ${String(operation.op)} is not allowed`);
    const parts = pointerParts(operation.path);
    if (!operation.path.startsWith("/") || parts.length === 0) fail("names no place inside the drawing");
    if (parts.some((part) => FORBIDDEN_KEYS.has(part)) || forbiddenKey(operation.value)) fail("holds a key that is not allowed");
    let holder = root;
    for (const part of parts.slice(0, -1)) {
      const inner = Object.hasOwn(holder, part) ? holder[part] : undefined;
      if (typeof inner !== "object" || inner === null) { fail("is not there"); return; }
      if (Array.isArray(inner)) { fail("lies inside a list; lists are replaced whole"); return; }
      if (!copied.has(inner)) holder[part] = copy(inner);
      holder = holder[part] as Record<string, unknown>;
    }
    const key = parts.at(-1) as string;
    const there = Object.hasOwn(holder, key);
    if (operation.op === "test") {
      if (canonicalJson(there ? holder[key] : null) !== canonicalJson(operation.value ?? null)) fail("has been changed since");
    } else if (operation.op === "remove") {
      if (!there) fail("is not there");
      delete holder[key];
    } else {
      if (operation.value === undefined) fail("has no value");
      if (operation.op === "replace" && !there) fail("is not there");
      holder[key] = operation.value;
    }
  });
  return root as unknown as Drawing;
}

/** Paths at which both sides change the same part: equal, or one inside the other. Tests alone change nothing. */
export function overlaps(theirs: readonly PatchOperation[], yours: readonly PatchOperation[]): string[] {
  const written = new Set(theirs.filter((each) => each.op !== "test").map((each) => each.path));
  const prefixes = new Set([...written].flatMap((path) => path.split("/").map((_, i, all) => all.slice(0, i + 1).join("/"))));
  const clash = (path: string): boolean => prefixes.has(path) || path.split("/").some((_, i, all) => i > 0 && written.has(all.slice(0, i + 1).join("/")));
  return [...new Set(yours.filter((each) => each.op !== "test").map((each) => each.path).filter(clash))];
}
