import "server-only";
import { cookies } from "next/headers";
import { redirect } from "next/navigation";
import { getToken, type JWT } from "next-auth/jwt";
import { env } from "@/lib/server/env";
import { sessionPerson, type SessionPerson } from "@/lib/server/data/users";

/** Anything that holds cookies: a request, or the store of a page. */
interface CookieHolder { getAll: () => { name: string; value: string }[] }
type TokenRequest = Parameters<typeof getToken>[0]["req"];

/**
 * The person of a session cookie. The token alone is not believed: account and session version are looked up
 * each time, since a token cannot be taken back.
 */
export async function personOf(holder: CookieHolder): Promise<SessionPerson | null> {
  const jar = Object.fromEntries(holder.getAll().map(({ name, value }) => [name, value]));
  const token: JWT | null = await getToken({
    req: { cookies: jar, headers: {} } as unknown as TokenRequest,
    secret: env().NEXTAUTH_SECRET,
    secureCookie: env().NEXTAUTH_URL.startsWith("https://"),
  });
  if (!token?.sub || typeof token.sessionVersion !== "number") return null;
  return sessionPerson(token.sub, token.sessionVersion);
}

/** The person who asks for a page, or null. */
export async function pagePerson(): Promise<SessionPerson | null> {
  return personOf(await cookies());
}

/** The person who asks for a page; anonymous visitors are sent to sign in and come back. */
export async function requirePerson(returnTo: string): Promise<SessionPerson> {
  const person = await pagePerson();
  if (!person) redirect(`/sign-in?next=${encodeURIComponent(returnTo)}`);
  return person;
}
