import { templateQuery } from "@/lib/api";
import { exportTable } from "@/lib/server/data/libraryImport";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({
  params, query: templateQuery,
  run: async ({ actor, params: { companyId }, query: { kind, fill } }) => new Response(await exportTable(actor, companyId, kind, fill === "yes"), {
    headers: { "content-type": "text/csv; charset=utf-8", "content-disposition": `attachment; filename="library-${kind}.csv"` },
  }),
});
