import { and, asc, between, desc, eq, ne, sql } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { pointDirectory } from "@/modules/systems";
import { judgement, limitVersion, reading } from "./schema";

type Columns<T> = { [Name in keyof T]: ReturnType<typeof sql.placeholder> };

/** Every column but the key as a placeholder of its own name. */
function placeholders<const Names extends readonly string[]>(
  names: Names,
): Columns<Record<Names[number], unknown>> {
  return Object.fromEntries(names.map((name) => [name, sql.placeholder(name)])) as Columns<
    Record<Names[number], unknown>
  >;
}

const named = (name: string) => sql.placeholder(name);

/** Plain values of a series in a span that may stand for a change. */
function preparePreceding(db: Orm) {
  return db
    .select({
      id: reading.id,
      takenAt: reading.takenAt,
      value: reading.value,
      qualifier: reading.qualifier,
    })
    .from(reading)
    .where(
      and(
        eq(reading.pointId, named("pointId")),
        eq(reading.parameterId, named("parameterId")),
        between(reading.takenAt, named("fromAt"), named("toAt")),
        ne(reading.id, named("id")),
        sql`${reading.voidedAt} is null`,
        sql`(${reading.deliveryId} is null or ${reading.deliveryId} is ${named("deliveryId")} or exists (
            select 1 from measurements_delivery d
            where d.id = ${reading.deliveryId} and d.published_at is not null and d.withdrawn_at is null))`,
        sql`not exists (select 1 from measurements_reading later where later.supersedes_id = ${reading.id})`,
        sql`coalesce((select j.status from measurements_judgement j where j.reading_id = ${reading.id}
            order by j.id desc limit 1), '') <> 'implausible'`,
      ),
    )
    .orderBy(asc(reading.takenAt))
    .prepare();
}

/** What is asked. */
function prepareAsking(db: Orm) {
  return {
    byUuid: db
      .select()
      .from(reading)
      .where(eq(reading.uuid, named("uuid")))
      .prepare(),
    place: db
      .select()
      .from(pointDirectory)
      .where(eq(pointDirectory.pointId, named("pointId")))
      .prepare(),
    versions: db
      .select()
      .from(limitVersion)
      .where(
        and(
          eq(limitVersion.pointId, named("pointId")),
          eq(limitVersion.parameterId, named("parameterId")),
          eq(limitVersion.state, "approved"),
        ),
      )
      .orderBy(asc(limitVersion.version))
      .prepare(),
    latestJudgement: db
      .select({
        status: judgement.status,
        sentence: judgement.sentence,
        limitVersionId: judgement.limitVersionId,
      })
      .from(judgement)
      .where(eq(judgement.readingId, named("readingId")))
      .orderBy(desc(judgement.id))
      .limit(1)
      .prepare(),
    preceding: preparePreceding(db),
  };
}

/** What is written; only the connection that writes can prepare it. */
function prepareWriting(db: Orm) {
  return {
    store: db
      .insert(reading)
      .values(
        placeholders([
          "uuid",
          "pointId",
          "parameterId",
          "typedText",
          "typedUnit",
          "value",
          "qualifier",
          "answer",
          "takenAt",
          "enteredAt",
          "takenBy",
          "enteredBy",
          "methodId",
          "instrumentId",
          "source",
          "sourceRef",
          "deliveryId",
          "note",
          "confirmedBy",
          "confirmedAt",
        ]),
      )
      .returning()
      .prepare(),
    judge: db
      .insert(judgement)
      .values(
        placeholders([
          "readingId",
          "status",
          "side",
          "sentence",
          "reasons",
          "limitVersionId",
          "ruleVersion",
          "cause",
          "judgedAt",
        ]),
      )
      .prepare(),
  };
}

/** Prepares once for each connection, at the first use. */
function onceEach<T>(prepare: (db: Orm) => T): (db: Orm) => T {
  const kept = new WeakMap<Orm, T>();
  return (db) => {
    const known = kept.get(db);
    if (known) return known;
    const made = prepare(db);
    kept.set(db, made);
    return made;
  };
}

export const askingStatements = onceEach(prepareAsking);
export const writingStatements = onceEach(prepareWriting);
