import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import path from "node:path";
import { parse } from "papaparse";
import { beforeAll, describe, expect, it } from "vitest";
import { CSV_BOM, writeCsv } from "@/lib/csv";
import { settings } from "@/lib/env";
import { answerQuestions, rejectLine, rejectsHead, startCommit } from "@/modules/imports";
import { testBench } from "@/tests/support/database";
import { encodeText, workbook } from "@/tests/support/import-files";
import { checked, detail, inForce, rows, upload, work } from "@/tests/support/imports";
import { buildReader } from "@/tests/support/reader-script";
import { waterFor } from "@/tests/support/water";

beforeAll(buildReader, 60_000);

function begin() {
  const bench = testBench();
  const water = waterFor(bench);
  return { bench, water, ada: bench.person("Ada Finch", ["analyst"]) };
}

const FULL = [
  "System",
  "Point",
  "Parameter",
  "Value",
  "Unit",
  "Taken at",
  "Method",
  "Instrument",
  "Note",
  "Taken by",
];
const GOOD = ["KELP-01", "", "temperature", "12.5", "°C", "2026-03-01 09:00", "", "", "", ""];
const other = (column: string, text: string) =>
  GOOD.map((cell, index) => (FULL[index] === column ? text : cell));

/** One wrong cell each: the column, what stands in it, the code, and what the reason and the mend say. */
const WRONG: [column: string, text: string, code: string, reason: RegExp, mend: RegExp][] = [
  ["System", "KELP-99", "unknown-system", /no system “KELP-99”/, /code/],
  ["System", "", "missing-system", /names no system/, /Fill in/],
  ["Point", "attic", "unknown-point", /no point “attic”/, /surface/],
  ["Parameter", "sweetness", "unknown-parameter", /no parameter “sweetness”/, /Setup/],
  ["Parameter", "", "missing-parameter", /names no parameter/, /code or name/],
  ["Value", "", "missing-value", /missing/, /Fill it in/],
  ["Value", "warm", "bad-value", /“warm” is not a number/, /Write digits/],
  ["Value", "12.5 °C", "bad-value", /more than a number/, /unit/],
  ["Unit", "mg/L", "bad-unit", /“mg\/L” is not accepted for Temperature/, /°F/],
  ["Taken at", "", "missing-moment", /\w/, /\w/],
  ["Taken at", "yesterday", "bad-date", /“yesterday”/, /\w/],
  ["Taken at", "2026-02-30 09:00", "bad-date", /30/, /\w/],
  ["Taken at", "2026-03-29 01:30", "missing-hour", /clocks? w/, /\w/],
  ["Taken at", "2026-03-02 10:00", "future", /future/, /order of day and month/],
  ["Method", "M-99", "unknown-method", /no method “M-99”/, /leave the cell empty/],
  ["Instrument", "T-99", "unknown-instrument", /no instrument “T-99”/, /leave the cell empty/],
  ["Taken by", "Nobody Known", "unknown-person", /nobody here called/, /full name/],
  ["Note", "n".repeat(1001), "too-long", /1001 characters/, /1000/],
];

