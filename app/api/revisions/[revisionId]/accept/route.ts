import { acceptInput } from "@/lib/api";
import { acceptFinding } from "@/lib/server/data/revisions";
import { handle } from "@/lib/server/http/handle";
import { revisionParams as params } from "@/lib/server/http/params";

export const POST = handle({ params, body: acceptInput, run: ({ actor, params: { revisionId }, body }) => acceptFinding(actor, revisionId, body) });
