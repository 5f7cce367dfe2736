import Link from "next/link";
import type { ReactNode } from "react";
import { Button, type DataColumn, DataTable, DateInput, Field, Notice, PageHead, Panel } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import type { Act, RowChange } from "../model";
import { ChangeTable } from "./change-table";
import { fieldWord, type Row, tableWord } from "./field-words";
import { actorName, type HistoryWords, saidOf } from "./history-words";
import { recordHistoryHref } from "./record-history-link";
import { ValueText } from "./value-text";

export interface RecordPageProps {
  table: string;
  recordKey: string;
  changes: readonly (Act & RowChange & { entryId: number })[];
  words: HistoryWords;
  /** The record at the moment that was chosen. */
  then: { at: number; row: Row | null; by: (Act & { entryId: number }) | null } | null;
  /** What the moment's box holds, and what is wrong with it. */
  momentText: string;
  momentProblem: string | undefined;
  /** The record's own page. */
  page: string | null;
  mayReadHistory: boolean;
  pager: ReactNode;
}

/** All that ever happened to one record, newest first, and the record as it was at a chosen moment. */
export function RecordPage(props: RecordPageProps) {
  const { table, recordKey, changes, words, page, pager } = props;
  const word = tableWord(table);
  const name = words.names[`${table}/${recordKey}`];
  return (
    <>
      <PageHead
        title={`History of ${word} ${name ?? recordKey}`}
        facts={
          <>
            {name !== undefined && `Number ${recordKey}. `}
            {page !== null && <Link href={page}>The {word} itself</Link>}
          </>
        }
      />
      <div className="grid gap-5">
        <MomentPanel {...props} />
        {changes.map((change) => (
          <ChangePanel key={change.id} change={change} {...props} />
        ))}
      </div>
      {pager}
    </>
  );
}

function ChangePanel({
  change,
  words,
  mayReadHistory,
}: RecordPageProps & { change: RecordPageProps["changes"][number] }) {
  const said = `${actorName(words, change)} ${saidOf(words, change.verb)}`;
  return (
    <Panel
      title={said}
      aside={formatLocal(change.at, words.zone, "second")}
      actions={
        mayReadHistory ? <Link href={`/history/${change.entryId}`}>Entry {change.entryId}</Link> : undefined
      }
    >
      {change.reason !== null && <p className="mb-2 text-ink-2">“{change.reason}”</p>}
      <ChangeTable
        caption={`${said}, ${formatLocal(change.at, words.zone, "second")}`}
        change={change}
        words={words}
      />
    </Panel>
  );
}

function MomentPanel({ table, recordKey, words, then, momentText, momentProblem }: RecordPageProps) {
  return (
    <Panel title="As it was at a moment" id="moment">
      <form
        action={recordHistoryHref(table, recordKey)}
        method="get"
        className="flex flex-wrap items-end gap-3"
      >
        <Field label="Day and time" name="at" required error={momentProblem}>
          <DateInput kind="datetime-local" name="at" defaultValue={momentText} required />
        </Field>
        <Button type="submit">Show it as it was</Button>
      </form>
      {then !== null && (
        <div className="mt-4" aria-live="polite">
          <ThenRow then={then} words={words} />
        </div>
      )}
    </Panel>
  );
}

function ThenRow({ then, words }: { then: NonNullable<RecordPageProps["then"]>; words: HistoryWords }) {
  const { at, row, by } = then;
  const moment = formatLocal(at, words.zone, "second");
  if (row === null) {
    return (
      <Notice title={`There was no such record at ${moment}`}>
        {by === null ? "It was made later." : `${actorName(words, by)} had taken it out.`}
      </Notice>
    );
  }
  const columns: DataColumn<[string, unknown]>[] = [
    {
      id: "field",
      head: "Field",
      rowHead: true,
      cell: ([name]) => <span title={name}>{fieldWord(name)}</span>,
    },
    {
      id: "value",
      head: moment,
      cell: ([name, value]) => <ValueText name={name} value={value} words={words} />,
    },
  ];
  return (
    <>
      {by !== null && (
        <p className="mb-2 text-ink-2">
          As {actorName(words, by)} left it at {formatLocal(by.at, words.zone, "second")}.
        </p>
      )}
      <DataTable
        caption={`The record at ${moment}`}
        columns={columns}
        rows={Object.entries(row)}
        rowKey={([name]) => name}
      />
    </>
  );
}
