import { jurisdictionChange } from "@/lib/api";
import { changeJurisdiction, deleteJurisdiction, getJurisdiction } from "@/lib/server/data/jurisdictions";
import { handle } from "@/lib/server/http/handle";
import { jurisdictionParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { jurisdictionId } }) => getJurisdiction(actor, jurisdictionId) });
export const PATCH = handle({ params, body: jurisdictionChange, perMinute: 120, run: ({ actor, params: { jurisdictionId }, body }) => changeJurisdiction(actor, jurisdictionId, body) });
export const DELETE = handle({ params, run: ({ actor, params: { jurisdictionId } }) => deleteJurisdiction(actor, jurisdictionId) });
