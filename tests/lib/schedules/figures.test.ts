import { describe, expect, it } from "vitest";
import { buildGraph } from "@/lib/diagram/graph";
import { circuitFigures, conductorSchedule, conductorText, racewayFigures, sectionFigures } from "@/lib/schedules";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

/**
 * The workshop of the demo against its circuit and raceway tables, which were worked out apart from this program with the
 * code's tables: 310.16, 310.15(B), Chapter 9 Tables 1, 4, 5, 8 and 9.
 */
const drawing = cleanDrawing();
const graph = buildGraph(drawing);
const circuitId = (tag: string): string => {
  const found = Object.entries(drawing.circuits).find(([, each]) => each.tag === tag);
  if (!found) throw new Error(`no circuit ${tag}`);
  return found[0];
};
const racewayId = (tag: string): string => {
  const found = Object.entries(drawing.raceways).find(([, each]) => each.tag === tag);
  if (!found) throw new Error(`no raceway ${tag}`);
  return found[0];
};

describe("conductors of the demo", () => {
  it.each([
    // tag, conductors, device A, ampacity at 75 °C, corrected, usable
    ["SVC", "3 × 250 kcmil", 200, 205, null, 205], ["F1b", "3 × 1 AWG + 6 AWG G", 125, 130, 131.95, 130], ["F2", "3 × 8 AWG + 10 AWG G", 45, 50, 50.05, 50], ["F3", "3 × 8 AWG + 10 AWG G", 45, 50, 50.05, 50],
    ["F4", "3 × 1 AWG + 6 AWG G", 125, 130, null, 130], ["F5", "3 × 6 AWG + 10 AWG G", 60, 65, null, 65], ["N1", "3 × 3 AWG + 6 AWG G", 80, 100, null, 100],
    ["B1", "2 × 1 AWG + 6 AWG G", 125, 130, null, 130], ["B4", "2 × 1 AWG + 6 AWG G", 125, 130, null, 130], ["D1", "2 × 250 kcmil + 4 AWG G", 250, 255, 263.9, 255], ["D2", "2 × 250 kcmil + 4 AWG G", 250, 255, 263.9, 255],
  ] as const)("%s: %s on %i A", (tag, words, deviceA, terminalA, correctedA, usableA) => {
    const id = circuitId(tag);
    const [section] = graph.sections(id);
    if (!section) throw new Error("no section");
    expect(conductorText(section)).toBe(words);
    expect(circuitFigures(graph, id).deviceA).toBe(deviceA);
    expect(circuitFigures(graph, id).terminalC).toBe(75);
    const figures = sectionFigures(graph, id, section.id);
    expect(figures.terminalA).toBe(terminalA);
    expect(figures.usableA).toBe(usableA);
    if (correctedA !== null) expect(figures.correctedA).toBeCloseTo(correctedA, 2);
  });
  it.each([
    // tag, load A, ampacity asked for A, tolerance in decimals
    ["F1b", 65, 81.25, 2], ["F2", 32.5, 40.625, 2], ["F5", 58.3, 58.3, 1], ["D1", 175, 218.75, 2], ["B1", 100, 125, 2], ["S1", 17.5625, 21.953, 2], ["P1a", 8, 10, 2],
  ] as const)("%s carries %d A and asks for %d A", (tag, loadA, requiredA, decimals) => {
    const figures = circuitFigures(graph, circuitId(tag));
    expect(figures.loadA).toBeCloseTo(loadA, decimals);
    expect(figures.requiredA).toBeCloseTo(requiredA, decimals);
  });
  it("F4 asks for what the creamery's load, with a quarter of its continuous part, comes to", () => {
    // 58.3 A and 25 % of heater and chiller: 67.2 A with the loads rounded to a tenth.
    expect(Math.abs((circuitFigures(graph, circuitId("F4")).requiredA ?? 0) - 67.2)).toBeLessThanOrEqual(0.15);
  });
  it.each([["F2", 0.14], ["F4", 0.28], ["F5", 2.16], ["N1", 0.92], ["S1", 0.66], ["S4", 0.66]] as const)("%s drops %d percent", (tag, dropPct) => {
    expect(circuitFigures(graph, circuitId(tag)).dropPct).toBeCloseTo(dropPct, 2);
  });
  it("drops .40 % along both runs of F1 and .8 % along both of P1", () => {
    const sum = (...tags: string[]): number => tags.reduce((total, tag) => total + (circuitFigures(graph, circuitId(tag)).dropPct ?? Number.NaN), 0);
    expect(sum("F1a", "F1b")).toBeCloseTo(0.4, 2);
    expect(sum("P1a", "P1b")).toBeCloseTo(0.8, 1);
  });
  it("has a string section as PV wire under the modules and one in conduit, the second the weaker", () => {
    const id = circuitId("S1");
    const [array, inside] = graph.sections(id).map((section) => sectionFigures(graph, id, section.id));
    expect(array?.correctedA).toBeCloseTo(28.4, 1);
    expect(inside?.usableA).toBeCloseTo(25.5, 1);
    expect(inside?.terminalA).toBe(35);
  });
  it("shows load, device and drop once a circuit, on its first section", () => {
    const schedule = conductorSchedule(graph);
    const rows = schedule.rows.filter((row) => row.tag === "S1");
    const load = schedule.columns.find((column) => column.id === "loadA");
    expect(rows.map((row) => load?.text(row))).toEqual(["17.56", ""]);
  });
});

