import "server-only";
import { FILE_BYTES, FILE_PIXELS, type FilePurpose, type FileType } from "@/lib/api";
import { Problem, unprocessable } from "@/lib/server/http/problem";
import { TYPES_FOR, TYPE_WORDS, announcedType, otherKind, typeList } from "./kinds";
import { PdfRefusal, countPdfPages, type PdfFault } from "./pdf";
import { PictureRefusal, cleanPicture } from "./picture";
import { turns } from "./turns";

/** What is stored of an upload: a PDF as it came, a picture drawn anew. */
export interface InspectedFile { bytes: Buffer; contentType: FileType; widthPx: number | null; heightPx: number | null; pages: number | null }

const oneAtATime = turns(1);
const refuse = (detail: string, code = "file-damaged") => unprocessable("file", detail, code);

/** A file above the limit, before or after it was read. */
export const fileTooLarge = () =>
  new Problem(413, "file-too-large", "Too large", `The file is larger than ${Math.round(FILE_BYTES / 1024 / 1024)} MB, the most that is taken.`, { field: "file", limitBytes: FILE_BYTES });

const PDF_FAULTS: Readonly<Record<PdfFault, string>> = {
  damaged: "says it is a PDF, but it is damaged or cut off",
  protected: "is a PDF protected with a password or against copying; print it to a new PDF and upload that",
  "too dense": "is a PDF whose tables unpack to more than is taken",
  "no pages": "is a PDF without pages",
  "too many pages": "is a PDF of more than 3,000 pages",
};

/**
 * Judges a file by what it is, whatever its name says.
 * @throws Problem 422 naming what it is, or what is wrong with it
 */
export async function inspectFile(bytes: Buffer, purpose: FilePurpose): Promise<InspectedFile> {
  if (bytes.length === 0) throw refuse("is empty (0 bytes)", "file-empty");
  const type = announcedType(bytes);
  const taken = TYPES_FOR[purpose];
  if (!type || !taken.includes(type)) {
    const found = type ? TYPE_WORDS[type] : otherKind(bytes);
    throw refuse(`is ${found}, whatever its name says; a ${purpose} is ${typeList(taken)}`, "file-type");
  }
  return oneAtATime(() => (type === "application/pdf" ? inspectPdf(bytes) : inspectPicture(bytes, type)));
}

async function inspectPdf(bytes: Buffer): Promise<InspectedFile> {
  try {
    return { bytes, contentType: "application/pdf", widthPx: null, heightPx: null, pages: await countPdfPages(bytes) };
  } catch (error) {
    if (error instanceof PdfRefusal) throw refuse(PDF_FAULTS[error.fault]);
    throw error;
  }
}

async function inspectPicture(bytes: Buffer, type: Exclude<FileType, "application/pdf">): Promise<InspectedFile> {
  try {
    const picture = await cleanPicture(bytes, type);
    return { ...picture, contentType: type, pages: null };
  } catch (error) {
    if (!(error instanceof PictureRefusal)) throw error;
    if (!error.size) throw refuse(`says it is ${TYPE_WORDS[type]}, but it is damaged or cut off`);
    const { widthPx, heightPx } = error.size;
    const megapixels = (pixels: number) => Number((pixels / 1e6).toFixed(1)).toLocaleString("en-US");
    throw refuse(`has ${widthPx} × ${heightPx} px, ${megapixels(widthPx * heightPx)} megapixels; at most ${megapixels(FILE_PIXELS)} are taken`, "file-pixels");
  }
}
