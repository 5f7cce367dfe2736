import { type DataColumn, DataTable } from "@/lib/ui";
import type { RowChange } from "../model";
import { type FieldChange, fieldChanges, readRow } from "./field-words";
import type { HistoryWords } from "./history-words";
import { ValueText } from "./value-text";

export interface ChangeTableProps {
  caption: string;
  change: Pick<RowChange, "operation" | "before" | "after" | "superseded">;
  words: HistoryWords;
  /** Fields that did not change too. */
  all?: boolean;
}

/** A row before and after, field by field; by default those fields alone that differ. A correction stands beside what it
 * corrects. */
export function ChangeTable({ caption, change, words, all = false }: ChangeTableProps) {
  const { operation, superseded } = change;
  const before = superseded?.row ?? change.before;
  const isNew = operation === "insert" && superseded === null;
  const fields = fieldChanges(readRow(before), readRow(change.after)).filter((field) => all || field.differs);
  const beforeHead = superseded === null ? "Before" : `Before (number ${superseded.key})`;
  const columns: DataColumn<FieldChange>[] = [
    {
      id: "field",
      head: "Field",
      rowHead: true,
      cell: (field) => <span title={field.name}>{field.word}</span>,
    },
    ...(isNew ? [] : [valueColumn("before", beforeHead, words)]),
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
