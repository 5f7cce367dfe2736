import { type DataColumn, DataTable, EmptyState, Facts, Notice, PageHead, Panel } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import type { HistoryCheck } from "../model";
import { AskForCheck } from "./ask-for-check";

export interface VerificationPageProps {
  head: { id: number; at: number; hash: string } | null;
  checkpoint: { at: number; entryId: number; hash: string } | null;
  checks: readonly HistoryCheck[];
  people: Readonly<Record<number, string>>;
  zone: string;
}

const Hash = ({ children }: { children: string }) => (
  <span className="font-mono text-sm font-normal break-all">{children}</span>
);

/** Where the chain stands, the checkpoint that left the machine last, how anybody verifies, and the checks made here. */
export function VerificationPage({ head, checkpoint, checks, people, zone }: VerificationPageProps) {
  const underWay = checks.some((check) => check.finishedAt === null);
  return (
    <>
      <PageHead
        title="Is the history whole?"
        facts="Each entry's hash covers the hash before it, so whoever alters one entry breaks every one after it."
        actions={<AskForCheck underWay={underWay} />}
      />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        <Panel title="Newest entry">
          {head !== null && (
            <Facts
              facts={[
                { label: "Entry", value: head.id, note: formatLocal(head.at, zone, "second") },
                { label: "Hash", value: <Hash>{head.hash}</Hash> },
              ]}
            />
          )}
          <p className="mt-3 text-ink-2">
            Write both down, or print this page: kept away from this machine, they prove later that nothing up
            to here was cut or rewritten.
          </p>
        </Panel>
        <Panel title="Last checkpoint that left this machine">
          {checkpoint === null ? (
            <p className="text-ink-2">
              None has gone out yet; one is mailed to auditors and administrators every day.
            </p>
          ) : (
            <Facts
              facts={[
                { label: "Sent", value: formatLocal(checkpoint.at, zone) },
                { label: "Entry", value: checkpoint.entryId },
                { label: "Hash", value: <Hash>{checkpoint.hash}</Hash> },
              ]}
            />
          )}
        </Panel>
        <Panel title="Check it yourself" className="lg:col-span-2">
          <div className="prose text-ink-2">
            <p>
              A backup file alone is enough, on any machine that has the product:{" "}
              <code className="font-mono text-sm break-words">npm run history:verify -- FILE</code>. With{" "}
              <code className="font-mono text-sm break-words">--checkpoints LETTER</code> (a saved checkpoint
              letter) a tail that was cut off is found too; the check on this page cannot find that, since
              nothing here has left the machine.
            </p>
          </div>
        </Panel>
        <Panel title="Checks made here" className="lg:col-span-2">
          <ChecksTable checks={checks} people={people} zone={zone} />
        </Panel>
      </div>
    </>
  );
}

function ChecksTable({ checks, people, zone }: Pick<VerificationPageProps, "checks" | "people" | "zone">) {
  const columns: DataColumn<HistoryCheck>[] = [
    { id: "asked", head: "Asked", rowHead: true, cell: (check) => formatLocal(check.askedAt, zone) },
    {
      id: "by",
      head: "By",
      cell: (check) =>
        check.askedBy === null ? "Stillwell" : (people[check.askedBy] ?? `person ${check.askedBy}`),
    },
    { id: "entries", head: "Entries", numeric: true, cell: (check) => check.entries ?? "" },
    { id: "result", head: "Result", cell: (check) => <Result check={check} zone={zone} /> },
  ];
  return (
    <DataTable
      caption="Checks of the whole history"
      columns={columns}
      rows={checks}
      rowKey={(check) => check.id}
      rowStatus={(check) => (check.findingCount ? "out" : check.trouble === null ? undefined : "watch")}
      empty={
        <EmptyState title="Nobody has asked for a check yet">
          <p>
            A check copies the database, recomputes every hash and compares every record with its changes, in
            a process of its own. Work goes on meanwhile.
          </p>
        </EmptyState>
      }
    />
  );
}

function Result({ check, zone }: { check: HistoryCheck; zone: string }) {
  if (check.finishedAt === null) return <>Under way; load the page again in a moment.</>;
  const when = (
    <span className="block text-sm text-ink-3">{formatLocal(check.finishedAt, zone, "second")}</span>
  );
  if (check.trouble !== null) {
    return (
      <>
        The check could not be made: {check.trouble} {when}
      </>
    );
  }
  if (!check.findingCount) {
    return (
      <>
        The history is whole, up to entry {check.headEntryId}. {when}
      </>
    );
  }
  return (
    <Notice
      kind="stop"
      title={check.findingCount === 1 ? "One thing was altered" : `${check.findingCount} things were altered`}
    >
      <p>First altered: {check.findings[0]?.sentence}.</p>
      {check.findings.length > 1 && (
        <details>
          <summary className="min-h-6">What else was found</summary>
          <ul>
            {check.findings.slice(1).map(({ sentence }) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </details>
      )}
      <p>Keep this file and its backups as they are, and tell the administrator and the auditor.</p>
      {when}
    </Notice>
  );
}
