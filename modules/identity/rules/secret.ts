import { createHash, randomBytes } from "node:crypto";

/** An unguessable value for a cookie or a link: 256 bits, base64url. */
export function newSecret(): string {
  return randomBytes(32).toString("base64url");
}

/** What is stored of a secret. */
export function secretHash(secret: string): string {
  return createHash("sha256").update(secret).digest("hex");
}
