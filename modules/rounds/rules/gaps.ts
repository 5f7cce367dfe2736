import { DAY_MS } from "@/lib/clock";
import type { SheetGap } from "../model";

/** A watch item that may be due: how often, since when, and its last reading before the span that is looked at. */
export interface DueItem {
  readonly pointId: number;
  readonly parameterId: number;
  readonly everyDays: number;
  readonly since: number;
  readonly endedAt: number | null;
  readonly systemCode: string;
  readonly pointCode: string;
  readonly parameterCode: string;
  readonly parameterName: string;
  readonly lastBeforeAt: number | null;
}

/**
 * What was due on an operational day and was not read: the plan covered the whole day, and the last reading before its end
 * lies further back than the plan allows. `momentsOf` gives the moments (UTC ms) at which an item was read in the span that
 * was looked at, in any order.
 */
export function gapsOfDay(
  items: readonly DueItem[],
  momentsOf: (item: DueItem) => readonly number[],
  { fromAt, toAt }: { fromAt: number; toAt: number },
): SheetGap[] {
  return items.flatMap((item) => {
    if (item.since > fromAt || (item.endedAt !== null && item.endedAt <= toAt)) return [];
    const lastAt = momentsOf(item).reduce<number | null>(
      (last, at) => (at < toAt && (last === null || at > last) ? at : last),
      item.lastBeforeAt,
    );
    if (lastAt !== null && lastAt >= fromAt - (item.everyDays - 1) * DAY_MS) return [];
    const { systemCode, pointCode, parameterCode, parameterName } = item;
    return [{ systemCode, pointCode, parameterCode, parameterName, lastAt }];
  });
}
