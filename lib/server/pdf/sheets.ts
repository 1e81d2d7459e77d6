import "server-only";
import { buildGraph } from "@/lib/diagram/graph";
import { sheetSet } from "@/lib/sheets/set";
import type { SealOnSheet, SheetPage } from "@/lib/sheets/context";
import { stateSpace } from "@/lib/states";
import type { SheetSource } from "@/lib/server/data/sheetSets";
import { getBytes } from "@/lib/server/storage";
import { writePdf } from "./write";

/** Width and height of a PNG, px, from its header. */
function pngSize(bytes: Buffer): { widthPx: number; heightPx: number } {
  return { widthPx: bytes.readUInt32BE(16), heightPx: bytes.readUInt32BE(20) };
}

async function sealOf(source: SheetSource): Promise<SealOnSheet | null> {
  const { seal } = source;
  if (!seal) return null;
  const picture = seal.graphicKey ? await getBytes(seal.graphicKey) : null;
  return {
    licensee: seal.licensee, title: seal.title, state: seal.state, number: seal.number, expiresOn: seal.expiresOn,
    signedOn: seal.sealedAt.toISOString().slice(0, 10), sealCode: seal.sealCode, legend: "",
    graphic: picture ? { href: `data:image/png;base64,${picture.toString("base64")}`, ...pngSize(picture) } : null,
  };
}

/** The sheets of a revision as pictures, from its frozen drawing alone. */
export async function sheetsOf(source: SheetSource): Promise<SheetPage[]> {
  const graph = buildGraph(source.drawing);
  return sheetSet({
    drawing: source.drawing, graph, states: stateSpace(graph), check: source.check, digest: source.digest,
    revisions: source.revisions, seal: await sealOf(source), sealPlace: source.kind === "sealed" ? "NOT SEALED" : "DRAFT",
  });
}

/** Draws the PDF of a revision. Date and file id come from the revision, so that drawing it again gives the same bytes. */
export async function renderSheets(source: SheetSource): Promise<{ bytes: Buffer; sheets: number }> {
  const pages = await sheetsOf(source);
  const { titleBlock } = source.drawing.sheet;
  const bytes = await writePdf(pages, {
    title: `${titleBlock.jobName}, Rev ${source.letter}`, subject: `${titleBlock.jobNumber} ${source.purpose}`.trim(), author: titleBlock.preparer || titleBlock.designedBy,
    createdAt: source.seal?.sealedAt ?? source.issuedAt, fileId: source.digest.slice(0, 32), bookmarks: source.bookmarks,
  });
  return { bytes, sheets: pages.length };
}
