import { readdir } from "node:fs/promises";
import path from "node:path";
import ExcelJS from "exceljs";
import { beforeAll, describe, expect, it } from "vitest";
import { readSettings, settings, useSettings } from "@/lib/env";
import { answerQuestions, receiveUpload, templateCsv } from "@/modules/imports";
import { testBench } from "@/tests/support/database";
import { bareWorkbook, workbook, xmlRow, zip } from "@/tests/support/import-files";
import { checked, detail, rows, upload, work } from "@/tests/support/imports";
import { buildReader } from "@/tests/support/reader-script";
import { waterFor } from "@/tests/support/water";

beforeAll(buildReader, 60_000);

const HEADER = "System,Parameter,Value,Taken at\n";
const ROW = "KELP-01,temperature,12,2026-03-01 09:00\n";

function begin() {
  const bench = testBench();
  waterFor(bench);
  return { bench, ada: bench.person("Ada Finch", ["analyst"]) };
}

const leftovers = async (): Promise<string[]> => {
  const folder = settings().dataFolder;
  const list = (name: string) => readdir(path.join(folder, name)).catch(() => []);
  return [...(await list("arriving")), ...(await list("uploads"))];
};

const wide = (columns: number) =>
  `System,Taken at,${Array.from({ length: columns }, (_, index) => `P${index} (mg/L)`).join(",")}\n`;

/** What is refused at the door: its name, its bytes, the refusal's code and what its sentence says. */
const AT_THE_DOOR: [title: string, name: string, bytes: () => Buffer | string, code: string, says: RegExp][] =
  [
    ["an empty file", "empty.csv", () => "", "invalid", /empty/],
    [
      "a file of another type",
      "picture.csv",
      () => Buffer.from("89504e470d0a1a0a0000000d49484452", "hex"),
      "wrong-type",
      /\w/,
    ],
    [
      "a workbook under the name of a text file",
      "a.csv",
      () => zip(bareWorkbook(xmlRow(1, "a"))),
      "wrong-type",
      /\w/,
    ],
    [
      "a workbook with macros",
      "macro.xlsm",
      () => zip(bareWorkbook(xmlRow(1, "System"), [{ name: "xl/vbaProject.bin", data: "x" }])),
      "invalid",
      /macro/i,
    ],
    [
      "a zip bomb",
      "bomb.xlsx",
      () => zip(bareWorkbook(`${xmlRow(1, "System")}${" ".repeat(80 * 1024 * 1024)}`)),
      "invalid",
      /unpack|inflat|larger|times/i,
    ],
    ["10,000 columns", "wide.csv", () => wide(10_000), "invalid", /columns/],
    [
      "NUL bytes",
      "nul.csv",
      () => `${HEADER}${ROW}KELP-01,temp\0erature,12,2026-03-01 10:00\n`,
      "invalid",
      /NUL/,
    ],
    [
      "an unclosed quote",
      "quote.csv",
      () => `${HEADER}${ROW}KELP-01,"temperature,12,2026-03-01 10:00\n${ROW.repeat(1500)}`,
      "invalid",
      /quot/i,
    ],
    [
      "headers that stand twice",
      "twice.csv",
      () => `System,Value,Value,Parameter,Taken at\n${ROW}`,
      "invalid",
      /“Value”/,
    ],
    ["a file without a header", "none.csv", () => "1,2,3\n4,5,6\n", "invalid", /header/],
    [
      "a file that says nothing of when",
      "when.csv",
      () => "System,Parameter,Value\nKELP-01,temperature,1\n",
      "invalid",
      /date and time/,
    ],
  ];

