import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { canonicalJson, drawingDigest } from "@/lib/diagram/canonical";
import { checkDocument } from "@/lib/diagram/check";
import { applyCommand, copyElements, idsIn, type Command, type CommandDone } from "@/lib/diagram/commands";
import { buildGraph } from "@/lib/diagram/graph";
import { applyPatches, overlaps, PatchError, type PatchOperation } from "@/lib/diagram/patch";
import { COLLECTIONS, type Collection, type Drawing, type ElementRef } from "@/lib/diagram/schema";
import { kindDefinition, KIND_IDS } from "@/lib/equipment/registry";
import { frozen, run, smallDrawing } from "../lib/diagram/support";

/** Numbers from which a command is made for whatever drawing it meets, so that long sequences keep hitting something. */
type Seed = readonly [what: number, a: number, b: number, c: number];
const seeds = fc.array(fc.tuple(fc.nat(19), fc.nat(999), fc.nat(999), fc.nat(999)) as fc.Arbitrary<Seed>, { minLength: 1, maxLength: 14 });
const pick = <T>(list: readonly T[], n: number): T | undefined => (list.length === 0 ? undefined : list[n % list.length]);
const refsOf = (drawing: Drawing, ...maps: readonly Collection[]): ElementRef[] =>
  (maps.length > 0 ? maps : COLLECTIONS).flatMap((collection) => Object.keys(drawing[collection]).map((id) => ({ collection, id })));

function commandFor(drawing: Drawing, [what, a, b, c]: Seed, serial: number): Command {
  const id = (map: Collection, n: number): string => pick(Object.keys(drawing[map]), n) ?? "nowhere";
  const fresh = `n${serial}-${a}`;
  const at = { x: a % 130, y: b % 80 };
  const equipment = id("equipment", a);
  const circuit = id("circuits", a);
  const section = pick(Object.keys(drawing.circuits[circuit]?.sections ?? {}), b) ?? "s1";
  const kind = pick(KIND_IDS, b) ?? "load";
  const port = (n: number) => {
    const one = id("equipment", n);
    const found = drawing.equipment[one];
    return { equipment: one, port: pick(found ? kindDefinition(found.kind).ports(found.props as never) : [], c)?.id ?? "line", offset: n % 3 };
  };
  switch (what) {
    case 0: return { type: "placeEquipment", id: fresh, kind, at, parent: c % 3 === 0 ? equipment : null };
    case 1: case 2: return { type: "moveElements", refs: [pick(refsOf(drawing), a), pick(refsOf(drawing), b)].flatMap((ref) => ref ?? []), dx: (b % 9) - 4, dy: (c % 9) - 4 };
    case 3: return { type: "deleteElements", refs: [pick(refsOf(drawing), a)].flatMap((ref) => ref ?? []) };
    case 4: case 5: return { type: "joinPorts", id: fresh, from: port(a), to: port(b) };
    case 6: {
      const each = drawing.equipment[equipment];
      const [name, property] = pick(Object.entries(each ? kindDefinition(each.kind).properties : {}), b) ?? ["ratingA", undefined];
      const value = property?.type === "number" ? Math.round(property.min + ((property.max - property.min) * (c % 100)) / 99) : property?.type === "choice" ? pick(property.options, c) ?? null : property?.type === "flag" ? c % 2 === 0 : c % 5 === 0 ? null : `v${c}`;
      return { type: "setProperty", id: equipment, name, value };
    }
    case 7: return { type: "setSection", circuit, section, change: { lengthFt: c % 7 === 0 ? -1 : c / 10, parallelSets: 1 + (b % 3) } };
    case 8: return { type: "splitSection", circuit, section, id: `s${serial}`, lengthFt: null };
    case 9: return { type: "removeSection", circuit, section };
    case 10: return { type: "placeRaceway", id: fresh, kind: pick(["conduit", "nipple", "wireway", "box"] as const, b) ?? "box", at };
    case 11: return { type: "addToRoute", circuit, section, raceway: id("raceways", b), compartment: null };
    case 12: return { type: "setCompartment", raceway: id("raceways", a), compartment: `c${b % 4}`, name: "X", widthIn: null };
    case 13: return { type: "removeCompartment", raceway: id("raceways", a), compartment: `c${b % 4}` };
    case 14: return { type: "turnElements", refs: [pick(refsOf(drawing, "equipment", "raceways", "sensors"), a)].flatMap((ref) => ref ?? []), turn: b % 2 ? "mirror" : "clockwise" };
    case 15: return { type: "setParent", id: equipment, parent: c % 4 === 0 ? null : id("equipment", b) };
    case 16: return { type: "placeSensor", id: fresh, circuit, at };
    case 17: return { type: "addInterlock", id: fresh, switches: [equipment, id("equipment", b)] };
    case 18: return { type: "setEnd", circuit, end: b % 2 ? "from" : "to", endpoint: port(c) };
    default: {
      const { content } = copyElements(drawing, [pick(refsOf(drawing, "equipment", "raceways"), a)].flatMap((ref) => ref ?? []));
      return { type: "paste", content, ids: Object.fromEntries(idsIn(content).map((each, n) => [each, `${fresh}-p${n}`])), dx: b % 20, dy: c % 20 };
    }
  }
}
function play(drawing: Drawing, list: readonly Seed[], offset = 0): { drawing: Drawing; done: CommandDone[] } {
  const done: CommandDone[] = [];
  let at = drawing;
  list.forEach((seed, n) => {
    const result = applyCommand(at, commandFor(at, seed, n + offset));
    if (result.ok) { done.push(result); at = result.drawing; }
  });
  return { drawing: at, done };
}

