import "server-only";
import { readBytes } from "@/lib/server/http/body";
import { Problem } from "@/lib/server/http/problem";

/** Whoever sent it is gone, or has stopped. */
export const interrupted = () =>
  new Problem(400, "interrupted", "The upload broke off", "The upload broke off before its end. Nothing was stored. Send the file again.");

/**
 * The whole body of an upload, or nothing: one that broke off is not taken for a short file.
 * @param tooLarge what to say above the limit
 * @throws Problem 400 `interrupted`, or `tooLarge`
 */
export async function readUpload(request: Request, limit: number, tooLarge: () => Problem): Promise<Buffer> {
  let bytes: Buffer;
  try {
    bytes = await readBytes(request, limit);
  } catch (error) {
    throw error instanceof Problem ? tooLarge() : interrupted();
  }
  const stated = request.headers.get("content-length");
  if (request.signal.aborted || (stated !== null && Number(stated) !== bytes.length)) throw interrupted();
  return bytes;
}