describe("a row with one wrong cell", () => {
  it.each(WRONG)(
    "in %s (%j) is refused as %s, with column, reason and how to mend it",
    async (column, text, code, reason, mend) => {
      const { bench, ada } = begin();
      bench.clock.set(Date.UTC(2026, 2, 2, 9, 0) + (code === "missing-hour" ? 30 * 86_400_000 : 0));
      const found = await checked(bench, ada, "one.csv", writeCsv(FULL, [GOOD, other(column, text)]));
      expect(found).toMatchObject({ state: "checked", acceptedCount: 1, refusedCount: 1 });
      const [row] = rows(bench, ada, found.id, "refused");
      expect(row?.line).toBe(3);
      expect(row?.problems).toEqual([expect.objectContaining({ code, columnName: column })]);
      expect(row?.problems[0]?.reason).toMatch(reason);
      expect(row?.problems[0]?.mend).toMatch(mend);
    },
  );

  it("names all that is wrong with it at once", async () => {
    const { bench, ada } = begin();
    const row = ["KELP-99", "", "sweetness", "12", "", "2026-03-01 09:00", "M-99", "", "", ""];
    const found = await checked(bench, ada, "three.csv", writeCsv(FULL, [row]));
    const [refused] = rows(bench, ada, found.id, "refused");
    expect(refused?.problems.map((each) => each.code)).toEqual([
      "unknown-system",
      "unknown-parameter",
      "unknown-method",
    ]);
  });

  it("of the wide form leaves the other cells of its row good", async () => {
    const { bench, ada } = begin();
    const file = writeCsv(
      ["Taken at", "System", "Temperature", "Ammonia (mg/L)"],
      [
        ["2026-03-01 09:00", "KELP-01", "12", "lots"],
        ["2026-03-01 10:00", "KELP-99", "12", "0.01"],
        ["2026-03-01 11:00", "KELP-01", "", "0.01"],
      ],
    );
    const found = await checked(bench, ada, "wide.csv", file);
    expect(found).toMatchObject({ form: "wide", acceptedCount: 2, refusedCount: 3 });
    expect(
      rows(bench, ada, found.id, "refused").map((row) => [row.line, row.problems[0]?.columnName]),
    ).toEqual([
      [2, "Ammonia (mg/L)"],
      [3, "System"],
      [3, "System"],
    ]);
  });
});

describe("what a file does not say itself", () => {
  it("is asked: which of day and month stands first, with both readings of the same date", async () => {
    const { bench, ada } = begin();
    const file = writeCsv(FULL, [other("Taken at", "03/02/2026 09:00")]);
    const asked = await checked(bench, ada, "dates.csv", file);
    expect(asked.state).toBe("questions");
    expect(asked.questions[0]?.choices.map((choice) => choice.reading)).toEqual(["3 Feb 2026", "2 Mar 2026"]);
    bench.run(ada, answerQuestions, { importId: asked.id, dateOrder: "day-first" });
    await work(bench);
    expect(detail(bench, ada, asked.id)).toMatchObject({ state: "checked", acceptedCount: 1 });
    bench.run(ada, startCommit, { importId: asked.id });
    await work(bench);
    expect(inForce(bench)[0]?.taken_at).toBe(Date.UTC(2026, 1, 3, 9));
  });

  it.each([
    ["earlier", Date.UTC(2025, 9, 26, 0, 30), 1],
    ["later", Date.UTC(2025, 9, 26, 1, 30), 1],
    ["refuse", null, 0],
  ] as const)(
    "is asked: the hour that was twice, answered with %s",
    async (doubledHour, takenAt, accepted) => {
      const { bench, ada } = begin();
      // The clocks of London went back on 26 October 2025 at 02:00 summer time (IANA tz database).
      const file = writeCsv(FULL, [other("Taken at", "2025-10-26 01:30")]);
      const asked = await checked(bench, ada, "october.csv", file);
      expect(asked.questions).toMatchObject([{ kind: "doubled-hour", example: "2025-10-26 01:30" }]);
      bench.run(ada, answerQuestions, { importId: asked.id, doubledHour });
      await work(bench);
      const found = detail(bench, ada, asked.id);
      expect(found).toMatchObject({ state: "checked", acceptedCount: accepted, refusedCount: 1 - accepted });
      if (takenAt === null) return;
      bench.run(ada, startCommit, { importId: asked.id });
      await work(bench);
      expect(inForce(bench)[0]?.taken_at).toBe(takenAt);
    },
  );

  it("is asked: the system, where no column names one", async () => {
    const { bench, ada } = begin();
    const file = writeCsv(["Taken at", "Temperature"], [["2026-03-01 09:00", "12"]]);
    const asked = await checked(bench, ada, "probe.csv", file);
    expect(asked.systemQuestion?.systems).toEqual([{ code: "KELP-01", name: "KELP-01 tank" }]);
    bench.run(ada, answerQuestions, { importId: asked.id, system: "KELP-01" });
    await work(bench);
    expect(detail(bench, ada, asked.id)).toMatchObject({ state: "checked", acceptedCount: 1 });
  });

  it("stays asked until all of it is answered", async () => {
    const { bench, ada } = begin();
    const text = "Taken at;Temperature\n03/02/2026 09:00;1,234\n";
    const asked = await checked(bench, ada, "two.csv", text);
    expect(asked.questions.map((each) => each.kind)).toEqual(["date-order", "decimal-sign"]);
    bench.run(ada, answerQuestions, { importId: asked.id, dateOrder: "day-first", system: "KELP-01" });
    await work(bench);
    expect(detail(bench, ada, asked.id)).toMatchObject({ state: "questions", acceptedCount: null });
    expect(() => bench.run(ada, startCommit, { importId: asked.id })).toThrow(/waits for answers/);
    bench.run(ada, answerQuestions, { importId: asked.id, decimalSign: "comma" });
    await work(bench);
    expect(rows(bench, ada, asked.id)[0]).toMatchObject({ outcome: "accepted", texts: { value: "1,234" } });
  });
});

