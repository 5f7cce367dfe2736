import { StatusWord } from "@/lib/ui";
import type { Status, WatchRow } from "../model";

const OFF = ["implausible", "out", "watch"] as const satisfies readonly Status[];
export type OffStatus = (typeof OFF)[number];

/** The worst of the newest readings; null where none is off. */
export function worstOf(rows: readonly WatchRow[]): OffStatus | null {
  const now = rows.map((row) => row.recent[0]?.status);
  return (["out", "implausible", "watch"] as const).find((status) => now.includes(status)) ?? null;
}

/** What is off among the newest readings: "2 out of tolerance", "1 watch". Null where nothing is. */
export function OffWords({ rows }: { rows: readonly WatchRow[] }) {
  const counts = OFF.map(
    (status) => [status, rows.filter((row) => row.recent[0]?.status === status).length] as const,
  );
  return (
    <span className="flex flex-wrap gap-x-4 gap-y-0.5">
      {counts
        .filter(([, count]) => count > 0)
        .map(([status, count]) => (
          <span key={status} className="inline-flex items-baseline gap-1.5">
            <span className="num font-semibold">{count}</span>
            <StatusWord status={status} />
          </span>
        ))}
    </span>
  );
}

/** When the newest of all readings was taken; null where there is none. */
export function newestAt(rows: readonly WatchRow[]): number | null {
  const times = rows.flatMap((row) => (row.recent[0] ? [row.recent[0].takenAt] : []));
  return times.length === 0 ? null : Math.max(...times);
}
