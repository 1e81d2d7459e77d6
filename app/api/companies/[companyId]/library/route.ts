import { libraryEntryInput, libraryQuery } from "@/lib/api";
import { addEntry, listLibrary } from "@/lib/server/data/library";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, query: libraryQuery, run: ({ actor, params: { companyId }, query }) => listLibrary(actor, companyId, query) });
export const POST = handle({
  params, body: libraryEntryInput, perMinute: 120, status: 201, run: ({ actor, params: { companyId }, body }) => addEntry(actor, companyId, body),
});
