import { z } from "zod";

/** What a stored file is for; decides which types are taken and where it is listed. */
export const FILE_PURPOSES = ["document", "datasheet", "picture", "site photo", "background"] as const;
export type FilePurpose = (typeof FILE_PURPOSES)[number];
/** Types that are taken, by what the content is, whatever the name says. */
export const FILE_TYPES = ["application/pdf", "image/png", "image/jpeg", "image/webp"] as const;
export type FileType = (typeof FILE_TYPES)[number];
/** Largest file, bytes. */
export const FILE_BYTES = 20 * 1024 * 1024;
/** Most pixels of a picture, width × height: a phone's 48-megapixel photo is the largest that is taken. */
export const FILE_PIXELS = 48_500_000;

export const uploadQuery = z.strictObject({ name: z.string().min(1, "is missing").max(300), purpose: z.enum(FILE_PURPOSES) });

export interface FileAnswer {
  id: string; name: string; purpose: FilePurpose; contentType: FileType; bytes: number; digest: string;
  widthPx: number | null; heightPx: number | null; pages: number | null; uploadedBy: string; uploadedAt: string;
  may: { remove: boolean };
}
