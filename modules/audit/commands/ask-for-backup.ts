import path from "node:path";
import { z } from "zod";
import { settings } from "@/lib/env";
import { auditMay } from "../abilities";
import { backUpTask } from "../backup";
import { defineCommand } from "../define-command";
import { auditEvents } from "../events";

/** `2026-03-02T09-00-00-000Z.db`: sorts by time, fits every file system. */
const fileNameAt = (at: number): string => `${new Date(at).toISOString().replaceAll(/[:.]/g, "-")}.db`;

/** Puts a backup into the queue; it is written into `backups/` of the data folder while everybody goes on working. */
export const askForBackup = defineCommand({
  verb: "askForBackup",
  permission: auditMay.askForBackup,
  input: z.strictObject({}),
  run(ctx) {
    const fileName = fileNameAt(ctx.at);
    ctx.enqueue(backUpTask, { target: path.join(settings().dataFolder, "backups", fileName) });
    return {
      result: { fileName },
      event: { kind: auditEvents.backupAsked, subject: { type: "database", id: fileName } },
    };
  },
});
