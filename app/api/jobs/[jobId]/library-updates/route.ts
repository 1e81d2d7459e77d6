import { libraryUpdates } from "@/lib/server/data/libraryUse";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { jobId } }) => libraryUpdates(actor, jobId) });
