import { visitChange } from "@/lib/api";
import { changeVisit, getVisit } from "@/lib/server/data/visits";
import { handle } from "@/lib/server/http/handle";
import { visitParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { visitId } }) => getVisit(actor, visitId) });
export const PATCH = handle({ params, body: visitChange, maxBytes: 1024 * 1024, run: ({ actor, params: { visitId }, body }) => changeVisit(actor, visitId, body) });
