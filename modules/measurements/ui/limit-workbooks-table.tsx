import Link from "next/link";
import { type DataColumn, DataTable, TimeText } from "@/lib/ui";
import type { LimitWorkbookRow } from "../model";

export interface LimitWorkbooksTableProps {
  workbooks: readonly LimitWorkbookRow[];
  names: Readonly<Record<number, string>>;
  zone: string;
  caption: string;
  emptyText: string;
}

const STATE = { proposed: "waits for approval", approved: "approved", declined: "declined" } as const;

/** Workbooks of limits, newest first: who proposed, and who decided or is waited for. */
export function LimitWorkbooksTable({
  workbooks,
  names,
  zone,
  caption,
  emptyText,
}: LimitWorkbooksTableProps) {
  return (
    <DataTable
      caption={caption}
      rows={workbooks}
      rowKey={(each) => each.id}
      columns={columns(names, zone)}
      empty={<p className="text-ink-2">{emptyText}</p>}
    />
  );
}

const columns = (names: Readonly<Record<number, string>>, zone: string): DataColumn<LimitWorkbookRow>[] => [
  {
    id: "title",
    head: "Change",
    rowHead: true,
    cell: (each) => (
      <>
        <Link className="link" href={`/setup/limits/workbooks/${each.id}`}>
          {each.title}
        </Link>
        <span className="block text-sm font-normal text-ink-3">{each.reason}</span>
      </>
    ),
  },
  {
    id: "proposed",
    head: "Proposed",
    wideOnly: true,
    cell: (each) => (
      <>
        {names[each.proposedBy]}, <TimeText at={each.proposedAt} zone={zone} show="day" />
      </>
    ),
  },
  {
    id: "state",
    head: "State",
    cell: (each) =>
      each.decidedBy === null ? (
        <>
          {STATE[each.state]}
          <span className="block text-sm text-ink-3">a lead other than {names[each.proposedBy]}</span>
        </>
      ) : (
        <>
          {STATE[each.state]} by {names[each.decidedBy]}
        </>
      ),
  },
];
