import { describe, expect, it } from "vitest";
import { canonicalJson } from "@/lib/diagram/canonical";
import { checkDocument } from "@/lib/diagram/check";
import { applyCommand, copyElements, freeSpaces, idsIn, type Command } from "@/lib/diagram/commands";
import { emptyDrawing } from "@/lib/diagram/new";
import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing } from "@/lib/diagram/schema";
import { done, frozen, run, SMALL, smallDrawing } from "./support";

const ref = (collection: "equipment" | "circuits" | "raceways" | "sensors" | "texts" | "interlocks" | "bonds", id: string) => ({ collection, id });
const point = { x: 3, y: 7 };
const MORE: readonly Command[] = [
  { type: "moveElements", refs: [ref("equipment", "house"), ref("raceways", "way"), ref("texts", "note")], dx: 3, dy: -2 },
  { type: "moveElements", refs: [ref("circuits", "output")], dx: 1, dy: 1 },
  { type: "turnElements", refs: [ref("equipment", "array"), ref("raceways", "way"), ref("sensors", "sensor")], turn: "clockwise" },
  { type: "turnElements", refs: [ref("equipment", "pump")], turn: "mirror" },
  { type: "resizeElement", ref: ref("equipment", "house"), at: { x: 18, y: 3 }, size: { width: 20, height: 18 } },
  { type: "resizeElement", ref: ref("raceways", "way"), at: { x: 18, y: 3 }, size: { width: 20, height: 18 } },
  { type: "setParent", id: "pump", parent: "house" },
  { type: "setProperty", id: "inverter", name: "trackers", value: 4 },
  { type: "setProperty", id: "cb-a", name: "ratingA", value: null, source: { document: "HB-78", page: "12" } },
  { type: "takeFromLibrary", id: "cb-a", from: { ref: { entry: "7d444840-9dc0-41d1-b245-5ffdce74fad2", version: 2 }, name: "Breaker, 60 A", data: { props: { ratingA: 60, interruptingKA: 22, poles: null }, sources: { ratingA: { document: "Breaker sheet", page: "3" } }, ports: { load: { maximumA: 60 } } } } },
  { type: "setPort", id: "inverter", port: "ac", change: { continuousA: 32.5 } },
  { type: "setField", ref: ref("equipment", "cb-a"), path: ["location", "ambientC"], value: 40 },
  { type: "setTag", ref: ref("circuits", "output"), tag: " F20 " },
  { type: "setEnd", circuit: "service", end: "to", endpoint: { equipment: "pump", port: "line", offset: 0 } },
  { type: "routeCircuit", circuit: "output", points: [point, { x: 3, y: 9 }], bends: [point], calloutAt: point },
  { type: "setSection", circuit: "output", section: "s1", change: { lengthFt: 12, parallelSets: 2 } },
  { type: "splitSection", circuit: "output", section: "s1", id: "s2", lengthFt: 5 },
  { type: "addToRoute", circuit: "string", section: "s1", raceway: "way", compartment: "c1", index: 0 },
  { type: "removeFromRoute", circuit: "output", section: "s1", raceway: "way" },
  { type: "setRaceway", id: "stub", change: { tradeSize: "1-1/4" } },
  { type: "setStretch", raceway: "stub", stretch: "t1", change: { lengthFt: 0.8 } },
  { type: "setStretch", raceway: "stub", stretch: "t2", change: { lengthFt: 3 } },
  { type: "setCompartment", raceway: "way", compartment: "c2", name: "B", widthIn: 3 },
  { type: "setSensor", id: "sensor", change: { purpose: "load", arrow: "to" } },
  { type: "addBond", id: "strap", equipment: "inverter", kind: "neutral relay" },
  { type: "setBond", id: "house-mbj", change: { fitted: true } },
  { type: "setInterlock", id: "lock", change: { listed: true } },
  { type: "setSite", change: { edition: "2020" } },
  { type: "setSheet", change: { subtitle: "EXISTING" } },
  { type: "setTitleBlock", change: { owner: "Thorne" } },
  { type: "setUnderlay", change: { file: "0e0d5c1a-7f7e-4a52-9c59-0b2f5e1c7a11", width: 80, height: 60 } },
  { type: "applySuggestion", label: "Set CB-1 to 45 A", patches: [{ op: "replace", path: "/equipment/cb-a/props/ratingA", value: 45 }] },
  { type: "deleteElements", refs: [ref("equipment", "inverter"), ref("raceways", "way")] },
  { type: "deleteElements", refs: [ref("circuits", "output")] },
];

