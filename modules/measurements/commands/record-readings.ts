import { invariant } from "@/lib/invariant";
import { defineCommand } from "@/modules/audit";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { recordReadingsInput } from "../input";
import { takeReading } from "../intake";
import { needsConfirmation, type ReadingAnswer } from "../model";
import { areasOfPoints } from "../points";

/** Records one reading or many, all or none; each is stored and judged in the same transaction. */
export const recordReadings = defineCommand({
  verb: "recordReadings",
  permission: measurementsMay.record,
  input: recordReadingsInput,
  areas: (ctx, input) =>
    areasOfPoints(
      ctx.db,
      input.readings.map((each) => each.pointId),
    ),
  run(ctx, input) {
    invariant(ctx.actor.personId !== null, "a person records readings");
    const intake = { db: ctx.db, at: ctx.at, enteredBy: ctx.actor.personId, source: input.source };
    const answers: ReadingAnswer[] = input.readings.map((each, index) => {
      const { row, verdict, isRepeat } = takeReading(intake, each, `/readings/${index}`);
      return {
        uuid: row.uuid,
        readingId: row.id,
        isRepeat,
        status: verdict?.status ?? null,
        side: verdict?.side ?? null,
        sentence: verdict?.sentence ?? "",
        mustBeConfirmed: verdict !== null && needsConfirmation(verdict.status) && !each.confirmed,
      };
    });
    const fresh = answers.filter((answer) => !answer.isRepeat);
    return {
      result: { readings: answers },
      event: {
        kind: measurementsEvents.recorded,
        ...(fresh.length === 1 && fresh[0] ? { subject: { type: "reading", id: fresh[0].readingId } } : {}),
        payload: { readingIds: fresh.map((answer) => answer.readingId), source: input.source },
      },
    };
  },
});
