import { libraryQuery } from "@/lib/api";
import { jobLibrary } from "@/lib/server/data/libraryUse";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

const query = libraryQuery.pick({ q: true, kind: true });

export const GET = handle({ params, query, run: ({ actor, params: { jobId }, query: { q, kind } }) => jobLibrary(actor, jobId, { q, kind }) });