describe("every command", () => {
  it("undoes to exactly what was before, and redoes to exactly what came of it", () => {
    let drawing = emptyDrawing({});
    for (const command of SMALL) drawing = step(drawing, command);
    for (const command of MORE) step(smallDrawing(), command);
  });
  function step(drawing: Drawing, command: Command): Drawing {
    const before = canonicalJson(drawing);
    const result = done(frozen(drawing), command);
    expect(canonicalJson(drawing)).toBe(before);
    expect(checkDocument(result.drawing), command.type).toEqual([]);
    expect(canonicalJson(applyPatches(drawing, result.patches)), command.type).toBe(canonicalJson(result.drawing));
    expect(canonicalJson(applyPatches(result.drawing, result.inverse)), command.type).toBe(before);
    expect(canonicalJson(result.drawing), command.type).not.toBe(before);
    expect(result.title, command.type).toMatch(/^[a-z]/);
    return result.drawing;
  }
  it("is here at least once", () => {
    const types = new Set([...SMALL, ...MORE].map((command) => command.type));
    const elsewhere = ["removeSection", "removeStretch", "removeCompartment", "removeUnderlay", "paste"];
    // The list of types as the union names them; a new one fails here until it has an example.
    const all: Record<Command["type"], true> = {
      placeEquipment: true, moveElements: true, turnElements: true, resizeElement: true, setParent: true, deleteElements: true, setProperty: true, takeFromLibrary: true, setPort: true, setField: true,
      setTag: true, joinPorts: true, setEnd: true, routeCircuit: true, setSection: true, splitSection: true, removeSection: true, addToRoute: true, removeFromRoute: true,
      placeRaceway: true, setRaceway: true, setStretch: true, removeStretch: true, setCompartment: true, removeCompartment: true, placeSensor: true, setSensor: true,
      addBond: true, setBond: true, addInterlock: true, setInterlock: true, placeText: true, setSite: true, setSheet: true, setUnderlay: true, removeUnderlay: true, setTitleBlock: true, applySuggestion: true, paste: true,
    };
    expect([...types, ...elsewhere].sort()).toEqual(Object.keys(all).sort());
  });
  it("removes sections, stretches and compartments it added, and keeps the last", () => {
    const split = run(smallDrawing(), { type: "splitSection", circuit: "output", section: "s1", id: "s2", lengthFt: 5 });
    expect(run(split, { type: "removeSection", circuit: "output", section: "s2" })).toEqual(smallDrawing());
    const parts = run(smallDrawing(), { type: "setCompartment", raceway: "way", compartment: "c2", name: "B", widthIn: 3 }, { type: "addToRoute", circuit: "string", section: "s1", raceway: "way", compartment: "c2" });
    const one = done(parts, { type: "removeCompartment", raceway: "way", compartment: "c2" });
    expect(one.drawing.circuits["string"]?.sections["s1"]?.route).toEqual([{ raceway: "way", compartment: "c1" }]);
    expect(one.also).toHaveLength(1);
    expect(run(run(smallDrawing(), { type: "setStretch", raceway: "stub", stretch: "t2", change: {} }), { type: "removeStretch", raceway: "stub", stretch: "t2" })).toEqual(smallDrawing());
  });
});

