import { describe, expect, it } from "vitest";
import type { FileAnswers, RawCell, RawRow, RowContext } from "@/modules/imports/model";
import { FileSurvey, fileQuestions, settledAnswers } from "@/modules/imports/rules/file-questions";
import { findHeader } from "@/modules/imports/rules/find-header";
import { RowMapper } from "@/modules/imports/rules/map-rows";

const KNOWN = [
  { code: "TEMP", names: ["Temperature"] },
  { code: "PH", names: ["pH"] },
];

function read(table: RawCell[][], answers: FileAnswers = {}, more: Partial<RowContext> = {}) {
  const rows: RawRow[] = table.map((cells, index) => ({ line: index + 1, cells }));
  const header = findHeader(rows, KNOWN);
  if (header.kind === "refused") throw new Error(header.refusal.reason);
  const context = {
    kind: "csv",
    zone: "Europe/London",
    serialEpoch: 1900,
    defaults: {},
    answers,
    ...more,
  } as const;
  const survey = new FileSurvey(header.columnMap, context);
  const data = rows.slice(header.rowIndex + 1);
  for (const row of data) survey.add(row);
  const seen = survey.end();
  const mapper = new RowMapper(header.columnMap, { ...context, answers: settledAnswers(seen, answers) });
  const mapped = data.map((row) => mapper.map(row));
  return {
    questions: fileQuestions(seen, answers),
    seen,
    candidates: mapped.flatMap((row) => row.candidates),
    problems: mapped.flatMap((row) => row.problems),
  };
}

const LONG = ["System", "Parameter", "Value", "Unit", "Taken at"];
const WIDE = ["System", "Taken at", "Temperature (°C)", "pH"];

describe("RowMapper", () => {
  it("reads a row of the long form as one reading, as typed", () => {
    const { candidates, problems } = read([LONG, ["KELP-01", "TEMP", "<12,5", "°C", "2026-03-14 09:00"]]);
    expect(problems).toEqual([]);
    expect(candidates).toMatchObject([
      {
        line: 2,
        column: 2,
        system: "KELP-01",
        parameter: "TEMP",
        valueText: "<12,5",
        value: { kind: "number", number: 12.5, relation: "<" },
        unit: "°C",
        takenAt: Date.UTC(2026, 2, 14, 9),
        remarks: [],
      },
    ]);
  });

  it("reads a row of the wide form as a reading per filled column, one bad cell leaving the others good", () => {
    const { candidates, problems } = read([
      WIDE,
      ["KELP-01", "2026-03-14 09:00", "12.5", ""],
      ["KELP-01", "2026-03-14 10:00", { kind: "error", text: "#REF!" }, "8.1"],
    ]);
    expect(candidates.map(({ line, parameter, unit }) => [line, parameter, unit])).toEqual([
      [2, "TEMP", "°C"],
      [3, "PH", null],
    ]);
    expect(problems).toMatchObject([
      { line: 3, column: 2, columnName: "Temperature (°C)", code: "error-value" },
    ]);
  });

  it("names every fault of a row by its column", () => {
    const { candidates, problems } = read([LONG, ["", "", "", "", "2026-02-30 09:00"]]);
    expect(candidates).toEqual([]);
    expect(problems.map(({ column, code }) => [column, code])).toEqual([
      [4, "bad-date"],
      [0, "missing-system"],
      [1, "missing-parameter"],
      [2, "missing-value"],
    ]);
    for (const problem of problems) expect(problem.reason && problem.mend).toMatch(/\.$/);
  });

  it("refuses rows with more or fewer fields than the header, but not trailing empty ones", () => {
    const good = ["KELP-01", "TEMP", "12.5", "°C", "2026-03-14 09:00"];
    const { candidates, problems } = read([
      LONG,
      [...good, "more"],
      good.slice(0, 4),
      [...good, ""],
      ["", "", "", "", ""],
    ]);
    expect(problems.map(({ line, code }) => [line, code])).toEqual([
      [2, "too-many-fields"],
      [3, "too-few-fields"],
    ]);
    expect(candidates.map(({ line }) => line)).toEqual([4]);
  });

  it("takes a formula's saved result with a remark and refuses one without", () => {
    const formula = (value: number | null): RawCell => ({ kind: "formula", value, dateStyle: null });
    const { candidates, problems } = read(
      [WIDE, ["KELP-01", "2026-03-14 09:00", formula(12.5), formula(null)]],
      {},
      { kind: "xlsx" },
    );
    expect(candidates).toMatchObject([{ value: { number: 12.5 }, remarks: ["formula-result"] }]);
    expect(problems).toMatchObject([{ column: 3, code: "formula-without-result" }]);
  });

  it("remarks numbers that a workbook holds as text, and refuses values that became dates", () => {
    const { candidates, problems } = read(
      [WIDE, ["KELP-01", "2026-03-14 09:00", "12.5", { kind: "serial", value: 46364, showsTime: false }]],
      {},
      { kind: "xlsx" },
    );
    expect(candidates).toMatchObject([{ remarks: ["number-as-text"] }]);
    expect(problems).toMatchObject([{ column: 3, code: "bad-number" }]);
  });

  it("fills what the file leaves out from the person's choice for the file", () => {
    const { candidates } = read(
      [
        ["Taken at", "pH"],
        ["2026-03-14", "8.1"],
      ],
      {},
      {
        defaults: { system: "REEF-02", timeOfDay: "08:00", instrument: "PH-3" },
      },
    );
    expect(candidates).toMatchObject([{ system: "REEF-02", instrument: "PH-3", remarks: ["time-missing"] }]);
  });
});

