import { hash, verify } from "@node-rs/argon2";

/** argon2id with m = 19 MiB, t = 2, p = 1 (OWASP Password Storage Cheat Sheet; RFC 9106 names the variant). */
const ARGON2ID = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** The hash that is compared where there is no such account, so that the answer takes as long. */
let decoy: Promise<string> | undefined;

export async function hashPassword(password: string): Promise<string> {
  return hash(password.normalize("NFKC"), ARGON2ID);
}

/** Whether the password fits the hash; any fault in the check is a no. Without a hash the same time is spent. */
export async function passwordFits(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword("no account has this password");
  try {
    const fits = await verify(passwordHash ?? (await decoy), password.normalize("NFKC"), ARGON2ID);
    return fits && passwordHash !== null;
  } catch {
    return false;
  }
}
