import { describe, expect, it } from "vitest";
import { number } from "@/lib/equipment/define";
import { cellOf, guardedCell, openedCell, readCell, tableColumns } from "@/lib/equipment/libraryTable";
import { KIND_IDS, kindDefinition } from "@/lib/equipment/registry";

describe("columns of a kind's table", () => {
  it.each(KIND_IDS)("%s: no heading means two things", (kind) => {
    const accepted = tableColumns(kindDefinition(kind)).flatMap((column) => [...new Set(column.accepted)]);
    expect(accepted.filter((heading, index) => accepted.indexOf(heading) !== index)).toEqual([]);
  });

  it("have units in their headings, and datasheet and page beside what is rated", () => {
    const headings = tableColumns(kindDefinition("hybrid-inverter")).map((column) => column.heading);
    expect(headings.slice(0, 4)).toEqual(["Name", "Maker", "Model", "Listing standard"]);
    const at = headings.indexOf("Ac output (kW)");
    expect(headings.slice(at, at + 3)).toEqual(["Ac output (kW)", "Ac output: datasheet", "Ac output: page"]);
    expect(headings).not.toContain("Firmware: datasheet");
  });
});

describe("a cell", () => {
  const volts = number("Voltage", "V", -100, 10_000);
  it.each([["12.5", 12.5], [" 12 ", 12], ["-0.26", -0.26], ["+3", 3], [".5", 0.5], ["1e3", 1000], ["", null], ["   ", null]])("%j is the number %s", (cell, value) => {
    expect(readCell(volts, cell)).toEqual({ value });
  });
  it.each([
    ["12,5", /comma/], ["1,200", /comma/], ["1.200,5", /comma/], ["1 200,5", /comma/], ["12 V", /number alone; the column is in V/], ["12kV", /number alone/], ["0x10", /must be a number/],
    ["1e999", /must be a number/], ["Infinity", /must be a number/], ["--1", /must be a number/], ["1.2.3", /must be a number/], ["=1+1", /must be a number/], ["9".repeat(500), /longer/],
  ])("%j is no number, and says why", (cell, words) => {
    expect(readCell(volts, cell)).toEqual({ fault: expect.stringMatching(words) });
  });

  it.each(["=1+1", "+1+1", "-1+1", "@sum(a1)", "'=1", "''=1", "\tx", "plain", "'quoted'", "-12", "a=b"])("%j comes back as it was, and begins no formula", (text) => {
    expect(openedCell(guardedCell(text))).toBe(text);
    expect(guardedCell(text)).toMatch(/^(?![=+@\t\r])(?!-(?!12$))/);
  });

  it("says yes, no or nothing", () => {
    expect([true, false, null, 0, -2.5, "-"].map(cellOf)).toEqual(["yes", "no", "", "0", "-2.5", "'-"]);
  });
});