describe("file questions", () => {
  const row = (moment: string, value = "8.1") => ["KELP-01", "PH", value, "", moment];

  it("asks once for the order of day and month, with both readings shown", () => {
    const { questions, problems, candidates } = read([
      LONG,
      row("03/04/2026 09:00"),
      row("05/06/2026 09:00"),
    ]);
    expect(questions).toMatchObject([
      {
        kind: "date-order",
        line: 2,
        rows: 2,
        choices: [
          { answer: "day-first", reading: "3 Apr 2026" },
          { answer: "month-first", reading: "4 Mar 2026" },
        ],
      },
    ]);
    expect(candidates).toEqual([]);
    expect(problems.map(({ code }) => code)).toEqual(["date-order", "date-order"]);
  });

  it("does not ask what another row of the file shows", () => {
    const { questions, candidates } = read([LONG, row("03/04/2026 09:00"), row("14/06/2026 09:00")]);
    expect(questions).toEqual([]);
    expect(candidates[0]?.takenAt).toBe(Date.UTC(2026, 3, 3, 8));
  });

  it("asks when a file shows both orders, and refuses what does not fit the answer", () => {
    const table = [LONG, row("03/04/2026 09:00"), row("14/06/2026 09:00"), row("06/14/2026 09:00")];
    expect(read(table).questions).toMatchObject([{ kind: "date-order" }]);
    const answered = read(table, { dateOrder: "month-first" });
    expect(answered.questions).toEqual([]);
    expect(answered.problems).toMatchObject([{ line: 3, code: "date-order" }]);
    expect(answered.candidates).toHaveLength(2);
  });

  it("asks for the decimal sign where every number has two readings", () => {
    const table = [LONG, row("2026-03-14 09:00", "1.025"), row("2026-03-14 10:00", "1.026")];
    expect(read(table).questions).toMatchObject([
      {
        kind: "decimal-sign",
        rows: 2,
        choices: [
          { answer: "point", reading: "1.025" },
          { answer: "comma", reading: "1025" },
        ],
      },
    ]);
    expect(read(table, { decimalSign: "point" }).candidates.map(({ value }) => value)).toMatchObject([
      { number: 1.025 },
      { number: 1.026 },
    ]);
    const shown = read([...table, row("2026-03-14 11:00", "8.1")]);
    expect(shown.questions).toEqual([]);
    expect(shown.candidates).toHaveLength(3);
  });

  it("asks when a file mixes decimal signs, and refuses the other one", () => {
    const table = [LONG, row("2026-03-14 09:00", "8.1"), row("2026-03-14 10:00", "8,2")];
    expect(read(table).questions).toMatchObject([{ kind: "decimal-sign" }]);
    expect(read(table, { decimalSign: "comma" }).problems).toMatchObject([{ line: 2, code: "decimal-sign" }]);
  });

  it("asks for the doubled hour, also behind an open order of day and month", () => {
    const table = [LONG, row("01/11/2026 01:30")];
    const zone = "America/New_York"; // Energy Policy Act of 2005: clocks go back on the first Sunday of November
    expect(read(table, {}, { zone }).questions.map(({ kind }) => kind)).toEqual(["date-order"]);
    expect(read(table, { dateOrder: "day-first" }, { zone }).questions).toMatchObject([
      { kind: "doubled-hour", rows: 1 },
    ]);
    expect(read(table, { dateOrder: "month-first" }, { zone }).questions).toEqual([]);
    const answered = read(table, { dateOrder: "day-first", doubledHour: "later" }, { zone });
    expect(answered.candidates).toMatchObject([
      { takenAt: Date.UTC(2026, 10, 1, 6, 30), remarks: ["doubled-hour-settled"] },
    ]);
  });
});
