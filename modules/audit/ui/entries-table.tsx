import Link from "next/link";
import { type DataColumn, DataTable, EmptyState } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import type { ListedEntry } from "../model";
import { actorName, type HistoryWords, saidOf } from "./history-words";
import { SubjectText } from "./subject-text";

export interface EntriesTableProps {
  entries: readonly ListedEntry[];
  words: HistoryWords;
  /** Whether a search narrows what is shown; an empty page then says so. */
  searched: boolean;
}

/** Entries of the history: who, when, what in a sentence, about what, why, how many rows changed, and the entry's hash. */
export function EntriesTable({ entries, words, searched }: EntriesTableProps) {
  const columns: DataColumn<ListedEntry>[] = [
    {
      id: "when",
      head: "When",
      tight: true,
      cell: (entry) => (
        <time dateTime={new Date(entry.at).toISOString()} className="tabular-nums">
          {formatLocal(entry.at, words.zone, "second")}
        </time>
      ),
    },
    {
      id: "what",
      head: "Who did what",
      rowHead: true,
      cell: (entry) => (
        <>
          <Link href={`/history/${entry.id}`} className="link inline-block min-h-6">
            {actorName(words, entry)} {saidOf(words, entry.verb)}
          </Link>
          {entry.reason !== null && (
            <span className="block max-w-prose font-normal break-words text-ink-2">“{entry.reason}”</span>
          )}
        </>
      ),
    },
    {
      id: "subject",
      head: "About",
      cell: (entry) => <SubjectText type={entry.subjectType} id={entry.subjectId} words={words} />,
    },
    { id: "changes", head: "Changes", numeric: true, wideOnly: true, cell: (entry) => entry.changeCount },
    {
      id: "hash",
      head: "Entry and hash",
      tight: true,
      wideOnly: true,
      cell: (entry) => (
        <span className="num text-sm text-ink-2" title={entry.hash}>
          {entry.id} · {entry.hash.slice(0, 10)}
        </span>
      ),
    },
  ];
  return (
    <DataTable
      caption="Entries of the history, newest first"
      columns={columns}
      rows={entries}
      rowKey={(entry) => entry.id}
      empty={
        <EmptyState title={searched ? "Nothing in the history fits this search" : "The history begins here"}>
          <p>
            {searched
              ? "Widen the period or take a condition away."
              : "Whatever anybody changes stands here from then on: who, when, what, and why."}
          </p>
        </EmptyState>
      }
    />
  );
}
