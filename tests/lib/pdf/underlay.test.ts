import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, expect, it } from "vitest";
import { applyCommand } from "@/lib/diagram/commands";
import { writePdf, type PdfFacts } from "@/lib/server/pdf/write";
import { sheetSet } from "@/lib/sheets/set";
import { DIGEST, contextOf } from "@/tests/lib/sheets/support/context";
import { farm } from "@/tests/lib/sheets/support/farm";

const folder = mkdtempSync(path.join(tmpdir(), "underlay-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));
const FACTS: PdfFacts = { title: "A farm, Rev A", subject: "26-031", author: "Lanternfield", createdAt: new Date("2026-04-23T17:04:05Z"), fileId: DIGEST.slice(0, 32) };

// Debian's pdfimages reads the file independently of the program that wrote it.
it("prints no picture that lies under the drawing: the same bytes, without an image in them", async () => {
  const under = applyCommand(farm(), { type: "setUnderlay", change: { file: "0e0d5c1a-7f7e-4a52-9c59-0b2f5e1c7a11", width: 100, height: 70 } });
  if (!under.ok) throw new Error(under.reason);
  const bytes = await writePdf(sheetSet(contextOf(under.drawing)), FACTS);
  expect(Buffer.compare(bytes, await writePdf(sheetSet(contextOf(farm())), FACTS))).toBe(0);
  const file = path.join(folder, "set.pdf");
  writeFileSync(file, bytes);
  const listed = execFileSync("pdfimages", ["-list", file], { encoding: "utf8" }).trim().split("\n");
  expect(listed[0]).toContain("page");
  expect(listed.slice(2)).toEqual([]);
}, 60_000);
