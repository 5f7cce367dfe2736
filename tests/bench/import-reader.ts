/**
 * How fast is a file of 100,000 rows read, with how much memory, and does the process that asks for it keep answering?
 * Run: npx tsx tests/bench/import-reader.ts [ROWS]
 * Prints figures; it checks nothing but that every row arrived.
 */
import { execFileSync } from "node:child_process";
import { createHash } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { mkdtemp, rm, stat } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { monitorEventLoopDelay, performance } from "node:perf_hooks";
import ExcelJS from "exceljs";
import { csvLine } from "@/lib/csv";
import { invariant } from "@/lib/invariant";
import type { ReaderMode } from "@/modules/imports/reader/messages";
import { openReader } from "@/modules/imports/reader/open-reader";

const ROWS = Number(process.argv[2] ?? 100_000);
const HEADER = ["System", "Point", "Parameter", "Value", "Unit", "Taken at", "Method", "Instrument", "Note"];
const MINUTE_MS = 60_000;
const START = Date.UTC(2024, 0, 1);
const MB = 1024 * 1024;

const takenAt = (index: number): Date => new Date(START + index * 10 * MINUTE_MS);
const cells = (index: number) => [
  `SYS-${String(index % 16).padStart(2, "0")}`,
  "surface",
  ["TEMP", "PH", "SAL", "DO"][index % 4] ?? "",
  Math.round((8 + Math.sin(index / 50)) * 100) / 100,
  "°C",
];

async function writeCsvFile(file: string): Promise<void> {
  const out = createWriteStream(file);
  out.write(csvLine(HEADER));
  for (let index = 0; index < ROWS; index += 1) {
    const at = takenAt(index).toISOString().slice(0, 16).replace("T", " ");
    out.write(csvLine([...cells(index), at, "M-1", "I-1", index % 10 === 0 ? "checked, steady" : ""]));
  }
  await new Promise<void>((resolve) => out.end(() => resolve()));
}

async function writeXlsxFile(file: string): Promise<void> {
  const book = new ExcelJS.stream.xlsx.WorkbookWriter({
    filename: file,
    useStyles: true,
    useSharedStrings: true,
  });
  const sheet = book.addWorksheet("Readings");
  sheet.addRow(HEADER).commit();
  for (let index = 0; index < ROWS; index += 1) {
    const row = sheet.addRow([
      ...cells(index),
      takenAt(index),
      "M-1",
      "I-1",
      index % 10 === 0 ? "checked, steady" : null,
    ]);
    row.getCell(6).numFmt = "yyyy-mm-dd hh:mm";
    row.commit();
  }
  await book.commit();
}

/** Yardstick of the same run: the same bytes hashed once, nothing else done with them. */
async function hashMs(file: string): Promise<number> {
  const from = performance.now();
  const hash = createHash("sha256");
  for await (const piece of createReadStream(file)) hash.update(piece as Buffer);
  hash.digest("hex");
  return performance.now() - from;
}

/** Yardstick of the same run: the longest pause of this process while it does nothing for two seconds. */
async function idlePauseMs(): Promise<number> {
  const delay = monitorEventLoopDelay({ resolution: 1 });
  delay.enable();
  await new Promise((resolve) => setTimeout(resolve, 2000));
  delay.disable();
  return delay.max / 1e6;
}

async function measure(file: string, mode: ReaderMode, script: string) {
  const delay = monitorEventLoopDelay({ resolution: 1 });
  delay.enable();
  const from = performance.now();
  const opened = await openReader(
    {
      path: file,
      name: path.basename(file),
      mode,
      zone: "Europe/London",
      parameters: [],
      defaults: {},
      answers: { decimalSign: "point", doubledHour: "earlier" },
    },
    { script },
  );
  const headerMs = performance.now() - from;
  let candidates = 0;
  let problems = 0;
  for await (const batch of opened.batches) {
    candidates += batch.candidates.length;
    problems += batch.problems.length;
  }
  const ms = performance.now() - from;
  delay.disable();
  const report = opened.report();
  invariant(report.rows === ROWS, `only ${report.rows} of ${ROWS} rows arrived`);
  return { ms, headerMs, candidates, problems, peakMb: report.peakRssBytes / MB, pauseMs: delay.max / 1e6 };
}

const folder = await mkdtemp(path.join(tmpdir(), "import-bench-"));
try {
  const script = path.join(folder, "reader-process.mjs");
  execFileSync(process.execPath, [path.resolve("scripts/build-reader.mjs"), script]);
  const csv = path.join(folder, "readings.csv");
  const xlsx = path.join(folder, "readings.xlsx");
  await writeCsvFile(csv);
  await writeXlsxFile(xlsx);
  console.log(`longest pause of this process while idle ${(await idlePauseMs()).toFixed(1)} ms`);
  for (const file of [csv, xlsx]) {
    const size = (await stat(file)).size / MB;
    console.log(
      `${path.extname(file).slice(1)} ${ROWS} rows, ${size.toFixed(1)} MB, hashing alone ${(await hashMs(file)).toFixed(0)} ms`,
    );
    for (const mode of ["survey", "map", "rows"] as const) {
      const { ms, headerMs, candidates, problems, peakMb, pauseMs } = await measure(file, mode, script);
      console.log(
        `  ${mode.padEnd(6)} ${(ms / 1000).toFixed(2)} s (header after ${headerMs.toFixed(0)} ms), ${Math.round(ROWS / (ms / 1000))} rows/s, ` +
          `reading process at most ${peakMb.toFixed(0)} MB, longest pause of this process ${pauseMs.toFixed(1)} ms, ` +
          `${candidates} candidates, ${problems} problems`,
      );
    }
  }
} finally {
  await rm(folder, { recursive: true });
}