describe("at the door", () => {
  it.each(AT_THE_DOOR)(
    "%s is refused with a sentence, and leaves nothing behind",
    async (_title, name, bytes, code, says) => {
      const { bench, ada } = begin();
      await expect(upload(bench, ada, name, bytes())).rejects.toMatchObject({
        code,
        message: expect.stringMatching(says),
        errors: [{ pointer: "/file", detail: expect.stringMatching(/\.$/) }],
      });
      expect(await leftovers()).toEqual([]);
      const made = bench.db.reader.sqlite.prepare("select count(*) as n from imports_import").get();
      expect(made).toEqual({ n: 0 });
    },
  );

  it("a file one byte too large is refused while it arrives; one byte less is taken", async () => {
    const { bench, ada } = begin();
    useSettings({
      ...readSettings({ STILLWELL_DATA: settings().dataFolder, LOG_LEVEL: "silent" }),
      IMPORT_MAX_MB: 1,
    });
    const most = 1024 * 1024;
    const fill = (bytes: number) => `${HEADER}${ROW}${"\n".repeat(bytes - HEADER.length - ROW.length)}`;
    await expect(upload(bench, ada, "large.csv", fill(most + 1))).rejects.toMatchObject({
      code: "too-large",
    });
    expect(await leftovers()).toEqual([]);
    await expect(upload(bench, ada, "just.csv", fill(most))).resolves.toMatchObject({ code: "I26-0001" });
  });

  it("a file that says it is 200 MB and more is refused before a byte is read", async () => {
    const { bench, ada } = begin();
    let pulled = 0;
    async function* body() {
      pulled += 1;
      yield Buffer.from("x");
    }
    const deps = { db: bench.db, actor: ada, clock: bench.clock, requestId: null };
    const given = { name: "huge.csv", body: body(), declaredBytes: 200 * 1024 * 1024 + 1 };
    await expect(receiveUpload(deps, given)).rejects.toMatchObject({
      code: "too-large",
      message: expect.stringContaining("200 MB"),
    });
    expect(pulled).toBe(0);
  });

  it("a file whose network breaks off is not taken", async () => {
    const { bench, ada } = begin();
    async function* body() {
      yield Buffer.from(HEADER);
      throw new Error("the connection was reset");
    }
    const deps = { db: bench.db, actor: ada, clock: bench.clock, requestId: null };
    await expect(
      receiveUpload(deps, { name: "half.csv", body: body(), declaredBytes: 5000 }),
    ).rejects.toMatchObject({
      code: "invalid",
      message: expect.stringContaining("did not arrive whole"),
    });
    expect(await leftovers()).toEqual([]);
  });

  it.each(["../passwd.csv", "a\u0000.csv", "", "  "])("the name %j is refused", async (name) => {
    const { bench, ada } = begin();
    await expect(upload(bench, ada, name, HEADER + ROW)).rejects.toMatchObject({ code: "invalid" });
  });
});

describe("while it is looked through", () => {
  it("a file with nothing below its header ends with a sentence", async () => {
    const { bench, ada } = begin();
    const found = await checked(bench, ada, "header.csv", HEADER);
    expect(found.state).toBe("failed");
    expect(found.problem).toContain("no rows below");
  });

  it("a formula counts by its saved result; one without a result is refused with its cell", async () => {
    const { bench, ada } = begin();
    const file = await workbook([
      ["System", "Parameter", "Value", "Taken at"],
      ["KELP-01", "temperature", { formula: "6*2", result: 12 }, new Date(Date.UTC(2026, 1, 3, 8))],
      ["KELP-01", "temperature", { formula: "6*3" }, new Date(Date.UTC(2026, 1, 3, 9))],
    ]);
    const found = await checked(bench, ada, "formulas.xlsx", file);
    expect(found).toMatchObject({ state: "checked", acceptedCount: 1, refusedCount: 1 });
  });

  it("another worksheet than the first can be chosen; one that is not there is refused", async () => {
    const { bench, ada } = begin();
    const book = new ExcelJS.Workbook();
    for (const [sheet, value] of [
      ["Spring", 12],
      ["Summer", 16],
    ] as const) {
      const rows = book.addWorksheet(sheet);
      rows.addRow(["System", "Parameter", "Value", "Taken at"]);
      for (let index = 0; index < value; index += 1) {
        rows.addRow(["KELP-01", "temperature", value, `2026-01-${10 + index} 09:00`]);
      }
    }
    const found = await checked(bench, ada, "two.xlsx", Buffer.from(await book.xlsx.writeBuffer()));
    expect(found).toMatchObject({
      acceptedCount: 12,
      header: { sheet: "Spring", sheets: ["Spring", "Summer"] },
    });
    expect(() => bench.run(ada, answerQuestions, { importId: found.id, sheet: "Autumn" })).toThrow(
      /no worksheet/,
    );
    bench.run(ada, answerQuestions, { importId: found.id, sheet: "Summer" });
    await work(bench);
    expect(detail(bench, ada, found.id)).toMatchObject({
      state: "checked",
      acceptedCount: 16,
      header: { sheet: "Summer" },
    });
    expect(rows(bench, ada, found.id).every((row) => row.texts.value === "16")).toBe(true);
  });
});

it("a template that is filled in as it is handed out can be imported", async () => {
  const { bench, ada } = begin();
  const found = await checked(bench, ada, "template.csv", templateCsv());
  expect(found).toMatchObject({ state: "checked", acceptedCount: 2, refusedCount: 0 });
});
