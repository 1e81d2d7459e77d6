import { jobInput } from "@/lib/api";
import { createJob, listJobs } from "@/lib/server/data/jobs";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: async ({ actor }) => ({ jobs: await listJobs(actor) }) });
export const POST = handle({ body: jobInput, perMinute: 60, status: 201, run: ({ actor, body }) => createJob(actor, body) });
