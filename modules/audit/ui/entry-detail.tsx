import { Facts, LinkButton, PageHead, Panel } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import { ROLE_LABELS, type Role } from "@/modules/access";
import type { ListedEntry, RowChange } from "../model";
import { ChangeTable } from "./change-table";
import { prettyJson, tableWord } from "./field-words";
import { actorName, type HistoryWords, saidOf } from "./history-words";
import { RecordHistoryLink } from "./record-history-link";
import { SubjectText } from "./subject-text";

export interface EntryDetailProps {
  entry: ListedEntry & { roles: string; payload: string; prevHash: string; requestId: string | null };
  changes: readonly (RowChange & { tableName: string })[];
  words: HistoryWords;
  /** Fields that did not change too. */
  all: boolean;
}

const DONE: Record<RowChange["operation"], string> = {
  insert: "made",
  update: "changed",
  delete: "taken out",
  migrate: "changed by a new version",
};

function rolesText(json: string): string {
  const roles = JSON.parse(json) as Role[];
  return roles.length === 0 ? "none" : roles.map((role) => ROLE_LABELS[role] ?? role).join(", ");
}

const Hash = ({ children }: { children: string }) => (
  <span className="font-mono text-sm font-normal break-all">{children}</span>
);

/** One entry: who did what, why, every row before and after, and its place in the chain. */
export function EntryDetail({ entry, changes, words, all }: EntryDetailProps) {
  return (
    <>
      <PageHead
        title={`${actorName(words, entry)} ${saidOf(words, entry.verb)}`}
        facts={
          <>
            {formatLocal(entry.at, words.zone, "second")} · entry {entry.id} ·{" "}
            <SubjectText type={entry.subjectType} id={entry.subjectId} words={words} />
          </>
        }
        actions={
          <LinkButton size="small" href={all ? `/history/${entry.id}` : `/history/${entry.id}?fields=all`}>
            {all ? "Only what differs" : "Show every field"}
          </LinkButton>
        }
      />
      <div className="grid gap-5">
        <Panel title="The entry">
          <Facts
            facts={[
              { label: "Reason", value: entry.reason === null ? "none given" : `“${entry.reason}”` },
              { label: "Acting as", value: rolesText(entry.roles) },
              { label: "Hash", value: <Hash>{entry.hash}</Hash> },
              { label: "Hash before", value: <Hash>{entry.prevHash}</Hash> },
            ]}
          />
          {entry.payload !== "{}" && (
            <details className="mt-3">
              <summary className="min-h-6">What else was noted</summary>
              <pre className="mt-2 font-mono text-sm whitespace-pre-wrap break-words">
                {prettyJson(entry.payload)}
              </pre>
            </details>
          )}
        </Panel>
        {changes.length === 0 && <p className="text-ink-2">This act changed no record.</p>}
        {changes.map((change) => (
          <ChangePanel key={change.id} change={change} words={words} all={all} />
        ))}
      </div>
    </>
  );
}

function ChangePanel({
  change,
  words,
  all,
}: Pick<EntryDetailProps, "words" | "all"> & { change: EntryDetailProps["changes"][number] }) {
  const { tableName, rowKey, operation } = change;
  const name = words.names[`${tableName}/${rowKey}`] ?? rowKey;
  const title = `${tableWord(tableName)} ${name}`;
  return (
    <Panel
      title={<span className="inline-block first-letter:uppercase">{title}</span>}
      aside={change.superseded === null ? DONE[operation] : "corrected: a new version beside the old one"}
      actions={
        <RecordHistoryLink table={tableName} id={rowKey}>
          All that happened to it
        </RecordHistoryLink>
      }
    >
      <ChangeTable caption={`Fields of ${title}`} change={change} words={words} all={all} />
    </Panel>
  );
}
