import { duplicateInput } from "@/lib/api";
import { duplicateJob } from "@/lib/server/data/jobLife";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const POST = handle({ params, body: duplicateInput, perMinute: 60, status: 201, run: ({ actor, params: { jobId }, body }) => duplicateJob(actor, jobId, body) });
