import { returnInput } from "@/lib/api";
import { returnRevision } from "@/lib/server/data/revisions";
import { handle } from "@/lib/server/http/handle";
import { revisionParams as params } from "@/lib/server/http/params";

export const POST = handle({ params, body: returnInput, run: ({ actor, params: { revisionId }, body }) => returnRevision(actor, revisionId, body.comment) });
