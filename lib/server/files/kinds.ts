import { FILE_TYPES, type FilePurpose, type FileType } from "@/lib/api";

const latin = (bytes: Buffer, start: number, end: number) => bytes.toString("latin1", start, end);

/** What each taken type is called in a sentence. */
export const TYPE_WORDS: Readonly<Record<FileType, string>> = {
  "application/pdf": "a PDF", "image/png": "a PNG picture", "image/jpeg": "a JPEG picture", "image/webp": "a WebP picture",
};

const PICTURES: readonly FileType[] = ["image/png", "image/jpeg", "image/webp"];
/** Types taken for each purpose. A background is drawn under the sheet, so it is a picture. */
export const TYPES_FOR: Readonly<Record<FilePurpose, readonly FileType[]>> = {
  document: FILE_TYPES, datasheet: ["application/pdf"], picture: PICTURES, "site photo": PICTURES, background: PICTURES,
};

/** The taken type that the first bytes announce, or null. A PDF begins with its header: what stands before it may be another file. */
export function announcedType(bytes: Buffer): FileType | null {
  if (latin(bytes, 0, 5) === "%PDF-") return "application/pdf";
  if (bytes.subarray(0, 8).equals(Buffer.from("89504e470d0a1a0a", "hex"))) return "image/png";
  if (bytes.subarray(0, 3).equals(Buffer.from("ffd8ff", "hex"))) return "image/jpeg";
  if (latin(bytes, 0, 4) === "RIFF" && latin(bytes, 8, 12) === "WEBP") return "image/webp";
  return null;
}

/** Beginnings of files that people send by mistake or with intent, and what they are. */
const OTHERS: readonly [RegExp, string][] = [
  [/^MZ/, "a Windows program"], [/^\x7fELF/, "a Linux program"], [/^(\xca\xfe\xba\xbe|\xcf\xfa\xed\xfe|\xfe\xed\xfa)/, "a program"], [/^#!/, "a script"],
  [/^PK(\x03\x04|\x05\x06)/, "a ZIP archive or an office document"], [/^\xd0\xcf\x11\xe0/, "an old office document"],
  [/^Rar!/, "a RAR archive"], [/^7z\xbc\xaf/, "a 7z archive"], [/^\x1f\x8b/, "a gzip archive"],
  [/^GIF8/, "a GIF picture"], [/^BM/, "a BMP picture"], [/^(II\*\0|MM\0\*)/, "a TIFF picture"],
  [/^[^]{4}ftyp(heic|heix|mif1|msf1|hevc)/, "a HEIC picture"], [/^[^]{4}ftypavif/, "an AVIF picture"], [/^[^]{4}ftyp/, "a video"],
  [/^AC10/, "a DWG drawing"], [/^\s*0\r?\n\s*SECTION/, "a DXF drawing"], [/^\{\\rtf/, "an RTF text"], [/^%!PS/, "a PostScript file"],
  [/^(\xef\xbb\xbf)?\s*<(!doctype html|html|head|body|script|iframe|div)/i, "a web page"], [/^(\xef\xbb\xbf)?\s*(<\?xml[^]*?)?\s*<svg/i, "an SVG picture"],
  [/^(\xef\xbb\xbf)?\s*<\?xml/i, "an XML file"],
];

/** What bytes of no taken type are, in words: "a web page", "text". */
export function otherKind(bytes: Buffer): string {
  const start = latin(bytes, 0, 1024);
  const known = OTHERS.find(([beginning]) => beginning.test(start));
  if (known) return known[1];
  return /^[\t\n\r\x20-\x7e\x80-\xff]+$/.test(start) && !/[\x80-\x9f]{4}/.test(start) ? "text" : "of no kind that is known here";
}

/** "a PDF", "a PNG picture, a JPEG picture or a WebP picture". */
export function typeList(types: readonly FileType[]): string {
  const words = types.map((type) => TYPE_WORDS[type]);
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} or ${words.at(-1) ?? ""}`;
}
