import { eq } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { notFound, Problem } from "@/lib/problem";
import type { CommandContext } from "@/modules/audit";
import { explanation, reading, readingInForce } from "./schema";

/** A reading that counts now. @throws Problem `not-found`, `conflict` where it has been corrected or struck out. */
export function getInForce(db: Orm, readingId: number) {
  const row = db.select().from(reading).where(eq(reading.id, readingId)).get();
  if (!row) throw notFound("such reading");
  const counts = db
    .select({ id: readingInForce.id })
    .from(readingInForce)
    .where(eq(readingInForce.id, readingId))
    .get();
  if (!counts) {
    throw new Problem(
      "conflict",
      "This reading has been corrected, struck out or withdrawn; look at the newest one.",
    );
  }
  return row;
}

/**
 * Adds a sentence that explains a reading in force, inside a command (an explanation of its own, or "incident 26-0007: …").
 * Answers the explanation's id. @throws Problem `not-found`, `conflict`
 */
export function addExplanation(
  ctx: Pick<CommandContext, "db" | "actor" | "at">,
  { readingId, text }: { readingId: number; text: string },
): number {
  invariant(ctx.actor.personId !== null, "a person explains a reading");
  getInForce(ctx.db, readingId);
  const added = ctx.db
    .insert(explanation)
    .values({ readingId, text, explainedBy: ctx.actor.personId, explainedAt: ctx.at })
    .returning({ id: explanation.id })
    .get();
  return added.id;
}
