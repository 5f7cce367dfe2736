"use client";
import { Button, type DataColumn, DataTable, EmptyState, Panel, useAct } from "@/lib/ui";
import { formatLocal } from "@/lib/zone";
import type { TroubledJob } from "../model";

export interface JobsPanelProps {
  jobs: readonly TroubledJob[];
  mayRetry: boolean;
  zone: string;
}

/** Work that did not go well: what it was, what went wrong, and another try. */
export function JobsPanel({ jobs, mayRetry, zone }: JobsPanelProps) {
  const { act, busy } = useAct();
  const retry = (job: TroubledJob) =>
    void act(`/api/v1/jobs/${job.id}/retry`, {}, { done: "It is tried again now." });
  const columns: DataColumn<TroubledJob>[] = [
    { id: "kind", head: "Work", rowHead: true, cell: (job) => <WorkName kind={job.kind} id={job.id} /> },
    {
      id: "since",
      head: "Since",
      tight: true,
      wideOnly: true,
      cell: (job) => formatLocal(job.createdAt, zone),
    },
    { id: "error", head: "What went wrong", cell: (job) => <span className="break-words">{job.error}</span> },
    {
      id: "state",
      head: "State",
      cell: (job) =>
        job.failedAt === null ? (
          `${job.attempts} ${job.attempts === 1 ? "try" : "tries"}; again by itself at ${formatLocal(job.runAt, zone, "time")}`
        ) : (
          <>
            <span className="font-semibold text-out">given up after {job.attempts} tries</span>
            {mayRetry && (
              <Button size="small" className="mt-1 flex" busy={busy} onClick={() => retry(job)}>
                Try again
              </Button>
            )}
          </>
        ),
    },
  ];
  return (
    <Panel title="Work that failed">
      <DataTable
        caption="Work that failed"
        columns={columns}
        rows={jobs}
        rowKey={(job) => job.id}
        rowStatus={(job) => (job.failedAt === null ? "watch" : "out")}
        empty={
          <EmptyState title="Nothing has failed">
            <p>
              Mail, checkpoints, backups and judgements made again are done after the act that caused them.
              What fails is tried again by itself, then stands here with what went wrong.
            </p>
          </EmptyState>
        }
      />
    </Panel>
  );
}

/** `judgeSeriesAgain` reads "judge series again". */
function WorkName({ kind, id }: { kind: string; id: number }) {
  const words = kind.replaceAll(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
  return (
    <>
      {words} <span className="text-sm font-normal text-ink-3">number {id}</span>
    </>
  );
}
