import { listJurisdictions } from "@/lib/server/data/jurisdictions";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: async ({ actor }) => ({ jurisdictions: await listJurisdictions(actor) }) });
