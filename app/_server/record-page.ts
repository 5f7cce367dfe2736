import "server-only";

type Row = Readonly<Record<string, unknown>>;

/** Table → the address of a record's own page. */
const PAGES: Readonly<Record<string, (key: string, row: Row) => string>> = {
  identity_person: (key) => `/setup/people/${key}`,
  measurements_reading: (key) => `/readings/${key}`,
  methods_instrument: (_key, row) => `/setup/instruments/${String(row.code)}`,
  quality_incident: (key) => `/incidents/${key}`,
  systems_system: (_key, row) => `/systems/${String(row.code)}`,
};

/** Where a record is shown in use; null where it has no page of its own. */
export function pageOfRecord(table: string, key: string, newest: string | null): string | null {
  const page = PAGES[table];
  return page && newest ? page(key, JSON.parse(newest) as Row) : null;
}
