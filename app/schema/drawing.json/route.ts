import { drawingJsonSchema } from "@/lib/diagram/jsonSchema";

/** The public description of the drawing file; it holds nobody's data, so nobody has to sign in for it. */
export function GET(): Response {
  return new Response(`${JSON.stringify(drawingJsonSchema(), null, 2)}\n`, { headers: { "content-type": "application/schema+json; charset=utf-8", "cache-control": "public, max-age=3600" } });
}
