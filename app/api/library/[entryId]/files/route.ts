import { uploadQuery } from "@/lib/api";
import { addFile, listFiles } from "@/lib/server/data/files";
import { handle } from "@/lib/server/http/handle";
import { entryParams as params } from "@/lib/server/http/params";

export const GET = handle({
  params, run: async ({ actor, params: { entryId } }) => ({ files: await listFiles(actor, { libraryEntryId: entryId }) }),
});

/** The body is the file itself. */
export const POST = handle({
  params, query: uploadQuery, perMinute: 60, status: 201,
  run: ({ actor, params: { entryId }, query, request }) => addFile(actor, { libraryEntryId: entryId }, query, request),
});
