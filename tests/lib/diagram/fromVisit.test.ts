import { describe, expect, it } from "vitest";
import { applyAll } from "@/lib/client/gate";
import { checkDocument } from "@/lib/diagram/check";
import { NO_CHOICES, celsius, fromVisit, guessedChoices, takenAtFirst, temperatureWords, visitLines, visitSource, type VisitChoices, type VisitFacts } from "@/lib/diagram/fromVisit";
import { emptyDrawing } from "@/lib/diagram/new";
import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing } from "@/lib/diagram/schema";
import { emptyRow, emptyVisit, visitDataSchema, type VisitData } from "@/lib/diagram/siteVisit";
import { frozen, run, smallDrawing } from "./support";

const visitOf = (change: Partial<VisitData>): VisitFacts => ({ visitedOn: "2026-11-30", byName: "K. Fenner", data: visitDataSchema.parse({ ...emptyVisit(), ...change }) });
const SOURCE = "site visit, Nov 30, 2026, K. Fenner";
/** Everything that could be taken, taken as one step. */
function taken(drawing: Drawing, visit: VisitFacts, choices: VisitChoices = NO_CHOICES, only: (key: string) => boolean = () => true) {
  const keys = new Set(visitLines(drawing, visit, choices).map((line) => line.key).filter(only));
  const result = applyAll(frozen(drawing), fromVisit(drawing, visit, choices, keys));
  if (!result.ok) throw new Error(result.reason);
  expect(checkDocument(result.drawing)).toEqual([]);
  expect(applyPatches(result.drawing, result.inverse)).toEqual(drawing);
  return result.drawing;
}
const shown = (drawing: Drawing, visit: VisitFacts, choices: VisitChoices = NO_CHOICES) => visitLines(drawing, visit, choices).map((line) => [line.target, line.field, line.before, line.after]);

describe("a visit on which nothing was looked at", () => {
  it("would set nothing", () => {
    const data = { ...emptyVisit(), panels: [emptyRow.panels("p1")], lengths: [emptyRow.lengths("l1")], places: [emptyRow.places("w1")] };
    const choices = { panels: { p1: { as: "update", id: "house" } }, lengths: { l1: { circuit: "output", section: "s1" } }, places: { w1: "inverter" }, raceways: { way: "attic" } } as const;
    // The panel was found standing there; that is all there is to say of it.
    expect(shown(smallDrawing(), { ...visitOf({}), data }, choices)).toEqual([["MM-1", "Status", "new", "existing"]]);
  });
});

describe("temperatures", () => {
  // ITS-90 fixed points in both scales: water freezes at 32 °F and boils at 212 °F; both scales meet at −40 (common knowledge of the trade).
  it.each([[32, "°F", 0], [212, "°F", 100], [-40, "°F", -40], [104, "°F", 40], [37.5, "°C", 37.5]] as const)("%s %s is %s °C", (value, unit, expected) => {
    expect(celsius({ value, unit })).toBe(expected);
  });
  it("are said as they were read, with the other scale beside", () => {
    expect(temperatureWords({ value: 141, unit: "°F" })).toBe("141 °F (60.6 °C)");
    expect(temperatureWords({ value: 40, unit: "°C" })).toBe("40 °C");
  });
  it("are taken only by decision: one day is not the highest that is expected", () => {
    const visit = visitOf({ temperatures: { ...emptyVisit().temperatures, attic: { value: 122, unit: "°F" } } });
    const [line] = visitLines(smallDrawing(), visit, { ...NO_CHOICES, raceways: { way: "attic" } });
    expect(line).toMatchObject({ field: "Ambient", after: "122 °F (50 °C)", caution: expect.stringContaining("one day") as string });
    expect(line && takenAtFirst(line)).toBe(false);
  });
});

