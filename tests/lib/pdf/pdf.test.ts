import { createHash } from "node:crypto";
import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { sheetSet } from "@/lib/sheets/set";
import { letter } from "@/lib/sheets/lettering";
import type { SheetPage } from "@/lib/sheets/context";
import { writePdf, type PdfFacts } from "@/lib/server/pdf/write";
import { CHECK, DIGEST, SEAL, contextOf } from "@/tests/lib/sheets/support/context";
import { farm } from "@/tests/lib/sheets/support/farm";

/** Debian's tools read the file independently of the program that wrote it; without them the check fails. */
const tool = (name: string, ...args: string[]): string => execFileSync(name, args, { encoding: "utf8", maxBuffer: 64 * 1024 * 1024 });
const sha256 = (bytes: Uint8Array): string => createHash("sha256").update(bytes).digest("hex");
const FACTS: PdfFacts = { title: "Teasel Hill Creamery, Rev A", subject: "26-031", author: "Lanternfield", createdAt: new Date("2026-04-23T17:04:05Z"), fileId: DIGEST.slice(0, 32) };

const demo = typeof cleanDrawing === "function" ? cleanDrawing() : cleanDrawing;
const picture = readFileSync("seeders/demo/sealGraphic.png");
const graphic = { href: `data:image/png;base64,${picture.toString("base64")}`, widthPx: picture.readUInt32BE(16), heightPx: picture.readUInt32BE(20) };
let folder = "";
let file = "";
let pages: SheetPage[] = [];
let bytes: Buffer = Buffer.alloc(0);

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), "sheets-"));
  file = path.join(folder, "set.pdf");
  pages = sheetSet(contextOf(demo, { seal: { ...SEAL, graphic } }));
  bytes = await writePdf(pages, FACTS);
  writeFileSync(file, bytes);
}, 60_000);
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe("the sheet set as PDF", () => {
  it("is the same file when it is drawn again, also while others are drawn", async () => {
    const other = sheetSet(contextOf(farm()));
    const again = await Promise.all([writePdf(other, FACTS), writePdf(pages, FACTS), writePdf(other, FACTS), writePdf(pages, FACTS)]);
    expect(again.map(sha256)).toEqual([sha256(again[0]), sha256(bytes), sha256(again[0]), sha256(bytes)]);
    expect(sha256(again[0])).not.toBe(sha256(bytes));
  }, 60_000);
  it("is another file with another date, id or drawing", async () => {
    const shown = pages.slice(0, 1);
    const base = sha256(await writePdf(shown, FACTS));
    expect(sha256(await writePdf(shown, { ...FACTS, createdAt: new Date("2026-04-24T17:04:05Z") }))).not.toBe(base);
    expect(sha256(await writePdf(shown, { ...FACTS, fileId: "f".repeat(32) }))).not.toBe(base);
  }, 60_000);
  it("is sound", () => {
    expect(tool("qpdf", "--check", file)).toContain("No syntax or stream encoding errors found");
  });
  it("has every font embedded, with its words searchable", () => {
    const rows = tool("pdffonts", file).trim().split("\n").slice(2);
    expect(rows.map((row) => row.slice(0, 36).trim()).sort()).toEqual(["Ferrule Lettering", "Ferrule Lettering Narrow"]);
    for (const row of rows) expect(row).toMatch(/ yes (yes|no) {1,2}yes /);
  });
  it("holds every tag, callout, rating, the digest and the seal code as text", () => {
    const printed = tool("pdftotext", "-layout", file, "-");
    const squeezed = printed.replace(/\s+/g, "");
    for (const each of [...Object.values(demo.equipment), ...Object.values(demo.raceways)]) expect(printed).toContain(letter(each.tag));
    for (const circuit of Object.values(demo.circuits).filter((each) => each.wiring === "field")) expect(printed).toContain(letter(circuit.callout ?? circuit.tag));
    expect(squeezed).toContain(DIGEST.slice(0, 24).toUpperCase());
    for (const phrase of ["SEAL CODE F7K2-91QD", "125 A 2P", "ORRIN RURAL ELECTRIC", "27 RULES RUN", "OR LICENSE E-00000"]) expect(printed).toContain(phrase);
  });
  it("has no bookmark where none is wanted, and is then the same file each time too", async () => {
    const plain = await writePdf(pages, { ...FACTS, bookmarks: false });
    const other = path.join(folder, "plain.pdf");
    writeFileSync(other, plain);
    expect(JSON.parse(tool("qpdf", "--json", "--json-key=outlines", other)).outlines).toEqual([]);
    expect(sha256(await writePdf(pages, { ...FACTS, bookmarks: false }))).toBe(sha256(plain));
    expect(sha256(plain)).not.toBe(sha256(bytes));
  });

  it("says on each sheet that an edition is not confirmed, and of one that was read nothing", () => {
    const words = (edition: "2023" | "2026"): string[] => sheetSet(contextOf(farm(), { check: { ...CHECK, edition } })).map((page) => JSON.stringify(page.primitives));
    expect(words("2026").every((page) => page.includes(`(${letter("not confirmed")})`))).toBe(true);
    expect(words("2023").some((page) => page.includes(letter("not confirmed")))).toBe(false);
  });

  it("has a page of the plotted size and a bookmark for each sheet, and says who and when", () => {
    const facts = tool("pdfinfo", "-isodates", file);
    expect(facts).toMatch(new RegExp(`Pages: +${pages.length}\\n`));
    // 34 × 22 in at 72 points to the inch.
    expect(facts).toContain("2448 x 1584 pts");
    expect(facts).toContain("Teasel Hill Creamery, Rev A");
    expect(facts).toContain("2026-04-23T17:04:05Z");
    const structure = tool("qpdf", "--json", "--json-key=outlines", file);
    for (const page of pages) expect(structure).toContain(`${page.number} ${page.title}`);
  });
  it("draws lines as vectors: the seal's picture is the only image", () => {
    const images = tool("pdfimages", "-list", file).trim().split("\n").slice(2).filter((row) => / image /.test(row));
    expect(images.length).toBeGreaterThan(0);
    const objects = new Set(images.map((row) => row.trim().split(/\s+/)[10]));
    expect(objects.size).toBe(1);
  });
  it("letters capitals at least 3/16 in high on the plotted sheet, measured on the raster", () => {
    // The narrow face at its least size: a word that stands alone on a white place of the title block.
    const words = tool("pdftotext", "-f", "1", "-l", "1", "-bbox", file, "-");
    const hit = /xMin="([\d.]+)" yMin="([\d.]+)" xMax="([\d.]+)" yMax="([\d.]+)">PLOTTED</.exec(words);
    const [x0, y0, x1, y1] = (hit ?? []).slice(1).map(Number) as [number, number, number, number];
    expect(hit).not.toBeNull();
    const dpi = 300;
    const px = (points: number) => Math.round((points / 72) * dpi);
    tool("pdftoppm", "-r", String(dpi), "-f", "1", "-l", "1", "-x", String(px(x0) + 2), "-y", String(px(y0)), "-W", String(px(x1 - x0) - 4), "-H", String(px(y1 - y0)), "-gray", "-singlefile", file, path.join(folder, "word"));
    const raster = readFileSync(path.join(folder, "word.pgm"));
    const [, width, height] = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(raster.subarray(0, 40).toString("latin1"))?.map(Number) ?? [];
    const start = raster.length - (width ?? 0) * (height ?? 0);
    const rows = Array.from({ length: height ?? 0 }, (_, row) => raster.subarray(start + row * (width ?? 0), start + (row + 1) * (width ?? 0)).some((gray) => gray < 128));
    // The tallest run of rows with ink is the word; a shorter one may be a rule of the block.
    const inkRows = Math.max(...rows.map((ink) => (ink ? "x" : " ")).join("").split(/ +/).map((run) => run.length));
    expect(inkRows / dpi).toBeGreaterThanOrEqual(3 / 16);
    expect(inkRows / dpi).toBeLessThan(0.24);
  });
});

it("refuses a set without sheets", async () => {
  await expect(writePdf([], FACTS)).rejects.toThrow("at least one sheet");
});
