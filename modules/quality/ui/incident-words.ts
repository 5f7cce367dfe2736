import { timeText } from "@/lib/ui";
import { INCIDENT_STATE_WORDS, type IncidentRow } from "../model";

export type Names = Readonly<Record<number, string>>;
export const nameOf = (names: Names, personId: number | null): string =>
  personId === null ? "Stillwell" : (names[personId] ?? `person ${personId}`);

/** Where an incident is: "KELP-01, oxygen, surface". */
export function whereWords(row: IncidentRow): string {
  const parts = [row.systemCode, row.parameterName?.toLowerCase(), row.pointName?.toLowerCase()];
  return parts.filter(Boolean).join(", ");
}

/** Who is waited for, and since when it is late. */
export function waitedFor(row: IncidentRow, names: Names, zone: string, now: number): string {
  if (row.state === "closed") return INCIDENT_STATE_WORDS.closed;
  if (row.state === "rechecked") return "The recheck was within: waits for a lead to close it.";
  const owner = nameOf(names, row.ownerId);
  if (row.recheckDueAt === null) return `Waits for ${owner}; no recheck is set.`;
  const when = timeText(row.recheckDueAt, zone, "day-time");
  return row.recheckDueAt < now
    ? `Recheck by ${owner} is overdue since ${when}.`
    : `Waits for ${owner}: recheck due ${when}.`;
}

export const isOverdue = (row: IncidentRow, now: number): boolean =>
  row.state === "open" && row.recheckDueAt !== null && row.recheckDueAt < now;

/** Hours after which a recheck may be due, as one picks them. */
export const RECHECK_OPTIONS = [
  { value: "", label: "No recheck yet" },
  { value: "1", label: "in 1 hour" },
  { value: "2", label: "in 2 hours" },
  { value: "4", label: "in 4 hours" },
  { value: "12", label: "in 12 hours" },
  { value: "24", label: "tomorrow at this time" },
  { value: "72", label: "in 3 days" },
] as const;

const HOUR_MS = 3_600_000;
/** The moment that lies so many hours ahead; undefined for none. */
export const dueIn = (hours: number | null, now: number): number | undefined =>
  hours === null ? undefined : now + hours * HOUR_MS;
