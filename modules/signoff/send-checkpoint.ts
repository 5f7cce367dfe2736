import { z } from "zod";
import type { Database } from "@/db/database";
import { type Clock, DAY_MS } from "@/lib/clock";
import { settings } from "@/lib/env";
import { SYSTEM_ACTOR } from "@/modules/access";
import {
  auditEvents,
  auditMay,
  chainHead,
  defineCommand,
  defineTask,
  runCommand,
  scheduleOnce,
  schemaHash,
} from "@/modules/audit";
import { addressesOf } from "@/modules/identity";
import { queueMail } from "@/modules/notifications";

/** Mails the newest entry's number and hash to auditors and administrators: with it a tail that is cut off later is found. */
export const sendCheckpoint = defineCommand({
  verb: "sendCheckpoint",
  permission: auditMay.makeCheckpoint,
  input: z.strictObject({
    entryId: z.number().int(),
    hash: z.string().length(64),
    schemaHash: z.string().length(64),
  }),
  run(ctx, input) {
    const { STILLWELL_FACILITY } = settings();
    const to = addressesOf(ctx.db, ["auditor", "admin"]);
    for (const address of to) {
      queueMail(ctx, {
        to: address,
        kind: "checkpoint",
        subject: `History checkpoint ${input.entryId}, ${STILLWELL_FACILITY}`,
        body:
          `Keep this letter. With it anybody can find out later whether the history was cut or rewritten.\n\n` +
          `checkpoint ${input.entryId}:${input.hash}\nschema ${input.schemaHash}\ntime ${new Date(ctx.at).toISOString()}\n`,
      });
    }
    return {
      result: { sentTo: to.length },
      event: {
        kind: auditEvents.checkpointMade,
        subject: { type: "checkpoint", id: input.entryId },
        payload: input,
      },
    };
  },
});

/** Once a day: a checkpoint goes out, and the next one is put into the queue. */
export const dailyCheckpoint = defineTask({
  verb: "dailyCheckpoint",
  lane: "mail",
  input: z.strictObject({}),
  perform({ db, clock }) {
    const { sqlite } = db.reader;
    const head = chainHead(sqlite);
    const checkpoint = { entryId: head.id, hash: head.hash, schemaHash: schemaHash(sqlite) };
    runCommand(db, SYSTEM_ACTOR, sendCheckpoint, checkpoint, { clock });
    scheduleCheckpoint(db, clock, DAY_MS);
    return Promise.resolve();
  },
});

/** Puts the next checkpoint into the queue where none waits. */
export function scheduleCheckpoint(db: Database, clock: Clock, inMs = 0): void {
  scheduleOnce(db, dailyCheckpoint.verb, clock.now(), clock.now() + inMs);
}
