"use client";
import { Button, type DataColumn, DataTable, EmptyState, Panel, useAct } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import type { MadeBackup } from "../model";
import { useRefreshWhile } from "./use-refresh-while";

export interface BackupsPanelProps {
  made: readonly MadeBackup[];
  waiting: readonly { id: number; error: string | null }[];
  mayAsk: boolean;
  zone: string;
}

const MIB = 1024 ** 2;

/** The backups that the history tells of, and the way to one more. */
export function BackupsPanel({ made, waiting, mayAsk, zone }: BackupsPanelProps) {
  const { act, busy } = useAct();
  const underWay = waiting.length > 0;
  useRefreshWhile(underWay);
  const error = waiting.find((job) => job.error !== null)?.error;
  return (
    <Panel
      title="Backups"
      actions={
        mayAsk ? (
          <Button
            variant="next"
            size="small"
            busy={busy || underWay}
            busyText="A backup is being made"
            onClick={() =>
              void act("/api/v1/backups", {}, { done: "The backup has begun; work goes on meanwhile." })
            }
          >
            Back up now
          </Button>
        ) : undefined
      }
    >
      <p className="mb-3 max-w-prose text-ink-2">
        Backups made here lie in <code className="font-mono text-sm">backups/</code> of the data folder. Copy
        them to another machine: a disk that fails takes its backups along.
      </p>
      {error !== undefined && <p className="mb-3 font-semibold text-out">The last try failed: {error}</p>}
      <DataTable
        caption="Backups, newest first"
        columns={columnsFor(zone)}
        rows={made}
        rowKey={(backup) => backup.entryId}
        empty={
          <EmptyState title="No backup yet">
            <p>
              A backup is a copy of the whole database, made while everybody goes on working, and checked
              before it counts.
            </p>
          </EmptyState>
        }
      />
    </Panel>
  );
}

const columnsFor = (zone: string): DataColumn<MadeBackup>[] => [
  { id: "at", head: "Made", tight: true, cell: (backup) => formatLocal(backup.at, zone) },
  {
    id: "file",
    head: "File",
    rowHead: true,
    cell: (backup) => <span className="font-mono text-sm font-normal break-all">{backup.fileName}</span>,
  },
  { id: "size", head: "MiB", numeric: true, cell: (backup) => (backup.bytes / MIB).toFixed(1) },
  { id: "entry", head: "Up to entry", numeric: true, wideOnly: true, cell: (backup) => backup.headEntryId },
  {
    id: "sha256",
    head: "SHA-256",
    wideOnly: true,
    cell: (backup) => <span className="font-mono text-sm break-all">{backup.sha256}</span>,
  },
];
