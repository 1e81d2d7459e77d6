import { recordsQuery } from "@/lib/api";
import { listRecords } from "@/lib/server/data/records";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, query: recordsQuery, run: ({ actor, params: { companyId }, query }) => listRecords(actor, companyId, query) });