describe("raceways of the demo", () => {
  it.each([
    ["R-0", 1.171, 24.1, 40], ["R-1a", 0.519, 25.5, 40], ["R-1b", 0.519, 25.5, 40], ["R-4", 0.519, 25.5, 40], ["R-5", 0.173, 20.8, 40], ["R-7", 0.343, 23.6, 40], ["R-S", 0.190, 22.0, 40],
    ["N-1", 0.131, 15.2, 60], ["N-2", 0.131, 15.2, 60], ["N-3", 0.954, 28.4, 60], ["N-4", 0.106, 12.2, 60], ["N-6", 0.492, 14.7, 60], ["N-9", 0.492, 14.7, 60], ["N-10", 0.984, 29.3, 60],
    ["N-11", 0.984, 29.3, 60], ["N-12", 1.139, 33.9, 60], ["N-13", 1.139, 33.9, 60], ["WW-1", 0.954, 2.7, 20], ["WW-2", 0.190, 0.5, 20],
    ["C-1a", 0.049, 9.2, 53], ["C-1b", 0.098, 18.4, 31], ["C-2a", 0.191, 35.9, 40], ["C-3", 0.031, 6.2, 53], ["C-5a", 0.098, 18.4, 31], ["C-5b", 0.130, 24.3, 40], ["C-6", 0.112, 21.0, 60],
  ] as const)("%s: %d in², %d percent, limit %i", (tag, usedIn2, fillPct, limitPct) => {
    const figures = racewayFigures(graph, racewayId(tag));
    // The table prints three decimals.
    expect(Math.abs((figures.usedIn2 ?? Number.NaN) - usedIn2)).toBeLessThanOrEqual(0.000501);
    // Printed to a tenth of a percent.
    expect(Number(figures.fillPct?.toFixed(1))).toBeCloseTo(fillPct, 9);
    expect(figures.limitPct).toBe(limitPct);
  });
  it.each([["WW-1", 8], ["N-3", 8], ["R-S", 8], ["R-4", 2], ["C-1b", 0]] as const)("%s holds %i current-carrying conductors", (tag, count) => {
    expect(racewayFigures(graph, racewayId(tag)).currentCarrying).toBe(count);
  });
  it("has no fill for a box", () => expect(racewayFigures(graph, racewayId("JB-2"))).toMatchObject({ fillPct: null, currentCarrying: null }));
});