function tryApply(drawing: Drawing, patches: readonly PatchOperation[]): Drawing | null {
  try { return applyPatches(drawing, patches); } catch (error) { if (error instanceof PatchError) return null; throw error; }
}
/** With a circuit in several sections from the start, so that removing one is met too. */
const begin = (): Drawing => run(smallDrawing(),
  { type: "splitSection", circuit: "string", section: "s1", id: "s2", lengthFt: 4 }, { type: "splitSection", circuit: "output", section: "s1", id: "s2", lengthFt: 4 });

describe("random editing", () => {
  it("keeps the drawing whole, and undoes to where it began and redoes to where it ended", () => {
    fc.assert(fc.property(seeds, (list) => {
      const start = frozen(begin());
      const { drawing, done } = play(start, list);
      expect(checkDocument(drawing)).toEqual([]);
      expect(() => buildGraph(drawing)).not.toThrow();
      const undone = done.reduceRight((at, step) => applyPatches(at, step.inverse), drawing);
      expect(canonicalJson(undone)).toBe(canonicalJson(start));
      expect(drawingDigest(done.reduce((at, step) => applyPatches(at, step.patches), undone), "1")).toBe(drawingDigest(drawing, "1"));
    }), { numRuns: 120 });
  });
  it("reaches every kind of command often enough to mean something", () => {
    const seen = new Set<number>();
    for (const list of fc.sample(seeds, { numRuns: 200, seed: 11 })) {
      let at = begin();
      list.forEach((seed, n) => { const result = applyCommand(at, commandFor(at, seed, n)); if (result.ok) { seen.add(seed[0]); at = result.drawing; } });
    }
    expect([...seen].sort((x, y) => x - y)).toEqual(Array.from({ length: 20 }, (_, n) => n));
  });
});

describe("two people at once", () => {
  const writes = (done: readonly CommandDone[]): PatchOperation[] => done.flatMap((step) => step.patches);
  it("come to the same drawing in either order when their edits do not meet", () => {
    let apart = 0;
    fc.assert(fc.property(seeds, seeds, (mine, yours) => {
      const start = begin();
      const a = writes(play(start, mine.slice(0, 3), 100).done);
      const b = writes(play(start, yours.slice(0, 3), 200).done);
      fc.pre(a.length > 0 && b.length > 0 && overlaps(a, b).length === 0);
      const ab = tryApply(applyPatches(start, a), b);
      const ba = tryApply(applyPatches(start, b), a);
      expect(ab).not.toBeNull();
      expect(canonicalJson(ab)).toBe(canonicalJson(ba));
      apart += 1;
    }), { numRuns: 60 });
    expect(apart).toBeGreaterThan(20);
  });
  it("see an overlap from both sides", () => {
    fc.assert(fc.property(seeds, seeds, (mine, yours) => {
      const start = begin();
      const a = writes(play(start, mine, 100).done);
      const b = writes(play(start, yours, 200).done);
      expect(overlaps(a, b).length > 0).toBe(overlaps(b, a).length > 0);
    }), { numRuns: 40 });
  });
  it("never lose one of two values written to one field", () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 500 }), fc.integer({ min: 501, max: 900 }), (one, two) => {
      const start = smallDrawing();
      const set = (value: number): PatchOperation[] => {
        const result = applyCommand(start, { type: "setProperty", id: "cb-a", name: "ratingA", value });
        return result.ok ? result.patches : [];
      };
      fc.pre(one !== 40);
      expect(overlaps(set(one), set(two))).toEqual(["/equipment/cb-a/props/ratingA"]);
      expect(tryApply(applyPatches(start, set(one)), set(two))).toBeNull();
    }));
  });
});

describe("untrusted documents", () => {
  it("are answered with a list of faults, whatever they hold", () => {
    fc.assert(fc.property(fc.anything({ withNullPrototype: true, withBigInt: true, withDate: true, withSparseArray: true }), (value) => {
      expect(checkDocument(value).length).toBeGreaterThan(0);
      expect(checkDocument({ ...smallDrawing(), equipment: value }).length).toBeGreaterThanOrEqual(typeof value === "object" && value !== null && Object.keys(value).length === 0 ? 0 : 1);
    }), { numRuns: 200 });
  });
  it("are refused by patches without changing anything", () => {
    fc.assert(fc.property(fc.array(fc.record({ op: fc.constantFrom("add", "remove", "replace", "test", "move"), path: fc.oneof(fc.string(), fc.constantFrom("/equipment/grid/tag", "/__proto__/x", "/texts/note/at/x")), value: fc.jsonValue() })), (operations) => {
      const start = smallDrawing();
      const before = canonicalJson(start);
      tryApply(start, operations as PatchOperation[]);
      expect(canonicalJson(start)).toBe(before);
      expect(({} as Record<string, unknown>)["x"]).toBeUndefined();
    }));
  });
});
