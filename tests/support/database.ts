import { copyFileSync, existsSync, mkdirSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach } from "vitest";
import type { z } from "zod";
import { type Database, openDatabase } from "@/db/database";
import { SetClock } from "@/lib/clock";
import { readSettings, useSettings } from "@/lib/env";
import { type Actor, type Role } from "@/modules/access";
import { ask, type Command, migrateDatabase, type Query, type RunOptions, runCommand } from "@/modules/audit";
import { addPersonForTest } from "./people";

/** 2026-03-02 09:00 in London: a Monday in winter time. */
export const NOON = Date.UTC(2026, 2, 2, 9, 0);

const folder = path.join(tmpdir(), `stillwell-template-${process.pid}`);

function templateFile(): string {
  const file = path.join(folder, "template.db");
  if (existsSync(file)) return file;
  mkdirSync(folder, { recursive: true });
  const db = openDatabase(file);
  migrateDatabase(db, new SetClock(NOON));
  db.writer.sqlite.pragma("wal_checkpoint(TRUNCATE)");
  db.close();
  return file;
}

/** A test's own database: a copy of one migrated template, people on request, a clock that is told the time. */
export type TestBench = {
  db: Database;
  clock: SetClock;
  /** Makes an active person with these roles (bound to these areas) and answers them as actor. */
  person(name: string, roles: Role[], areaIds?: number[]): Actor;
  run<S extends z.ZodType, R>(
    actor: Actor,
    command: Command<S, R>,
    input: z.input<S>,
    options?: Partial<RunOptions>,
  ): R;
  ask<S extends z.ZodType, R>(actor: Actor, query: Query<S, R>, input: z.input<S>): R;
};

const open: { db: Database; folder: string }[] = [];

afterEach(() => {
  for (const bench of open.splice(0)) {
    bench.db.close();
    rmSync(bench.folder, { recursive: true, force: true });
  }
});

/** Opens a fresh database for one test; closed and removed after it. */
export function testBench(at = NOON): TestBench {
  const own = mkdtempSync(path.join(tmpdir(), "stillwell-test-"));
  useSettings(readSettings({ NODE_ENV: "test", STILLWELL_DATA: own, LOG_LEVEL: "silent" }));
  const file = path.join(own, "stillwell.db");
  copyFileSync(templateFile(), file);
  const db = openDatabase(file);
  open.push({ db, folder: own });
  const clock = new SetClock(at);
  return {
    db,
    clock,
    person: (name, roles, areaIds = []) => addPersonForTest(db, clock, name, roles, areaIds),
    run: (actor, command, input, options = {}) =>
      runCommand(db, actor, command, input, { clock, passwordConfirmed: command.signed ?? false, ...options })
        .result,
    ask: (actor, query, input) => ask({ db: db.reader.orm, actor, at: clock.now() }, query, input),
  };
}
