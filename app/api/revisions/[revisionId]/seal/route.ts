import { sealInput } from "@/lib/api";
import { sealRevision } from "@/lib/server/data/seals";
import { handle } from "@/lib/server/http/handle";
import { revisionParams as params } from "@/lib/server/http/params";

export const POST = handle({ params, body: sealInput, perMinute: 20, status: 202, run: ({ actor, params: { revisionId }, body }) => sealRevision(actor, revisionId, body.password) });
