/**
 * Builds a database with a million history entries and prints how long pages and searches of the history take, in milliseconds
 * and as ratios to the first page of the same run; then how the queries are planned.
 *
 * The entries are written straight into a file of the bench's own, its triggers dropped: the product itself has no way to do so.
 * Run: node --conditions=react-server --import tsx tests/bench/history-million.ts
 */
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import type { z } from "zod";
import { openDatabase } from "@/db/database";
import { MINUTE_MS, SetClock } from "@/lib/clock";
import type { Actor } from "@/modules/access";
import { ask, getEntry, getRecordHistory, listEntries, listVerbs, migrateDatabase } from "@/modules/audit";

const ENTRIES = 1_000_000;
const REPEATS = 25;
const PAGE = 50;
const BEGAN = Date.UTC(2016, 0, 1);
const auditor: Actor = {
  kind: "person",
  personId: 1,
  name: "Auditor",
  roles: ["auditor"],
  areaIds: null,
  sessionId: null,
};

const folder = mkdtempSync(path.join(tmpdir(), "stillwell-million-"));
const db = openDatabase(path.join(folder, "million.db"));
migrateDatabase(db, new SetClock(BEGAN));
fill();
const asked = { db: db.reader.orm, actor: auditor, at: BEGAN };
type Search = z.input<typeof listEntries.input>;

/** One entry a minute or so by nine people; the rare verb and the rare person are needles in the stack. */
function fill(): void {
  const { sqlite } = db.writer;
  const triggers = sqlite
    .prepare("select name from sqlite_master where type = 'trigger' and name like 'history_%'")
    .all();
  for (const { name } of triggers as { name: string }[]) sqlite.exec(`drop trigger "${name}"`);
  sqlite.exec(`
    with recursive n(i) as (select 2 union all select i + 1 from n where i < ${ENTRIES})
    insert into audit_entry (id, at, verb, version, actor_kind, actor_id, roles, subject_type, subject_id, reason, payload,
      request_id, change_count, prev_hash, hash)
    select i, ${BEGAN} + i * ${5 * MINUTE_MS},
      case when i % 50000 = 7 then 'limits.approved' when i % 97 = 0 then 'reading.corrected' else 'reading.recorded' end,
      1, 'person', case when i % 100000 = 7 then 9 else 1 + i % 8 end, '["aquarist"]',
      case when i % 50000 = 7 then 'limit-workbook' else 'reading' end, cast(i % 200000 as text), null, '{}', null, 1,
      hex(i), printf('%064x', i) from n;
    insert into audit_change (id, entry_id, table_name, row_key, operation, before, after)
    select id, id, 'measurements_reading', cast(id % 200000 as text), 'insert', null, '{"id":1,"value":12.4}'
    from audit_entry where id > 1;
    analyze;`);
}

/** Median milliseconds of one call. */
function timeOf(work: () => unknown): number {
  work();
  const times = Array.from({ length: REPEATS }, () => {
    const start = process.hrtime.bigint();
    work();
    return Number(process.hrtime.bigint() - start) / 1e6;
  });
  return times.toSorted((a, b) => a - b)[Math.floor(REPEATS / 2)] ?? 0;
}

const list = (search: Search) => () => ask(asked, listEntries, { limit: PAGE, ...search });
const at = (entry: number): number => BEGAN + entry * 5 * MINUTE_MS;
const rows: [string, () => unknown][] = [
  ["first page", list({})],
  ["page 9,000", list({ before: ENTRIES - 9_000 * PAGE })],
  ["page 9,000 from the other end", list({ after: 9_000 * PAGE })],
  ["a person", list({ personId: 3 })],
  ["a person with ten entries", list({ personId: 9 })],
  ["a person, page 9,000 of everything", list({ personId: 3, before: ENTRIES - 9_000 * PAGE })],
  ["the product itself", list({ actorKind: "system" })],
  ["an action", list({ verb: "reading.corrected" })],
  ["a rare action", list({ verb: "limits.approved" })],
  ["a person and a rare action", list({ personId: 3, verb: "limits.approved" })],
  ["a kind of subject", list({ subjectType: "limit-workbook" })],
  ["one subject", list({ subjectType: "reading", subjectId: "1234" })],
  ["a day five years ago", list({ fromAt: at(500_000), toAt: at(500_288) })],
  ["a person in that day", list({ personId: 3, fromAt: at(500_000), toAt: at(500_288) })],
  [
    "a person, an action, a year",
    list({ personId: 3, verb: "reading.corrected", fromAt: at(300_000), toAt: at(405_000) }),
  ],
  [
    "a search that finds nothing",
    list({ personId: 9, subjectType: "limit-workbook", verb: "reading.corrected" }),
  ],
  ["actions that occur", () => ask(asked, listVerbs, {})],
  ["one entry", () => ask(asked, getEntry, { entryId: 500_000 })],
  ["one record", () => ask(asked, getRecordHistory, { table: "measurements_reading", key: "1234" })],
];

const first = timeOf(list({}));
console.log(
  `${ENTRIES.toLocaleString("en-GB")} entries, median of ${REPEATS}; ratio to the first page (${first.toFixed(2)} ms)`,
);
for (const [name, work] of rows) {
  const took = timeOf(work);
  console.log(`${name.padEnd(38)} ${took.toFixed(2).padStart(8)} ms  ×${(took / first).toFixed(2)}`);
}

/** Statements as the queries send them, explained. */
const PLANS = [
  "select * from audit_entry where (at, id) < (1, 1) order by at desc, id desc limit 51",
  "select * from audit_entry where actor_id = 3 and (at, id) < (1, 1) order by at desc, id desc limit 51",
  "select * from audit_entry where actor_id = 3 and verb = 'x' order by at desc, id desc limit 51",
  "select * from audit_entry where verb = 'x' and at >= 1 and at < 2 order by at desc, id desc limit 51",
  "select * from audit_entry where subject_type = 'x' order by at desc, id desc limit 51",
  "select * from audit_entry where subject_type = 'x' and subject_id = 'y' order by at desc, id desc limit 51",
];
for (const statement of PLANS) {
  const plan = db.reader.sqlite.prepare(`explain query plan ${statement}`).all() as { detail: string }[];
  console.log(`${statement}\n    ${plan.map((step) => step.detail).join("; ")}`);
}
db.close();
rmSync(folder, { recursive: true });
