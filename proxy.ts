import { getToken } from "next-auth/jwt";
import { NextResponse, type NextRequest } from "next/server";

/*
 * Sets the policy of every answer and sends anonymous visitors to sign in. The guard is a convenience alone: pages
 * and handlers ask for the session themselves, since a token seen here may have been ended meanwhile.
 */

/** Pages that anybody may open. */
const OPEN_PAGES = new Set(["/sign-in", "/setup", "/schema/drawing.json", "/rules"]);
/** Pages below it show what the rules are and nobody's data. */
const OPEN_FOLDER = "/rules/";

function contentPolicy(nonce: string): string {
  const development = process.env.NODE_ENV !== "production";
  return [
    "default-src 'self'",
    // Hot reload evaluates code and opens a socket.
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`,
    development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`,
    // style="" of server-rendered HTML; rules for elements still need the nonce.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self'${development ? " ws:" : ""}`,
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

export default async function proxy(request: NextRequest): Promise<Response> {
  const nonce = Buffer.from(crypto.randomUUID()).toString("base64");
  const policy = contentPolicy(nonce);
  const { pathname, search } = request.nextUrl;
  const guarded = !pathname.startsWith("/api/") && !OPEN_PAGES.has(pathname) && !pathname.startsWith(OPEN_FOLDER);
  if (guarded && !(await getToken({ req: request }))) {
    const target = request.nextUrl.clone();
    target.pathname = "/sign-in";
    target.search = pathname === "/" ? "" : `?next=${encodeURIComponent(`${pathname}${search}`)}`;
    const redirected = NextResponse.redirect(target);
    redirected.headers.set("content-security-policy", policy);
    return redirected;
  }
  const headers = new Headers(request.headers);
  // Next takes the nonce for its own scripts from here.
  headers.set("content-security-policy", policy);
  headers.set("x-nonce", nonce);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  return response;
}

// Files pass it by: it would keep a copy of each upload and silently cut it off at 10 MB, and its policy would replace the
// stricter one that a download sets for itself.
// No exception for prefetches: it would switch the guard off for whoever sends their header.
export const config = { matcher: ["/((?!_next/static|_next/image|icon.svg|fonts/|api/files/|api/jobs/[^/]+/files|api/library/[^/]+/files).*)"] };
