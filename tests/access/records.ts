import path from "node:path";
import Sqlite from "better-sqlite3";

/** What an address can name. Each is filled with a record of the demonstration. */
export const RECORD_KINDS = [
  "systemCode",
  "systemId",
  "pointId",
  "areaId",
  "areaCode",
  "readingId",
  "incidentId",
  "workbookId",
  "determinationId",
  "equipmentId",
  "key",
  "instrumentCode",
  "instrumentId",
  "parameter",
  "parameterId",
  "methodId",
  "personId",
  "deputyshipId",
  "grantId",
  "entryId",
  "importId",
  "importCode",
  "jobId",
  "day",
  "onDay",
  "moment",
  "table",
  "token",
  "helpPage",
  "formulaPage",
  "authSession",
  "authUnknown",
] as const;
export type RecordKind = (typeof RECORD_KINDS)[number];
export type Filling = Record<RecordKind, string>;

/** Kinds that say how or when something is asked, not about which record. */
const NO_RECORD: readonly RecordKind[] = ["day", "onDay", "moment", "table", "authSession", "authUnknown"];
export const isRecord = (kind: RecordKind): boolean => !NO_RECORD.includes(kind);

/** What belongs to one area alone. */
const OF_AN_AREA: readonly RecordKind[] = [
  "systemCode",
  "systemId",
  "pointId",
  "areaId",
  "areaCode",
  "readingId",
  "incidentId",
  "workbookId",
  "determinationId",
  "equipmentId",
  "key",
];
export const isOfAnArea = (kind: RecordKind): boolean => OF_AN_AREA.includes(kind);

export type Fillings = {
  /** Records of the areas that the aquarist is bound to. */
  own: Filling;
  /** The same kinds of record from an area that they are not bound to. */
  elsewhere: Filling;
  /** Records that do not exist. */
  missing: Filling;
  /** Texts by which a page or an answer would show that it holds something of another area. */
  foreignWords: string[];
};

type Db = Sqlite.Database;

function one(db: Db, sql: string, ...given: unknown[]): string {
  const row = db
    .prepare(sql)
    .pluck()
    .get(...given);
  if (row === undefined || row === null) throw new Error(`the demonstration has nothing for: ${sql}`);
  return String(row);
}

function ofPlace(db: Db, areas: readonly number[]): Partial<Filling> {
  const list = `(${areas.join(",")})`;
  const place = `systems_system s where s.area_id in ${list}`;
  const incidentId = one(
    db,
    `select i.id from quality_incident i join systems_system s on s.id = i.system_id where s.area_id in ${list} limit 1`,
  );
  const systemId = one(
    db,
    `select s.id from ${place} and exists (select 1 from systems_point p join measurements_watch_item w on w.point_id = p.id
     join methods_parameter m on m.id = w.parameter_id where p.system_id = s.id and p.is_default and m.code = 'temperature') order by s.id limit 1`,
  );
  const pointId = one(db, "select id from systems_point where system_id = ? and is_default", systemId);
  const areaId = one(db, "select area_id from systems_system where id = ?", systemId);
  const readingId = one(
    db,
    "select id from measurements_reading_in_force where point_id = ? order by id desc limit 1",
    pointId,
  );
  const day = one(db, "select max(on_day) from rounds_day_review where area_id = ?", areaId);
  return {
    systemId,
    systemCode: one(db, "select code from systems_system where id = ?", systemId),
    pointId,
    areaId,
    areaCode: one(db, "select code from systems_area where id = ?", areaId),
    readingId,
    key: readingId,
    incidentId,
    // A workbook that touches water of these areas alone.
    workbookId: one(
      db,
      `select v.workbook_id from measurements_limit_version v join systems_point p on p.id = v.point_id
       join systems_system s on s.id = p.system_id group by v.workbook_id having min(s.area_id in ${list}) = 1 limit 1`,
    ),
    determinationId: one(
      db,
      `select d.id from systems_volume_determination d join systems_system s on s.id = d.system_id where s.area_id in ${list} limit 1`,
    ),
    equipmentId: one(
      db,
      `select e.id from systems_equipment e join systems_system s on s.id = e.system_id where s.area_id in ${list} limit 1`,
    ),
    day,
    onDay: day,
  };
}

