import { randomBytes, randomUUID } from "node:crypto";
import { type NextRequest, NextResponse } from "next/server";
import { settings } from "@/lib/env";

const ONE_YEAR_S = 31_536_000;

/** What a page may load. Scripts and style sheets run by the nonce of this answer alone. */
function contentPolicy(nonce: string, secure: boolean, developing: boolean): string {
  const rows: [string, string][] = [
    ["default-src", "'self'"],
    ["script-src", `'self' 'nonce-${nonce}' 'strict-dynamic'${developing ? " 'unsafe-eval'" : ""}`],
    // While developing, the bundler puts its style sheets into the page without a nonce.
    ["style-src", developing ? "'self' 'unsafe-inline'" : `'self' 'nonce-${nonce}'`],
    // Charts and grids place things by style attributes; these cannot carry a nonce.
    ["style-src-attr", "'unsafe-inline'"],
    ["img-src", "'self' data: blob:"],
    ["font-src", "'self' data:"],
    ["connect-src", developing ? "'self' ws: wss:" : "'self'"],
    ["worker-src", "'self' blob:"],
    ["manifest-src", "'self'"],
    ["object-src", "'none'"],
    ["base-uri", "'none'"],
    ["form-action", "'self'"],
    ["frame-ancestors", "'none'"],
  ];
  const policy = rows.map(([name, value]) => `${name} ${value}`);
  if (secure) policy.push("upgrade-insecure-requests");
  return policy.join("; ");
}

/** Sets the headers of a page. Never decides who may see what: that is done where data is read and written. */
export function proxy(request: NextRequest): NextResponse {
  const { secureCookies, NODE_ENV } = settings();
  const nonce = randomBytes(18).toString("base64");
  const policy = contentPolicy(nonce, secureCookies, NODE_ENV === "development");
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("x-page", request.nextUrl.pathname);
  const requestId = randomUUID();
  headers.set("x-request-id", requestId);
  // Next reads the nonce for its own scripts from here.
  headers.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  response.headers.set("x-request-id", requestId);
  if (secureCookies) response.headers.set("strict-transport-security", `max-age=${ONE_YEAR_S}`);
  return response;
}

/** Pages alone: the interface has its own policy, and the bodies of uploads must not pass through here. */
export const config = { matcher: ["/((?!api/|_next/static/).*)"] };
