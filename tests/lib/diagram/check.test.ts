import { describe, expect, it } from "vitest";
import { checkDocument } from "@/lib/diagram/check";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing } from "@/lib/diagram/schema";
import { smallDrawing } from "./support";

/** The small drawing with one change to it, and the paths of the faults it then has. */
function faults(change: (drawing: Drawing) => void): string[] {
  const drawing = structuredClone(smallDrawing());
  change(drawing);
  return checkDocument(drawing).map((fault) => fault.path);
}
const set = (path: string, value: unknown) => (drawing: Drawing): void => {
  const parts = path.split("/").slice(1);
  let at = drawing as unknown as Record<string, unknown>;
  for (const part of parts.slice(0, -1)) at = at[part] as Record<string, unknown>;
  at[parts.at(-1) as string] = value;
};

describe("checking a document", () => {
  it("finds nothing in drawings made by commands", () => {
    expect(checkDocument(emptyDrawing({}))).toEqual([]);
    expect(checkDocument(smallDrawing())).toEqual([]);
  });
  it.each([null, undefined, 0, "drawing", [], {}, { schemaVersion: 2 }, new Date(0)])("answers for %j without throwing", (document) => {
    expect(checkDocument(document).length).toBeGreaterThan(0);
  });
  const WRONG: readonly (readonly [path: string, value: unknown, named?: string])[] = [
    ["/schemaVersion", 2], ["/surprise", 1], ["/site/edition", "2024"], ["/site/recordLowC", Number.NaN], ["/site/designHighC", Infinity], ["/site/elevationM", "310"],
    ["/sheet/size", "A1"], ["/sheet/titleBlock/owner", "a\u0000b"], ["/equipment/grid/at", { x: 1 }, "/equipment/grid/at/y"], ["/equipment/grid/rotation", 45],
    ["/equipment/grid/surprise", 1], ["/equipment/grid/tag", "x".repeat(25)], ["/equipment/BAD ID", {}], ["/equipment/cb-a/spaces", [0], "/equipment/cb-a/spaces/0"],
    ["/equipment/cb-a/props/ratingA", -1], ["/equipment/cb-a/props/ratingA", "40"], ["/equipment/cb-a/props/poles", 1.5], ["/equipment/cb-a/props/mount", "glued"],
    ["/equipment/cb-a/props/color", "red"], ["/equipment/cb-a/kind", "toaster"], ["/equipment/cb-a/sources/nothing", { document: "a", page: "1" }],
    ["/equipment/cb-a/parent", "nowhere"], ["/equipment/cb-a/parent", "cb-a"], ["/equipment/cb-a/ports/side", {}],
    ["/circuits/output/from/equipment", "nowhere"], ["/circuits/output/to/port", "side"], ["/circuits/output/system", "steam"],
    ["/circuits/output/sections/s1/ungrounded/size", "7 gauge"], ["/circuits/output/sections/s1/lengthFt", -4], ["/circuits/output/sections/s1/parallelSets", 0],
    ["/circuits/output/sections/s1/sharesGroundOf", "output"], ["/circuits/output/sections/s1/sharesGroundOf", "nowhere"],
    ["/circuits/output/sections/s1/route", [{ raceway: "nowhere", compartment: null }], "/circuits/output/sections/s1/route/0"],
    ["/circuits/output/sections/s1/route", [{ raceway: "way", compartment: "c9" }], "/circuits/output/sections/s1/route/0"],
    ["/raceways/way/tradeSize", "1 1/4"], ["/raceways/way/from", "nowhere"], ["/raceways/way/to", "way"], ["/raceways/way/type", "hose"],
    ["/bonds/house-mbj/equipment", "nowhere"], ["/sensors/sensor/circuit", "nowhere"], ["/sensors/sensor/reads", "nowhere"],
    ["/interlocks/lock/switches/nowhere", true], ["/interlocks/lock/switches/grid", true],
    ["/labels/one", { number: "1", rule: null, lines: "A", places: { nowhere: true }, status: "new" }, "/labels/one/places/nowhere"],
  ];
  it.each(WRONG.map(([path, value, named]) => ({ path, value, named: named ?? path })))("names $path set to $value", ({ path, value, named }) => {
    expect(faults(set(path, value))).toContain(named);
  });
  it("takes a property that was left out for one that is not known: drawings outlive the day on which a kind gains one", () => {
    expect(faults((drawing) => { delete drawing.equipment["cb-a"]?.props["interruptingKA"]; })).toEqual([]);
    expect(faults((drawing) => { (drawing.equipment["cb-a"]?.props as Record<string, unknown>)["interruptingKiloA"] = 10; })).toEqual(["/equipment/cb-a/props/interruptingKiloA"]);
  });
  it("finds equipment that stands inside itself over several steps", () => {
    expect(faults((drawing) => { set("/equipment/house/parent", "genset")(drawing); set("/equipment/genset/parent", "house")(drawing); }))
      .toEqual(expect.arrayContaining(["/equipment/house/parent", "/equipment/genset/parent"]));
  });
  it("refuses a second field circuit on one terminal and a circuit between two systems", () => {
    expect(faults((drawing) => { set("/circuits/standby/to/equipment", "cb-a")(drawing); })).toEqual(["/circuits/standby/to/port"]);
    expect(faults(set("/circuits/output/from/port", "battery"))).toContain("/circuits/output/from/port");
    expect(faults(set("/circuits/output/to", { equipment: "inverter", port: "ac", offset: 0 }))).toContain("/circuits/output/to");
  });
  it("refuses keys that reach a prototype before anything else is read", () => {
    const document = JSON.parse("{\"site\":{\"__proto__\":{\"admin\":true}}}") as unknown;
    expect(checkDocument(document)).toEqual([{ path: "", message: "holds the key __proto__, which is not allowed" }]);
  });
  it("answers with a bounded list for a document full of faults", () => {
    const drawing = { ...emptyDrawing({}), equipment: Object.fromEntries(Array.from({ length: 3000 }, (_, i) => [`e${i}`, { kind: 7 }])) };
    expect(checkDocument(drawing).length).toBeLessThanOrEqual(1000);
  });
  it("keeps script in a name as text and nothing more", () => {
    expect(faults(set("/equipment/grid/tag", "<script>alert</script>"))).toEqual([]);
  });
});