describe("an entry of the library", () => {
  const ref = { entry: "7d444840-9dc0-41d1-b245-5ffdce74fad2", version: 2 };
  const take = (props: Record<string, number | string | null>): Command => ({ type: "takeFromLibrary", id: "cb-a", from: { ref, name: "Breaker, 60 A", data: { props, sources: { ratingA: { document: "Breaker sheet", page: "3" } }, ports: { load: { maximumA: 60 }, nowhere: { maximumA: 1 } } } } });
  it("gives its values with the page behind them, says what it replaced, and leaves what it does not know", () => {
    const { drawing, also } = done(smallDrawing(), take({ ratingA: 60, interruptingKA: 22, poles: null }));
    expect(drawing.equipment["cb-a"]).toMatchObject({ library: ref, props: { ratingA: 60, interruptingKA: 22, poles: 2 }, sources: { ratingA: { document: "Breaker sheet", page: "3" } }, ports: { load: { maximumA: 60 } } });
    expect(drawing.equipment["cb-a"]?.ports["nowhere"]).toBeUndefined();
    expect(also).toEqual(["Trip rating: 40 becomes 60."]);
  });
  it("can be let go of; the values stay", () => {
    const { drawing } = done(run(smallDrawing(), take({ ratingA: 60 })), { type: "takeFromLibrary", id: "cb-a", from: null });
    expect(drawing.equipment["cb-a"]).toMatchObject({ props: { ratingA: 60 } });
    expect(drawing.equipment["cb-a"]?.library).toBeUndefined();
  });
  it("is refused where it holds what the kind does not", () => {
    expect(applyCommand(smallDrawing(), take({ moduleW: 400 }))).toMatchObject({ ok: false, field: "moduleW" });
    expect(applyCommand(smallDrawing(), take({ ratingA: -1 }))).toMatchObject({ ok: false, field: "ratingA" });
  });
});

describe("refusals", () => {
  const end = (equipment: string, port: string) => ({ equipment, port, offset: 0 });
  it.each<[string, Command]>([
    ["an id that is taken", { type: "placeEquipment", id: "grid", kind: "utility", at: point }],
    ["a parent that is no enclosure", { type: "placeEquipment", id: "x", kind: "breaker", at: point, parent: "grid" }],
    ["a property of another kind", { type: "setProperty", id: "grid", name: "ratingA", value: 1 }],
    ["an inherited name as a property", { type: "setProperty", id: "grid", name: "constructor", value: 1 }],
    ["a value beyond its limits", { type: "setProperty", id: "cb-a", name: "ratingA", value: 9e9 }],
    ["a value that takes a landed circuit's place away", { type: "setProperty", id: "array-none", name: "x", value: 1 }],
    ["equipment inside itself", { type: "setParent", id: "house", parent: "house" }],
    ["two systems joined", { type: "joinPorts", id: "x", from: end("array", "dc"), to: end("pump", "line") }],
    ["a terminal that holds a circuit already", { type: "joinPorts", id: "x", from: end("pump", "line"), to: end("cb-a", "load") }],
    ["both ends on one piece", { type: "joinPorts", id: "x", from: end("house", "bus"), to: end("house", "bus") }],
    ["a port that does not exist", { type: "joinPorts", id: "x", from: end("pump", "side"), to: end("house", "bus") }],
    ["a raceway twice in one route", { type: "addToRoute", circuit: "output", section: "s1", raceway: "way", compartment: "c1" }],
    ["the only section", { type: "removeSection", circuit: "output", section: "s1" }],
    ["the only stretch", { type: "removeStretch", raceway: "stub", stretch: "t1" }],
    ["compartments of a nipple", { type: "setCompartment", raceway: "stub", compartment: "c1", name: "A", widthIn: null }],
    ["a sensor on a dc circuit", { type: "placeSensor", id: "x", circuit: "string", at: point }],
    ["an interlock of one", { type: "addInterlock", id: "x", switches: ["cb-a", "cb-a"] }],
    ["an interlock of what does not switch", { type: "addInterlock", id: "x", switches: ["cb-a", "grid"] }],
    ["a bond where there is no neutral bar", { type: "addBond", id: "x", equipment: "array", kind: "bonding screw" }],
    ["an unknown field", { type: "setField", ref: ref("equipment", "grid"), path: ["surprise"], value: 1 }],
    ["a field through a prototype", { type: "setField", ref: ref("equipment", "grid"), path: ["__proto__", "x"], value: 1 }],
    ["a tag that is too long", { type: "setTag", ref: ref("equipment", "grid"), tag: "x".repeat(25) }],
    ["a wrong trade size", { type: "setRaceway", id: "stub", change: { tradeSize: "1 inch" } }],
    ["a length below zero", { type: "setSection", circuit: "output", section: "s1", change: { lengthFt: -1 } }],
    ["a place off the sheet", { type: "moveElements", refs: [ref("equipment", "grid")], dx: 1e6, dy: 0 }],
    ["an edition nobody adopted", { type: "setSite", change: { edition: "1999" as never } }],
    ["nothing to delete", { type: "deleteElements", refs: [ref("equipment", "nowhere")] }],
    ["a stale suggestion", { type: "applySuggestion", label: "x", patches: [{ op: "test", path: "/site/edition", value: "2017" }] }],
    ["a suggestion that breaks the drawing", { type: "applySuggestion", label: "x", patches: [{ op: "remove", path: "/raceways/way" }] }],
    ["a command of no known type", { type: "toString" } as unknown as Command],
    ["a reference to nothing", { type: "setField", ref: ref("equipment", "cb-a"), path: ["parent"], value: "nowhere" }],
    ["a route through nothing", { type: "setSection", circuit: "output", section: "s1", change: { route: [{ raceway: "nowhere", compartment: null }] } }],
    ["a raceway that ends nowhere", { type: "setRaceway", id: "stub", change: { from: "nowhere" } }],
    ["a sensor read by nothing", { type: "setSensor", id: "sensor", change: { reads: "nowhere" } }],
  ])("%s", (_, command) => {
    const drawing = frozen(smallDrawing());
    const result = applyCommand(drawing, command);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.reason.length).toBeGreaterThan(10);
  });
  it("keeps a circuit's landing when a value would take it away", () => {
    const result = applyCommand(run(smallDrawing(), { type: "setProperty", id: "inverter", name: "trackers", value: 2 }), { type: "setProperty", id: "cb-a", name: "current", value: "battery dc" });
    expect(result).toMatchObject({ ok: false });
  });
});

