import { eq } from "drizzle-orm";
import type { z } from "zod";
import { invariant } from "@/lib/invariant";
import { invalidField, Problem } from "@/lib/problem";
import { type CommandContext, defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { getInForce } from "../explanations";
import { correctReadingInput } from "../input";
import { judgeWithDependents, readTypedValue } from "../intake";
import { judgeDependents } from "../judge";
import { areaOfReading } from "../points";
import { reading } from "../schema";

type Correction = z.output<typeof correctReadingInput>;

function mustBeNew(ctx: CommandContext, { uuid }: Correction): void {
  const known = ctx.db.select({ id: reading.id }).from(reading).where(eq(reading.uuid, uuid)).get();
  if (known) throw new Problem("conflict", "This correction has been sent before.");
}

/** Writes the new version beside the old one: everything of the old that the correction does not change is kept. */
function insertVersion(ctx: CommandContext, input: Correction, old: typeof reading.$inferSelect) {
  const { id: _id, ...kept } = old;
  const typedUnit = input.typedUnit ?? old.typedUnit;
  const takenAt = input.takenAt ?? old.takenAt;
  if (takenAt > ctx.at) throw invalidField("/takenAt", "future", "The time lies in the future.");
  invariant(ctx.actor.personId !== null, "a person corrects a reading");
  const typed = readTypedValue(
    getParameter(ctx.db, old.parameterId),
    { typedText: input.typedText, typedUnit },
    "",
  );
  return ctx.db
    .insert(reading)
    .values({
      ...kept,
      ...typed,
      uuid: input.uuid,
      typedText: input.typedText,
      typedUnit,
      takenAt,
      enteredAt: ctx.at,
      enteredBy: ctx.actor.personId,
      supersedesId: old.id,
      correctionReason: input.reason,
      confirmedBy: input.confirmed ? ctx.actor.personId : null,
      confirmedAt: input.confirmed ? ctx.at : null,
    })
    .returning()
    .get();
}

/** Puts a new value beside an old one, with a reason. The old one stays; reviews of the day are asked for again. */
export const correctReading = defineCommand({
  verb: "correctReading",
  permission: measurementsMay.correct,
  input: correctReadingInput,
  areas: areaOfReading,
  run(ctx, input) {
    mustBeNew(ctx, input);
    const old = getInForce(ctx.db, input.readingId);
    const row = insertVersion(ctx, input, old);
    const verdict = judgeWithDependents(ctx.db, row, ctx.at, "correction", "correction");
    judgeDependents(ctx.db, old, ctx.at, "correction");
    return {
      result: { readingId: row.id, status: verdict.status, side: verdict.side, sentence: verdict.sentence },
      event: {
        kind: measurementsEvents.corrected,
        subject: { type: "reading", id: row.id },
        payload: {
          supersedes: old.id,
          pointId: row.pointId,
          parameterId: row.parameterId,
          takenAt: row.takenAt,
          wasTakenAt: old.takenAt,
        },
        reason: input.reason,
      },
    };
  },
});
