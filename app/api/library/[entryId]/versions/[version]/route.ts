import { getVersion } from "@/lib/server/data/library";
import { handle } from "@/lib/server/http/handle";
import { entryVersionParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { entryId, version } }) => getVersion(actor, entryId, version) });
