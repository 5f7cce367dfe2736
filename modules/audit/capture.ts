import { createHash } from "node:crypto";
import type { Sqlite } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { EXEMPT_TABLES } from "./exempt.data";

type Column = { name: string; type: string; pk: number };

/** Names of the tables whose rows are captured, in alphabetical order. */
export function capturedTables(sqlite: Sqlite): string[] {
  const rows = sqlite
    .prepare("select name from sqlite_master where type = 'table' and name not like 'sqlite_%' order by name")
    .all() as { name: string }[];
  return rows.map((row) => row.name).filter((name) => !(name in EXEMPT_TABLES));
}

function columnsOf(sqlite: Sqlite, table: string): Column[] {
  return sqlite.pragma(`table_info(${quote(table)})`) as Column[];
}

const quote = (name: string): string => `"${name.replaceAll('"', '""')}"`;
const literal = (text: string): string => `'${text.replaceAll("'", "''")}'`;

/** The SQL that gives a row as JSON, columns in alphabetical order, numbers to 17 digits, blobs as hexadecimal. */
export function rowJsonSql(sqlite: Sqlite, table: string, row: string): string {
  const columns = columnsOf(sqlite, table).toSorted((a, b) => (a.name < b.name ? -1 : 1));
  const pairs = columns.map((column) => {
    const cell = `${row}.${quote(column.name)}`;
    return `${literal(column.name)}, ${column.type.toLowerCase() === "blob" ? `hex(${cell})` : cell}`;
  });
  return `json_object(${pairs.join(", ")})`;
}

/** The SQL that gives a row's key as text: the id, or a JSON array where the key has several columns. */
export function rowKeySql(sqlite: Sqlite, table: string, row: string): string {
  const keys = columnsOf(sqlite, table)
    .filter((column) => column.pk > 0)
    .toSorted((a, b) => a.pk - b.pk)
    .map((column) => `${row}.${quote(column.name)}`);
  invariant(keys.length > 0, `table ${table} has no primary key`);
  return keys.length === 1 ? `cast(${keys[0]} as text)` : `json_array(${keys.join(", ")})`;
}

const CAPTURE_INTO = "insert into audit_change (entry_id, table_name, row_key, operation, before, after)";

function captureTriggers(sqlite: Sqlite, table: string): string[] {
  const [oldKey, newKey] = [rowKeySql(sqlite, table, "old"), rowKeySql(sqlite, table, "new")];
  const [oldRow, newRow] = [rowJsonSql(sqlite, table, "old"), rowJsonSql(sqlite, table, "new")];
  const name = literal(table);
  const on = (what: string, event: string, body: string) =>
    `create trigger ${quote(`history_${what}_${table}`)} ${event} on ${quote(table)} begin ${body}; end`;
  return [
    on(
      "insert",
      "after insert",
      `${CAPTURE_INTO} values (current_entry(), ${name}, ${newKey}, 'insert', null, ${newRow})`,
    ),
    on(
      "update",
      "after update",
      `${CAPTURE_INTO} values (current_entry(), ${name}, ${newKey}, 'update', ${oldRow}, ${newRow})`,
    ),
    on(
      "delete",
      "after delete",
      `${CAPTURE_INTO} values (current_entry(), ${name}, ${oldKey}, 'delete', ${oldRow}, null)`,
    ),
    on(
      "key",
      "before update",
      `select raise(abort, 'the key of a record cannot be changed') where ${oldKey} is not ${newKey}`,
    ),
  ];
}

const refuse = (table: string, event: string): string =>
  `create trigger history_no_${event}_${table} before ${event} on ${table} ` +
  `begin select raise(abort, 'the history is only added to'); end`;

const GUARDS = [
  refuse("audit_entry", "update"),
  refuse("audit_entry", "delete"),
  refuse("audit_change", "update"),
  refuse("audit_change", "delete"),
  "create trigger history_only_open_entry before insert on audit_entry " +
    "when new.id is not current_entry() begin select raise(abort, 'the entry is not the one that is open'); end",
  "create trigger history_only_open_change before insert on audit_change " +
    "when new.entry_id is not current_entry() begin select raise(abort, 'the entry is not the one that is open'); end",
];

/** Removes every trigger of the history, so that a migration can rebuild tables; `installCapture` puts them back. */
export function removeCapture(sqlite: Sqlite): void {
  const rows = sqlite
    .prepare("select name from sqlite_master where type = 'trigger' and name like 'history_%'")
    .all();
  for (const row of rows as { name: string }[]) sqlite.exec(`drop trigger ${quote(row.name)}`);
}

/** Generates the capture triggers for every table that is not exempt, and the guards of the history itself. */
export function installCapture(sqlite: Sqlite): void {
  removeCapture(sqlite);
  for (const table of capturedTables(sqlite)) {
    for (const trigger of captureTriggers(sqlite, table)) sqlite.exec(trigger);
  }
  for (const guard of GUARDS) sqlite.exec(guard);
}

/** SHA-256 of the whole schema, triggers included: a trigger that is gone or altered shows. */
export function schemaHash(sqlite: Sqlite): string {
  const rows = sqlite
    .prepare(
      "select type, name, coalesce(sql, '') as sql from sqlite_master where name not like 'sqlite_%' order by type, name",
    )
    .all();
  return createHash("sha256").update(JSON.stringify(rows)).digest("hex");
}
