import { saveInput } from "@/lib/api";
import { saveDrawing, savesSince } from "@/lib/server/data/drawings";
import { handle } from "@/lib/server/http/handle";
import { drawingParams as params, sinceQuery } from "@/lib/server/http/params";

export const GET = handle({ params, query: sinceQuery, run: ({ actor, params: { drawingId }, query }) => savesSince(actor, drawingId, query.since) });
export const POST = handle({ params, body: saveInput, run: ({ actor, params: { drawingId }, body }) => saveDrawing(actor, drawingId, body) });
