import { describe, expect, it } from "vitest";
import { applyCommand, type Command } from "@/lib/diagram/commands";
import { buildGraph } from "@/lib/diagram/graph";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing } from "@/lib/diagram/schema";
import { conductorSchedule, conductorText, equipmentSchedule, printedColumns, racewaySchedule, type Schedule, type ScheduleColumn, type ScheduleRow } from "@/lib/schedules";
import { run, smallDrawing } from "../diagram/support";

const BUILD = { equipment: equipmentSchedule, conductors: conductorSchedule, raceways: racewaySchedule };
type Which = keyof typeof BUILD;
const of = (which: Which, drawing: Drawing): Schedule => BUILD[which](buildGraph(drawing));
const rowOf = (schedule: Schedule, tag: string): ScheduleRow => {
  const found = schedule.rows.find((row) => row.tag === tag);
  if (!found) throw new Error(`no row ${tag}`);
  return found;
};
const columnOf = (schedule: Schedule, id: string): ScheduleColumn => {
  const found = schedule.columns.find((column) => column.id === id);
  if (!found) throw new Error(`no column ${id}`);
  return found;
};
const shown = (which: Which, drawing: Drawing, tag: string, id: string): string => { const schedule = of(which, drawing); return columnOf(schedule, id).text(rowOf(schedule, tag)); };
/** Writes a cell as a person does; the answer is the new drawing, or the reason why not. */
function write(which: Which, drawing: Drawing, tag: string, id: string, text: string): Drawing | string {
  const schedule = of(which, drawing);
  const answer = schedule.command(rowOf(schedule, tag), id, text);
  if ("reason" in answer) return answer.reason;
  let at = drawing;
  for (const command of answer.commands) {
    const result = applyCommand(at, command);
    if (!result.ok) return result.reason;
    at = result.drawing;
  }
  return at;
}
const written = (...args: Parameters<typeof write>): Drawing => { const made = write(...args); if (typeof made === "string") throw new Error(made); return made; };

describe("every schedule", () => {
  const which = Object.keys(BUILD) as Which[];
  it.each(which)("%s is empty on an empty sheet and has a row for every element of a drawn one", (name) => {
    expect(of(name, emptyDrawing({})).rows).toEqual([]);
    const drawing = smallDrawing();
    const wanted = name === "equipment" ? Object.keys(drawing.equipment) : name === "raceways" ? Object.keys(drawing.raceways) : Object.keys(drawing.circuits).filter((id) => drawing.circuits[id]?.wiring === "field");
    expect(of(name, drawing).rows.map((row) => row.ref.id).sort()).toEqual(wanted.sort());
  });
  it.each(which)("%s names columns once and keeps a cell that is entered as it stands", (name) => {
    const drawing = smallDrawing();
    const schedule = of(name, drawing);
    const ids = schedule.columns.map((column) => column.id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const row of schedule.rows) for (const column of schedule.columns) {
      if (!column.editable(row)) { expect(column.parse(row, "1")).toHaveProperty("reason"); continue; }
      const answer = column.parse(row, column.text(row));
      expect(answer, `${column.id} of ${row.tag}`).toHaveProperty("commands");
      if ("commands" in answer) for (const command of answer.commands) expect(run(drawing, command), `${column.id} of ${row.tag}`).toEqual(drawing);
    }
  });
  it.each(which)("%s prints columns that hold something, the tag first, and never the word null", (name) => {
    const schedule = of(name, smallDrawing());
    const printed = printedColumns(schedule);
    expect(printed[0]?.id).toBe("tag");
    for (const column of printed) {
      if (column.id !== "tag") expect(schedule.rows.some((row) => column.print(row) !== ""), column.id).toBe(true);
      for (const row of schedule.rows) expect(column.print(row)).not.toMatch(/null|undefined|NaN/);
    }
  });
  it("stands in the order of numbers in tags", () => {
    const drawing = run(emptyDrawing({}), ...[10, 9, 1, 2].map((n): Command => ({ type: "placeRaceway", id: `r${n}`, kind: "conduit", at: { x: n, y: 1 }, tag: `R-${n}` })));
    expect(of("raceways", drawing).rows.map((row) => row.tag)).toEqual(["R-1", "R-2", "R-9", "R-10"]);
  });
});

