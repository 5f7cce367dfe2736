import "server-only";
import { settings } from "@/lib/env";
import { Problem } from "@/lib/problem";

const MAX_JSON_BYTES = 2 * 1024 * 1024;

/**
 * A write must come from our own pages: the browser's Origin header names this site, and the body is JSON (which no form of
 * another site can send without being asked first).
 * @throws Problem `wrong-origin`
 */
export function mustComeFromHere(request: Request): void {
  const origin = request.headers.get("origin");
  const host = request.headers.get("host");
  const site = request.headers.get("sec-fetch-site");
  if (site !== null && site !== "same-origin" && site !== "none") {
    throw new Problem("wrong-origin", "Writes are taken from this site's own pages alone.");
  }
  if (origin === null) return;
  const isOwn =
    origin === new URL(settings().STILLWELL_URL).origin || (host !== null && hostOf(origin) === host);
  if (!isOwn) throw new Problem("wrong-origin", "Writes are taken from this site's own pages alone.");
}

/** The host of an origin; null where it is none (`Origin: null` of a sandboxed page). */
function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}

/**
 * Reads a JSON object.
 * @throws Problem `wrong-type`, `too-large` or `invalid`
 */
export async function readBody(request: Request): Promise<Record<string, unknown>> {
  const type = request.headers.get("content-type") ?? "";
  if (!type.toLowerCase().startsWith("application/json")) {
    throw new Problem("wrong-type", "Send JSON with the content type application/json.");
  }
  if (Number(request.headers.get("content-length") ?? 0) > MAX_JSON_BYTES) throw tooLarge();
  const text = await request.text();
  if (Buffer.byteLength(text) > MAX_JSON_BYTES) throw tooLarge();
  let body: unknown;
  try {
    body = JSON.parse(text === "" ? "{}" : text);
  } catch (cause) {
    throw new Problem("invalid", "The body is not JSON.", [], { cause });
  }
  if (typeof body !== "object" || body === null || Array.isArray(body)) {
    throw new Problem("invalid", "The body must be a JSON object.");
  }
  return body as Record<string, unknown>;
}

const tooLarge = () =>
  new Problem("too-large", "The body is larger than 2 MB; import large tables as a file.");

/**
 * The address a request came from. Forwarded headers are believed only as far as there are proxies of our own.
 */
export function addressOf(headers: Headers): string {
  const hops = settings().TRUST_PROXY_HOPS;
  const forwarded = (headers.get("x-forwarded-for") ?? "").split(",").map((part) => part.trim());
  if (hops === 0 || forwarded[0] === "") return "direct";
  return forwarded[Math.max(0, forwarded.length - hops)] ?? "direct";
}
