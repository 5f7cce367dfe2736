import { eq } from "drizzle-orm";
import { Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { getInForce } from "../explanations";
import { confirmReadingInput } from "../input";
import { areaOfReading } from "../points";
import { reading } from "../schema";

/** A person says that the instrument really showed a value that is off. */
export const confirmReading = defineCommand({
  verb: "confirmReading",
  permission: measurementsMay.record,
  input: confirmReadingInput,
  areas: areaOfReading,
  run(ctx, { readingId }) {
    const row = getInForce(ctx.db, readingId);
    if (row.confirmedAt !== null) throw new Problem("conflict", "This reading is confirmed already.");
    ctx.db
      .update(reading)
      .set({ confirmedBy: ctx.actor.personId, confirmedAt: ctx.at })
      .where(eq(reading.id, readingId))
      .run();
    return {
      result: { readingId },
      event: { kind: measurementsEvents.confirmed, subject: { type: "reading", id: readingId } },
    };
  },
});
