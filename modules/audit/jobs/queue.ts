import type { Database, Sqlite } from "@/db/database";
import { processSingleton } from "@/lib/process-singleton";
import type { QueuedWork } from "../define-command";
import type { HistoryEvent } from "../model";
import { upkeep } from "../upkeep";

/** Event verb → the work that follows it, with its input made from the event. */
export type Reaction = { work: QueuedWork; input(event: HistoryEvent): unknown };
export type ReactionTable = Readonly<Record<string, readonly Reaction[]>>;

const registry = processSingleton("reactions", () => ({ table: {} as ReactionTable }));

/** Says what follows which event (the table is app/_server/reactions.ts). */
export function useReactions(table: ReactionTable): void {
  registry.table = table;
}

/** The jobs that follow an event. */
export function jobsFor(event: HistoryEvent): { verb: string; input: unknown }[] {
  const reactions = registry.table[event.kind.verb] ?? [];
  return reactions.map(({ work, input }) => ({ verb: work.verb, input: input(event) }));
}

/** Writes a job inside the open transaction. */
export function insertJob(
  sqlite: Sqlite,
  verb: string,
  input: unknown,
  causeEntryId: number | null,
  at: number,
  runAt: number,
): void {
  sqlite
    .prepare("insert into audit_job (kind, input, cause_entry_id, created_at, run_at) values (?, ?, ?, ?, ?)")
    .run(verb, JSON.stringify(input ?? {}), causeEntryId, at, runAt);
}

/** Puts work into the queue for later, outside a command, unless the same work waits for a later moment already. */
export function scheduleOnce(db: Database, verb: string, at: number, runAt: number): void {
  upkeep(db, () => {
    const { sqlite } = db.writer;
    const waits = sqlite
      .prepare(
        "select 1 from audit_job where kind = ? and done_at is null and failed_at is null and run_at > ?",
      )
      .get(verb, at);
    if (!waits) insertJob(sqlite, verb, {}, null, at, runAt);
  });
}
