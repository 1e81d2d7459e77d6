import { jobInput, jobsQuery } from "@/lib/api";
import { createJob } from "@/lib/server/data/jobs";
import { listJobs } from "@/lib/server/data/jobsList";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ query: jobsQuery, run: ({ actor, query }) => listJobs(actor, query) });
export const POST = handle({ body: jobInput, perMinute: 60, status: 201, run: ({ actor, body }) => createJob(actor, body) });