function ofNoPlace(db: Db, more: { importId: string; importCode: string }): Partial<Filling> {
  return {
    instrumentCode: one(db, "select code from methods_instrument limit 1"),
    instrumentId: one(db, "select id from methods_instrument limit 1"),
    parameter: "temperature",
    parameterId: one(db, "select id from methods_parameter where code = 'temperature'"),
    methodId: one(db, "select id from methods_method limit 1"),
    // Not one whose sessions the walk uses: the probe changes nothing, and were it to, it would show here alone.
    personId: one(db, "select id from identity_person where name = 'Noor Haddaway'"),
    deputyshipId: "1",
    grantId: one(db, "select id from identity_role_grant limit 1"),
    entryId: one(db, "select id from audit_entry where verb = 'reading.recorded' limit 1"),
    jobId: one(db, "select id from audit_job limit 1"),
    moment: String(Date.UTC(2040, 0, 1)),
    table: "measurements_reading",
    token: "a-link-that-was-never-sent-to-anybody",
    helpPage: "aquarist",
    formulaPage: "seawater-density",
    authSession: "session",
    authUnknown: "nothing-of-this-name",
    ...more,
  };
}

/** What stands in an address where a record does not exist. */
const NOBODYS_NUMBER = "987654321";
const NOT_THERE: Partial<Filling> = {
  systemCode: "NOWHERE-99",
  areaCode: "NOWHERE",
  instrumentCode: "NOTHING-99",
  parameter: "nothing_of_this_name",
  importCode: "I26-9999",
  token: "another-link-that-was-never-sent",
};

/** Reads from the demonstration what the addresses are filled with. */
export function fillingsOf(dataFolder: string, more: { importId: string; importCode: string }): Fillings {
  const db = new Sqlite(path.join(dataFolder, "stillwell.db"), { readonly: true });
  try {
    const bound = db
      .prepare(
        `select b.area_id from identity_area_binding b join identity_role_grant g on g.person_id = b.person_id
         where b.ended_at is null and g.role = 'aquarist' and g.state = 'active'`,
      )
      .pluck()
      .all() as number[];
    const others = (db.prepare("select id from systems_area").pluck().all() as number[]).filter(
      (id) => !bound.includes(id),
    );
    const common = ofNoPlace(db, more);
    const own = { ...common, ...ofPlace(db, bound) } as Filling;
    const elsewhere = { ...common, ...ofPlace(db, others) } as Filling;
    const missing = Object.fromEntries(
      RECORD_KINDS.map((kind) => [kind, isRecord(kind) ? (NOT_THERE[kind] ?? NOBODYS_NUMBER) : own[kind]]),
    ) as Filling;
    const foreignWords = db
      .prepare(`select code from systems_system where area_id in (${others.join(",")})`)
      .pluck()
      .all() as string[];
    return { own, elsewhere, missing, foreignWords };
  } finally {
    db.close();
  }
}

/** The kind of record that fills a part of an address: its name says it, unless the row of the matrix does. */
export function kindOf(part: string, parts: Readonly<Record<string, RecordKind>> = {}): RecordKind {
  const kind = parts[part] ?? RECORD_KINDS.find((known) => known === part);
  if (kind === undefined) throw new Error(`say in the matrix what [${part}] is filled with`);
  return kind;
}

type Asked = {
  parts?: Readonly<Record<string, RecordKind>>;
  search?: Readonly<Record<string, RecordKind>>;
};

/** Every kind of record that an address names. */
export function kindsIn(address: string, { parts, search }: Asked): RecordKind[] {
  const named = [...address.matchAll(/\[(?:\.\.\.)?(\w+)\]/g)].map(([, part = ""]) => kindOf(part, parts));
  return [...named, ...Object.values(search ?? {})];
}

/** An address with its dynamic parts and its search filled. */
export function fill(address: string, { parts, search }: Asked, filling: Filling): string {
  const filled = address.replaceAll(/\[(?:\.\.\.)?(\w+)\]/g, (_, part: string) =>
    encodeURIComponent(filling[kindOf(part, parts)]),
  );
  const asked = Object.entries(search ?? {}).map(([name, kind]) => [name, filling[kind]]);
  return asked.length === 0 ? filled : `${filled}?${new URLSearchParams(asked)}`;
}
