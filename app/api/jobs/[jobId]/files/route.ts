import { uploadQuery } from "@/lib/api";
import { addFile, listFiles } from "@/lib/server/data/files";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: async ({ actor, params: { jobId } }) => ({ files: await listFiles(actor, { jobId }) }) });

/** The body is the file itself. */
export const POST = handle({
  params, query: uploadQuery, perMinute: 60, status: 201,
  run: ({ actor, params: { jobId }, query, request }) => addFile(actor, { jobId }, query, request),
});
