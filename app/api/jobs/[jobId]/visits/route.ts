import { visitInput } from "@/lib/api";
import { createVisit, listVisits } from "@/lib/server/data/visits";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { jobId } }) => listVisits(actor, jobId) });
export const POST = handle({ params, body: visitInput, maxBytes: 1024 * 1024, perMinute: 60, status: 201, run: ({ actor, params: { jobId }, body }) => createVisit(actor, jobId, body) });
