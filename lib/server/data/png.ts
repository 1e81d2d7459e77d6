import "server-only";
import { crc32, inflateSync } from "node:zlib";
import { SEAL_GRAPHIC_SIDE_PX } from "@/lib/api";
import { unprocessable } from "@/lib/server/http/problem";

const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
/** Samples in a pixel by color type: gray, RGB, palette, gray with alpha, RGB with alpha (PNG specification, IHDR). */
const SAMPLES: Readonly<Record<number, number>> = { 0: 1, 2: 3, 3: 1, 4: 2, 6: 4 };
const refuse = (detail: string) => unprocessable("sealGraphic", detail, "seal-graphic");

/**
 * Size of a PNG, px, after walking all its chunks, their check sums and the packed picture, so that a broken or
 * disguised file is refused when it is uploaded and not when a sheet is being sealed.
 * @throws Problem 422 naming what is wrong
 */
export function readPngSize(bytes: Buffer): { widthPx: number; heightPx: number } {
  if (!bytes.subarray(0, 8).equals(SIGNATURE)) throw refuse("is not a PNG file");
  let at = 8;
  let header: Buffer | null = null;
  const packed: Buffer[] = [];
  let ended = false;
  while (at + 12 <= bytes.length && !ended) {
    const length = bytes.readUInt32BE(at);
    if (at + 12 + length > bytes.length) throw refuse("is cut off");
    const type = bytes.toString("latin1", at + 4, at + 8);
    const data = bytes.subarray(at + 8, at + 8 + length);
    if (crc32(bytes.subarray(at + 4, at + 8 + length)) !== bytes.readUInt32BE(at + 8 + length)) throw refuse("is damaged");
    if (type === "IHDR" && length === 13) header = data;
    if (type === "IDAT") packed.push(data);
    ended = type === "IEND";
    at += 12 + length;
  }
  if (!header || !ended || packed.length === 0) throw refuse("is cut off");
  const widthPx = header.readUInt32BE(0);
  const heightPx = header.readUInt32BE(4);
  const samples = SAMPLES[header[9] ?? -1];
  if (samples === undefined) throw refuse("is damaged");
  if (widthPx < 64 || heightPx < 64) throw refuse("is smaller than 64 px");
  if (widthPx > SEAL_GRAPHIC_SIDE_PX || heightPx > SEAL_GRAPHIC_SIDE_PX) throw refuse(`is larger than ${SEAL_GRAPHIC_SIDE_PX} px`);
  const expected = heightPx * (Math.ceil((widthPx * samples * (header[8] ?? 8)) / 8) + 1);
  // Interlaced pictures have a few bytes more than that.
  if (unpackedSize(Buffer.concat(packed), expected + 65536) < expected) throw refuse("is cut off");
  return { widthPx, heightPx };
}

function unpackedSize(packed: Buffer, most: number): number {
  try {
    return inflateSync(packed, { maxOutputLength: most }).length;
  } catch {
    throw refuse("is damaged");
  }
}
