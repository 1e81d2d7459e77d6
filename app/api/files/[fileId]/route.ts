import { z } from "zod";
import { readableFile, removeFile } from "@/lib/server/data/files";
import { downloadAnswer, thumbnailAnswer } from "@/lib/server/files/download";
import { handle } from "@/lib/server/http/handle";
import { fileParams as params } from "@/lib/server/http/params";

const query = z.strictObject({
  inline: z.string().max(0, "takes no value").optional(),
  width: z.enum(["320", "1280"], "is 320 or 1280").transform((value) => (value === "320" ? 320 : 1280)).optional(),
});

/** The file itself; of a picture also a smaller copy, by ?width. */
export const GET = handle({
  params, query,
  run: async ({ actor, params: { fileId }, query: { inline, width }, request }) => {
    const file = await readableFile(actor, fileId);
    return width && file.contentType !== "application/pdf" ? thumbnailAnswer(file, request, width) : downloadAnswer(file, request, inline !== undefined);
  },
});

export const DELETE = handle({ params, run: ({ actor, params: { fileId } }) => removeFile(actor, fileId) });