describe("what goes with what", () => {
  it("deletes circuits, bonds and sensors that cannot stand alone, and says so", () => {
    const { drawing, also } = done(smallDrawing(), { type: "deleteElements", refs: [ref("equipment", "house")] });
    expect(Object.keys(drawing.equipment)).not.toEqual(expect.arrayContaining(["cb-a"]));
    expect(drawing.circuits["output"]).toBeUndefined();
    expect(drawing.bonds["house-mbj"]).toBeUndefined();
    expect(drawing.sensors).toEqual({});
    expect(drawing.interlocks).toEqual({});
    expect(also.join(" ")).toContain("F2");
  });
  it("mounts breakers in spaces that are free", () => {
    const drawing = smallDrawing();
    expect(drawing.equipment["cb-a"]?.spaces).toEqual([1, 3]);
    const spaces = [drawing.equipment["cb-a"], drawing.equipment["cb-b"]].flatMap((each) => each?.spaces ?? []);
    expect(new Set(spaces).size).toBe(4);
    expect(freeSpaces(drawing, "house", 2)?.some((space) => spaces.includes(space))).toBe(false);
  });
  it("pastes a copy with new ids and free tags, whole", () => {
    const drawing = smallDrawing();
    const { content, cut } = copyElements(drawing, [ref("equipment", "inverter"), ref("equipment", "pack")]);
    expect([...cut].sort()).toEqual(["F2", "S1"]);
    const ids = Object.fromEntries(idsIn(content).map((id) => [id, `copy-${id}`]));
    const { drawing: next, inverse } = done(drawing, { type: "paste", content, ids, dx: 0, dy: 30 });
    expect(checkDocument(next)).toEqual([]);
    const tags = Object.values(next.equipment).map((each) => each.tag);
    expect(new Set(tags).size).toBe(tags.length);
    expect(canonicalJson(applyPatches(next, inverse))).toBe(canonicalJson(drawing));
    expect(applyCommand(drawing, { type: "paste", content, ids: {}, dx: 0, dy: 0 })).toMatchObject({ ok: false, field: "ids" });
  });
});
