import { updateInput, updateQuery } from "@/lib/api";
import { jurisdictionUpdate, takeJurisdiction } from "@/lib/server/data/jurisdictionUpdate";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, query: updateQuery, perMinute: 120, run: ({ actor, params: { jobId }, query }) => jurisdictionUpdate(actor, jobId, query.edition) });
export const POST = handle({ params, body: updateInput, perMinute: 30, run: ({ actor, params: { jobId }, body }) => takeJurisdiction(actor, jobId, body) });
