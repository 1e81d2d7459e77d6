import { historyQuery } from "@/lib/api";
import { jobHistory } from "@/lib/server/data/jobLife";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, query: historyQuery, run: ({ actor, params: { jobId }, query }) => jobHistory(actor, jobId, query) });
