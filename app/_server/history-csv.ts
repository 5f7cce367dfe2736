import "server-only";
import { database } from "@/db/database";
import { CSV_BOM, csvLine } from "@/lib/csv";
import { settings } from "@/lib/env";
import { formatLocal } from "@/lib/zone";
import type { Actor } from "@/modules/access";
import { ask, type HistoryFilter, listEntries } from "@/modules/audit";
import type { ListedEntry } from "@/modules/audit/model";
import { listPersonNames } from "@/modules/identity";
import { saidOf } from "./all-events";

/** Entries in one file; a wider search ends with a line that says how to go on. */
export const CSV_MOST_ENTRIES = 100_000;
/** Entries read at once: a few milliseconds, so that others get their turn between. */
const SLICE = 500;

const HEADER = [
  "entry",
  "time (UTC)",
  "time (facility)",
  "person",
  "what",
  "action",
  "about",
  "number",
  "reason",
  "changes",
  "hash",
] as const;

type Names = ReadonlyMap<number, string>;

function lineOf(entry: ListedEntry, names: Names, zone: string): string {
  const who = entry.actorId === null ? "Stillwell" : (names.get(entry.actorId) ?? `person ${entry.actorId}`);
  return csvLine([
    entry.id,
    new Date(entry.at).toISOString(),
    formatLocal(entry.at, zone, "second"),
    who,
    saidOf(entry.verb),
    entry.verb,
    entry.subjectType,
    entry.subjectId,
    entry.reason,
    entry.changeCount,
    entry.hash,
  ]);
}

const endLine = (last: number): string =>
  csvLine([
    `This file ends here, after ${CSV_MOST_ENTRIES} entries; there are more before entry ${last}. Search a shorter period.`,
    ...HEADER.slice(1).map(() => null),
  ]);

/**
 * The entries that a search finds as CSV that is safe to open in a spreadsheet, newest first, read and sent in slices.
 * @throws Problem `not-allowed` before anything is sent
 */
export function historyCsv(
  from: { actor: Actor; at: number },
  filter: HistoryFilter,
  most = CSV_MOST_ENTRIES,
): ReadableStream<Uint8Array> {
  const asked = { db: database().reader.orm, ...from };
  const people = ask(asked, listPersonNames, {});
  const names: Names = new Map(people.map(({ id, name }) => [id, name]));
  const zone = settings().STILLWELL_ZONE;
  const slice = (before: number | undefined, left: number) =>
    ask(asked, listEntries, { ...filter, before, limit: Math.min(SLICE, left) });
  const encoder = new TextEncoder();
  let [next, left]: [ReturnType<typeof slice> | null, number] = [slice(undefined, most), most];
  return new ReadableStream({
    start: (out) => out.enqueue(encoder.encode(CSV_BOM + csvLine(HEADER))),
    async pull(out) {
      await new Promise((resolve) => setImmediate(resolve));
      const { entries, hasMore } = next ?? slice(undefined, left);
      left -= entries.length;
      const last = entries.at(-1);
      const lines = entries.map((entry) => lineOf(entry, names, zone));
      if (hasMore && last && left <= 0) lines.push(endLine(last.id));
      out.enqueue(encoder.encode(lines.join("")));
      if (hasMore && last && left > 0) next = slice(last.id, left);
      else out.close();
    },
  });
}
