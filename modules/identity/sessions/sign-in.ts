import { eq, sql } from "drizzle-orm";
import type { Database, Orm } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { log } from "@/lib/log";
import { runCommand, upkeep } from "@/modules/audit";
import { startSession } from "../commands/start-session";
import { passwordFits } from "../rules/password";
import { newSecret, secretHash } from "../rules/secret";
import { afterFailure, MAX_FAILURES, mayTry } from "../rules/throttle";
import { credential, person, throttle } from "../schema";
import { actorOf } from "./actor";

export type SignIn =
  | { kind: "signed-in"; secret: string; personId: number; name: string }
  | { kind: "refused" | "throttled" };

const throttleKeys = (email: string, address: string) => ({
  account: `account:${secretHash(email.trim().toLowerCase())}`,
  address: `address:${address}`,
});

function isThrottled(db: Orm, keys: Record<keyof typeof MAX_FAILURES, string>, at: number): boolean {
  return (Object.keys(MAX_FAILURES) as (keyof typeof MAX_FAILURES)[]).some((kind) => {
    const state = db.select().from(throttle).where(eq(throttle.key, keys[kind])).get();
    return !mayTry(state, kind, at);
  });
}

function countFailure(db: Database, keys: string[], at: number): void {
  upkeep(db, (orm) => {
    for (const key of keys) {
      const state = orm.select().from(throttle).where(eq(throttle.key, key)).get();
      const next = afterFailure(state, at);
      orm
        .insert(throttle)
        .values({ key, ...next })
        .onConflictDoUpdate({ target: throttle.key, set: next })
        .run();
    }
  });
}

/** A try that was right counts for nothing: the account's tries are forgotten, the address gets its one back. */
function forgiveTry(db: Database, keys: { account: string; address: string }): void {
  upkeep(db, (orm) => {
    orm.delete(throttle).where(eq(throttle.key, keys.account)).run();
    orm
      .update(throttle)
      .set({ failures: sql`max(0, ${throttle.failures} - 1)` })
      .where(eq(throttle.key, keys.address))
      .run();
  });
}

/**
 * Signs a person in: the throttle first (before any hashing), then the password (the same time is spent where there is no
 * such account), then a new session with a new secret. Every refusal answers the same.
 */
export async function signIn(
  db: Database,
  clock: Clock,
  given: { email: string; password: string; address: string },
): Promise<SignIn> {
  const at = clock.now();
  const keys = throttleKeys(given.email, given.address);
  if (isThrottled(db.reader.orm, keys, at)) {
    log().warn({ address: given.address }, "sign-in throttled");
    return { kind: "throttled" };
  }
  // The try counts before the password is looked at, so that many at once cannot slip past.
  countFailure(db, Object.values(keys), at);
  const account = db.reader.orm
    .select({ id: person.id, state: person.state, passwordHash: credential.passwordHash })
    .from(person)
    .leftJoin(credential, eq(credential.personId, person.id))
    .where(sql`lower(${person.email}) = ${given.email.trim().toLowerCase()}`)
    .get();
  const fits = await passwordFits(account?.passwordHash ?? null, given.password);
  const actor = account && fits ? actorOf(db.reader.orm, account.id, at) : null;
  if (!account || !fits || !actor) {
    log().warn({ address: given.address }, "sign-in refused");
    return { kind: "refused" };
  }
  const secret = newSecret();
  runCommand(db, actor, startSession, { sessionId: secretHash(secret), address: given.address }, { clock });
  forgiveTry(db, keys);
  return { kind: "signed-in", secret, personId: account.id, name: actor.name };
}
