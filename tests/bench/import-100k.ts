/**
 * How fast does a file of 100,000 readings come in, from upload to commit, and does the site keep answering meanwhile?
 * First alone, then the same while 50 people post readings.
 * Run: node --conditions=react-server --import tsx tests/bench/import-100k.ts [ROWS]
 * Prints figures; checks nothing but that every reading arrived. Works on a database of its own in the temporary folder.
 */
import { execFileSync } from "node:child_process";
import { randomUUID } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { mkdtemp, rm, stat } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { monitorEventLoopDelay, performance } from "node:perf_hooks";
import type { z } from "zod";
import { openDatabase } from "@/db/database";
import { systemClock } from "@/lib/clock";
import { csvLine } from "@/lib/csv";
import { readSettings, useSettings as takeSettings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import type { Actor } from "@/modules/access";
import { type Command, JobRunner, migrateDatabase, runCommand, type WorkTable } from "@/modules/audit";
import { checkImport, commitImport, receiveUpload, startCommit, withdrawImport } from "@/modules/imports";
import { judgeSeriesAgain, recordReadings } from "@/modules/measurements";
import type { TestBench } from "../support/database";
import { addPersonForTest } from "../support/people";
import { type Water, waterFor } from "../support/water";

const ROWS = Number(process.argv[2] ?? 100_000);
const SYSTEMS = 16;
const PEOPLE = 50;
/** Each person sends a reading this often. */
const EVERY_MS = 2000;
const MINUTE_MS = 60_000;
const START = Date.UTC(2024, 0, 1);

const folder = await mkdtemp(path.join(tmpdir(), "import-100k-"));
takeSettings(readSettings({ NODE_ENV: "test", STILLWELL_DATA: folder, LOG_LEVEL: "silent" }));
const script = path.resolve("build/reader-process.mjs");
execFileSync(process.execPath, [path.resolve("scripts/build-reader.mjs"), script]);
const db = openDatabase(path.join(folder, "stillwell.db"));
migrateDatabase(db, systemClock);
const act = <S extends z.ZodType, R>(actor: Actor, command: Command<S, R>, input: z.input<S>): R =>
  runCommand(db, actor, command, input, { clock: systemClock, passwordConfirmed: true }).result;
const bench = { db, run: act } as unknown as TestBench;
const analyst = addPersonForTest(db, systemClock, "Ada Finch", ["analyst"], []);
const people = Array.from({ length: PEOPLE }, (_, index) =>
  addPersonForTest(
    db,
    systemClock,
    `Person ${"abcdefghij"[Math.floor(index / 10)]}${"abcdefghij"[index % 10]}`,
    ["lead"],
    [],
  ),
);
const waters: Water[] = Array.from({ length: SYSTEMS }, (_, index) => waterFor(bench, `S${index}`));
for (const water of waters) {
  const bounds = { watchLow: 7, watchHigh: 9, toleranceLow: 6, toleranceHigh: 8.9, greatestChange24h: 2.5 };
  water.limit(water.temperatureId, { kind: "constant", bounds });
  water.limit(water.ammoniaId, { kind: "constant", bounds: { toleranceHigh: 1 } });
}

/** Readings of 16 systems, two parameters; each series a value every 3 hours or so. */
async function writeFile(file: string, shift: number): Promise<void> {
  const out = createWriteStream(file);
  out.write(csvLine(["System", "Parameter", "Value", "Unit", "Taken at", "Note"]));
  for (let index = 0; index < ROWS; index += 1) {
    const isTemperature = index % 2 === 0;
    const value = isTemperature ? 8 + Math.sin(index / 500) : 0.2 + 0.1 * Math.cos(index / 300);
    const at = new Date(START + shift + Math.floor(index / 32) * 180 * MINUTE_MS + (index % 32) * MINUTE_MS);
    const system = `S${Math.floor(index / 2) % SYSTEMS}-01`;
    const parameter = isTemperature ? "temperature" : "ammonia_n";
    const unit = isTemperature ? "°C" : "mg/L";
    out.write(csvLine([system, parameter, Math.round(value * 1000) / 1000, unit, at.toISOString(), ""]));
  }
  await new Promise<void>((resolve) => out.end(() => resolve()));
}

type Posted = { waits: number[]; stop: () => void };

/** 50 people who send one reading each every two seconds; how long each waits from the moment it was due. */
function postReadings(): Posted {
  const waits: number[] = [];
  const timers = people.map((person, index) => {
    let due = performance.now() + (index * EVERY_MS) / PEOPLE;
    let timer: NodeJS.Timeout;
    const post = () => {
      const water = waters[index % SYSTEMS];
      invariant(water, "every person has a system");
      const at = systemClock.now() - index;
      act(person, recordReadings, {
        readings: [{ ...water.reading(water.temperatureId, "8.1", at), uuid: randomUUID() }],
      });
      waits.push(performance.now() - due);
      due += EVERY_MS;
      timer = setTimeout(post, Math.max(0, due - performance.now()));
    };
    timer = setTimeout(post, Math.max(0, due - performance.now()));
    return () => clearTimeout(timer);
  });
  return { waits, stop: () => timers.forEach((stop) => stop()) };
}

const percentile = (values: number[], share: number): number =>
  values.toSorted((a, b) => a - b)[Math.min(values.length - 1, Math.floor(values.length * share))] ?? 0;

async function timed<T>(title: string, work: () => Promise<T>): Promise<T> {
  const delay = monitorEventLoopDelay({ resolution: 1 });
  delay.enable();
  const from = performance.now();
  const result = await work();
  const ms = performance.now() - from;
  delay.disable();
  console.log(
    `  ${title.padEnd(24)} ${(ms / 1000).toFixed(2).padStart(7)} s  ${String(Math.round(ROWS / (ms / 1000))).padStart(7)} rows/s  ` +
      `longest pause ${(delay.max / 1e6).toFixed(1)} ms, 99.9 % under ${(delay.percentile(99.9) / 1e6).toFixed(1)} ms`,
  );
  return result;
}

/** Carries out what is due, one job a turn of the event loop, as the server does. */
async function drain(...tasks: WorkTable[number][]): Promise<void> {
  const runner = new JobRunner(db, systemClock, tasks);
  while ((await runner.drain(1)) > 0) await new Promise((resolve) => setImmediate(resolve));
}

const count = (): number =>
  (
    db.reader.sqlite
      .prepare("select count(*) as n from measurements_reading where source = 'import'")
      .get() as { n: number }
  ).n;

async function bringIn(file: string, expected: number): Promise<void> {
  const deps = { db, actor: analyst, clock: systemClock, requestId: null, reader: { script } };
  const name = path.basename(file);
  const upload = () => receiveUpload(deps, { name, body: createReadStream(file), declaredBytes: null });
  const { importId } = await timed("upload", upload);
  await timed("look through and check", () => drain(checkImport));
  act(analyst, startCommit, { importId });
  await timed("commit", () => drain(commitImport));
  invariant(count() === expected, `${count()} readings arrived instead of ${expected}`);
  await timed("judge again", () => drain(judgeSeriesAgain));
  act(analyst, withdrawImport, { importId, reason: "The bench is done with it." });
}

async function idlePauseMs(): Promise<number> {
  const delay = monitorEventLoopDelay({ resolution: 1 });
  delay.enable();
  await new Promise((resolve) => setTimeout(resolve, 2000));
  delay.disable();
  return delay.max / 1e6;
}

try {
  const files = [path.join(folder, "alone.csv"), path.join(folder, "beside.csv")];
  for (const [index, file] of files.entries()) await writeFile(file, index * 30_000);
  const size = (await stat(files[0] ?? "")).size / 1024 / 1024;
  console.log(
    `${ROWS} readings, ${size.toFixed(1)} MB; longest pause while idle ${(await idlePauseMs()).toFixed(1)} ms`,
  );
  console.log("alone");
  await bringIn(files[0] ?? "", ROWS);
  console.log(`while ${PEOPLE} people send a reading every ${EVERY_MS / 1000} s each`);
  const posted = postReadings();
  await bringIn(files[1] ?? "", 2 * ROWS);
  posted.stop();
  const { waits } = posted;
  console.log(
    `  ${waits.length} readings sent meanwhile: answered within ${percentile(waits, 0.5).toFixed(1)} ms (half), ` +
      `${percentile(waits, 0.95).toFixed(1)} ms (95 %), ${Math.max(...waits).toFixed(1)} ms (all)`,
  );
} finally {
  db.close();
  await rm(folder, { recursive: true });
}
