import "server-only";
import sharp, { type Sharp } from "sharp";
import { FILE_PIXELS, type FileType } from "@/lib/api";

/** Widths a picture is asked for in, px. */
export const THUMB_WIDTHS_PX = [320, 1280] as const;
export type ThumbWidthPx = (typeof THUMB_WIDTHS_PX)[number];
/** At this a photo shows no difference beside its original. */
const QUALITY = 92;
const THUMB_QUALITY = 80;

export class PictureRefusal extends Error {
  constructor(readonly fault: "damaged" | "too many pixels", readonly size: { widthPx: number; heightPx: number } | null = null) {
    super(fault);
  }
}

export interface Picture { bytes: Buffer; widthPx: number; heightPx: number }
type PictureType = Exclude<FileType, "application/pdf">;

/**
 * A picture drawn anew from its pixels: turned upright, without location, camera or any other data beside the pixels,
 * and without what was hidden behind its end.
 * @param type what its first bytes announce
 * @throws PictureRefusal naming what is wrong
 */
export async function cleanPicture(bytes: Buffer, type: PictureType): Promise<Picture> {
  // The size stands in the header: a picture that is too large is refused before a pixel of it is unpacked.
  const header = await sharp(bytes, { limitInputPixels: false }).metadata().catch(() => null);
  if (!header) throw new PictureRefusal("damaged");
  const size = { widthPx: header.width, heightPx: header.height };
  if (size.widthPx * size.heightPx > FILE_PIXELS) throw new PictureRefusal("too many pixels", size);
  try {
    const upright = sharp(bytes, { limitInputPixels: FILE_PIXELS, failOn: "error" }).autoOrient();
    const { data, info } = await written(upright, type, header.chromaSubsampling).toBuffer({ resolveWithObject: true });
    return { bytes: data, widthPx: info.width, heightPx: info.height };
  } catch (error) {
    console.warn("picture refused:", error instanceof Error ? error.message : error);
    throw new PictureRefusal("damaged");
  }
}

function written(picture: Sharp, type: PictureType, chromaSubsampling = "4:4:4"): Sharp {
  if (type === "image/png") return picture.png({ compressionLevel: 8 });
  if (type === "image/webp") return picture.webp({ quality: QUALITY, smartSubsample: true });
  // Colors at full resolution only where the original has them: more would add bytes and no detail.
  return picture.jpeg({ quality: QUALITY, chromaSubsampling: chromaSubsampling === "4:2:0" ? "4:2:0" : "4:4:4" });
}

/** A smaller copy for lists and previews, WebP; a picture that is not wider stays as wide as it is. */
export function thumbnail(bytes: Buffer, widthPx: ThumbWidthPx): Promise<Buffer> {
  return sharp(bytes, { limitInputPixels: FILE_PIXELS, failOn: "none" })
    .resize({ width: widthPx, height: widthPx * 2, fit: "inside", withoutEnlargement: true })
    .webp({ quality: THUMB_QUALITY }).toBuffer();
}
