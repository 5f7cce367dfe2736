import { copyFileSync, rmSync } from "node:fs";
import BetterSqlite3 from "better-sqlite3";
import { describe, expect, it } from "vitest";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import { capturedTables, verifyHistory } from "@/modules/audit";
import { correctReading, recordReadings } from "@/modules/measurements";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

/** A small linear congruential generator (Numerical Recipes' constants), so that a failure can be repeated by its number. */
function numbers(seed: number) {
  let state = seed >>> 0;
  return (below: number): number => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
  };
}

/** A database with a real history: people, water, limits, readings and corrections. */
function livedIn() {
  const bench = testBench(NOON + 10 * DAY_MS);
  const water = waterFor(bench);
  water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18, greatestChange24h: 1 } });
  const joe = bench.person("Joe Okafor", ["aquarist"]);
  for (let day = 0; day < 4; day += 1) {
    const at = NOON + day * DAY_MS;
    const { readings } = bench.run(joe, recordReadings, {
      readings: [
        water.reading(water.temperatureId, `1${day}.4`, at),
        water.reading(water.ammoniaId, "<0.05", at + HOUR_MS, { note: "after feeding" }),
      ],
    });
    if (day % 3 !== 0) continue;
    bench.run(joe, correctReading, {
      readingId: readings[0]?.readingId ?? 0,
      uuid: crypto.randomUUID(),
      typedText: "13.3",
      reason: "misread",
    });
  }
  const file = `${bench.db.file}.copy`;
  bench.db.writer.sqlite.pragma("wal_checkpoint(TRUNCATE)");
  copyFileSync(bench.db.file, file);
  return { bench, file };
}

type Alter = (sqlite: BetterSqlite3.Database, pick: (below: number) => number) => string | null;

const rowsOf = (sqlite: BetterSqlite3.Database, table: string) =>
  sqlite.prepare(`select rowid as rowid, * from "${table}"`).all() as Record<string, unknown>[];

/** Another value of the same kind; never the same. */
function another(value: unknown, pick: (below: number) => number): unknown {
  if (value === null) return `x${pick(1000)}`;
  if (typeof value === "number") return value + 1 + pick(1000);
  return `${String(value)}${pick(10)}`;
}

const alterCell =
  (tables: (sqlite: BetterSqlite3.Database) => string[]): Alter =>
  (sqlite, pick) => {
    const names = tables(sqlite);
    const table = names[pick(names.length)] ?? "";
    const rows = rowsOf(sqlite, table);
    const row = rows[pick(rows.length)];
    if (!row) return null;
    const columns = Object.keys(row).filter((name) => name !== "rowid");
    const column = columns[pick(columns.length)] ?? "";
    sqlite
      .prepare(`update "${table}" set "${column}" = ? where rowid = ?`)
      .run(another(row[column], pick), row.rowid);
    return `${table}.${column} of row ${String(row.rowid)}`;
  };

const history = () => ["audit_entry", "audit_change"];

const ALTERATIONS: Alter[] = [
  alterCell((sqlite) => capturedTables(sqlite)),
  alterCell(history),
  (sqlite, pick) => {
    const tables = [...capturedTables(sqlite), ...history()];
    const table = tables[pick(tables.length)] ?? "";
    const row = rowsOf(sqlite, table)[0];
    if (!row) return null;
    sqlite.prepare(`delete from "${table}" where rowid = ?`).run(row.rowid);
    return `a row of ${table} taken out`;
  },
  (sqlite, pick) => {
    const { n } = sqlite.prepare("select max(id) as n from audit_entry").get() as { n: number };
    const [a, b] = [1 + pick(n - 1), n];
    sqlite.exec(
      `update audit_entry set id = -1 where id = ${a}; update audit_entry set id = ${a} where id = ${b}; update audit_entry set id = ${b} where id = -1`,
    );
    return `entries ${a} and ${b} swapped`;
  },
];

describe("the history", () => {
  it("of a real database is whole", () => {
    const { bench } = livedIn();
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("shows each of 1,000 random alterations of any table, any column, entries or their order", () => {
    const { file } = livedIn();
    const sqlite = new BetterSqlite3(file);
    sqlite.pragma("foreign_keys = OFF");
    sqlite.pragma("ignore_check_constraints = ON");
    const dropped = sqlite.prepare("select name, sql from sqlite_master where type = 'trigger'").all() as {
      name: string;
      sql: string;
    }[];
    const missed: string[] = [];
    let found = 0;
    for (let number = 0; found + missed.length < 1000; number += 1) {
      const pick = numbers(number);
      sqlite.exec("begin");
      const alter = ALTERATIONS[number % 4];
      // Whoever owns the file can take the triggers away, alter, and put them back.
      for (const { name } of dropped) sqlite.exec(`drop trigger "${name}"`);
      let what: string | null = null;
      try {
        what = alter?.(sqlite, pick) ?? null;
      } catch (cause) {
        if (!/UNIQUE|NOT NULL|datatype mismatch/.test(String(cause))) throw cause;
      }
      for (const { sql } of dropped) sqlite.exec(sql);
      if (what !== null) {
        if (verifyHistory(sqlite).findings.length > 0) found += 1;
        else missed.push(`${number}: ${what}`);
      }
      sqlite.exec("rollback");
    }
    sqlite.close();
    rmSync(file);
    expect(missed).toEqual([]);
    expect(found).toBe(1000);
  }, 300_000);

  it("shows a trigger that is gone", () => {
    const { file } = livedIn();
    const sqlite = new BetterSqlite3(file);
    sqlite.exec("drop trigger history_update_measurements_reading");
    expect(verifyHistory(sqlite).findings.map((finding) => finding.kind)).toEqual(["schema"]);
    sqlite.close();
  });

  it("with its tail cut off is found by a checkpoint, and only by that", () => {
    const { file } = livedIn();
    const sqlite = new BetterSqlite3(file);
    sqlite.pragma("foreign_keys = OFF");
    const { head } = verifyHistory(sqlite);
    const triggers = sqlite.prepare("select name, sql from sqlite_master where type = 'trigger'").all() as {
      name: string;
      sql: string;
    }[];
    for (const { name } of triggers) sqlite.exec(`drop trigger "${name}"`);
    // The last entry recorded readings only: its rows go with it.
    const last = head?.entryId ?? 0;
    const changes = sqlite
      .prepare("select table_name as t, row_key as k from audit_change where entry_id = ? order by id desc")
      .all(last);
    for (const { t, k } of changes as { t: string; k: string }[])
      sqlite.exec(`delete from "${t}" where id = ${k}`);
    sqlite.exec(
      `delete from audit_change where entry_id = ${last}; delete from audit_entry where id = ${last}`,
    );
    for (const { sql } of triggers) sqlite.exec(sql);
    expect(verifyHistory(sqlite).findings).toEqual([]);
    const findings = verifyHistory(sqlite, head ? [head] : []).findings;
    expect(findings[0]?.sentence).toContain("the history has been cut");
    sqlite.close();
  });

  it("names the record that was altered first", () => {
    const { file } = livedIn();
    const sqlite = new BetterSqlite3(file);
    const triggers = sqlite.prepare("select name, sql from sqlite_master where type = 'trigger'").all() as {
      name: string;
      sql: string;
    }[];
    for (const { name } of triggers) sqlite.exec(`drop trigger "${name}"`);
    sqlite.exec("update measurements_reading set value = 99 where id in (4, 2)");
    for (const { sql } of triggers) sqlite.exec(sql);
    expect(verifyHistory(sqlite).findings[0]?.sentence).toBe(
      "measurements_reading 2 differs from its history in value",
    );
    sqlite.close();
  });
});
