import type { Sqlite } from "@/db/database";
import { capturedTables, rowJsonSql, rowKeySql, schemaHash } from "./capture";
import type { Checkpoint } from "./model";
import {
  type ChangeFields,
  type EntryFields,
  entryHash,
  GENESIS_HASH,
  SELECT_CHANGES,
  SELECT_ENTRIES,
} from "./seal";

/** One thing found wrong, as a sentence that names the record. */
export type Finding = {
  kind: "chain" | "rows" | "schema" | "checkpoint";
  entryId: number | null;
  sentence: string;
};

export type Verification = {
  entries: number;
  head: Checkpoint | null;
  /** How many outside checkpoints were compared; with none a cut tail cannot be found. */
  checkpoints: number;
  findings: Finding[];
};

type StoredEntry = EntryFields & { hash: string };

function checkChain(sqlite: Sqlite, findings: Finding[]): { count: number; head: Checkpoint | null } {
  const changesOf = sqlite.prepare(SELECT_CHANGES);
  let previous = { id: 0, hash: GENESIS_HASH };
  let count = 0;
  for (const row of sqlite.prepare(`${SELECT_ENTRIES} order by id`).iterate()) {
    const { hash, ...entry } = row as StoredEntry;
    count += 1;
    const changes = changesOf.all(entry.id) as ChangeFields[];
    const problem = entryProblem(entry, hash, previous, changes);
    if (problem)
      findings.push({
        kind: "chain",
        entryId: entry.id,
        sentence: `entry ${entry.id} (${entry.verb}): ${problem}`,
      });
    previous = { id: entry.id, hash };
  }
  const head = count === 0 ? null : { entryId: previous.id, hash: previous.hash };
  return { count, head };
}

function entryProblem(
  entry: EntryFields,
  hash: string,
  previous: { id: number; hash: string },
  changes: ChangeFields[],
): string | null {
  if (entry.id !== previous.id + 1) return `entries ${previous.id + 1} to ${entry.id - 1} are missing`;
  if (entry.prevHash !== previous.hash) return "it does not follow the entry before it";
  if (entry.changeCount !== changes.length)
    return `it had ${entry.changeCount} changes, ${changes.length} are there`;
  if (entryHash(entry, changes) !== hash) return "the entry or one of its changes has been altered";
  return null;
}

function checkStrayChanges(sqlite: Sqlite, findings: Finding[]): void {
  const strays = sqlite
    .prepare(
      "select c.id, c.entry_id as entryId, c.table_name as tableName, c.row_key as rowKey from audit_change c " +
        "where not exists (select 1 from audit_entry e where e.id = c.entry_id) order by c.id limit 20",
    )
    .all() as { id: number; entryId: number; tableName: string; rowKey: string }[];
  for (const stray of strays) {
    const sentence = `change ${stray.id} (${stray.tableName} ${stray.rowKey}) belongs to no entry`;
    findings.push({ kind: "chain", entryId: stray.entryId, sentence });
  }
}

const LATEST =
  "select row_key as rowKey, entry_id as entryId, after from audit_change where id in " +
  "(select max(id) from audit_change where table_name = ? group by row_key)";

function checkRows(sqlite: Sqlite, table: string, findings: Finding[]): void {
  const rebuilt = new Map<string, { entryId: number; after: string | null }>();
  for (const row of sqlite.prepare(LATEST).iterate(table) as IterableIterator<{
    rowKey: string;
    entryId: number;
    after: string | null;
  }>) {
    rebuilt.set(row.rowKey, { entryId: row.entryId, after: row.after });
  }
  const live = `select ${rowKeySql(sqlite, table, "t")} as rowKey, ${rowJsonSql(sqlite, table, "t")} as row from "${table}" t`;
  for (const row of sqlite.prepare(live).iterate() as IterableIterator<{ rowKey: string; row: string }>) {
    const known = rebuilt.get(row.rowKey);
    rebuilt.delete(row.rowKey);
    if (known?.after === row.row) continue;
    const what = known?.after
      ? `differs from its history in ${differingFields(known.after, row.row)}`
      : "has no history";
    findings.push({
      kind: "rows",
      entryId: known?.entryId ?? null,
      sentence: `${table} ${row.rowKey} ${what}`,
    });
  }
  for (const [rowKey, { entryId, after }] of rebuilt) {
    if (after === null) continue;
    findings.push({
      kind: "rows",
      entryId,
      sentence: `${table} ${rowKey} is in the history but not in the table`,
    });
  }
}

function readFields(json: string): Record<string, unknown> | null {
  try {
    return JSON.parse(json) as Record<string, unknown>;
  } catch {
    return null;
  }
}

function differingFields(before: string, after: string): string {
  const [was, is] = [readFields(before), readFields(after)];
  if (!was || !is) return "a form that cannot be read any more";
  const names = [...new Set([...Object.keys(was), ...Object.keys(is)])].filter(
    (name) => was[name] !== is[name],
  );
  return names.length > 0 ? names.join(", ") : "its form";
}

function checkSchema(sqlite: Sqlite, findings: Finding[]): void {
  const row = sqlite
    .prepare(
      "select id, json_extract(payload, '$.schemaAfter') as hash from audit_entry " +
        "where verb = 'database.migrated' and json_valid(payload) and json_extract(payload, '$.schemaAfter') is not null " +
        "order by id desc limit 1",
    )
    .get() as { id: number; hash: string } | undefined;
  if (row?.hash === schemaHash(sqlite)) return;
  const sentence = row
    ? `the tables or triggers differ from those that entry ${row.id} left: a trigger may have been dropped`
    : "no entry says which tables and triggers there should be";
  findings.push({ kind: "schema", entryId: row?.id ?? null, sentence });
}

function checkCheckpoints(sqlite: Sqlite, checkpoints: readonly Checkpoint[], findings: Finding[]): void {
  const find = sqlite.prepare("select hash from audit_entry where id = ?");
  for (const { entryId, hash } of checkpoints) {
    const row = find.get(entryId) as { hash: string } | undefined;
    if (row?.hash === hash) continue;
    const sentence = row
      ? `entry ${entryId} has another hash than the checkpoint that left the machine`
      : `entry ${entryId} is gone: the history has been cut after it left a checkpoint`;
    findings.push({ kind: "checkpoint", entryId, sentence });
  }
}

/**
 * Checks a copy of the file alone: the chain, every row against its changes, the triggers, and the checkpoints that are
 * given. Findings come in the order of the chain, the record first altered first.
 */
export function verifyHistory(sqlite: Sqlite, checkpoints: readonly Checkpoint[] = []): Verification {
  const findings: Finding[] = [];
  const { count, head } = checkChain(sqlite, findings);
  checkStrayChanges(sqlite, findings);
  for (const table of capturedTables(sqlite)) checkRows(sqlite, table, findings);
  checkSchema(sqlite, findings);
  checkCheckpoints(sqlite, checkpoints, findings);
  const order = (finding: Finding): number => finding.entryId ?? Number.POSITIVE_INFINITY;
  findings.sort((a, b) => order(a) - order(b));
  return { entries: count, head, checkpoints: checkpoints.length, findings };
}