describe("the file's own make", () => {
  it.each(["utf-8", "utf-16le", "utf-16be", "windows-1252"] as const)(
    "%s is read with its units",
    async (encoding) => {
      const { bench, ada } = begin();
      const text = `\n${FULL.join("\t")}\n${other("Unit", "°F").join("\t")}\n`.trimStart();
      const found = await checked(
        bench,
        ada,
        "text.csv",
        encodeText(text, encoding, encoding.startsWith("utf-16")),
      );
      expect(found).toMatchObject({ state: "checked", acceptedCount: 1 });
    },
  );

  it.each([false, true])("a workbook's dates of either epoch mean the same (1904: %s)", async (date1904) => {
    const { bench, ada } = begin();
    const when = new Date(Date.UTC(2026, 1, 3, 8, 30));
    const file = await workbook(
      [
        ["System", "Temperature", "Taken at"],
        ["KELP-01", 12, when],
      ],
      { date1904 },
    );
    const { id } = await checked(bench, ada, "dates.xlsx", file);
    bench.run(ada, startCommit, { importId: id });
    await work(bench);
    expect(inForce(bench)[0]?.taken_at).toBe(when.getTime());
  });
});

describe("the list of what was refused", () => {
  it("says where, why and how to mend it, is safe to open, and can be imported once it is mended", async () => {
    const { bench, ada } = begin();
    const file = writeCsv(FULL, [GOOD, other("System", "KELP-99"), other("Note", "=1+2").with(0, "@SUM")]);
    const found = await checked(bench, ada, "some.csv", file);
    const list = rejectsHead() + rows(bench, ada, found.id, "refused").map(rejectLine).join("");
    // Read back by another library than the one that wrote it.
    const read = parse<Record<string, string>>(list.replace(CSV_BOM, ""), {
      header: true,
      skipEmptyLines: true,
    });
    expect(read.data).toHaveLength(2);
    expect(read.data[0]).toMatchObject({
      System: "KELP-99",
      "Line in file": "3",
      "Column in file": "System",
      Reason: "There is no system “KELP-99”.",
    });
    expect(read.data[1]).toMatchObject({ System: "'@SUM", Note: "'=1+2" });
    const mended = list
      .replaceAll("KELP-99", "KELP-01")
      .replaceAll("'@SUM", "KELP-01")
      .replaceAll("12.5", "12.6");
    const again = await checked(bench, ada, "mended.csv", mended);
    expect(again.refusedCount).toBe(0);
    expect((again.acceptedCount ?? 0) + (again.duplicateCount ?? 0)).toBe(2);
  });
});

it("what is uploaded is kept byte for byte under its SHA-256", async () => {
  const { bench, ada } = begin();
  const bytes = writeCsv(FULL, [GOOD]);
  const { importId } = await upload(bench, ada, "kept.csv", bytes);
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  expect(detail(bench, ada, importId).sha256).toBe(sha256);
  expect(await readFile(path.join(settings().dataFolder, "uploads", sha256), "utf8")).toBe(bytes);
});
