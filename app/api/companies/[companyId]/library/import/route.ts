import { IMPORT_BYTES, importQuery } from "@/lib/api";
import { confirmImport, previewImport } from "@/lib/server/data/libraryImport";
import { readBytes } from "@/lib/server/http/body";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";
import { Problem } from "@/lib/server/http/problem";

export const POST = handle({
  params, query: importQuery, perMinute: 30,
  run: async ({ actor, params: { companyId }, query: { kind, confirm }, request }) => {
    if (request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase() !== "text/csv") throw new Problem(415, "content-type", "Unsupported content", "Send text/csv.");
    const bytes = await readBytes(request, IMPORT_BYTES);
    return confirm === undefined ? previewImport(actor, companyId, kind, bytes) : confirmImport(actor, companyId, kind, bytes, confirm);
  },
});
