import { sheetFile } from "@/lib/server/data/sheetFiles";
import { handle } from "@/lib/server/http/handle";
import { revisionParams as params } from "@/lib/server/http/params";

export const GET = handle({
  params,
  run: async ({ actor, params: { revisionId }, request }) => {
    const file = await sheetFile(actor, revisionId);
    const place = request.nextUrl.searchParams.has("inline") ? "inline" : "attachment";
    return new Response(new Uint8Array(file.bytes), {
      headers: {
        "content-type": "application/pdf", "content-length": String(file.bytes.length),
        "content-disposition": `${place}; filename="${file.fileName}"`, "cache-control": "private, no-cache", "x-file-digest": file.digest,
      },
    });
  },
});
