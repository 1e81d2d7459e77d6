import { getRevision } from "@/lib/server/data/revisions";
import { handle } from "@/lib/server/http/handle";
import { revisionParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { revisionId } }) => getRevision(actor, revisionId) });
