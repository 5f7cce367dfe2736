import Link from "next/link";
import type { ReactNode } from "react";

/** The address of a record's own history. */
export const recordHistoryHref = (table: string, key: string | number): string =>
  `/history/record/${table}/${encodeURIComponent(String(key))}`;

/** Leads to all that ever happened to one record. */
export function RecordHistoryLink({
  table,
  id,
  children = "History of this record",
}: {
  table: string;
  id: string | number;
  children?: ReactNode;
}) {
  return (
    <Link href={recordHistoryHref(table, id)} className="link">
      {children}
    </Link>
  );
}
