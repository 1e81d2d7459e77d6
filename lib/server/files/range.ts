import type { ByteRange } from "@/lib/server/storage";

/**
 * The part of a file that a Range header asks for (RFC 9110, 14.2).
 * @param size bytes of the whole file, above 0
 * @returns null for the whole file (no header, several parts, or one that is not understood); "outside" when the file has no such part
 */
export function requestedRange(header: string | null, size: number): ByteRange | "outside" | null {
  const match = /^bytes=\s*(\d{0,15})-(\d{0,15})\s*$/i.exec(header ?? "");
  const [, first = "", last = ""] = match ?? [];
  if (!match || (first === "" && last === "")) return null;
  if (first === "") return Number(last) === 0 ? "outside" : { start: Math.max(0, size - Number(last)), end: size - 1 };
  if (last !== "" && Number(last) < Number(first)) return null;
  return Number(first) >= size ? "outside" : { start: Number(first), end: last === "" ? size - 1 : Math.min(Number(last), size - 1) };
}
