import { readdirSync } from "node:fs";
import path from "node:path";
import { NextRequest } from "next/server";

/*
 * Runs the route handlers themselves, found by their place in app/api as the server finds them: request in, answer out,
 * with session, origin check, schemas and a real database.
 */
const root = path.resolve(import.meta.dirname, "../../..");
const apiFolder = path.join(root, "app/api");

type Handler = (request: NextRequest, segment: { params: Promise<Record<string, string>> }) => Promise<Response>;
export interface Route { method: string; pattern: string; file: string }

const METHODS = ["GET", "POST", "PUT", "PATCH", "DELETE"] as const;
const files = readdirSync(apiFolder, { recursive: true, encoding: "utf8" })
  .filter((name) => path.basename(name) === "route.ts" && !name.startsWith("auth"))
  .map((name) => name.split(path.sep).join("/"));

/** Every method of every route below /api, except the sign-in library's own. */
export async function allRoutes(): Promise<Route[]> {
  const found = await Promise.all(files.map(async (file) => {
    const handlers = (await import(path.join(apiFolder, file))) as Record<string, unknown>;
    return METHODS.filter((method) => typeof handlers[method] === "function").map((method) => ({ method, pattern: `/api/${path.posix.dirname(file)}`, file }));
  }));
  return found.flat().sort((a, b) => `${a.pattern} ${a.method}`.localeCompare(`${b.pattern} ${b.method}`));
}

const expressions = files.map((file) => {
  const names: string[] = [];
  const source = path.posix.dirname(file).split("/").map((part) => {
    const name = /^\[(\w+)\]$/.exec(part)?.[1];
    if (!name) return part.replace(/[.]/g, "\\.");
    names.push(name);
    return "([^/]+)";
  }).join("/");
  return { file, names, expression: new RegExp(`^/api/${source}$`), literal: names.length === 0 };
}).sort((a, b) => a.names.length - b.names.length);

export interface Call { as?: { cookie: string } | null; body?: unknown; raw?: BodyInit; headers?: Record<string, string>; origin?: string | null }
export interface Answer<Body> { status: number; body: Body; headers: Headers; bytes: Buffer }

/** What tests look at in an answer; an error's members stand beside. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- tests compare with what they expect; a wrong shape fails there.
export type Loose = any;

/** One request. `body` is sent as JSON, `raw` as it is. */
export async function request<Body = Loose>(method: string, address: string, { as, body, raw, headers = {}, origin }: Call = {}): Promise<Answer<Body>> {
  const url = new URL(address, process.env["NEXTAUTH_URL"]);
  const match = expressions.map((each) => ({ ...each, found: each.expression.exec(url.pathname) })).find((each) => each.found);
  if (!match?.found) throw new Error(`no route for ${address}`);
  const handlers = (await import(path.join(apiFolder, match.file))) as Record<string, Handler | undefined>;
  const handler = handlers[method];
  if (!handler) throw new Error(`${address} has no ${method}`);
  const params = Object.fromEntries(match.names.map((name, index) => [name, decodeURIComponent(match.found?.[index + 1] ?? "")]));
  const sent = raw ?? (body === undefined ? undefined : JSON.stringify(body));
  const given = new NextRequest(url, {
    method,
    headers: {
      ...(sent === undefined ? {} : { "content-type": "application/json" }), ...(as ? { cookie: as.cookie } : {}),
      ...(method === "GET" || origin === null ? {} : { origin: origin ?? url.origin }), ...headers,
    },
    ...(sent === undefined ? {} : { body: sent, duplex: "half" }),
  } as ConstructorParameters<typeof NextRequest>[1]);
  const response = await handler(given, { params: Promise.resolve(params) });
  const bytes = Buffer.from(await response.arrayBuffer());
  const json = response.headers.get("content-type")?.includes("json");
  return { status: response.status, headers: response.headers, bytes, body: (json ? JSON.parse(bytes.toString("utf8")) : undefined) as Body };
}
