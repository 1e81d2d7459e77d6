import { jobChange } from "@/lib/api";
import { getJob, updateJob } from "@/lib/server/data/jobs";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { jobId } }) => getJob(actor, jobId) });
export const PATCH = handle({ params, body: jobChange, run: ({ actor, params: { jobId }, body }) => updateJob(actor, jobId, body) });
