import Link from "next/link";
import { DataTable, TimeText } from "@/lib/ui";
import type { IncidentRow } from "../model";
import { isOverdue, type Names, waitedFor, whereWords } from "./incident-words";

export interface IncidentListProps {
  rows: readonly IncidentRow[];
  caption: string;
  names: Names;
  zone: string;
  now: number;
}

/** Incidents as a table; what is overdue carries a mark and says so. */
export function IncidentList({ rows, caption, names, zone, now }: IncidentListProps) {
  return (
    <DataTable
      caption={caption}
      rows={rows}
      rowKey={(row) => row.id}
      rowStatus={(row) => (isOverdue(row, now) ? "out" : undefined)}
      columns={[
        {
          id: "code",
          head: "Incident",
          rowHead: true,
          cell: (row) => (
            <Link href={`/incidents/${row.id}`} className="link inline-block min-h-6">
              <span className="num">{row.code}</span> {row.title}
            </Link>
          ),
        },
        { id: "where", head: "Where", cell: whereWords },
        {
          id: "waits",
          head: "Who is waited for",
          cell: (row) => (
            <span className={isOverdue(row, now) ? "font-semibold text-out" : "text-ink-2"}>
              {waitedFor(row, names, zone, now)}
            </span>
          ),
        },
        { id: "readings", head: "Readings", numeric: true, wideOnly: true, cell: (row) => row.readings },
        {
          id: "since",
          head: "Since",
          tight: true,
          wideOnly: true,
          cell: (row) => <TimeText at={row.beganAt} zone={zone} />,
        },
      ]}
    />
  );
}

/** Incidents as lines, for a narrow place: what, where, who is waited for. */
export function IncidentLines({ rows, names, zone, now }: Omit<IncidentListProps, "caption">) {
  return (
    <ul className="divide-y divide-rule border-t border-rule">
      {rows.map((row) => (
        <li key={row.id} className="py-2.5">
          <Link href={`/incidents/${row.id}`} className="link inline-block min-h-6 font-semibold">
            <span className="num">{row.code}</span> {row.title}
          </Link>
          <p className="text-[0.9375rem] text-ink-2">
            {whereWords(row)}.{" "}
            <span className={isOverdue(row, now) ? "font-semibold text-out" : ""}>
              {waitedFor(row, names, zone, now)}
            </span>
          </p>
        </li>
      ))}
    </ul>
  );
}
