import { execFile } from "node:child_process";
import { readdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { promisify } from "node:util";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { csvLine, writeCsv } from "@/lib/csv";
import { openReader, surveyFile } from "@/modules/imports/reader/open-reader";
import { bareWorkbook, workbook, xmlRow, zip } from "@/tests/support/import-files";
import { ImportFolder } from "@/tests/support/import-folder";

const files = new ImportFolder();
let script = "";
beforeAll(async () => {
  await files.make();
  script = files.request("reader-process.mjs").path;
  await promisify(execFile)(process.execPath, [path.resolve("scripts/build-reader.mjs"), script]);
}, 60_000);
afterAll(() => files.remove());

const HEADER = ["System", "Parameter", "Value", "Taken at"];
const row = (index: number) => ["KELP-01", "PH", `8,${index}`, `0${1 + (index % 9)}/04/2026 09:00`];
/** Processes that run this test's reader, by what the system says about each (Linux). */
async function readers(): Promise<string[]> {
  const pids = (await readdir("/proc")).filter((name) => /^\d+$/.test(name));
  const commands = await Promise.all(
    pids.map((pid) => readFile(`/proc/${pid}/cmdline`, "utf8").catch(() => "")),
  );
  return commands.filter((command) => command.includes(script) && !command.includes("build-reader"));
}

describe("openReader", () => {
  it("hands on batches one at a time and reports at the end, the process gone", async () => {
    const wanted = files.request("batches.csv", {
      mode: "map",
      answers: { dateOrder: "day-first", decimalSign: "comma" },
    });
    await writeFile(
      wanted.path,
      writeCsv(
        HEADER,
        Array.from({ length: 1201 }, (_, index) => row(index)),
      ),
    );
    const opened = await openReader(wanted, { script });
    expect(opened.header).toMatchObject({ kind: "csv", delimiter: ",", columnMap: { form: "long" } });
    const sizes: number[] = [];
    let candidates = 0;
    for await (const batch of opened.batches) {
      sizes.push(batch.rowsRead);
      candidates += batch.candidates.length;
      expect(batch.problems).toEqual([]);
    }
    expect(Math.max(...sizes)).toBe(500);
    expect(candidates).toBe(1201);
    expect(opened.report()).toMatchObject({ rows: 1201, survey: null });
    expect(opened.report().peakRssBytes).toBeGreaterThan(10_000_000);
    expect(await readers()).toEqual([]);
  });

  it("gives the sentence of a refusal and leaves no process behind", async () => {
    const wanted = files.request("twice.csv");
    await writeFile(wanted.path, "System,pH,Date,pH\r\n");
    await expect(openReader(wanted, { script })).rejects.toMatchObject({
      refusal: { code: "duplicate-headers", line: 1 },
    });
    const late = files.request("late.csv");
    await writeFile(late.path, `${csvLine(HEADER).repeat(1)}${csvLine(row(1)).repeat(20_000)}"open`);
    const opened = await openReader(late, { script });
    const readOn = async () => {
      let rows = 0;
      for await (const batch of opened.batches) rows += batch.rowsRead;
      return rows;
    };
    await expect(readOn()).rejects.toMatchObject({ refusal: { code: "unclosed-quote", line: 20_002 } });
    expect(await readers()).toEqual([]);
  });

  it("ends the process when it is stopped, closed or left early", async () => {
    const wanted = files.request("stop.csv");
    await writeFile(wanted.path, csvLine(HEADER) + csvLine(row(1)).repeat(20_000));
    const controller = new AbortController();
    const opened = await openReader(wanted, { script, signal: controller.signal });
    expect(await readers()).toHaveLength(1);
    await opened.batches.next();
    controller.abort();
    await expect(opened.batches.next()).rejects.toMatchObject({ refusal: { code: "stopped" } });
    const left = await openReader(wanted, { script });
    for await (const batch of left.batches) {
      expect(batch.rowsRead).toBeGreaterThan(0);
      break;
    }
    const closed = await openReader(wanted, { script });
    await closed.close();
    expect(await readers()).toEqual([]);
    await expect(openReader(wanted, { script, signal: controller.signal })).rejects.toMatchObject({
      refusal: { code: "stopped" },
    });
  });

  it("stops a file that needs more memory than is allowed, and goes on living itself", async () => {
    const texts = Array.from(
      { length: 400_000 },
      (_, index) => `<si><t>${index} ${"abcdefgh".repeat(12)}</t></si>`,
    ).join("");
    const rels = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
    const parts = bareWorkbook(xmlRow(1, "System", "Taken at", "pH"), [
      { name: "xl/sharedStrings.xml", data: `<sst>${texts}</sst>` },
      {
        name: "xl/_rels/workbook.xml.rels",
        data: `<Relationships><Relationship Id="r1" Type="${rels}/worksheet" Target="worksheets/sheet1.xml"/><Relationship Id="r2" Type="${rels}/sharedStrings" Target="sharedStrings.xml"/></Relationships>`,
      },
    ]);
    const wanted = files.request("hungry.xlsx");
    await writeFile(wanted.path, zip(parts));
    await expect(openReader(wanted, { script, heapMb: 24 })).rejects.toMatchObject({
      refusal: { code: "out-of-memory" },
    });
  }, 30_000);

  it("stops a file that takes longer than is allowed", async () => {
    const wanted = files.request("slow.csv");
    await writeFile(wanted.path, csvLine(HEADER) + csvLine(row(1)).repeat(200_000));
    await expect(openReader(wanted, { script, answerMs: 5 })).rejects.toMatchObject({
      refusal: { code: "took-too-long" },
    });
    expect(await readers()).toEqual([]);
  });

  it("calls a fault of the program one, without showing its insides", async () => {
    const missing = files.request("no-such-file.csv");
    await expect(openReader(missing, { script })).rejects.toMatchObject({
      refusal: { code: "reader-failed", reason: expect.not.stringContaining("ENOENT") as string },
      cause: expect.objectContaining({ message: expect.stringContaining("ENOENT") as string }) as Error,
    });
  });
});

describe("surveyFile", () => {
  it("says what must be asked before a preview, for text files and workbooks", async () => {
    const csv = files.request("ask.csv", { zone: "Europe/London" });
    await writeFile(csv.path, writeCsv(HEADER, [["KELP-01", "SG", "1.025", "03/04/2026 09:00"]]));
    const { report, header } = await surveyFile(csv, { script });
    expect(header.columnMap.headerLine).toBe(1);
    expect(report.survey).toMatchObject({
      rows: 1,
      dateOrder: { open: { rows: 1 } },
      decimal: { open: { rows: 1 } },
    });
    const xlsx = files.request("ask.xlsx", { zone: "Europe/London" });
    await writeFile(
      xlsx.path,
      await workbook([HEADER, ["KELP-01", "SG", 1.025, new Date(Date.UTC(2026, 9, 25, 1, 30))]]),
    );
    const shares: number[] = [];
    const surveyed = await surveyFile(xlsx, { script, onProgress: (share) => shares.push(share) });
    expect(surveyed.report.survey).toMatchObject({
      doubled: { anyOrder: { rows: 1 } },
      decimal: { open: { rows: 0 } },
    });
    expect(shares.at(-1)).toBe(1);
  });
});
