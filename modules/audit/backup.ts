import { createHash } from "node:crypto";
import { createReadStream } from "node:fs";
import { mkdir, rename, rm, stat } from "node:fs/promises";
import path from "node:path";
import { z } from "zod";
import type { Database } from "@/db/database";
import type { Clock } from "@/lib/clock";
import { SYSTEM_ACTOR } from "@/modules/access";
import { auditMay } from "./abilities";
import { headOfFile, quickCheck } from "./database-files";
import { defineCommand } from "./define-command";
import { auditEvents } from "./events";
import { defineTask } from "./jobs/runner";
import { runCommand } from "./run-command";

/** Pages copied before other work gets its turn: about 2 MB, a few milliseconds. */
const PAGES_A_STEP = 512;

/** SHA-256 of a file, read as a stream. */
export async function fileSha256(file: string): Promise<string> {
  const hash = createHash("sha256");
  for await (const chunk of createReadStream(file)) hash.update(chunk as Buffer);
  return hash.digest("hex");
}

const recordBackup = defineCommand({
  verb: "recordBackup",
  permission: auditMay.backUp,
  input: z.strictObject({
    fileName: z.string(),
    sha256: z.string().length(64),
    bytes: z.number().int(),
    headEntryId: z.number().int(),
    headHash: z.string(),
  }),
  run: (_ctx, input) => ({
    result: input,
    event: { kind: auditEvents.backedUp, subject: { type: "database", id: input.fileName }, payload: input },
  }),
});

function mustBeSound(file: string): { id: number; hash: string } {
  const answer = quickCheck(file);
  if (answer !== "ok") throw new Error(`the copy is not sound: ${answer}`);
  return headOfFile(file);
}

/**
 * Copies the database while it is in use, from the writing connection itself (a copy from another connection would begin
 * anew at every write), checks the copy, and puts it in place under its name at once.
 * @throws Error when the copy is not sound; nothing is left under the name then
 */
export async function copyDatabase(db: Database, target: string): Promise<{ id: number; hash: string }> {
  await mkdir(path.dirname(target), { recursive: true });
  const part = `${target}.part`;
  await rm(part, { force: true });
  await db.writer.sqlite.backup(part, { progress: () => PAGES_A_STEP });
  const head = mustBeSound(part);
  await rm(`${part}-journal`, { force: true });
  await rename(part, target);
  return head;
}

/** Makes a backup: copies the database while it is in use, and notes the copy with its hash in the history. */
export async function backUpDatabase(
  db: Database,
  clock: Clock,
  target: string,
): Promise<{ sha256: string; bytes: number; headEntryId: number }> {
  const head = await copyDatabase(db, target);
  const [sha256, { size: bytes }] = [await fileSha256(target), await stat(target)];
  const input = { fileName: path.basename(target), sha256, bytes, headEntryId: head.id, headHash: head.hash };
  runCommand(db, SYSTEM_ACTOR, recordBackup, input, { clock });
  return { sha256, bytes, headEntryId: head.id };
}

/** The same as a task, for a server that is running: whoever asks puts it into the queue and waits. */
export const backUpTask = defineTask({
  verb: "backUpDatabase",
  lane: "files",
  input: z.strictObject({ target: z.string().min(1) }),
  async perform({ db, clock }, { target }) {
    await backUpDatabase(db, clock, target);
  },
});
