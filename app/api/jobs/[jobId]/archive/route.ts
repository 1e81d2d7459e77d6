import { archiveInput } from "@/lib/api";
import { archiveJob } from "@/lib/server/data/jobLife";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const POST = handle({ params, body: archiveInput, run: ({ actor, params: { jobId }, body }) => archiveJob(actor, jobId, body.archived) });
