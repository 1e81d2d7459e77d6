import { SEAL_GRAPHIC_BYTES } from "@/lib/api";
import { putSealGraphic, sealGraphic } from "@/lib/server/data/licenses";
import { readBytes } from "@/lib/server/http/body";
import { handle } from "@/lib/server/http/handle";
import { notFound } from "@/lib/server/http/problem";

/** The body is the file itself. */
export const PUT = handle({
  perMinute: 20,
  run: async ({ actor, request }) => ({ license: await putSealGraphic(actor, await readBytes(request, SEAL_GRAPHIC_BYTES)) }),
});

export const GET = handle({
  run: async ({ actor }) => {
    const bytes = await sealGraphic(actor);
    if (!bytes) throw notFound();
    return new Response(new Uint8Array(bytes), { headers: { "content-type": "image/png", "content-security-policy": "default-src 'none'", "cache-control": "private, no-cache" } });
  },
});
