import { cpSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { migrateDatabase, verifyHistory } from "@/modules/audit";
import { recordReadings } from "@/modules/measurements";
import { NOON, type TestBench, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

type Journal = {
  entries: { idx: number; when: number; tag: string; version: string; breakpoints: boolean }[];
};

/** The migrations as they are, and one more. */
function migrationsAnd(bench: TestBench, sql: string): string {
  const folder = path.join(path.dirname(bench.db.file), "migrations");
  cpSync("db/migrations", folder, { recursive: true });
  const file = path.join(folder, "meta", "_journal.json");
  const journal = JSON.parse(readFileSync(file, "utf8")) as Journal;
  const last = journal.entries.at(-1);
  if (!last) throw new Error("there is a first migration");
  journal.entries.push({ ...last, idx: last.idx + 1, when: last.when + 1, tag: "0999_trial" });
  writeFileSync(file, JSON.stringify(journal));
  writeFileSync(path.join(folder, "0999_trial.sql"), sql);
  return folder;
}

/** Rebuilds systems_system, the parent of points and more, with one column more: the way a schema tool does it. */
function rebuildOfSystems(bench: TestBench): string {
  const { sql } = bench.db.reader.sqlite
    .prepare("select sql from sqlite_master where name = 'systems_system' and type = 'table'")
    .get() as { sql: string };
  const columns = (bench.db.reader.sqlite.pragma("table_info(systems_system)") as { name: string }[])
    .map(({ name }) => `\`${name}\``)
    .join(", ");
  const indexes = bench.db.reader.sqlite
    .prepare(
      "select sql from sqlite_master where tbl_name = 'systems_system' and type = 'index' and sql is not null",
    )
    .all() as { sql: string }[];
  const rebuilt = sql.replace(
    /CREATE TABLE [`"]systems_system[`"] \(/,
    "CREATE TABLE `__new_systems_system` (\n`trial_mark` text DEFAULT 'kept' NOT NULL,",
  );
  return [
    "PRAGMA foreign_keys=OFF;",
    `${rebuilt};`,
    `INSERT INTO \`__new_systems_system\`(${columns}) SELECT ${columns} FROM \`systems_system\`;`,
    "DROP TABLE `systems_system`;",
    "ALTER TABLE `__new_systems_system` RENAME TO `systems_system`;",
    ...indexes.map((index) => `${index.sql};`),
    "PRAGMA foreign_keys=ON;",
  ].join("--> statement-breakpoint\n");
}

function livedIn() {
  const bench = testBench(NOON);
  const water = waterFor(bench);
  const joe = bench.person("Joe Okafor", ["aquarist"]);
  const read = () =>
    bench.run(joe, recordReadings, {
      readings: [water.reading(water.temperatureId, "12.4", bench.clock.now())],
    });
  read();
  return { bench, water, read };
}

const count = (bench: TestBench, table: string): number =>
  (bench.db.writer.sqlite.prepare(`select count(*) as n from ${table}`).get() as { n: number }).n;
const newest = (bench: TestBench) =>
  bench.db.writer.sqlite
    .prepare("select verb, change_count as changes, payload from audit_entry order by id desc limit 1")
    .get();

describe("a migration", () => {
  it("that rebuilds a parent table keeps its child rows, is sealed row by row, and leaves the history whole", () => {
    const { bench, read } = livedIn();
    const before = { points: count(bench, "systems_point"), readings: count(bench, "measurements_reading") };
    expect(before.points).toBeGreaterThan(0);
    const folder = migrationsAnd(bench, rebuildOfSystems(bench));
    expect(migrateDatabase(bench.db, bench.clock, folder)).toEqual({ migrated: true });
    expect({ points: count(bench, "systems_point"), readings: count(bench, "measurements_reading") }).toEqual(
      before,
    );
    expect(newest(bench)).toMatchObject({
      verb: "database.migrated",
      changes: count(bench, "systems_system"),
    });
    const change = bench.db.writer.sqlite
      .prepare(
        "select operation, before, after from audit_change where table_name = 'systems_system' order by id desc",
      )
      .get() as { operation: string; before: string; after: string };
    expect(change.operation).toBe("migrate");
    expect(JSON.parse(change.before)).not.toHaveProperty("trial_mark");
    expect(JSON.parse(change.after)).toEqual({ ...JSON.parse(change.before), trial_mark: "kept" });
    expect(verifyHistory(bench.db.writer.sqlite).findings).toEqual([]);
    expect(bench.db.writer.sqlite.pragma("foreign_key_check")).toEqual([]);
    expect(Number(bench.db.writer.sqlite.pragma("foreign_keys", { simple: true }))).toBe(1);
    read();
    expect(verifyHistory(bench.db.writer.sqlite).findings).toEqual([]);
  });

  it("that is up to date writes nothing", () => {
    const { bench } = livedIn();
    const entries = count(bench, "audit_entry");
    expect(migrateDatabase(bench.db, bench.clock)).toEqual({ migrated: false });
    expect(count(bench, "audit_entry")).toBe(entries);
  });

  it("puts a trigger back that is gone, and the history says that the schema was another", () => {
    const { bench } = livedIn();
    bench.db.writer.sqlite.exec("drop trigger history_update_measurements_reading");
    expect(migrateDatabase(bench.db, bench.clock)).toEqual({ migrated: true });
    expect(newest(bench)).toMatchObject({ verb: "database.migrated", changes: 0 });
    expect(verifyHistory(bench.db.writer.sqlite).findings).toEqual([]);
  });

  it("that fails leaves nothing of itself, and the file goes on as it was", () => {
    const { bench, read } = livedIn();
    const [entries, points] = [count(bench, "audit_entry"), count(bench, "systems_point")];
    const sql = `ALTER TABLE systems_system ADD trial_mark text;--> statement-breakpoint\nINSERT INTO no_such_table VALUES (1);`;
    expect(() => migrateDatabase(bench.db, bench.clock, migrationsAnd(bench, sql))).toThrow();
    expect(count(bench, "audit_entry")).toBe(entries);
    expect(count(bench, "systems_point")).toBe(points);
    const columns = bench.db.writer.sqlite.pragma("table_info(systems_system)") as { name: string }[];
    expect(columns.map(({ name }) => name)).not.toContain("trial_mark");
    expect(verifyHistory(bench.db.writer.sqlite).findings).toEqual([]);
    read();
    expect(verifyHistory(bench.db.writer.sqlite).findings).toEqual([]);
  });

  it("that would take child rows along, or leave them pointing to nothing, is refused, says so, and changes nothing", () => {
    const { bench } = livedIn();
    const sql = "DELETE FROM `systems_system`;";
    expect(() => migrateDatabase(bench.db, bench.clock, migrationsAnd(bench, sql))).toThrow(
      /point to nothing/,
    );
  });
});
