import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fromTabbed, placePaste, toTabbed } from "@/components/schedules/gridText";

describe("tab-separated cells", () => {
  // Layout of text/tab-separated-values (IANA media type registration): lines of cells, one tab between two.
  it("reads plain lines, Windows breaks and a trailing break", () => {
    expect(fromTabbed("a\tb\r\nc\td\r\n")).toEqual([["a", "b"], ["c", "d"]]);
  });
  it("keeps empty cells and reads quoted ones", () => {
    expect(fromTabbed("\t\n\"two\nlines\"\t\"a \"\"b\"\"\"")).toEqual([["", ""], ["two\nlines", "a \"b\""]]);
  });
  it("gives back what it wrote", () => {
    const cell = fc.string({ maxLength: 8 }).filter((s) => !s.includes("\r") && s !== "");
    fc.assert(fc.property(fc.array(fc.array(cell, { minLength: 2, maxLength: 3 }), { minLength: 1, maxLength: 4 }), (cells) => {
      expect(fromTabbed(toTabbed(cells))).toEqual(cells);
    }));
  });
});

describe("where a paste goes", () => {
  const one = { top: 1, left: 2, bottom: 1, right: 2 };
  it("puts a column down from the cell", () => {
    expect(placePaste([["a"], ["b"]], one, 5, 5).cells).toEqual([{ row: 1, column: 2, text: "a" }, { row: 2, column: 2, text: "b" }]);
  });
  it("fills a selected range with one cell", () => {
    expect(placePaste([["x"]], { top: 0, left: 0, bottom: 1, right: 1 }, 5, 5).cells).toHaveLength(4);
  });
  it("counts what does not fit instead of dropping it", () => {
    expect(placePaste([["a"], ["b"]], { top: 4, left: 0, bottom: 4, right: 0 }, 5, 5)).toEqual({ cells: [{ row: 4, column: 0, text: "a" }], outside: 1 });
  });
});
