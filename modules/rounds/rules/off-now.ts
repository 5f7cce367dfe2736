import type { RecentReading, Status, WatchRow } from "@/modules/measurements/model";

/** What is watched, with its newest reading, which is not well. */
export interface OffNow {
  readonly row: WatchRow;
  readonly newest: RecentReading;
  readonly previous: RecentReading | null;
}

const RANK: Readonly<Partial<Record<Status, number>>> = { out: 0, implausible: 1, watch: 2 };

/** What is off now: watch items whose newest reading is out, implausible or watch; the gravest first, then the walk. */
export function offNow(rows: readonly WatchRow[]): OffNow[] {
  return rows
    .flatMap((row): OffNow[] => {
      const [newest, previous] = row.recent;
      if (newest === undefined || RANK[newest.status] === undefined) return [];
      return [{ row, newest, previous: previous ?? null }];
    })
    .sort((one, other) => (RANK[one.newest.status] ?? 9) - (RANK[other.newest.status] ?? 9));
}
