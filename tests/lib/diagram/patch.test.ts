import { describe, expect, it } from "vitest";
import { canonicalJson } from "@/lib/diagram/canonical";
import { applyPatches, edit, forbiddenKey, overlaps, PatchError, pointer, pointerParts, type PatchOperation } from "@/lib/diagram/patch";
import { frozen, smallDrawing } from "./support";

const refused = (operations: readonly PatchOperation[]): PatchError => {
  try { applyPatches(smallDrawing(), operations); } catch (error) { if (error instanceof PatchError) return error; throw error; }
  throw new Error("was applied");
};

describe("pointers", () => {
  // RFC 6901, section 5: the pointers of its example and what they name.
  it.each([["/foo", ["foo"]], ["/foo/0", ["foo", "0"]], ["/", [""]], ["/a~1b", ["a/b"]], ["/c%d", ["c%d"]], ["/m~0n", ["m~n"]], ["", []]] as const)("%j", (text, parts) => {
    expect(pointerParts(text)).toEqual(parts);
    expect(pointer(...parts)).toBe(text);
  });
  // RFC 6901, section 4: ~01 is ~1 after decoding, never a slash.
  it("decodes ~01 to ~1", () => expect(pointerParts("/~01")).toEqual(["~1"]));
});

describe("applying patches", () => {
  it("adds, replaces and removes", () => {
    const next = applyPatches(smallDrawing(), [
      { op: "test", path: "/equipment/cb-a/props/ratingA", value: 40 }, { op: "replace", path: "/equipment/cb-a/props/ratingA", value: 45 },
      { op: "remove", path: "/texts/note" }, { op: "add", path: "/site/utilityName", value: "Rural" },
    ]);
    expect(next.equipment["cb-a"]?.props["ratingA"]).toBe(45);
    expect(next.texts).toEqual({});
    expect(next.site.utilityName).toBe("Rural");
  });
  it("refuses a stale edit and names the operation", () => {
    const error = refused([{ op: "replace", path: "/equipment/cb-a/tag", value: "X" }, { op: "test", path: "/equipment/cb-a/props/ratingA", value: 50 }, { op: "replace", path: "/equipment/cb-a/props/ratingA", value: 60 }]);
    expect(error.index).toBe(1);
    expect(error.path).toBe("/equipment/cb-a/props/ratingA");
    expect(error.message).toContain("has been changed since");
  });
  it("compares a tested value whatever the order of its keys", () => {
    const { x, y } = smallDrawing().equipment["grid"]?.at ?? { x: 0, y: 0 };
    expect(applyPatches(smallDrawing(), [{ op: "test", path: "/equipment/grid/at", value: { y, x } }])).toEqual(smallDrawing());
  });
  it.each([
    ["/__proto__/polluted", 1], ["/equipment/__proto__", {}], ["/equipment/constructor/prototype/polluted", 1], ["/equipment/grid/props/prototype", 1],
    ["/equipment/x", JSON.parse("{\"props\":{\"__proto__\":{\"polluted\":1}}}")], ["/equipment/x", [{ constructor: 1 }]],
  ])("refuses %s", (path, value) => {
    expect(refused([{ op: "add", path, value }]).message).toContain("not allowed");
    expect(({} as Record<string, unknown>)["polluted"]).toBeUndefined();
  });
  it.each(["move", "copy", "merge", "", "toString"])("refuses the operation %j", (op) => {
    const operation = { op, from: "/equipment", path: "/texts/a", value: {} } as unknown as PatchOperation;
    expect(refused([operation]).message).toContain("is not allowed");
  });
  it("refuses what is not there, what lies in a list, the whole document and values left out", () => {
    expect(refused([{ op: "replace", path: "/equipment/none/tag", value: "a" }]).message).toContain("is not there");
    expect(refused([{ op: "remove", path: "/equipment/none" }]).message).toContain("is not there");
    expect(refused([{ op: "replace", path: "/equipment/grid/nothing", value: 1 }]).message).toContain("is not there");
    expect(refused([{ op: "replace", path: "/circuits/output/points/0", value: { x: 0, y: 0 } }]).message).toContain("lists are replaced whole");
    expect(refused([{ op: "add", path: "/circuits/output/points/-", value: { x: 0, y: 0 } }]).message).toContain("lists are replaced whole");
    expect(refused([{ op: "replace", path: "", value: {} }]).message).toContain("names no place");
    expect(refused([{ op: "add", path: "equipment", value: {} }]).message).toContain("names no place");
    expect(refused([{ op: "add", path: "/texts/a" }]).message).toContain("has no value");
    expect(refused(Array.from({ length: 5001 }, () => ({ op: "test" as const, path: "/schemaVersion", value: 1 }))).message).toContain("more than 5000");
  });
  it("never touches what it was given, also when it fails half way", () => {
    const drawing = frozen(smallDrawing());
    const before = canonicalJson(drawing);
    applyPatches(drawing, [{ op: "replace", path: "/equipment/grid/tag", value: "G-9" }, { op: "remove", path: "/circuits/output" }]);
    expect(() => applyPatches(drawing, [{ op: "replace", path: "/equipment/grid/tag", value: "G-9" }, { op: "remove", path: "/circuits/none" }])).toThrow(PatchError);
    expect(canonicalJson(drawing)).toBe(before);
  });
  it("keeps untouched parts the same objects, so that views of them stay", () => {
    const drawing = smallDrawing();
    const next = applyPatches(drawing, [{ op: "replace", path: "/equipment/grid/tag", value: "G-9" }]);
    expect(next.circuits).toBe(drawing.circuits);
    expect(next.equipment["house"]).toBe(drawing.equipment["house"]);
    expect(next.equipment["grid"]).not.toBe(drawing.equipment["grid"]);
  });
});