describe("entries", () => {
  it("read ratings with units, write null for an empty cell and leave other rows alone", () => {
    const drawing = smallDrawing();
    const tag = drawing.equipment["cb-a"]?.tag ?? "";
    expect(written("equipment", drawing, tag, "ratingA", "50 A").equipment["cb-a"]?.props["ratingA"]).toBe(50);
    expect(written("equipment", drawing, tag, "interruptingKA", "10,000 A").equipment["cb-a"]?.props["interruptingKA"]).toBe(10);
    expect(written("equipment", drawing, tag, "ratingA", "").equipment["cb-a"]?.props["ratingA"]).toBeNull();
    expect(written("equipment", drawing, tag, "mount", "BOLT-ON").equipment["cb-a"]?.props["mount"]).toBe("bolt-on");
    expect(written("equipment", drawing, tag, "ambientC", "104 °F").equipment["cb-a"]?.location.ambientC).toBeCloseTo(40, 9);
  });
  it.each<[Which, string, string, string]>([
    ["equipment", "CB", "ratingA", "fifty"], ["equipment", "CB", "ratingA", "-5"], ["equipment", "CB", "ratingA", "50 ft"], ["equipment", "CB", "poles", "1.5"], ["equipment", "CB", "mount", "glued"],
    ["equipment", "CB", "energyKWh", "5"], ["equipment", "CB", "status", ""], ["equipment", "CB", "tag", " "], ["equipment", "CB", "kind", "fuse"],
    ["conductors", "F2", "ungrounded", "7 AWG"], ["conductors", "F2", "insulation", "silk"], ["conductors", "F2", "metal", "Ag"], ["conductors", "F2", "lengthFt", "-1"], ["conductors", "F2", "sets", "0"],
    ["conductors", "F2", "route", "N-99"], ["conductors", "F2", "route", "N-1 N-1"], ["conductors", "F2", "usableA", "100"],
    ["raceways", "N-1", "tradeSize", "7/8"], ["raceways", "N-1", "type", "hose"], ["raceways", "N-1", "widthIn", "4"], ["raceways", "N-1", "from", "nothing"], ["raceways", "WW-1", "tradeSize", "1"],
  ])("%s: %s %s refuses %j with a reason", (which, tag, column, text) => {
    const drawing = smallDrawing();
    expect(write(which, drawing, tag === "CB" ? drawing.equipment["cb-a"]?.tag ?? "" : tag, column, text)).toBeTypeOf("string");
  });
  it("write sizes the way the trade does, and change wires bought as one together", () => {
    let drawing = written("conductors", smallDrawing(), "F2", "ungrounded", "#8");
    expect(drawing.circuits["output"]?.sections["s1"]?.ungrounded?.size).toBe("8 AWG");
    drawing = written("conductors", drawing, "F2", "insulation", "xhhw-2");
    const section = drawing.circuits["output"]?.sections["s1"];
    expect([section?.ungrounded?.insulation, section?.grounded?.insulation, section?.equipmentGround?.insulation]).toEqual(["XHHW-2", "XHHW-2", "XHHW-2"]);
  });
  it("drop a measured diameter with the wire it was measured on, and nothing else", () => {
    const measured = run(smallDrawing(), { type: "setField", ref: { collection: "circuits", id: "output" }, path: ["sections", "s1", "ungrounded", "outerDiameterIn"], value: 0.3 });
    const before = measured.circuits["output"]?.sections["s1"]?.ungrounded;
    expect(written("conductors", measured, "F2", "ungrounded", "6").circuits["output"]?.sections["s1"]?.ungrounded).toEqual({ ...before, size: "6 AWG", outerDiameterIn: null });
    expect(written("conductors", measured, "F2", "ungrounded", "")).toEqual(measured);
  });
  it("route a circuit by the tags of its raceways", () => {
    const divided = run(smallDrawing(), { type: "setCompartment", raceway: "way", compartment: "c2", name: "B", widthIn: 3 });
    expect(write("conductors", divided, "S1", "route", "WW-1")).toContain("WW-1:A");
    const drawing = written("conductors", divided, "S1", "route", "n-1, ww-1:b");
    expect(drawing.circuits["string"]?.sections["s1"]?.route).toEqual([{ raceway: "stub", compartment: null }, { raceway: "way", compartment: "c2" }]);
    expect(shown("conductors", drawing, "S1", "route")).toBe("N-1 WW-1:B");
    expect(shown("raceways", drawing, "N-1", "inside")).toBe("F2 S1");
  });
  it("say where a raceway ends by tags", () => {
    const drawing = written("raceways", smallDrawing(), "N-1", "to", "ww-1");
    expect(drawing.raceways["stub"]?.to).toBe("way");
  });
});

