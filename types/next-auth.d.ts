import type { DefaultSession } from "next-auth";

declare module "next-auth" {
  interface User {
    id: string;
    sessionVersion: number;
  }
  interface Session extends DefaultSession {
    user: { id: string; name: string; email: string };
  }
}
declare module "next-auth/jwt" {
  interface JWT {
    sessionVersion?: number;
  }
}
