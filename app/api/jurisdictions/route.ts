import { jurisdictionMake } from "@/lib/api";
import { createJurisdiction, listJurisdictions } from "@/lib/server/data/jurisdictions";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: async ({ actor }) => ({ jurisdictions: await listJurisdictions(actor) }) });
export const POST = handle({ body: jurisdictionMake, perMinute: 60, status: 201, run: ({ actor, body }) => createJurisdiction(actor, body) });
