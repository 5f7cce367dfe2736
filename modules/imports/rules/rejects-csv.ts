import { CSV_BOM, csvLine } from "@/lib/csv";
import type { StagedRowView } from "../model";

const HEADER = [
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
  "Line in file",
  "Column in file",
  "Reason",
  "How to mend it",
];

/** Begins the list of rejects: UTF-8 with its mark, and the header. Mended, the list can be imported as it is. */
export const rejectsHead = (): string => CSV_BOM + csvLine(HEADER);

/** One refused reading with the reasons and how to mend it. Texts are safe to open in a spreadsheet. */
export function rejectLine({ texts, line, columnName, problems }: StagedRowView): string {
  const { system, point, parameter, value, unit, takenAt, method, instrument, note, takenBy } = texts;
  const columns = problems.map((each) => each.columnName ?? columnName).filter((name) => name !== null);
  return csvLine([
    system,
    point,
    parameter,
    value,
    unit,
    takenAt,
    method,
    instrument,
    note,
    takenBy,
    line,
    [...new Set(columns)].join(", "),
    problems.map((each) => each.reason).join(" "),
    [...new Set(problems.map((each) => each.mend))].join(" "),
  ]);
}

/** An example of the long form that people fill in. */
export function templateCsv(): string {
  const rows = [
    HEADER.slice(0, 10),
    ["KELP-01", "", "temperature", "12.4", "°C", "2026-03-02 09:00", "", "", "", ""],
    [
      "KELP-01",
      "",
      "ammonia_n",
      "<0.01",
      "mg/L",
      "2026-03-02 09:00",
      "",
      "",
      "less than the least reported",
      "",
    ],
  ];
  return CSV_BOM + rows.map((row) => csvLine(row)).join("");
}
