import { type DataColumn, DataTable, EmptyState, TimeText } from "@/lib/ui";
import type { MailState } from "../model";

export interface MailLine {
  id: number;
  toAddress: string;
  subject: string;
  body: string;
  state: MailState;
  queuedAt: number;
  sentAt: number | null;
  attempts: number;
  error: string | null;
  fileName: string | null;
}

const STATE_WORDS: Record<MailState, string> = {
  queued: "waits to go out",
  sent: "went out",
  failed: "has not gone out yet; it is tried again",
};

/** The outbox. A one-time link is not shown: it is a secret of the person written to. */
export function MailTable({ mail, zone }: { mail: readonly MailLine[]; zone: string }) {
  const columns: DataColumn<MailLine>[] = [
    {
      id: "queued",
      head: "Written",
      tight: true,
      cell: (line) => <TimeText at={line.queuedAt} zone={zone} />,
    },
    { id: "to", head: "To", wideOnly: true, cell: (line) => line.toAddress },
    {
      id: "subject",
      head: "Letter",
      rowHead: true,
      cell: (line) => (
        <details>
          <summary className="min-h-6">{line.subject}</summary>
          <p className="mt-1 font-normal text-ink-2 sm:hidden">To {line.toAddress}</p>
          <p className="mt-2 max-w-prose font-normal break-words whitespace-pre-line">{line.body}</p>
        </details>
      ),
    },
    {
      id: "state",
      head: "State",
      cell: (line) => (
        <>
          <span className={line.state === "failed" ? "font-semibold text-out" : ""}>
            {STATE_WORDS[line.state]}
          </span>
          {line.fileName !== null && <span className="num block text-sm text-ink-3">{line.fileName}</span>}
          {line.error !== null && (
            <span className="block text-sm text-ink-2">
              {line.error} ({line.attempts} {line.attempts === 1 ? "try" : "tries"})
            </span>
          )}
        </>
      ),
    },
  ];
  return (
    <DataTable
      caption="Mail"
      columns={columns}
      rows={mail}
      rowKey={(line) => line.id}
      rowStatus={(line) => (line.state === "failed" ? "out" : undefined)}
      empty={
        <EmptyState title="No letters yet">
          <p>Invitations, new passwords and notices stand here from the moment they are written.</p>
        </EmptyState>
      }
    />
  );
}
