import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { CAP_HEIGHT_EM, canLetter, fitText, letter, sheetWords, textSpan, textWidth, wrapText } from "@/lib/sheets/lettering";

/** Advances and capital height read from a font file itself (OpenType 1.9: head, hhea, hmtx, cmap format 4, OS/2). */
function readFont(name: string) {
  const bytes = readFileSync(`public/fonts/${name}.ttf`);
  const tables = new Map<string, number>();
  for (let i = 0; i < bytes.readUInt16BE(4); i += 1) tables.set(bytes.toString("latin1", 12 + 16 * i, 16 + 16 * i), bytes.readUInt32BE(20 + 16 * i));
  const at = (table: string): number => tables.get(table) ?? Number.NaN;
  const em = bytes.readUInt16BE(at("head") + 18);
  const metrics = bytes.readUInt16BE(at("hhea") + 34);
  const maps = Array.from({ length: bytes.readUInt16BE(at("cmap") + 2) }, (_, i) => at("cmap") + bytes.readUInt32BE(at("cmap") + 8 + 8 * i));
  const map = maps.find((each) => bytes.readUInt16BE(each) === 4) ?? Number.NaN;
  const segments = bytes.readUInt16BE(map + 6) / 2;
  const glyph = (code: number): number => {
    for (let i = 0; i < segments; i += 1) {
      if (bytes.readUInt16BE(map + 14 + 2 * i) < code) continue;
      const start = bytes.readUInt16BE(map + 16 + 2 * segments + 2 * i);
      if (start > code) return 0;
      const delta = bytes.readUInt16BE(map + 16 + 4 * segments + 2 * i);
      const place = map + 16 + 6 * segments + 2 * i;
      const range = bytes.readUInt16BE(place);
      if (range === 0) return (code + delta) & 0xffff;
      const found = bytes.readUInt16BE(place + range + 2 * (code - start));
      return found === 0 ? 0 : (found + delta) & 0xffff;
    }
    return 0;
  };
  const advance = (code: number): number => bytes.readUInt16BE(at("hmtx") + 4 * Math.min(glyph(code), metrics - 1)) / em;
  return { glyph, advance, capHeight: bytes.readInt16BE(at("OS/2") + 88) / em };
}

describe("lettering against the font files", () => {
  it.each([["ferrule-lettering", "normal"], ["ferrule-lettering-narrow", "narrow"]] as const)("%s has the widths that the sheets reckon with", (name, face) => {
    const font = readFont(name);
    const characters = Array.from({ length: 95 }, (_, i) => String.fromCharCode(32 + i)).concat([..."°±×½²ÑÖé–—ΩΔ≤≥≠√→•"]);
    for (const character of characters) {
      const code = character.codePointAt(0) ?? 0;
      expect([character, canLetter(character)]).toEqual([character, font.glyph(code) !== 0]);
      // Font units are 1/1024 em and the table's are 1/1000; the narrow face is rounded once more.
      expect(Math.abs(textWidth(character, 1, face) - font.advance(code)), character).toBeLessThan(0.003);
    }
    expect(font.capHeight).toBeCloseTo(CAP_HEIGHT_EM, 6);
  });
});

describe("words on a sheet", () => {
  it("are capitals, with units as they are written", () => {
    expect(letter("Sccr 10 ka, 3 kw and 250 kcmil")).toBe("SCCR 10 kA, 3 kW AND 250 kcmil");
    expect(sheetWords("a\u2713b…")).toBe("A?B...");
  });
  it("break between words and never between a figure and its unit", () => {
    const lines = wrapText("INTERRUPTING RATING 20 kA, VOLTAGE 80 V", 13, "narrow", 150);
    expect(lines.join(" ")).toBe("INTERRUPTING RATING 20 kA, VOLTAGE 80 V");
    expect(lines.length).toBeGreaterThan(1);
    for (const line of lines) {
      expect(textWidth(line, 13, "narrow")).toBeLessThanOrEqual(150);
      expect(line).not.toMatch(/^(kA|V)\b/);
    }
  });
  it("are cut with a mark where they cannot fit", () => {
    const cut = fitText("INTERCONNECT CABINET", 13, "narrow", 60);
    expect(cut).toMatch(/^INTER.*\.\.$/);
    expect(textWidth(cut, 13, "narrow")).toBeLessThanOrEqual(60);
    expect(fitText("N-3", 13, "narrow", 60)).toBe("N-3");
  });
  it("span to the right of a start, about a middle and to the left of an end", () => {
    const width = textWidth("CB-F1", 13, "normal");
    expect(textSpan(100, "CB-F1", 13, "normal", "start")).toEqual({ left: 100, right: 100 + width });
    expect(textSpan(100, "CB-F1", 13, "normal", "middle")).toEqual({ left: 100 - width / 2, right: 100 + width / 2 });
    expect(textSpan(100, "CB-F1", 13, "normal", "end")).toEqual({ left: 100 - width, right: 100 });
  });
});
