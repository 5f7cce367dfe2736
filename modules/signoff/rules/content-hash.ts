import { createHash } from "node:crypto";
import canonicalize from "canonicalize";
import { invariant } from "@/lib/invariant";

/** SHA-256 of what is signed, in canonical JSON (RFC 8785): the same content gives the same hash, in any order of keys. */
export function contentHash(content: unknown): string {
  const text = canonicalize(content);
  invariant(text !== undefined, "what is signed can be written as JSON");
  return createHash("sha256").update(text).digest("hex");
}
