import "server-only";
import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { z } from "zod";
import { sessionPerson, verifyCredentials } from "@/lib/server/data/users";
import { env } from "@/lib/server/env";
import { Problem } from "@/lib/server/http/problem";

const credentialsSchema = z.object({ email: z.string().trim().min(3).max(254), password: z.string().min(1).max(200) });
/** A working day: an open office computer is signed out overnight. */
const SESSION_SECONDS = 12 * 3600;

/** Sign-in by address and password, sessions as JWT with the account's session version. Read on request: a build has no settings. */
export function authOptions(): NextAuthOptions {
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: "jwt", maxAge: SESSION_SECONDS },
    pages: { signIn: "/sign-in", error: "/sign-in" },
    providers: [
      CredentialsProvider({
        name: "Password",
        credentials: { email: { type: "email" }, password: { type: "password" } },
        async authorize(given) {
          const parsed = credentialsSchema.safeParse(given);
          if (!parsed.success) return null;
          try {
            const person = await verifyCredentials(parsed.data.email, parsed.data.password);
            return person && { id: person.id, name: person.name, email: person.email, sessionVersion: person.sessionVersion };
          } catch (error) {
            // The library shows this text as the error code.
            if (error instanceof Problem) throw new Error(error.code);
            throw error;
          }
        },
      }),
    ],
    callbacks: {
      async jwt({ token, user }) {
        if (user) return { ...token, sub: user.id, sessionVersion: user.sessionVersion };
        const person = token.sub && typeof token.sessionVersion === "number" ? await sessionPerson(token.sub, token.sessionVersion) : null;
        // Throwing ends the session: the library clears the cookie.
        if (!person) throw new Error("session ended");
        return { ...token, name: person.name, email: person.email };
      },
      session({ session, token }) {
        return { ...session, user: { id: token.sub ?? "", name: token.name ?? "", email: token.email ?? "" } };
      },
    },
    logger: {
      error(code) {
        // An ended session is no fault of the server.
        if (code !== "JWT_SESSION_ERROR") console.error(`sign-in: ${code}`);
      },
    },
  };
}
