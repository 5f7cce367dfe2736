/**
 * A process that records readings through the command, one after the other, and prints each reading's id and entry once the
 * command has answered. Ends when it is killed, or after the number of readings that is given.
 * Usage: tsx keep-reading.ts PERSON POINT PARAMETER NEWEST_AT [COUNT]     (data folder by STILLWELL_DATA)
 */
import { randomUUID } from "node:crypto";
import { writeSync } from "node:fs";
import { openDatabase } from "@/db/database";
import { HOUR_MS, systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { runCommand } from "@/modules/audit";
import { actorOf } from "@/modules/identity";
import { recordReadings } from "@/modules/measurements";

const [personId = 0, pointId = 0, parameterId = 0, newestAt = 0, count = Number.POSITIVE_INFINITY] =
  process.argv.slice(2).map(Number);
/** More than a day between readings, each older than the one before, so that none is judged by the change from another. */
const APART_MS = 25 * HOUR_MS;

const db = openDatabase(settings().databaseFile);
const actor = actorOf(db.writer.orm, personId, systemClock.now());
if (!actor) throw new Error("the person is not active");

for (let number = 0; number < count; number += 1) {
  const { result, entryId } = runCommand(
    db,
    actor,
    recordReadings,
    {
      readings: [
        {
          uuid: randomUUID(),
          pointId,
          parameterId,
          typedText: `${10 + (number % 8)}.${number % 10}`,
          takenAt: newestAt - number * APART_MS,
        },
      ],
    },
    { clock: systemClock },
  );
  // Written at once, past every buffer of this process: what was printed was answered.
  writeSync(1, `${result.readings[0]?.readingId} ${entryId}\n`);
}
db.close();
