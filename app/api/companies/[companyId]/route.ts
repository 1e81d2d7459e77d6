import { companyChange } from "@/lib/api";
import { changeCompany, getCompany } from "@/lib/server/data/companies";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { companyId } }) => getCompany(actor, companyId) });
export const PATCH = handle({ params, body: companyChange, perMinute: 60, run: ({ actor, params: { companyId }, body }) => changeCompany(actor, companyId, body) });
