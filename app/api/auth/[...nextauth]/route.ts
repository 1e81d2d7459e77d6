import NextAuth from "next-auth";
import type { NextRequest } from "next/server";
import { authOptions } from "@/lib/server/auth/options";

interface Segment { params: Promise<{ nextauth: string[] }> }

// Options hold settings, which a build does not have: they are made on each request.
const answer = (request: NextRequest, segment: Segment): Promise<Response> => NextAuth(request, segment, authOptions()) as Promise<Response>;

export { answer as GET, answer as POST };