describe("the service", () => {
  const service = { ...emptyVisit().service, utilityName: "Orrin Rural Electric", availableFaultCurrentA: 10_400, faultCurrentStatedBy: "letter of March 12", system: "120/240 V, 3-wire" as const, mainRatingA: 200 };
  it("sets site, utility and the main of the only service equipment, each with its source", () => {
    const drawing = taken(smallDrawing(), visitOf({ service }));
    expect(drawing.site).toMatchObject({
      utilityName: "Orrin Rural Electric", availableFaultCurrentA: 10_400, serviceSystem: "120/240 V, 3-wire",
      faultCurrentSource: `letter of March 12; ${SOURCE}`, faultCurrentOn: "2026-11-30",
    });
    expect(drawing.equipment["grid"]?.props).toMatchObject({ name: "Orrin Rural Electric", availableFaultCurrentA: 10_400 });
    expect(drawing.equipment["grid"]?.sources["availableFaultCurrentA"]).toEqual({ document: SOURCE, page: "letter of March 12" });
    expect(drawing.equipment["house-main"]?.props.ratingA).toBe(200);
  });
  it("asks first where nobody stated the fault current", () => {
    const lines = visitLines(smallDrawing(), visitOf({ service: { ...service, faultCurrentStatedBy: null } }), NO_CHOICES).filter((line) => line.field === "Available fault current");
    expect(lines).toHaveLength(2);
    for (const line of lines) expect([line.caution, takenAtFirst(line)]).toEqual([expect.stringContaining("who stated it"), false]);
  });
  it("does not choose between two pieces of service equipment", () => {
    const two = run(smallDrawing(), { type: "placeEquipment", id: "barn", kind: "meter-main", at: { x: 20, y: 60 } });
    expect(shown(two, visitOf({ service })).filter(([, field]) => field === "Trip rating")).toEqual([]);
  });
  it("takes a bond that was seen for fitted, and one that was not seen for nothing", () => {
    const seen = (bondSeen: "yes" | "no") => shown(smallDrawing(), visitOf({ grounding: { ...emptyVisit().grounding, bondSeen } }));
    expect(seen("yes")).toEqual([["MBJ-1 in MM-1", "Fitted", "", "yes"]]);
    expect(seen("no")).toEqual([]);
  });
});

describe("a panel that was found", () => {
  const panel = { ...emptyRow.panels("p1"), name: "Barn", location: "inside barn entry", labelText: "Halden MB, 125 A MAX", busA: 125, mainA: 100, spacesTotal: 12 };
  it("is placed as existing with its main joined to its bus, where nothing stands", () => {
    const drawing = taken(smallDrawing(), visitOf({ panels: [panel], service: { ...emptyVisit().service, system: "120/240 V, 3-wire" } }), { ...NO_CHOICES, panels: { p1: { as: "panelboard", id: "new" } } });
    const made = drawing.equipment["new"];
    expect(made).toMatchObject({ kind: "panelboard", tag: "BARN", status: "existing", props: { busA: 125, spacesTotal: 12, mainType: "main breaker" }, location: { place: "inside barn entry" }, note: "Barn: Halden MB, 125 A MAX" });
    expect(made?.sources["busA"]).toEqual({ document: SOURCE, page: "panel label" });
    // What a label does not say stays unknown.
    expect(made?.props.shortCircuitKA).toBeNull();
    expect(drawing.equipment["new-main"]).toMatchObject({ kind: "breaker", parent: "new", status: "existing", spaces: [], props: { ratingA: 100, poles: 2, position: "main", mount: null, interruptingKA: null } });
    expect(drawing.circuits["new-main-bus"]).toMatchObject({ wiring: "factory", to: { equipment: "new", port: "bus" } });
    const box = { x: made?.at.x ?? 0, y: made?.at.y ?? 0 };
    for (const [id, other] of Object.entries(smallDrawing().equipment)) {
      if (!other.size || other.parent) continue;
      const apart = box.x >= other.at.x + other.size.width || other.at.x >= box.x + 16 || box.y >= other.at.y + other.size.height || other.at.y >= box.y + 14;
      expect([id, apart]).toEqual([id, true]);
    }
  });
  it("as a meter-main comes with the main of its kind", () => {
    const drawing = taken(emptyDrawing({}), visitOf({ panels: [panel] }), { ...NO_CHOICES, panels: { p1: { as: "meter-main", id: "new" } } });
    expect(drawing.equipment["new-main"]).toMatchObject({ status: "existing", props: { ratingA: 100 } });
    expect(drawing.bonds["new-mbj"]?.fitted).toBeNull();
  });
  it("is not half placed: without the panel, its ratings have no place", () => {
    const drawing = taken(emptyDrawing({}), visitOf({ panels: [panel] }), { ...NO_CHOICES, panels: { p1: { as: "panelboard", id: "new" } } }, (key) => !key.endsWith(".place"));
    expect(drawing.equipment).toEqual({});
  });
  it("that is drawn already gets what is not known, and says what would be replaced", () => {
    const before = run(smallDrawing(), { type: "setProperty", id: "house", name: "busA", value: 200 });
    const choices = { ...NO_CHOICES, panels: { p1: { as: "update", id: "house" } } } as const;
    const lines = visitLines(before, visitOf({ panels: [panel] }), choices);
    expect(lines.map((line) => [line.field, line.before, line.after, takenAtFirst(line)])).toEqual([
      ["Status", "new", "existing", false], ["Bus rating", "200 A", "125 A", false], ["Trip rating", "", "100 A", true], ["Spaces", "20", "12", false], ["Place", "", "inside barn entry", true],
      ["Note", "", "Barn: Halden MB, 125 A MAX", true],
    ]);
    const after = taken(before, visitOf({ panels: [panel] }), choices);
    expect(after.equipment["house"]?.props).toMatchObject({ busA: 125, spacesTotal: 12 });
    expect(after.equipment["house-main"]?.props.ratingA).toBe(100);
    // Taken once, there is nothing left to take.
    expect(visitLines(after, visitOf({ panels: [panel] }), choices)).toEqual([]);
  });
  it("that has been deleted meanwhile is left out", () => {
    expect(shown(emptyDrawing({}), visitOf({ panels: [panel] }), { ...NO_CHOICES, panels: { p1: { as: "update", id: "house" } } })).toEqual([]);
  });
});

