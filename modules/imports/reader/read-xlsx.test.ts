import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { dateStyleOf } from "@/modules/imports/reader/workbook-parts";
import { bareWorkbook, sha256, workbook, xmlRow, zip } from "@/tests/support/import-files";
import { ImportFolder } from "@/tests/support/import-folder";

const files = new ImportFolder();
beforeAll(() => files.make());
afterAll(() => files.remove());

describe("workbooks", () => {
  const moment = new Date(Date.UTC(2026, 2, 14, 9, 30));

  it.each([false, true])(
    "give their dates in both systems (1904: %s), numbers, texts and formulas",
    async (date1904) => {
      const bytes = await workbook(
        [
          ["System", "Taken at", "pH", "Redox (mV)", "Note"],
          ["KELP-01", moment, 8.12, { formula: "C2*10", result: 81.2 }, "21 °C – 5€"],
          [null, null, null, null, null],
          ["REEF-02", moment, "8,2", { formula: "C4*10" }, true],
        ],
        { date1904 },
      );
      const { header, candidates, problems } = await files.read("book.xlsx", bytes, {
        mode: "map",
        answers: { decimalSign: "comma" },
      });
      expect(header).toMatchObject({
        kind: "xlsx",
        serialEpoch: date1904 ? 1904 : 1900,
        sheet: "Readings",
        sha256: sha256(bytes),
      });
      expect(
        candidates.map(({ line, parameter, value, takenAt, note, remarks }) => ({
          line,
          parameter,
          value,
          takenAt,
          note,
          remarks,
        })),
      ).toMatchObject([
        {
          line: 2,
          parameter: "PH",
          value: { number: 8.12 },
          takenAt: moment.getTime(),
          note: "21 °C – 5€",
          remarks: [],
        },
        { line: 2, parameter: "Redox", value: { number: 81.2 }, remarks: ["formula-result"] },
        { line: 4, parameter: "PH", value: { number: 8.2 }, note: "yes", remarks: ["number-as-text"] },
      ]);
      expect(problems).toMatchObject([{ line: 4, column: 3, code: "formula-without-result" }]);
    },
  );

  it("tell midnight from a day without a time by what the cell shows", async () => {
    const midnight = new Date(Date.UTC(2026, 2, 14));
    const book = await workbook([
      ["System", "Taken at", "pH"],
      ["KELP-01", midnight, 8.1],
    ]);
    const { candidates } = await files.read("midnight.xlsx", book, { mode: "map" });
    expect(candidates).toMatchObject([{ takenAt: midnight.getTime(), remarks: [] }]);
  });

  it("keep letters whole across the edges of the pieces they come in", async () => {
    const notes = Array.from({ length: 20_000 }, (_, index) => [
      "KELP-01",
      moment,
      8,
      `°µ€ ${"é".repeat(index % 11)}${index}`,
    ]);
    const { rows } = await files.read(
      "letters.xlsx",
      await workbook([["System", "Taken at", "pH", "Note"], ...notes]),
    );
    expect(rows.map((row) => row.cells[3])).toEqual(notes.map((row) => row[3]));
  });

  it("read the first worksheet that is shown, or the one that is named", async () => {
    const parts = bareWorkbook(
      xmlRow(1, "System", "Taken at", "pH") + xmlRow(2, "KELP-01", "2026-03-14", "8.1"),
    );
    const { header, rows } = await files.read("named.xlsx", zip(parts), { sheet: "Data" });
    expect(header).toMatchObject({ sheet: "Data", sheets: ["Data"] });
    expect(rows).toEqual([{ line: 2, cells: ["KELP-01", "2026-03-14", "8.1"] }]);
    expect(await files.refusal("named.xlsx", zip(parts), { sheet: "Other" })).toMatchObject({
      code: "no-such-sheet",
    });
  });

  // Source: ECMA-376 part 1, 18.8.30 and 18.8.31 (number formats).
  it("know date formats from others", () => {
    expect(["dd/mm/yyyy", "[$-409]d-mmm-yy", 'yyyy"-"mm'].map(dateStyleOf)).toEqual(Array(3).fill("day"));
    expect(["[h]:mm", "h:mm AM/PM", "yyyy\\-mm\\-dd hh:mm", "mm:ss.0"].map(dateStyleOf)).toEqual(
      Array(4).fill("time"),
    );
    const others = ["General", "0.00", '0.0 "mg/day"', "[Red]0.0", "#,##0.00_d", "0.00E+00", "@"];
    expect(others.map(dateStyleOf)).toEqual(Array(7).fill(null));
  });
});

