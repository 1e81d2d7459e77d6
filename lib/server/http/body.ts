import "server-only";
import { Problem } from "./problem";

const tooLarge = (limit: number) =>
  new Problem(413, "too-large", "Too large", `The request body is larger than ${Math.round(limit / 1024)} kB.`, { limitBytes: limit });

/**
 * Reads a body without ever holding more than `limit` bytes of it.
 * @throws Problem 413 when it is larger, whatever its headers say
 */
export async function readBytes(request: Request, limit: number): Promise<Buffer> {
  const stated = Number(request.headers.get("content-length") ?? "0");
  if (stated > limit) throw tooLarge(limit);
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > limit) {
      await reader.cancel();
      throw tooLarge(limit);
    }
    chunks.push(value);
  }
  return Buffer.concat(chunks);
}

/**
 * Reads a JSON body.
 * @throws Problem 415 for another content type, 400 when it is no JSON (NaN and Infinity are none), 413 when too large
 */
export async function readJson(request: Request, limit: number): Promise<unknown> {
  const type = request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
  if (type !== "application/json") throw new Problem(415, "content-type", "Unsupported content", "Send application/json.");
  const text = (await readBytes(request, limit)).toString("utf8");
  try {
    return JSON.parse(text) as unknown;
  } catch {
    throw new Problem(400, "not-json", "Not JSON", "The request body is not valid JSON.");
  }
}