describe("lengths, places and raceways", () => {
  it("go where they were chosen for", () => {
    const visit = visitOf({
      lengths: [{ ...emptyRow.lengths("l1"), from: "INV-1", to: "MM-1", lengthFt: 42.5 }],
      places: [{ ...emptyRow.places("w1"), what: "INV-1", building: "A", place: "east wall", exposure: "outdoor", ambient: { value: 104, unit: "°F" }, clearDepthIn: 36 }],
      temperatures: { ...emptyVisit().temperatures, roof: { value: 131, unit: "°F" } }, roof: { ...emptyVisit().roof, conduitAboveRoofIn: 3.5 },
    });
    const choices: VisitChoices = { panels: {}, lengths: { l1: { circuit: "output", section: "s1" } }, places: { w1: "inverter" }, raceways: { stub: "roof" } };
    const drawing = taken(smallDrawing(), visit, choices);
    expect(drawing.circuits["output"]?.sections["s1"]?.lengthFt).toBe(42.5);
    expect(drawing.equipment["inverter"]).toMatchObject({ location: { building: "A", place: "east wall", exposure: "outdoor", ambientC: 40 } });
    expect(drawing.raceways["stub"]?.stretches["t1"]).toMatchObject({ ambientC: 55, aboveRoofIn: 3.5 });
    expect(drawing.raceways["way"]).toEqual(smallDrawing().raceways["way"]);
  });
  it("reach only the part on the roof, and in the attic only what is indoors", () => {
    const split = run(smallDrawing(),
      { type: "setStretch", raceway: "stub", stretch: "t1", change: { exposure: "roof" } }, { type: "setStretch", raceway: "stub", stretch: "t2", change: { exposure: "indoor dry" } },
      { type: "setStretch", raceway: "stub", stretch: "t3", change: { exposure: "outdoor" } });
    const visit = visitOf({ temperatures: { ...emptyVisit().temperatures, roof: { value: 55, unit: "°C" }, attic: { value: 48, unit: "°C" } } });
    const ambient = (where: "roof" | "attic") => {
      const stub = taken(split, visit, { ...NO_CHOICES, raceways: { stub: where } }).raceways["stub"];
      return ["t1", "t2", "t3"].map((id) => stub?.stretches[id]?.ambientC);
    };
    expect(ambient("roof")).toEqual([55, null, null]);
    expect(ambient("attic")).toEqual([null, 48, null]);
  });
  it("never set a value to not known", () => {
    const known = run(smallDrawing(), { type: "setSection", circuit: "output", section: "s1", change: { lengthFt: 12 } });
    expect(shown(known, visitOf({ lengths: [emptyRow.lengths("l1")] }), { ...NO_CHOICES, lengths: { l1: { circuit: "output", section: "s1" } } })).toEqual([]);
  });
});

describe("what is proposed", () => {
  it("follows words that name one thing plainly, and leaves the rest open", () => {
    const drawing = run(smallDrawing(), { type: "setStretch", raceway: "stub", stretch: "t1", change: { exposure: "roof" } }, { type: "setRaceway", id: "way", change: { location: { building: null, place: null, exposure: null, ambientC: null, room: "attic" } } });
    const data = visitDataSchema.parse({
      ...emptyVisit(),
      panels: [{ ...emptyRow.panels("p1"), name: "mm 1" }, { ...emptyRow.panels("p2"), name: "the one in the barn" }],
      // The breaker it lands on stands in MM-1.
      lengths: [{ ...emptyRow.lengths("l1"), from: "mm-1", to: "INV-1" }, { ...emptyRow.lengths("l2"), from: "roof", to: "INV-1" }],
      places: [{ ...emptyRow.places("w1"), what: "inv-1" }, { ...emptyRow.places("w2"), what: "battery" }],
    });
    expect(guessedChoices(drawing, data)).toEqual({
      panels: { p1: { as: "update", id: "house" }, p2: { as: "nothing" } }, lengths: { l1: { circuit: "output", section: "s1" } }, places: { w1: "inverter" }, raceways: { stub: "roof", way: "attic" },
    });
  });
});

it("names day and person of a visit as the source", () => {
  expect(visitSource({ visitedOn: "2026-11-30", byName: " K. Fenner " })).toBe(SOURCE);
  expect(visitSource({ visitedOn: "2026-01-05", byName: "" })).toBe("site visit, Jan 5, 2026");
});