describe("recording an edit", () => {
  it("guards each change by what stood there, and takes it back exactly", () => {
    const drawing = smallDrawing();
    const { drawing: next, patches, inverse } = edit(drawing, (draft) => {
      const breaker = draft.equipment["cb-a"];
      if (breaker) { breaker.props["ratingA"] = 50; breaker.note = "new"; }
      delete draft.texts["note"];
    });
    expect(patches).toContainEqual({ op: "test", path: "/equipment/cb-a/props/ratingA", value: 40 });
    expect(canonicalJson(applyPatches(drawing, patches))).toBe(canonicalJson(next));
    expect(canonicalJson(applyPatches(next, inverse))).toBe(canonicalJson(drawing));
    // Undoing after somebody else's change of the same value would lose that change.
    const other = applyPatches(next, [{ op: "replace", path: "/equipment/cb-a/props/ratingA", value: 60 }]);
    expect(() => applyPatches(other, inverse)).toThrow(PatchError);
  });
  it("finds a forbidden key at any depth", () => {
    expect(forbiddenKey({ a: [{ b: { prototype: 1 } }] })).toBe("prototype");
    expect(forbiddenKey({ a: ["__proto__"], b: null })).toBeNull();
  });
});

describe("overlap of two edits", () => {
  const write = (path: string): PatchOperation => ({ op: "replace", path, value: 1 });
  it.each([
    ["/equipment/a/tag", "/equipment/a/tag", true], ["/equipment/a", "/equipment/a/tag", true], ["/equipment/a/props/ratingA", "/equipment/a", true],
    ["/equipment/a/tag", "/equipment/a/note", false], ["/equipment/a", "/equipment/ab", false], ["/equipment/a/tag", "/circuits/a/tag", false],
  ])("%s and %s: %s", (theirs, yours, clash) => {
    expect(overlaps([write(theirs)], [write(yours)])).toEqual(clash ? [yours] : []);
  });
  it("is not made by tests alone", () => {
    expect(overlaps([{ op: "test", path: "/site/edition", value: "2023" }], [write("/site/edition")])).toEqual([]);
  });
});
