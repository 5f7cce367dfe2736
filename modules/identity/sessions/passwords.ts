import { eq, sql } from "drizzle-orm";
import type { Database } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { invalidField, Problem } from "@/lib/problem";
import { type Actor, SYSTEM_ACTOR } from "@/modules/access";
import { mustBeAllowed, parseInput, runCommand, upkeep } from "@/modules/audit";
import { requestReset } from "../commands/request-reset";
import { changePassword, setPassword } from "../commands/set-password";
import { changePasswordInput, requestResetInput, setPasswordInput } from "../input";
import { findOpenLink } from "../links";
import { hashPassword, passwordFits } from "../rules/password";
import { secretHash } from "../rules/secret";
import { afterFailure, type MAX_FAILURES, mayTry } from "../rules/throttle";
import { credential, person, throttle } from "../schema";

/** Tries one key of the throttle; counts the try. @throws Problem `too-many` */
function mustNotBeThrottled(
  db: Database,
  key: string,
  at: number,
  kind: keyof typeof MAX_FAILURES = "account",
): void {
  const allowed = upkeep(db, (orm) => {
    const state = orm.select().from(throttle).where(eq(throttle.key, key)).get();
    if (!mayTry(state, kind, at)) return false;
    const next = afterFailure(state, at);
    orm
      .insert(throttle)
      .values({ key, ...next })
      .onConflictDoUpdate({ target: throttle.key, set: next })
      .run();
    return true;
  });
  if (!allowed) throw new Problem("too-many", "Too many tries; wait a quarter of an hour and try again.");
}

/** Whether a password is this person's; counts wrong tries. For signatures and for changing a password. */
export async function confirmPassword(
  db: Database,
  clock: Clock,
  personId: number,
  password: string,
): Promise<boolean> {
  const key = `confirm:${personId}`;
  mustNotBeThrottled(db, key, clock.now());
  const row = db.reader.orm.select().from(credential).where(eq(credential.personId, personId)).get();
  const fits = await passwordFits(row?.passwordHash ?? null, password);
  if (fits) upkeep(db, (orm) => orm.delete(throttle).where(eq(throttle.key, key)).run());
  return fits;
}

/** Asks for a new password. Answers nothing about whether there is such an account. */
export function askForReset(db: Database, clock: Clock, raw: unknown, address: string): void {
  const { email } = parseInput(requestResetInput, raw);
  mustNotBeThrottled(db, `reset:${address}`, clock.now(), "address");
  mustNotBeThrottled(db, `reset:${secretHash(email.toLowerCase())}`, clock.now());
  const found = db.reader.orm
    .select({ id: person.id })
    .from(person)
    .where(sql`lower(${person.email}) = ${email.toLowerCase()}`)
    .get();
  if (found) runCommand(db, SYSTEM_ACTOR, requestReset, { personId: found.id }, { clock });
}

/** A link that is no good is refused before any hashing, and counted, so that nobody keeps the machine busy by guessing. */
function mustBeOpen(db: Database, token: string, at: number, address: string): void {
  if (findOpenLink(db.reader.orm, token, at)) return;
  mustNotBeThrottled(db, `link:${address}`, at, "address");
  throw new Problem("not-found", "This link has been used or is too old. Ask for a new one.");
}

/** Sets a password by a one-time link. @throws Problem `not-found` where the link is used or too old. */
export async function setPasswordByLink(
  db: Database,
  clock: Clock,
  raw: unknown,
  address: string,
): Promise<{ email: string }> {
  const { token, password } = parseInput(setPasswordInput, raw);
  mustBeOpen(db, token, clock.now(), address);
  const passwordHash = await hashPassword(password);
  return runCommand(db, SYSTEM_ACTOR, setPassword, { token, passwordHash }, { clock }).result;
}

/** Changes one's own password. @throws Problem `invalid` where the current one is wrong. */
export async function changeOwnPassword(
  db: Database,
  clock: Clock,
  actor: Actor,
  raw: unknown,
): Promise<void> {
  mustBeAllowed(actor, changePassword.permission);
  const { current, password } = parseInput(changePasswordInput, raw);
  if (actor.personId === null || !(await confirmPassword(db, clock, actor.personId, current))) {
    throw invalidField("/current", "wrong", "This is not your password.");
  }
  runCommand(db, actor, changePassword, { passwordHash: await hashPassword(password) }, { clock });
}
