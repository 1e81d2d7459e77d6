import type { Drawing } from "@/lib/diagram/schema";
import { sha256Hex } from "@/lib/diagram/sha256";

/**
 * JSON with sorted keys and no white space, so that equal drawings have equal bytes whatever order they were edited in.
 * @throws RangeError for a number JSON cannot hold
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === "string") return quoted(value);
  if (typeof value === "number") {
    if (!Number.isFinite(value)) throw new RangeError("a drawing cannot hold a number that is not finite");
    return Object.is(value, -0) ? "0" : String(value);
  }
  if (typeof value !== "object" || value === null) return JSON.stringify(value) ?? "null";
  if (Array.isArray(value)) {
    let text = "[";
    for (let i = 0; i < value.length; i += 1) text += (i === 0 ? "" : ",") + canonicalJson(value[i] ?? null);
    return `${text}]`;
  }
  const record = value as Readonly<Record<string, unknown>>;
  let text = "";
  // The default order of sort() is that of UTF-16 code units, the same everywhere.
  for (const key of Object.keys(record).sort()) {
    const each = record[key];
    if (each !== undefined) text += `${text === "" ? "" : ","}${quoted(key)}:${canonicalJson(each)}`;
  }
  return `{${text}}`;
}
/** Most strings of a drawing are ids and short words, which need no escapes; asking JSON for each is most of the time. */
const PLAIN = /^[ !#-[\]-~]*$/;
const quoted = (text: string): string => (PLAIN.test(text) ? `"${text}"` : JSON.stringify(text));

/** The drawing as it prints: a picture that lies under it on screen is no part of what was checked, sealed or built. */
function printed(drawing: Drawing): Drawing {
  if (!drawing.sheet.underlay) return drawing;
  const { underlay: _, ...sheet } = drawing.sheet;
  return { ...drawing, sheet };
}

/**
 * Drawing digest: SHA-256, 64 hexadecimal digits, of the canonical drawing with the rule set and the edition it was checked under. The
 * underlay is left out, so that a sketch put under a sealed drawing does not void its seal.
 * It is printed on the sheets. The digest of a finished file is another number and is never printed in that file.
 */
export function drawingDigest(drawing: Drawing, ruleSet: string): string {
  return sha256Hex(new TextEncoder().encode(canonicalJson({ drawing: printed(drawing), ruleSet, edition: drawing.site.edition })));
}
