import "server-only";
import { settings } from "@/lib/env";
import { dayBounds, isCalendarDay } from "@/lib/zone";
import type { HistoryFilter } from "@/modules/audit";
import type { HistorySearch } from "@/modules/audit/ui/history-filters";

/** What the search boxes ask for, as the history's queries take it; and sentences about what cannot be used. */
export type ReadSearch = { filter: HistoryFilter; problems: string[] };

const MIDNIGHT = 0;

/** Search boxes → filter. Days are whole days of the facility's calendar; what is empty asks for nothing. */
export function readHistorySearch(search: HistorySearch): ReadSearch {
  const problems: string[] = [];
  const zone = settings().STILLWELL_ZONE;
  const day = (text: string | undefined, name: string) => {
    if (!text) return undefined;
    if (isCalendarDay(text)) return dayBounds(text, zone, MIDNIGHT);
    problems.push(`“${text}” is no ${name}: write a day as 2026-03-31.`);
    return undefined;
  };
  const [from, to] = [day(search.from, "first day"), day(search.to, "last day")];
  if (from && to && to.toAt <= from.fromAt) problems.push("The last day lies before the first: swap them.");
  if (search.person && search.person !== "system" && !/^\d{1,15}$/.test(search.person)) {
    problems.push("Choose a person from the list.");
  }
  const filter: HistoryFilter = {
    personId: /^\d{1,15}$/.test(search.person ?? "") ? Number(search.person) || undefined : undefined,
    actorKind: search.person === "system" ? "system" : undefined,
    verb: search.verb?.slice(0, 80) || undefined,
    subjectType: search.subject?.slice(0, 40) || undefined,
    subjectId: search.key?.trim().slice(0, 80) || undefined,
    fromAt: from?.fromAt,
    toAt: to?.toAt,
  };
  return { filter, problems };
}

const BOXES = ["person", "verb", "subject", "key", "from", "to"] as const;

/** The search as it stands in an address, without empty boxes. */
export function searchParamsOf(search: HistorySearch, more: Record<string, string | undefined> = {}): string {
  const params = new URLSearchParams();
  for (const box of BOXES) if (search[box]) params.set(box, search[box]);
  for (const [name, value] of Object.entries(more)) if (value) params.set(name, value);
  return params.size > 0 ? `?${params}` : "";
}

type Given = Record<string, string | string[] | undefined>;

/** The search boxes out of an address; a box given twice counts as its first. */
export function searchOf(given: Given): HistorySearch {
  const one = (name: string) => [given[name]].flat()[0];
  return Object.fromEntries(BOXES.flatMap((box) => (one(box) ? [[box, one(box)]] : [])));
}
