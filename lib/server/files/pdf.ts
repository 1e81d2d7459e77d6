import "server-only";
import { EncryptedPDFError, PDFDocument, PDFName, PDFRawStream, ParseSpeeds, decodePDFRawStream, PDFContext, PDFDict } from "pdf-lib";

/** Most that the tables inside one PDF may unpack to, bytes. Pictures and pages stay packed when a PDF is read. */
const UNPACKED_BYTES = 64 * 1024 * 1024;
/** Most pages; a whole code book is a thousand. */
const PAGES = 3_000;

export type PdfFault = "damaged" | "protected" | "too dense" | "no pages" | "too many pages";
export class PdfRefusal extends Error {
  constructor(readonly fault: PdfFault) {
    super(fault);
  }
}

interface Unpacker { ensureBuffer: (requested: number) => Uint8Array }
let unpacked = 0;
let exceeded = false;
let guarded = false;

/**
 * The parser unpacks its tables without a limit, and a few kilobytes can stand for gigabytes. Every unpacker of it asks one
 * place for room, which is made to count here.
 */
function guardUnpacking(): void {
  if (guarded) return;
  const empty = PDFDict.withContext(PDFContext.create());
  empty.set(PDFName.of("Filter"), PDFName.of("FlateDecode"));
  // A stream of nothing, to get at what all unpackers are made from.
  const sample: object = decodePDFRawStream(PDFRawStream.of(empty, new Uint8Array([0x78, 0x9c, 0x03, 0x00])));
  const base = Object.getPrototypeOf(Object.getPrototypeOf(sample)) as Unpacker;
  if (typeof base.ensureBuffer !== "function") throw new Error("the PDF parser asks for room in another way now");
  const { ensureBuffer } = base;
  base.ensureBuffer = function room(this: Unpacker & { buffer: Uint8Array }, requested: number) {
    const before = this.buffer.byteLength;
    if (requested > before) {
      unpacked += requested - before;
      if (requested > UNPACKED_BYTES || unpacked > UNPACKED_BYTES) {
        // Noted too, since the parser steps over objects it cannot read.
        exceeded = true;
        throw new PdfRefusal("too dense");
      }
    }
    return ensureBuffer.call(this, requested);
  };
  guarded = true;
}

/**
 * Pages of a PDF, after reading its whole structure. One at a time: the caller sees to it.
 * @throws PdfRefusal naming what is wrong
 */
export async function countPdfPages(bytes: Buffer): Promise<number> {
  guardUnpacking();
  unpacked = 0;
  exceeded = false;
  // A file that was cut off has no end mark; readers look for it in the last kilobyte.
  if (!bytes.subarray(-2048).includes("%%EOF")) throw new PdfRefusal("damaged");
  let pages: number;
  try {
    const document = await PDFDocument.load(bytes, { updateMetadata: false, parseSpeed: ParseSpeeds.Medium });
    pages = document.getPageCount();
  } catch (error) {
    if (exceeded) throw new PdfRefusal("too dense");
    // A protected file may also fail earlier, on tables that cannot be unpacked.
    throw new PdfRefusal(error instanceof EncryptedPDFError || bytes.includes("/Encrypt") ? "protected" : "damaged");
  } finally {
    unpacked = 0;
  }
  if (exceeded) throw new PdfRefusal("too dense");
  if (pages === 0) throw new PdfRefusal("no pages");
  if (pages > PAGES) throw new PdfRefusal("too many pages");
  return pages;
}
