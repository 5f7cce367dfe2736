import Link from "next/link";
import { type DataColumn, DataTable, TimeText } from "@/lib/ui";
import { IMPORT_STATE_WORDS, type ImportRow } from "../model";

const count = (value: number | null) => (value === null ? "–" : value.toLocaleString("en-GB"));

const columns = (zone: string): DataColumn<ImportRow>[] => [
  {
    id: "code",
    head: "Import",
    rowHead: true,
    tight: true,
    cell: (row) => (
      <Link className="link" href={`/imports/${row.code}`}>
        {row.code}
      </Link>
    ),
  },
  { id: "file", head: "File", cell: (row) => <span className="break-all">{row.fileName}</span> },
  {
    id: "state",
    head: "State",
    cell: (row) => (
      <span className={row.state === "failed" ? "font-semibold text-out" : undefined}>
        {IMPORT_STATE_WORDS[row.state]}
      </span>
    ),
  },
  { id: "accepted", head: "Accepted", numeric: true, cell: (row) => count(row.acceptedCount) },
  {
    id: "duplicate",
    head: "Duplicate",
    numeric: true,
    wideOnly: true,
    cell: (row) => count(row.duplicateCount),
  },
  { id: "refused", head: "Refused", numeric: true, wideOnly: true, cell: (row) => count(row.refusedCount) },
  { id: "by", head: "Uploaded by", wideOnly: true, cell: (row) => row.uploadedByName },
  { id: "at", head: "Uploaded", wideOnly: true, cell: (row) => <TimeText at={row.uploadedAt} zone={zone} /> },
];

/** The imports, newest first. */
export function ImportTable({ rows, zone }: { rows: readonly ImportRow[]; zone: string }) {
  return <DataTable caption="Imports" columns={columns(zone)} rows={rows} rowKey={(row) => row.id} />;
}
