import type { NextRequest } from "next/server";
import NextAuth from "next-auth";
import { authOptions } from "@/app/_server/auth-options";

/** Options are read per request: a build loads this file without settings. */
function handle(
  request: NextRequest,
  context: { params: Promise<{ nextauth: string[] }> },
): Promise<Response> {
  return NextAuth(request as never, context as never, authOptions()) as Promise<Response>;
}

export { handle as GET, handle as POST };
