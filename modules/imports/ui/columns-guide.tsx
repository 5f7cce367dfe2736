import { DataTable } from "@/lib/ui";

type Line = { column: string; says: string; example: string };

const LINES: readonly Line[] = [
  {
    column: "System",
    says: "code or name; if no column names it, you are asked once for the whole file",
    example: "KELP-01",
  },
  { column: "Point", says: "where in the system; left empty, its default point", example: "surface" },
  { column: "Parameter", says: "code or name", example: "temperature" },
  {
    column: "Value",
    says: "a number, with < or > in front where it has one; ND; yes or no; an answer",
    example: "<0.05",
  },
  { column: "Unit", says: "left empty, the parameter's own unit", example: "°C" },
  {
    column: "Taken at",
    says: "day and time in the facility's zone, or with an offset; or Date and Time apart",
    example: "2026-03-02 09:00",
  },
  { column: "Method, Instrument", says: "code, or serial number; may be left out", example: "" },
  { column: "Note, Taken by", says: "may be left out; taken by is a full name, else it is you", example: "" },
];

/** What a file may look like to be understood. */
export function ColumnsGuide() {
  return (
    <div className="grid gap-4">
      <div className="prose">
        <p>
          Two forms are read. In the <b>long form</b> a row is one reading, with the columns below. In the{" "}
          <b>wide form</b> a row is one moment at one place, with a column for each parameter, such as
          “Temperature (°C)” and “pH”. Columns may stand in any order; headers are compared without regard to
          case, blanks and signs; columns that are not known are shown and left out.
        </p>
      </div>
      <DataTable
        caption="Columns that are understood"
        rows={LINES}
        rowKey={(line) => line.column}
        columns={[
          { id: "column", head: "Column", rowHead: true, cell: (line) => line.column },
          { id: "says", head: "What it says", cell: (line) => line.says },
          {
            id: "example",
            head: "Example",
            tight: true,
            wideOnly: true,
            cell: (line) => <span className="num">{line.example}</span>,
          },
        ]}
      />
      <div className="prose">
        <p>
          Text files may be delimited by comma, semicolon, tab or |, with a decimal point or comma, in UTF-8,
          UTF-16 or Windows-1252. Where the file itself does not show whether the day or the month stands
          first, which decimal sign it has, or which of two equal hours of the night the clocks go back is
          meant, you are asked. Workbooks with macros or a password are refused; formulas count by their saved
          results.
        </p>
      </div>
    </div>
  );
}