describe("refusals of workbooks", () => {
  const table = xmlRow(1, "System", "Taken at", "pH") + xmlRow(2, "KELP-01", "2026-03-14", "8.1");

  it("hold for macros, whatever the name says", async () => {
    expect(await files.refusal("book.xlsm", zip(bareWorkbook(table)))).toMatchObject({
      code: "macro-workbook",
    });
    expect(
      await files.refusal("book.xlsx", zip(bareWorkbook(table, [{ name: "xl/vbaProject.bin", data: "x" }]))),
    ).toMatchObject({ code: "macro-workbook" });
    const typed = {
      name: "[Content_Types].xml",
      data: '<Types><Override PartName="/xl/workbook.xml" ContentType="application/vnd.ms-excel.sheet.macroEnabled.main+xml"/></Types>',
    };
    expect(await files.refusal("book.xlsx", zip(bareWorkbook(table, [typed])))).toMatchObject({
      code: "macro-workbook",
    });
  });

  it("hold for old and encrypted workbooks", async () => {
    const compound = Buffer.from("d0cf11e0a1b11ae10000", "hex");
    expect(await files.refusal("book.xls", compound)).toMatchObject({ code: "old-workbook" });
    expect(await files.refusal("book.xlsx", compound)).toMatchObject({ code: "encrypted-workbook" });
    const locked = bareWorkbook(table).map((part) => ({ ...part, encrypted: true }));
    expect(await files.refusal("book.xlsx", zip(locked))).toMatchObject({ code: "encrypted-workbook" });
  });

  it("hold for archives that declare too much, too many parts or too great a ratio", async () => {
    const big = bareWorkbook(table).map((part) => ({ ...part, declaredSize: 80 * 1024 * 1024 }));
    expect(await files.refusal("book.xlsx", zip(big))).toMatchObject({ code: "zip-bomb" });
    const zeros = bareWorkbook(table, [{ name: "xl/media/a.bin", data: Buffer.alloc(20 * 1024 * 1024) }]);
    expect(await files.refusal("book.xlsx", zip(zeros))).toMatchObject({ code: "zip-bomb" });
    const many = Array.from({ length: 2001 }, (_, index) => ({ name: `p${index}`, data: "", stored: true }));
    expect(await files.refusal("book.xlsx", zip(many))).toMatchObject({ code: "zip-bomb" });
  });

  it("hold for an archive that lies about what it unpacks to", async () => {
    const sheet = `<worksheet><sheetData>${table}${" ".repeat(8 * 1024 * 1024)}</sheetData></worksheet>`;
    const liar = bareWorkbook(table, [{ name: "xl/worksheets/sheet1.xml", data: sheet, declaredSize: 1000 }]);
    expect(await files.refusal("book.xlsx", zip(liar))).toMatchObject({ code: "zip-bomb" });
  });

  it("hold for damaged archives and documents that are no workbooks", async () => {
    const whole = zip(bareWorkbook(table).map((part) => ({ ...part, stored: true })));
    expect(await files.refusal("book.xlsx", whole.subarray(0, whole.length - 30))).toMatchObject({
      code: "damaged-workbook",
    });
    const flipped = Buffer.from(whole);
    flipped.write("7", flipped.indexOf("8.1"));
    expect(await files.refusal("book.xlsx", flipped)).toMatchObject({ code: "damaged-workbook" });
    expect(await files.refusal("book.xlsx", zip([{ name: "notes.txt", data: "hello" }]))).toMatchObject({
      code: "wrong-type",
    });
    expect(await files.refusal("book.xlsx", zip(bareWorkbook("<row><c>")))).toMatchObject({
      code: "damaged-workbook",
    });
  });

  it("hold for entities of their own, for too many columns and for an empty worksheet", async () => {
    const lol = `<!DOCTYPE w [<!ENTITY a "aaaa">]><worksheet><sheetData>${table}</sheetData></worksheet>`;
    expect(
      await files.refusal(
        "book.xlsx",
        zip(bareWorkbook("", [{ name: "xl/worksheets/sheet1.xml", data: lol }])),
      ),
    ).toMatchObject({ code: "damaged-workbook" });
    const wide = `<row r="1">${'<c t="inlineStr"><is><t>pH</t></is></c>'.repeat(10_000)}</row>`;
    expect(await files.refusal("book.xlsx", zip(bareWorkbook(wide)))).toMatchObject({
      code: "too-many-columns",
    });
    expect(await files.refusal("book.xlsx", zip(bareWorkbook("")))).toMatchObject({ code: "empty-file" });
  });
});
