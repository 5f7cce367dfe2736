import { eq } from "drizzle-orm";
import { defineCommand } from "@/modules/audit";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { getInForce } from "../explanations";
import { voidReadingInput } from "../input";
import { judgeDependents } from "../judge";
import { areaOfReading } from "../points";
import { reading } from "../schema";

/** Strikes a reading out (entered for the wrong system, say). It stays readable and counts no more. */
export const voidReading = defineCommand({
  verb: "voidReading",
  permission: measurementsMay.correct,
  input: voidReadingInput,
  areas: areaOfReading,
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
