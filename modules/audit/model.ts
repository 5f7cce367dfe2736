/** A history verb: its name, the version of its payload, and what it says to a person. */
export type EventKind<Name extends string = string> = {
  readonly verb: Name;
  readonly version: number;
  readonly says: string;
};

/** What a command did, as it goes into the history. */
export type HistoryEvent = {
  kind: EventKind;
  subject?: { type: string; id: string | number };
  /** Plain JSON; ids, not names. */
  payload?: Record<string, unknown>;
  reason?: string | null;
};

/** A module's history verbs as one table: `defineEvents({ recorded: ["reading.recorded", 1, "recorded readings"] })`. */
export function defineEvents<const Table extends Record<string, readonly [string, number, string]>>(
  table: Table,
): { readonly [Name in keyof Table]: EventKind<Table[Name][0]> } {
  const entries = Object.entries(table).map(([name, [verb, version, says]]) => [
    name,
    { verb, version, says },
  ]);
  return Object.fromEntries(entries) as { readonly [Name in keyof Table]: EventKind<Table[Name][0]> };
}

/** A point of the chain that left the machine: with it a cut or rewritten tail is found. */
export type Checkpoint = { entryId: number; hash: string };

/** Who did what and why, as every page of the history shows it. `at` is UTC epoch ms. */
export type Act = {
  at: number;
  verb: string;
  actorKind: "person" | "system";
  actorId: number | null;
  reason: string | null;
};

/** An entry as lists show it. */
export type ListedEntry = Act & {
  id: number;
  subjectType: string | null;
  subjectId: string | null;
  changeCount: number;
  hash: string;
};

/** One row before and after, as JSON; where it supersedes another record, that one too. */
export type RowChange = {
  id: number;
  rowKey: string;
  superseded: { key: string; row: string } | null;
  operation: "insert" | "update" | "delete" | "migrate";
  before: string | null;
  after: string | null;
};

/** One check of the whole history, as it is shown. */
export type HistoryCheck = {
  id: number;
  askedBy: number | null;
  askedAt: number;
  finishedAt: number | null;
  entries: number | null;
  headEntryId: number | null;
  headHash: string | null;
  findingCount: number | null;
  findings: readonly { entryId: number | null; sentence: string }[];
  trouble: string | null;
};

/** A backup that was made. */
export type MadeBackup = {
  entryId: number;
  at: number;
  fileName: string;
  sha256: string;
  bytes: number;
  headEntryId: number;
};

/** Work that failed at least once: given up (`failedAt`), or to be tried again at `runAt`. */
export type TroubledJob = {
  id: number;
  kind: string;
  createdAt: number;
  runAt: number;
  attempts: number;
  failedAt: number | null;
  error: string | null;
};
