import "server-only";
import { readFileSync } from "node:fs";
import path from "node:path";
import { jsPDF } from "jspdf";
import { FACE_FAMILIES, sheetSvg } from "@/lib/sheets/svg";
import type { SheetPage } from "@/lib/sheets/context";
import type { Primitive } from "@/lib/sheets/primitives";
import { withBrowserGlobals } from "./shims";

const POINTS_PER_INCH = 72;
const FONT_FILES = { [FACE_FAMILIES.normal]: "ferrule-lettering.ttf", [FACE_FAMILIES.narrow]: "ferrule-lettering-narrow.ttf" } as const;

/**
 * Facts in the file's own description. `fileId` is 32 hexadecimal digits; with it and the date the same sheets give the same
 * bytes. Each sheet gets a bookmark unless `bookmarks` is false.
 */
export interface PdfFacts { title: string; subject: string; author: string; createdAt: Date; fileId: string; bookmarks?: boolean }

const fontData = new Map<string, string>();
function font(file: string): string {
  const known = fontData.get(file);
  if (known) return known;
  const data = readFileSync(path.join(process.cwd(), "public/fonts", file)).toString("base64");
  fontData.set(file, data);
  return data;
}

let queue: Promise<unknown> = Promise.resolve();
/** One after the other: the writer's browser globals belong to the whole process. */
function alone<T>(work: () => Promise<T>): Promise<T> {
  const next = queue.then(work, work);
  queue = next.catch(() => undefined);
  return next;
}

/** Pictures are set by the PDF writer itself; all else is drawn as vectors. */
const isImage = (each: Primitive): each is Extract<Primitive, { type: "image" }> => each.type === "image";

/**
 * Writes sheets as one vector PDF at plotted size: fonts embedded, words searchable, a bookmark for each sheet unless it is not wanted.
 * The same sheets and facts give the same bytes.
 * @throws Error when there is no sheet
 */
export function writePdf(pages: readonly SheetPage[], facts: PdfFacts): Promise<Buffer> {
  return alone(async () => {
    const [first] = pages;
    if (!first) throw new Error("a sheet set has at least one sheet");
    // A browser build of this module reads a global at import; it is loaded where the globals are in place.
    const { svg2pdf } = await import("svg2pdf.js/dist/svg2pdf.es.min.js");
    const size = (page: SheetPage): [number, number] => [page.widthIn * POINTS_PER_INCH, page.heightIn * POINTS_PER_INCH];
    const pdf = new jsPDF({ unit: "pt", format: size(first), orientation: "landscape", compress: true, putOnlyUsedFonts: true });
    pdf.setCreationDate(facts.createdAt);
    pdf.setFileId(facts.fileId.toUpperCase());
    pdf.setProperties({ title: facts.title, subject: facts.subject, author: facts.author, creator: "Ferrule" });
    pdf.setLanguage("en-US");
    for (const [family, file] of Object.entries(FONT_FILES)) {
      pdf.addFileToVFS(file, font(file));
      pdf.addFont(file, family, "normal");
    }
    for (const [index, page] of pages.entries()) {
      const [width, height] = size(page);
      if (index > 0) pdf.addPage([width, height], "landscape");
      const scale = width / page.widthPx;
      const svg = sheetSvg(page.primitives.filter((each) => !isImage(each)), page.widthPx, page.heightPx);
      await withBrowserGlobals(pdf, svg, (element) => svg2pdf(element, pdf, { x: 0, y: 0, width, height }));
      for (const image of page.primitives.filter(isImage)) pdf.addImage(image.href, "PNG", image.x * scale, image.y * scale, image.width * scale, image.height * scale, undefined, "FAST");
      if (facts.bookmarks !== false) pdf.outline.add(null, `${page.number} ${page.title}`, { pageNumber: index + 1 });
    }
    return Buffer.from(pdf.output("arraybuffer"));
  });
}
