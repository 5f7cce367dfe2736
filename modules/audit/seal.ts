import { createHash } from "node:crypto";
import canonicalize from "canonicalize";
import type { Sqlite } from "@/db/database";
import { invariant } from "@/lib/invariant";

/** The hash before the first entry. */
export const GENESIS_HASH = "0".repeat(64);

/** The fields of an entry that its hash covers, beside the hash before it and its changes. */
export type EntryFields = {
  id: number;
  at: number;
  verb: string;
  version: number;
  actorKind: string;
  actorId: number | null;
  roles: string;
  subjectType: string | null;
  subjectId: string | null;
  reason: string | null;
  payload: string;
  requestId: string | null;
  changeCount: number;
  prevHash: string;
};

export type ChangeFields = {
  id: number;
  tableName: string;
  rowKey: string;
  operation: string;
  before: string | null;
  after: string | null;
};

/**
 * SHA-256 over an entry in canonical JSON (RFC 8785), the hash before it included, then each of its changes in order, each
 * as a JSON array of strings (canonical by itself) on a line of its own.
 */
export function entryHash(entry: EntryFields, changes: Iterable<ChangeFields>): string {
  const text = canonicalize(entry);
  invariant(text !== undefined, "an entry has a canonical form");
  const hash = createHash("sha256").update(text);
  for (const { id, tableName, rowKey, operation, before, after } of changes) {
    hash.update(`\n${JSON.stringify([id, tableName, rowKey, operation, before, after])}`);
  }
  return hash.digest("hex");
}

export const SELECT_CHANGES =
  "select id, table_name as tableName, row_key as rowKey, operation, before, after from audit_change where entry_id = ? order by id";

export const SELECT_ENTRIES =
  "select id, at, verb, version, actor_kind as actorKind, actor_id as actorId, roles, subject_type as subjectType, " +
  "subject_id as subjectId, reason, payload, request_id as requestId, change_count as changeCount, " +
  "prev_hash as prevHash, hash from audit_entry";

const INSERT_ENTRY =
  "insert into audit_entry (id, at, verb, version, actor_kind, actor_id, roles, subject_type, subject_id, reason, payload, " +
  "request_id, change_count, prev_hash, hash) values (@id, @at, @verb, @version, @actorKind, @actorId, @roles, @subjectType, " +
  "@subjectId, @reason, @payload, @requestId, @changeCount, @prevHash, @hash)";

/** The id and hash of the newest entry; the genesis values where there is none. */
export function chainHead(sqlite: Sqlite): { id: number; hash: string } {
  const row = sqlite.prepare("select id, hash from audit_entry order by id desc limit 1").get();
  return (row as { id: number; hash: string } | undefined) ?? { id: 0, hash: GENESIS_HASH };
}

/** Writes the entry that closes a command: counts and hashes its changes onto the chain. */
export function sealEntry(
  sqlite: Sqlite,
  entry: Omit<EntryFields, "changeCount">,
): { hash: string; changeCount: number } {
  const counted = sqlite
    .prepare("select count(*) as n from audit_change where entry_id = ?")
    .get(entry.id) as { n: number };
  const fields: EntryFields = { ...entry, changeCount: counted.n };
  const changes = sqlite.prepare(SELECT_CHANGES).iterate(entry.id) as IterableIterator<ChangeFields>;
  const hash = entryHash(fields, changes);
  sqlite.prepare(INSERT_ENTRY).run({ ...fields, hash });
  return { hash, changeCount: counted.n };
}
