import { copyFileSync, existsSync, renameSync, rmSync } from "node:fs";
import { openDatabase } from "@/db/database";
import { servingProcess } from "@/db/server-mark";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import {
  auditEvents,
  chainHead,
  fileSha256,
  headOfFile,
  mergeWriteAheadLog,
  migrateDatabase,
  sealOutsideCommand,
  verifyFile,
} from "@/modules/audit";
import { endEverySession } from "@/modules/identity";

function mustBeWhole(file: string): void {
  const { findings, entries } = verifyFile(file);
  if (entries === 0) throw new Error(`${file} holds no history of Stillwell.`);
  if (findings.length > 0) {
    throw new Error(`Nothing was restored: the history in ${file} is not whole.\n${findings[0]?.sentence}`);
  }
}

/** Moves the database that is there aside; answers the newest entry it held. */
function keepAside(databaseFile: string): { id: number; hash: string } | null {
  if (!existsSync(databaseFile)) return null;
  mergeWriteAheadLog(databaseFile);
  const head = headOfFile(databaseFile);
  const kept = `${databaseFile}.before-restore-${systemClock.now()}`;
  renameSync(databaseFile, kept);
  for (const tail of ["-wal", "-shm"]) rmSync(`${databaseFile}${tail}`, { force: true });
  console.log(`What was there is kept as ${kept}`);
  return head;
}

/** `npm run restore -- FILE`: verifies a backup, puts it in place, keeps what was there, and says so in the history. */
async function main(): Promise<void> {
  const [file] = process.argv.slice(2);
  if (!file || !existsSync(file)) throw new Error("Say from which file: npm run restore -- FILE");
  const { dataFolder, databaseFile } = settings();
  const pid = servingProcess(dataFolder);
  if (pid !== null) throw new Error(`Stop the server first (process ${pid}); nothing was restored.`);
  mustBeWhole(file);
  const sha256 = await fileSha256(file);
  const replaced = keepAside(databaseFile);
  copyFileSync(file, databaseFile);
  const db = openDatabase(databaseFile);
  try {
    const restored = chainHead(db.writer.sqlite);
    const payload = {
      fileSha256: sha256,
      restoredEntryId: restored.id,
      restoredHash: restored.hash,
      replacedEntryId: replaced?.id ?? null,
      replacedHash: replaced?.hash ?? null,
    };
    sealOutsideCommand(db, systemClock.now(), auditEvents.restored.verb, payload, () => undefined);
    migrateDatabase(db, systemClock);
    endEverySession(db, systemClock.now());
    console.log(`Restored up to entry ${restored.id}; everybody signs in again.`);
  } finally {
    db.close();
  }
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