describe("figures", () => {
  it("stay empty while what they need is not known", () => {
    const drawing = smallDrawing();
    for (const id of ["loadA", "requiredA", "terminalA", "correctedA", "usableA", "dropPct"]) expect(shown("conductors", drawing, "F2", id), id).toBe("");
    for (const id of ["fillPct", "limitPct", "roomLeftIn2"]) expect(shown("raceways", drawing, "N-1", id), id).toBe("");
    // The breaker's rating is known.
    expect(shown("conductors", drawing, "F2", "deviceA")).toBe("40");
  });
  it("follow an entry at once", () => {
    let drawing = smallDrawing();
    for (const [column, text] of [["ungrounded", "8"], ["grounded", "8"], ["equipmentGround", "10"], ["lengthFt", "6.7"]] as const) drawing = written("conductors", drawing, "F2", column, text);
    drawing = run(drawing, { type: "setRaceway", id: "stub", change: { tradeSize: "1", location: { building: null, place: null, exposure: "indoor dry", ambientC: 40 } } },
      { type: "setStretch", raceway: "stub", stretch: "t1", change: { lengthFt: 10 / 12 } });
    // Three 8 AWG THWN-2 and one 10 AWG in a 1 in EMT nipple: (3 × .0366 + .0211) / .864 = 15.2 % of 60 (Chapter 9 Tables 1 note 4, 4 and 5).
    expect(shown("raceways", drawing, "N-1", "fillPct")).toBe("15.2");
    expect(shown("raceways", drawing, "N-1", "limitPct")).toBe("60");
    expect(shown("raceways", drawing, "N-1", "usedIn2")).toBe("0.131");
    const longer = run(drawing, { type: "setStretch", raceway: "stub", stretch: "t1", change: { lengthFt: 2.1 } });
    expect(shown("raceways", longer, "N-1", "limitPct")).toBe("40");
  });
  it("write conductors as the trade does", () => {
    const section = smallDrawing().circuits["output"]?.sections["s1"];
    if (!section?.ungrounded || !section.grounded || !section.equipmentGround) throw new Error("no conductors");
    const { ungrounded, grounded, equipmentGround } = section;
    const sized = { ...section, ungrounded: { ...ungrounded, size: "3 AWG" }, grounded: { ...grounded, size: "3 AWG" }, equipmentGround: { ...equipmentGround, size: "6 AWG" } };
    expect(conductorText(sized)).toBe("3 × 3 AWG + 6 AWG G");
    expect(conductorText({ ...sized, grounded: { ...grounded, size: "4 AWG" }, parallelSets: 2 })).toBe("2 sets of 2 × 3 AWG + 1 × 4 AWG N + 6 AWG G");
    expect(conductorText(section)).toBe("3 × ? + ? G");
  });
});
