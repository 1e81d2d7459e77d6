import { recordsExportQuery } from "@/lib/api";
import { exportRecords } from "@/lib/server/data/recordsExport";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({
  params, query: recordsExportQuery, perMinute: 12,
  run: async ({ actor, params: { companyId }, query }) => new Response(await exportRecords(actor, companyId, query), {
    headers: { "content-type": "text/csv; charset=utf-8", "content-disposition": `attachment; filename="records-${new Date().toISOString().slice(0, 10)}.csv"` },
  }),
});
