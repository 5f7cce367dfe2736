"use client";
import { DataTable, Field, Select, useAct } from "@/lib/ui";
import type { ImportDetail, MappedColumn } from "../model";
import { columnWords } from "./import-words";

const ENCODINGS = {
  "utf-8": "UTF-8",
  "utf-16le": "UTF-16",
  "utf-16be": "UTF-16",
  "windows-1252": "Windows-1252",
} as const;
const DELIMITERS = { ",": "commas", ";": "semicolons", "\t": "tabs", "|": "bars (|)" } as const;

function formText({ header, kind, form }: ImportDetail): string {
  const shape =
    form === "long" ? "Long form: a row is one reading" : "Wide form: a column for each parameter";
  const { encoding, delimiter } = header;
  const text =
    encoding && delimiter ? `; text in ${ENCODINGS[encoding]}, delimited by ${DELIMITERS[delimiter]}` : "";
  const sheet = kind === "xlsx" ? `; worksheet “${header.sheet ?? ""}”` : "";
  return `${shape}${text}${sheet}. Its header is line ${header.columnMap.headerLine}.`;
}

function answersText({ answers, defaults }: ImportDetail): string | null {
  const said = [
    answers.dateOrder === "day-first" && "the day stands first",
    answers.dateOrder === "month-first" && "the month stands first",
    answers.decimalSign && `the decimal sign is a ${answers.decimalSign}`,
    answers.doubledHour === "earlier" && "of the hour that was twice the first is meant",
    answers.doubledHour === "later" && "of the hour that was twice the second is meant",
    answers.doubledHour === "refuse" && "rows in the hour that was twice are refused",
    defaults.system && `rows without a system are of ${defaults.system}`,
  ].filter((each) => typeof each === "string");
  return said.length === 0 ? null : `As you said: ${said.join("; ")}.`;
}

/** How the file's columns are understood, and the choice of another worksheet. */
export function ColumnMapPanel({ detail, mayAnswer }: { detail: ImportDetail; mayAnswer: boolean }) {
  const { act, busy } = useAct();
  const { sheets, sheet } = detail.header;
  const answers = answersText(detail);
  const canChoose =
    mayAnswer && sheets.length > 1 && ["questions", "checked", "failed"].includes(detail.state);
  const choose = (name: string) =>
    act(
      `/api/v1/imports/${detail.id}/answers`,
      { sheet: name },
      { done: "The worksheet is being looked through." },
    );
  return (
    <div className="grid gap-4">
      <p>{formText(detail)}</p>
      {answers && <p>{answers}</p>}
      {canChoose && (
        <Field label="Worksheet" name="sheet" required>
          <Select
            value={sheet ?? ""}
            disabled={busy}
            onChange={(event) => void choose(event.target.value)}
            options={sheets.map((name) => ({ value: name, label: name }))}
          />
        </Field>
      )}
      <DataTable<MappedColumn>
        caption="Columns as understood"
        maxHeight="24rem"
        rows={detail.header.columnMap.columns}
        rowKey={(column) => column.index}
        columns={[
          {
            id: "header",
            head: "Column",
            rowHead: true,
            cell: ({ header, index }) => header || `(column ${index + 1}, no header)`,
          },
          {
            id: "use",
            head: "Read as",
            cell: ({ use }) => (
              <span className={use.kind === "unknown" ? "text-ink-3" : undefined}>{columnWords(use)}</span>
            ),
          },
        ]}
      />
    </div>
  );
}
