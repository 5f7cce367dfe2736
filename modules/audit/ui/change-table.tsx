import { type DataColumn, DataTable } from "@/lib/ui";
import { type FieldChange, fieldChanges, readRow } from "./field-words";
import type { HistoryWords } from "./history-words";
import { ValueText } from "./value-text";

export interface ChangeTableProps {
  caption: string;
  operation: string;
  before: string | null;
  after: string | null;
  words: HistoryWords;
  /** Fields that did not change too. */
  all?: boolean;
}

/** A row before and after, field by field; by default those fields alone that differ. */
export function ChangeTable({ caption, operation, before, after, words, all = false }: ChangeTableProps) {
  const isNew = operation === "insert";
  const fields = fieldChanges(readRow(before), readRow(after)).filter((field) => all || field.differs);
  const columns: DataColumn<FieldChange>[] = [
    {
      id: "field",
      head: "Field",
      rowHead: true,
      cell: (field) => <span title={field.name}>{field.word}</span>,
    },
    ...(isNew ? [] : [valueColumn("before", "Before", words)]),
    valueColumn("after", isNew ? "As it was made" : "After", words),
  ];
  return (
    <DataTable
      caption={caption}
      columns={columns}
      rows={fields}
      rowKey={(field) => field.name}
      empty={<p className="text-ink-2">No field differs.</p>}
    />
  );
}

function valueColumn(side: "before" | "after", head: string, words: HistoryWords): DataColumn<FieldChange> {
  return {
    id: side,
    head,
    cell: (field) => (
      <span className={field.differs ? "" : "text-ink-3"}>
        <ValueText name={field.name} value={field[side]} words={words} />
      </span>
    ),
  };
}
