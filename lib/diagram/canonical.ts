import type { Drawing } from "@/lib/diagram/schema";
import { sha256Hex } from "@/lib/diagram/sha256";

/**
 * JSON with sorted keys and no white space, so that equal drawings have equal bytes whatever order they were edited in.
 * @throws RangeError for a number JSON cannot hold
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((each) => canonicalJson(each ?? null)).join(",")}]`;
  if (typeof value === "object" && value !== null) {
    const entries = Object.entries(value).filter(([, each]) => each !== undefined).sort(([a], [b]) => (a < b ? -1 : 1));
    return `{${entries.map(([key, each]) => `${JSON.stringify(key)}:${canonicalJson(each)}`).join(",")}}`;
  }
  if (typeof value === "number" && !Number.isFinite(value)) throw new RangeError("a drawing cannot hold a number that is not finite");
  return JSON.stringify(value) ?? "null";
}

/**
 * Drawing digest: SHA-256, 64 hexadecimal digits, of the canonical drawing with the rule set and the edition it was checked under.
 * It is printed on the sheets. The digest of a finished file is another number and is never printed in that file.
 */
export function drawingDigest(drawing: Drawing, ruleSet: string): string {
  return sha256Hex(new TextEncoder().encode(canonicalJson({ drawing, ruleSet, edition: drawing.site.edition })));
}
