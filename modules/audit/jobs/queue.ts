import type { Sqlite } from "@/db/database";
import { processSingleton } from "@/lib/process-singleton";
import type { QueuedWork } from "../define-command";
import type { HistoryEvent } from "../model";

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
