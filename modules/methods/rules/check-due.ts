import { addDays } from "@/lib/zone";
import type { CheckDue, CheckVerdict } from "../model";

/** What the rule needs of an instrument and of its newest check. */
export interface CheckFacts {
  /** Calendar days from one check to the next; null where no check is asked for. */
  readonly checkEveryDays: number | null;
  readonly last: { readonly on: string; readonly verdict: CheckVerdict } | null;
}

/**
 * When is the next check of an instrument due, and is it overdue on a day ("YYYY-MM-DD", facility's calendar)?
 * A good or adjusted check holds for `checkEveryDays` calendar days, its last day included. A failed check is
 * overdue at once, whatever the interval: it holds for nothing until a good one follows.
 * Source: common practice, no source.
 * @throws RangeError on a day that does not exist
 * @example checkDue({ checkEveryDays: 7, last: { on: "2026-03-02", verdict: "good" } }, "2026-03-10") // => { state: "overdue", dueOn: "2026-03-09", isOverdue: true }
 */
export function checkDue({ checkEveryDays, last }: CheckFacts, today: string): CheckDue {
  if (last?.verdict === "failed") return { state: "failed", dueOn: last.on, isOverdue: true };
  if (checkEveryDays === null) return { state: "not-checked-by-date", dueOn: null, isOverdue: false };
  if (last === null) return { state: "never-checked", dueOn: null, isOverdue: true };
  const dueOn = addDays(last.on, checkEveryDays);
  const isOverdue = dueOn < today;
  return { state: isOverdue ? "overdue" : "due", dueOn, isOverdue };
}
