import { and, eq } from "drizzle-orm";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import type { Orm } from "@/db/database";
import { defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { addExplanation, getInForce } from "../explanations";
import { confirmReadingInput, correctReadingInput, explainReadingInput, voidReadingInput } from "../input";
import { judgeWithDependents, readTypedValue } from "../intake";
import { judgeDependents } from "../judge";
import { areasOfPoints } from "../points";
import { reading } from "../schema";

function areaOf(ctx: { db: Orm }, { readingId }: { readingId: number }): number[] {
  const row = ctx.db.select({ pointId: reading.pointId }).from(reading).where(eq(reading.id, readingId)).get();
  return row ? areasOfPoints(ctx.db, [row.pointId]) : [];
}

/** Puts a new value beside an old one, with a reason. The old one stays; reviews of the day are asked for again. */
export const correctReading = defineCommand({
  verb: "correctReading",
  permission: measurementsMay.correct,
  input: correctReadingInput,
  areas: areaOf,
  run(ctx, input) {
    invariant(ctx.actor.personId !== null, "a person corrects a reading");
    const known = ctx.db.select().from(reading).where(and(eq(reading.uuid, input.uuid))).get();
    if (known) throw new Problem("conflict", "This correction has been sent before.");
    const old = getInForce(ctx.db, input.readingId);
    const parameter = getParameter(ctx.db, old.parameterId);
    const typed = readTypedValue(parameter, { typedText: input.typedText, typedUnit: input.typedUnit ?? old.typedUnit }, "");
    if ((input.takenAt ?? old.takenAt) > ctx.at) throw new Problem("invalid", "The time lies in the future.");
    const { id: _id, ...kept } = old;
    const row = ctx.db
      .insert(reading)
      .values({
        ...kept,
        ...typed,
        uuid: input.uuid,
        typedText: input.typedText,
        typedUnit: input.typedUnit ?? old.typedUnit,
        takenAt: input.takenAt ?? old.takenAt,
        enteredAt: ctx.at,
        enteredBy: ctx.actor.personId,
        supersedesId: old.id,
        correctionReason: input.reason,
        confirmedBy: input.confirmed ? ctx.actor.personId : null,
        confirmedAt: input.confirmed ? ctx.at : null,
      })
      .returning()
      .get();
    const verdict = judgeWithDependents(ctx.db, row, ctx.at, "correction", "correction");
    judgeDependents(ctx.db, old, ctx.at, "correction");
    return {
      result: { readingId: row.id, status: verdict.status, side: verdict.side, sentence: verdict.sentence },
      event: {
        kind: measurementsEvents.corrected,
        subject: { type: "reading", id: row.id },
        payload: { supersedes: old.id, pointId: row.pointId, parameterId: row.parameterId, takenAt: row.takenAt, wasTakenAt: old.takenAt },
        reason: input.reason,
      },
    };
  },
});

/** Strikes a reading out (entered for the wrong system, say). It stays readable and counts no more. */
export const voidReading = defineCommand({
  verb: "voidReading",
  permission: measurementsMay.correct,
  input: voidReadingInput,
  areas: areaOf,
  run(ctx, { readingId, reason }) {
    const row = getInForce(ctx.db, readingId);
    ctx.db
      .update(reading)
      .set({ voidedBy: ctx.actor.personId, voidedAt: ctx.at, voidReason: reason })
      .where(eq(reading.id, readingId))
      .run();
    judgeDependents(ctx.db, row, ctx.at, "voided");
    return {
      result: { readingId },
      event: {
        kind: measurementsEvents.voided,
        subject: { type: "reading", id: readingId },
        payload: { pointId: row.pointId, parameterId: row.parameterId, takenAt: row.takenAt },
        reason,
      },
    };
  },
});

/** A person says that the instrument really showed a value that is off. */
export const confirmReading = defineCommand({
  verb: "confirmReading",
  permission: measurementsMay.record,
  input: confirmReadingInput,
  areas: areaOf,
  run(ctx, { readingId }) {
    const row = getInForce(ctx.db, readingId);
    if (row.confirmedAt !== null) throw new Problem("conflict", "This reading is confirmed already.");
    ctx.db
      .update(reading)
      .set({ confirmedBy: ctx.actor.personId, confirmedAt: ctx.at })
      .where(eq(reading.id, readingId))
      .run();
    return { result: { readingId }, event: { kind: measurementsEvents.confirmed, subject: { type: "reading", id: readingId } } };
  },
});

/** Adds a sentence that explains a reading. */
export const explainReading = defineCommand({
  verb: "explainReading",
  permission: measurementsMay.explain,
  input: explainReadingInput,
  areas: areaOf,
  run(ctx, { readingId, text }) {
    const explanationId = addExplanation(ctx, { readingId, text });
    return {
      result: { explanationId },
      event: { kind: measurementsEvents.explained, subject: { type: "reading", id: readingId } },
    };
  },
});
