import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import BetterSqlite3 from "better-sqlite3";
import { describe, expect, it } from "vitest";
import { WORK } from "@/app/_server/reactions";
import { HOUR_MS } from "@/lib/clock";
import {
  askForBackup,
  askForVerification,
  backUpDatabase,
  fileSha256,
  getVerification,
  JobRunner,
  listBackups,
  listTroubledJobs,
  retryJob,
  upkeep,
  verifyFile,
} from "@/modules/audit";
import { recordReadings } from "@/modules/measurements";
import { runScript } from "../../support/commands";
import { NOON, type TestBench, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

function livedIn(bench: TestBench) {
  const water = waterFor(bench);
  const joe = bench.person("Joe Okafor", ["aquarist"]);
  let takenAt = bench.clock.now();
  // Each more than a day before the last, so that none is judged by the change from another.
  const read = (text: string) => {
    takenAt -= 25 * HOUR_MS;
    bench.run(joe, recordReadings, { readings: [water.reading(water.temperatureId, text, takenAt)] });
  };
  read("12.4");
  return { read };
}

const folderOf = (bench: TestBench): string => path.dirname(bench.db.file);
const drain = (bench: TestBench) => new JobRunner(bench.db, bench.clock, WORK).drain();
const entries = (bench: TestBench): number =>
  (bench.db.reader.sqlite.prepare("select count(*) as n from audit_entry").get() as { n: number }).n;

/** Alters a reading as whoever owns the file could: the triggers taken away and put back. */
function alter(file: string): void {
  const sqlite = new BetterSqlite3(file);
  const triggers = sqlite.prepare("select name, sql from sqlite_master where type = 'trigger'").all();
  for (const { name } of triggers as { name: string }[]) sqlite.exec(`drop trigger "${name}"`);
  sqlite.exec("update measurements_reading set typed_text = '11.4' where id = 1");
  for (const { sql } of triggers as { sql: string }[]) sqlite.exec(sql);
  sqlite.close();
}

describe("a backup", () => {
  it("is verified, restored into its place, and the history says so; what was there before is kept", () => {
    const bench = testBench();
    const { read } = livedIn(bench);
    bench.db.writer.sqlite.pragma("wal_checkpoint(TRUNCATE)");
    const folder = folderOf(bench);
    const copy = path.join(folder, "copies", "one.db");
    expect(runScript("scripts/backup.ts", [copy], folder)).toMatchObject({ status: 0 });
    expect(runScript("scripts/history-verify.ts", [copy], folder).said).toContain("The history is whole.");
    const kept = verifyFile(copy).entries;
    read("13.9");
    const restored = runScript("scripts/restore.ts", [copy], folder);
    expect(restored).toMatchObject({ status: 0 });
    expect(restored.said).toContain("Restored up to entry");
    const { findings, entries: now } = verifyFile(bench.db.file);
    expect(findings).toEqual([]);
    expect(now).toBeGreaterThan(kept);
    const before = readdirSync(folder).find((name) => name.includes("before-restore"));
    expect(verifyFile(path.join(folder, before ?? "")).entries).toBeGreaterThan(kept);
  }, 120_000);

  it("whose history was altered is not restored, and what is in place stays", () => {
    const bench = testBench();
    livedIn(bench);
    const folder = folderOf(bench);
    const copy = path.join(folder, "one.db");
    expect(runScript("scripts/backup.ts", [copy], folder).status).toBe(0);
    const damaged = path.join(folder, "damaged.db");
    bench.db.writer.sqlite.exec(`vacuum into '${damaged}'`);
    const live = readFileSync(bench.db.file);
    alter(damaged);
    const verified = runScript("scripts/history-verify.ts", [damaged], folder);
    expect(verified.status).toBe(1);
    expect(verified.said).toContain("measurements_reading 1 differs from its history in typed_text");
    const restored = runScript("scripts/restore.ts", [damaged], folder);
    expect(restored.status).toBe(1);
    expect(restored.said).toContain("Nothing was restored");
    expect(readFileSync(bench.db.file).equals(live)).toBe(true);
    expect(runScript("scripts/restore.ts", [path.join(folder, "none.db")], folder).status).toBe(1);
  }, 120_000);

  it("made while 2,000 readings are written is whole, and holds every reading that was there when it began", async () => {
    const bench = testBench();
    const { read } = livedIn(bench);
    const began = entries(bench);
    const copy = path.join(folderOf(bench), "busy.db");
    let written = 0;
    const writing = (async () => {
      for (; written < 2000; written += 1) {
        read(`1${written % 9}.5`);
        if (written % 5 === 0) await new Promise((resolve) => setImmediate(resolve));
      }
    })();
    const made = await backUpDatabase(bench.db, bench.clock, copy);
    const during = written;
    await writing;
    expect(written).toBe(2000);
    expect(during).toBeGreaterThan(0);
    const verified = verifyFile(copy);
    expect(verified.findings).toEqual([]);
    expect(verified.entries).toBeGreaterThanOrEqual(began);
    expect(verified.entries).toBeLessThan(entries(bench));
    expect(made).toMatchObject({ sha256: await fileSha256(copy), headEntryId: verified.entries });
  }, 120_000);

  it("is made at an administrator's word, and listed with its size and hash; others are refused", async () => {
    const bench = testBench();
    livedIn(bench);
    const admin = bench.person("Marek Dvorsky", ["admin"]);
    const lead = bench.person("Ines Marlow", ["lead"]);
    const { fileName } = bench.run(admin, askForBackup, {});
    expect(bench.ask(admin, listBackups, {})).toMatchObject({ made: [], waiting: [{ error: null }] });
    await drain(bench);
    const { made, waiting } = bench.ask(admin, listBackups, {});
    expect(waiting).toEqual([]);
    const file = path.join(folderOf(bench), "backups", fileName);
    expect(made).toMatchObject([{ fileName, sha256: await fileSha256(file), at: NOON }]);
    expect(verifyFile(file).findings).toEqual([]);
    expect(() => bench.run(lead, askForBackup, {})).toThrow("does not allow you to ask for a backup");
    expect(() => bench.ask(lead, listBackups, {})).toThrow("does not allow you");
  });
});

describe("work that was given up", () => {
  it("is tried again at an administrator's word, and only then", async () => {
    const bench = testBench();
    const admin = bench.person("Marek Dvorsky", ["admin"]);
    const auditor = bench.person("Ruth Calder", ["auditor"]);
    bench.run(admin, askForBackup, {});
    upkeep(bench.db, () => {
      bench.db.writer.sqlite.exec(
        "update audit_job set attempts = 8, error = 'the disk was full', failed_at = 1",
      );
    });
    expect(await drain(bench)).toBe(0);
    const [job] = bench.ask(auditor, listTroubledJobs, {});
    expect(job).toMatchObject({ kind: "backUpDatabase", attempts: 8, error: "the disk was full" });
    const jobId = job?.id ?? 0;
    expect(() => bench.run(auditor, retryJob, { jobId })).toThrow("does not allow you");
    expect(() => bench.run(admin, retryJob, { jobId: 999 })).toThrow("There is no such work");
    bench.run(admin, retryJob, { jobId });
    expect(() => bench.run(admin, retryJob, { jobId })).toThrow("will be tried again by itself");
    expect(await drain(bench)).toBe(1);
    expect(bench.ask(admin, listBackups, {}).made).toHaveLength(1);
    expect(bench.ask(auditor, listTroubledJobs, {})).toEqual([]);
    expect(() => bench.run(admin, retryJob, { jobId })).toThrow("has been done");
  });
});

describe("a check of the whole history asked for on screen", () => {
  it("is made on a copy beside the work, and its result is kept", async () => {
    const bench = testBench();
    livedIn(bench);
    const auditor = bench.person("Ruth Calder", ["auditor"]);
    const lead = bench.person("Ines Marlow", ["lead"]);
    expect(() => bench.run(lead, askForVerification, {})).toThrow("does not allow you");
    bench.run(auditor, askForVerification, {});
    expect(() => bench.run(auditor, askForVerification, {})).toThrow("under way already");
    const asked = entries(bench);
    let turns = 0;
    const timer = setInterval(() => (turns += 1), 5);
    await drain(bench);
    clearInterval(timer);
    expect(turns).toBeGreaterThan(20);
    const { checks, head } = bench.ask(auditor, getVerification, {});
    expect(checks).toMatchObject([
      {
        askedBy: auditor.personId,
        entries: asked,
        headEntryId: asked,
        findingCount: 0,
        findings: [],
        trouble: null,
      },
    ]);
    expect(head?.id).toBe(asked + 1);
  }, 60_000);

  it("names what was altered behind the product's back", async () => {
    const bench = testBench();
    livedIn(bench);
    const auditor = bench.person("Ruth Calder", ["auditor"]);
    bench.db.writer.sqlite.pragma("wal_checkpoint(TRUNCATE)");
    alter(bench.db.file);
    bench.run(auditor, askForVerification, {});
    await drain(bench);
    const [check] = bench.ask(auditor, getVerification, {}).checks;
    expect(check?.findingCount).toBe(1);
    expect(check?.findings[0]?.sentence).toBe(
      "measurements_reading 1 differs from its history in typed_text",
    );
  }, 60_000);
});
