import { readFileSync } from "node:fs";
import path from "node:path";
import Sqlite from "better-sqlite3";
import { inject } from "vitest";

/** What the product does by itself in the meantime, whoever asks for what. */
const OF_ITSELF = ["checkpoint.made", "checkpoint.sent", "reading.judged-again"];

/** Opens the server's history for looking only. */
export function historyWatch() {
  const file = path.join(inject("serverData"), "stillwell.db");
  const db = new Sqlite(file, { readonly: true, fileMustExist: true });
  const newest = db.prepare("select coalesce(max(id), 0) from audit_entry").pluck();
  const since = db.prepare("select id, verb, actor_id as actorId from audit_entry where id > ? order by id");
  return {
    newest: (): number => Number(newest.get()),
    /** Entries after this one that somebody's request must have made. */
    since: (id: number) =>
      (since.all(id) as { id: number; verb: string; actorId: number | null }[]).filter(
        ({ verb }) => !OF_ITSELF.includes(verb),
      ),
    close: () => db.close(),
  };
}

type Line = { requestId?: string; msg?: string };

const isLine = (value: unknown): value is Line => typeof value === "object" && value !== null;

/** The ids of the refused requests that the server's log tells of. */
export function refusalsInLog(): Set<string> {
  const ids = new Set<string>();
  for (const text of readFileSync(inject("serverLog"), "utf8").split("\n")) {
    if (!text.startsWith("{")) continue;
    const line: unknown = JSON.parse(text);
    if (!isLine(line) || (line.msg !== "refused" && line.msg !== "page refused")) continue;
    if (line.requestId !== undefined) ids.add(line.requestId);
  }
  return ids;
}
