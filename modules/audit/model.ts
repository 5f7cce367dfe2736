/** A history verb: its name, the version of its payload, and what it says to a person. */
export type EventKind<Name extends string = string> = { readonly verb: Name; readonly version: number; readonly says: string };

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
  const entries = Object.entries(table).map(([name, [verb, version, says]]) => [name, { verb, version, says }]);
  return Object.fromEntries(entries) as { readonly [Name in keyof Table]: EventKind<Table[Name][0]> };
}

/** A point of the chain that left the machine: with it a cut or rewritten tail is found. */
export type Checkpoint = { entryId: number; hash: string };
