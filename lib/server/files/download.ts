import "server-only";
import { Problem } from "@/lib/server/http/problem";
import { getBytes, getIfPresent, getRange, putIfAbsent, stream } from "@/lib/server/storage";
import { contentDisposition } from "./names";
import { requestedRange } from "./range";
import { thumbnail, type ThumbWidthPx } from "./picture";
import { turns } from "./turns";

/** What is sent: where the bytes are, and what they are. */
export interface Download { name: string; contentType: string; bytes: number; digest: string; objectKey: string }

/** Nothing a file holds may run, load or be taken for another type, wherever it is opened. */
const SAFE_HEADERS = {
  "content-security-policy": "default-src 'none'; sandbox", "x-content-type-options": "nosniff", "cross-origin-resource-policy": "same-origin",
  // Kept by the browser, and asked about each time: permission may have been taken away.
  "cache-control": "private, no-cache",
};

/**
 * A stored file as an answer: whole, or the part that was asked for (RFC 9110), or 304 when the reader has it.
 * @throws Problem 416 for a part the file does not have; 503 `store-down`
 */
export async function downloadAnswer(file: Download, request: Request, inline: boolean): Promise<Response> {
  const etag = `"${file.digest}"`;
  const headers: Record<string, string> = { ...SAFE_HEADERS, etag, "accept-ranges": "bytes" };
  if (known(request, etag)) return new Response(null, { status: 304, headers });
  Object.assign(headers, { "content-type": file.contentType, "content-disposition": contentDisposition(inline ? "inline" : "attachment", file.name) });
  const condition = request.headers.get("if-range");
  const range = condition === null || condition === etag ? requestedRange(request.headers.get("range"), file.bytes) : null;
  if (range === "outside") throw outside(file.bytes);
  if (!range) return new Response(await stream(file.objectKey), { headers: { ...headers, "content-length": String(file.bytes) } });
  return new Response(await getRange(file.objectKey, range), {
    status: 206,
    headers: { ...headers, "content-length": String(range.end - range.start + 1), "content-range": `bytes ${range.start}-${range.end}/${file.bytes}` },
  });
}

const outside = (size: number) =>
  new Problem(416, "range", "No such part", `The file has ${size} bytes; the part that was asked for begins after them.`, { contentRange: `bytes */${size}` });

const known = (request: Request, etag: string) =>
  (request.headers.get("if-none-match") ?? "").split(",").some((each) => each.trim().replace(/^W\//, "") === etag);

const twoAtATime = turns(2);

/**
 * A picture made smaller. Kept in the store beside its original, since it is asked for by every list; a store that
 * cannot keep it does no harm.
 * @throws Problem 503 `store-down`
 */
export async function thumbnailAnswer(file: Download, request: Request, widthPx: ThumbWidthPx): Promise<Response> {
  const etag = `"${file.digest}-${widthPx}"`;
  const headers = { ...SAFE_HEADERS, etag };
  if (known(request, etag)) return new Response(null, { status: 304, headers });
  const key = `thumbs/${file.digest}-${widthPx}`;
  const kept = await getIfPresent(key);
  const bytes = kept ?? (await twoAtATime(async () => thumbnail(await getBytes(file.objectKey), widthPx)));
  if (!kept) await putIfAbsent(key, bytes, "image/webp").catch(() => undefined);
  return new Response(new Uint8Array(bytes), {
    headers: { ...headers, "content-type": "image/webp", "content-length": String(bytes.length), "content-disposition": contentDisposition("inline", `${file.name}.webp`) },
  });
}
