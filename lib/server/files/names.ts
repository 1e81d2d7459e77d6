import type { FileType } from "@/lib/api";

/** Longest name kept, characters. */
export const NAME_CHARACTERS = 120;

/** Endings of each type; the first one is given to files whose own ending says something else. */
const ENDINGS: Readonly<Record<FileType, readonly string[]>> = {
  "application/pdf": ["pdf"], "image/png": ["png"], "image/jpeg": ["jpg", "jpeg", "jpe", "jfif"], "image/webp": ["webp"],
};
/** Names that one system keeps for its devices, whatever their ending. */
const DEVICE = /^(con|prn|aux|nul|com\d|lpt\d)$/i;

/**
 * The name a file is listed and downloaded under: the last part of what was sent, without markup, control, direction and
 * invisible characters, or any a file system refuses, with the ending its content calls for, at most 120 characters.
 */
export function displayName(given: string, type: FileType): string {
  const plain = given.normalize("NFC")
    .replace(/<\/?[a-z!][^<>]*>/gi, "")
    .replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Cn}\u2028\u2029]/gu, "");
  const last = plain.split(/[\\/]/).map((part) => part.trim()).filter((part) => part !== "" && !/^\.+$/.test(part)).at(-1) ?? "";
  const clean = last.replace(/[<>:"|?*%]+/g, " ").replace(/\s+/g, " ").replace(/^[\s.]+|[\s.]+$/g, "");
  const whole = split(clean);
  // "panel.pdf.exe" that is a PDF is called panel.pdf.
  const inner = split(whole.stem);
  const { stem, ending } = isEnding(whole.ending, type) || !isEnding(inner.ending, type) ? whole : inner;
  const fits = isEnding(ending, type);
  const wanted = fits ? ending : ENDINGS[type][0] ?? "";
  const room = NAME_CHARACTERS - wanted.length - 1;
  const shortened = cut(stem, room).replace(/[\s.]+$/, "") || "file";
  return `${DEVICE.test(shortened) ? `file ${shortened}` : shortened}.${wanted}`;
}

const isEnding = (ending: string, type: FileType) => ENDINGS[type].includes(ending.toLowerCase());

function split(name: string): { stem: string; ending: string } {
  const [, stem = name, ending = ""] = /^(.*)\.([a-z][a-z0-9]{0,4})$/i.exec(name) ?? [];
  return { stem, ending };
}

/** At most `room` code units, never half a character. */
function cut(text: string, room: number): string {
  let kept = "";
  for (const character of text) {
    if (kept.length + character.length > room) break;
    kept += character;
  }
  return kept;
}

/**
 * Content-Disposition of a download (RFC 6266): a plain name for old readers, and the real one (RFC 8187).
 * @param place "inline" only for what a browser shows without running it
 */
export function contentDisposition(place: "inline" | "attachment", name: string): string {
  const plain = name.normalize("NFKD").replace(/\p{M}/gu, "").replace(/[^\x20-\x7e]/g, "_").replace(/["\\%]/g, "_");
  const encoded = encodeURIComponent(name).replace(/['()*]/g, (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`);
  return `${place}; filename="${plain}"; filename*=UTF-8''${encoded}`;
}
