import { issueInput } from "@/lib/api";
import { issueRevision, listRevisions } from "@/lib/server/data/revisions";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: async ({ actor, params: { jobId } }) => ({ revisions: await listRevisions(actor, jobId) }) });
export const POST = handle({ params, body: issueInput, perMinute: 20, status: 201, run: ({ actor, params: { jobId }, body }) => issueRevision(actor, jobId, body) });
