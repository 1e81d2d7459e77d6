import "server-only";
import { randomUUID } from "node:crypto";
import { NextResponse, type NextRequest } from "next/server";
import type { ZodError, ZodType } from "zod";
import { BODY_BYTES, type ProblemBody } from "@/lib/api";
import { personOf } from "@/lib/server/auth/session";
import type { Actor } from "@/lib/server/data/actor";
import { env } from "@/lib/server/env";
import { readJson } from "./body";
import { originOf, watchConnections, type Origin } from "./connection";
import { Problem, forbidden, notFound, signInNeeded } from "./problem";
import { takeAllowance } from "./rateLimit";

interface Context<Params, Query, Body> { actor: Actor; params: Params; query: Query; body: Body; request: NextRequest; requestId: string }
interface Segment { params: Promise<Record<string, string | string[] | undefined>> }
interface Route<Params, Query, Body> {
  /** Path segments. What does not fit is answered as not there. */
  params?: ZodType<Params>;
  query?: ZodType<Query>;
  /** JSON body; left out for routes that take none or read their own. */
  body?: ZodType<Body>;
  maxBytes?: number;
  /** Requests a person may make in a minute. */
  perMinute?: number;
  status?: number;
  run: (context: Context<Params, Query, Body>) => Promise<unknown>;
}
interface OpenContext<Body> { body: Body; request: NextRequest; requestId: string; from: Origin }
interface OpenRoute<Body> { body?: ZodType<Body>; perMinute?: number; status?: number; run: (context: OpenContext<Body>) => Promise<unknown> }
type Handler = (request: NextRequest, segment: Segment) => Promise<Response>;

// The server does it before its first request; whoever runs handlers without that start does it here.
watchConnections();

const SAFE = new Set(["GET", "HEAD"]);
/** Most requests a person makes in a minute by one route, where it says nothing else. */
const PER_MINUTE = 600;

/**
 * Wraps a route: request id, origin, session, rate, size, schema, then `run`, which makes one call into
 * lib/server/data, where permission is checked inside the transaction. Errors become RFC 9457 answers.
 */
export function handle<Params = undefined, Query = undefined, Body = undefined>(route: Route<Params, Query, Body>): Handler {
  // Each route counts by itself: much drawing must not use up the tries at sealing.
  const counter = randomUUID();
  return (request, segment) => answered(request, route.status, async (requestId) => {
    checkOrigin(request);
    const person = await personOf(request.cookies);
    if (!person) throw signInNeeded();
    takeAllowance(`${counter}:${person.id}`, route.perMinute ?? PER_MINUTE, 60);
    const params = parse(route.params, await segment.params, () => notFound());
    const query = parse(route.query, Object.fromEntries(request.nextUrl.searchParams), invalid);
    const body = parse(route.body, route.body ? await readJson(request, route.maxBytes ?? BODY_BYTES) : undefined, invalid);
    return route.run({ actor: { ...person, requestId, from: originOf(request.headers, env().TRUST_PROXY) }, params, query, body, request, requestId });
  });
}

/** The same for the few routes that need no session. */
export function handleOpen<Body = undefined>(route: OpenRoute<Body>): Handler {
  return (request) => answered(request, route.status, async (requestId) => {
    checkOrigin(request);
    const from = originOf(request.headers, env().TRUST_PROXY);
    takeAllowance(`open:${request.nextUrl.pathname}:${from.address ?? "local"}`, route.perMinute ?? 60, 60);
    const body = parse(route.body, route.body ? await readJson(request, 64 * 1024) : undefined, invalid);
    return route.run({ body, request, requestId, from });
  });
}

async function answered(request: NextRequest, status: number | undefined, work: (requestId: string) => Promise<unknown>): Promise<Response> {
  const requestId = randomUUID();
  try {
    const result = await work(requestId);
    const response = result instanceof Response ? result : result === undefined
      ? new NextResponse(null, { status: 204 })
      : NextResponse.json(result, { status: status ?? 200 });
    response.headers.set("x-request-id", requestId);
    if (!response.headers.has("cache-control")) response.headers.set("cache-control", "no-store");
    return response;
  } catch (error) {
    return problemResponse(error, requestId, `${request.method} ${request.nextUrl.pathname}`);
  }
}

function parse<Value>(schema: ZodType<Value> | undefined, given: unknown, refuse: (error: ZodError) => Problem): Value {
  if (!schema) return undefined as Value;
  const parsed = schema.safeParse(given);
  if (!parsed.success) throw refuse(parsed.error);
  return parsed.data;
}

/** Names every wrong field, the first one in the sentence. */
export function invalid(error: ZodError): Problem {
  const errors = error.issues.flatMap((issue) => {
    const at = issue.path.map(String);
    if (issue.code === "unrecognized_keys") return issue.keys.map((key) => ({ field: [...at, key].join("."), detail: "is not a field of this request" }));
    return [{ field: at.join(".") || "body", detail: issue.message }];
  }).slice(0, 20);
  const [first] = errors;
  return new Problem(422, "field", "Something in the request is wrong", first ? `${first.field}: ${first.detail}` : "The request does not fit.", { field: first?.field, errors });
}

/** A form on another site must not be able to act for a person who is signed in here. */
function checkOrigin(request: NextRequest): void {
  if (SAFE.has(request.method)) return;
  if (request.headers.get("origin") !== new URL(env().NEXTAUTH_URL).origin) throw forbidden("The request does not come from this site.");
}

function problemResponse(error: unknown, requestId: string, what: string): Response {
  if (!(error instanceof Problem)) console.error(`${requestId} ${what}`, error);
  const problem = error instanceof Problem
    ? error
    : new Problem(500, "internal", "Something went wrong here", "The server could not finish this. Nothing was changed. Try again, and tell us the request id if it stays.");
  const body: ProblemBody = {
    type: "about:blank", title: problem.title, status: problem.status, code: problem.code, detail: problem.detail, ...problem.members, requestId,
  };
  const headers: Record<string, string> = { "content-type": "application/problem+json", "cache-control": "no-store", "x-request-id": requestId };
  if (typeof problem.members["retryAfter"] === "number") headers["retry-after"] = String(problem.members["retryAfter"]);
  if (typeof problem.members["contentRange"] === "string") headers["content-range"] = problem.members["contentRange"];
  return new Response(JSON.stringify(body), { status: problem.status, headers });
}
