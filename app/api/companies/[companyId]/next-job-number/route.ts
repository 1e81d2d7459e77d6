import { suggestedNumber } from "@/lib/server/data/jobNumbers";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { companyId } }) => suggestedNumber(actor, companyId) });
