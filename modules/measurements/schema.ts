import { sql } from "drizzle-orm";
import {
  type AnySQLiteColumn,
  index,
  integer,
  real,
  sqliteTable,
  sqliteView,
  text,
  uniqueIndex,
} from "drizzle-orm/sqlite-core";
import type { LimitShape } from "./model";
import {
  JUDGEMENT_CAUSES,
  LIMIT_STATES,
  QUALIFIERS,
  READING_SOURCES,
  type Reason,
  SIDES,
  STATUSES,
} from "./model";

/**
 * Readings that become visible at one moment and can be withdrawn as one (an import). Its readings count from `publishedAt`
 * until `withdrawnAt`.
 */
export const delivery = sqliteTable("measurements_delivery", {
  id: integer("id").primaryKey(),
  source: text("source", { enum: READING_SOURCES }).notNull(),
  sourceRef: text("source_ref").notNull(),
  openedAt: integer("opened_at").notNull(),
  publishedAt: integer("published_at"),
  withdrawnAt: integer("withdrawn_at"),
  withdrawnBy: integer("withdrawn_by"),
  withdrawnReason: text("withdrawn_reason"),
});

/** One value of one parameter at one point: as typed and canonical. Never overwritten; a correction is a new row. */
export const reading = sqliteTable(
  "measurements_reading",
  {
    id: integer("id").primaryKey(),
    /** Made by whoever sent it: the same UUID twice is one reading. */
    uuid: text("uuid").notNull(),
    pointId: integer("point_id").notNull(),
    parameterId: integer("parameter_id").notNull(),
    typedText: text("typed_text").notNull(),
    typedUnit: text("typed_unit"),
    /** Canonical unit of the parameter; null for a value without a number (ND, too many to count, answers, texts). */
    value: real("value"),
    qualifier: text("qualifier", { enum: QUALIFIERS }).notNull(),
    /** The code of an answer, or a text. */
    answer: text("answer"),
    takenAt: integer("taken_at").notNull(),
    enteredAt: integer("entered_at").notNull(),
    takenBy: integer("taken_by").notNull(),
    enteredBy: integer("entered_by").notNull(),
    methodId: integer("method_id"),
    instrumentId: integer("instrument_id"),
    source: text("source", { enum: READING_SOURCES }).notNull(),
    sourceRef: text("source_ref"),
    deliveryId: integer("delivery_id").references(() => delivery.id),
    note: text("note"),
    supersedesId: integer("supersedes_id").references((): AnySQLiteColumn => reading.id),
    correctionReason: text("correction_reason"),
    /** A person said that an out-of-tolerance or implausible value is what the instrument showed. */
    confirmedBy: integer("confirmed_by"),
    confirmedAt: integer("confirmed_at"),
    voidedBy: integer("voided_by"),
    voidedAt: integer("voided_at"),
    voidReason: text("void_reason"),
  },
  (table) => [
    uniqueIndex("measurements_reading_uuid").on(table.uuid),
    uniqueIndex("measurements_reading_supersedes").on(table.supersedesId),
    index("measurements_reading_series").on(table.pointId, table.parameterId, table.takenAt),
    index("measurements_reading_taken").on(table.takenAt),
    index("measurements_reading_delivery").on(
      table.deliveryId,
      table.pointId,
      table.parameterId,
      table.takenAt,
    ),
  ],
);

/** What the server thought of a reading, and why it thought again. The newest counts; none is ever overwritten. */
export const judgement = sqliteTable(
  "measurements_judgement",
  {
    id: integer("id").primaryKey(),
    readingId: integer("reading_id")
      .notNull()
      .references(() => reading.id),
    status: text("status", { enum: STATUSES }).notNull(),
    side: text("side", { enum: SIDES }),
    sentence: text("sentence").notNull(),
    reasons: text("reasons", { mode: "json" }).$type<Reason[]>().notNull(),
    limitVersionId: integer("limit_version_id"),
    ruleVersion: integer("rule_version").notNull(),
    cause: text("cause", { enum: JUDGEMENT_CAUSES }).notNull(),
    judgedAt: integer("judged_at").notNull(),
  },
  (table) => [index("measurements_judgement_latest").on(table.readingId, table.id)],
);

/** A set of proposed limits that is approved in one act. */
export const limitWorkbook = sqliteTable("measurements_limit_workbook", {
  id: integer("id").primaryKey(),
  title: text("title").notNull(),
  reason: text("reason").notNull(),
  state: text("state", { enum: LIMIT_STATES }).notNull(),
  proposedBy: integer("proposed_by").notNull(),
  proposedAt: integer("proposed_at").notNull(),
  decidedBy: integer("decided_by"),
  decidedAt: integer("decided_at"),
  decisionComment: text("decision_comment"),
});

/** One version of the limits of a point and parameter. In force while approved and between its two moments. */
export const limitVersion = sqliteTable(
  "measurements_limit_version",
  {
    id: integer("id").primaryKey(),
    workbookId: integer("workbook_id")
      .notNull()
      .references(() => limitWorkbook.id),
    pointId: integer("point_id").notNull(),
    parameterId: integer("parameter_id").notNull(),
    version: integer("version").notNull(),
    state: text("state", { enum: LIMIT_STATES }).notNull(),
    effectiveFromAt: integer("effective_from_at").notNull(),
    effectiveToAt: integer("effective_to_at"),
    shape: text("shape", { mode: "json" }).$type<LimitShape>().notNull(),
    suspendedReason: text("suspended_reason"),
  },
  (table) => [
    uniqueIndex("measurements_limit_version_number").on(table.pointId, table.parameterId, table.version),
    index("measurements_limit_version_workbook").on(table.workbookId),
  ],
);

/** Limits by parameter, to be laid on many systems at once. */
export const limitTemplate = sqliteTable(
  "measurements_limit_template",
  {
    id: integer("id").primaryKey(),
    name: text("name").notNull(),
    note: text("note").notNull().default(""),
    rows: text("rows", { mode: "json" }).$type<{ parameterId: number; shape: LimitShape }[]>().notNull(),
    changedBy: integer("changed_by").notNull(),
    changedAt: integer("changed_at").notNull(),
    retiredAt: integer("retired_at"),
  },
  (table) => [uniqueIndex("measurements_limit_template_name").on(sql`lower(${table.name})`)],
);

/** That a parameter is read at a point: in which order, how often, and with what by default. */
export const watchItem = sqliteTable(
  "measurements_watch_item",
  {
    id: integer("id").primaryKey(),
    pointId: integer("point_id").notNull(),
    parameterId: integer("parameter_id").notNull(),
    position: integer("position").notNull(),
    /** Calendar days from one reading to the next; null: read when wanted, never a gap. */
    everyDays: integer("every_days"),
    unit: text("unit"),
    methodId: integer("method_id"),
    instrumentId: integer("instrument_id"),
    since: integer("since").notNull(),
    endedAt: integer("ended_at"),
  },
  (table) => [
    uniqueIndex("measurements_watch_item_open")
      .on(table.pointId, table.parameterId)
      .where(sql`${table.endedAt} is null`),
  ],
);

/** A sentence that explains a reading that is off. */
export const explanation = sqliteTable(
  "measurements_explanation",
  {
    id: integer("id").primaryKey(),
    readingId: integer("reading_id")
      .notNull()
      .references(() => reading.id),
    text: text("text").notNull(),
    explainedBy: integer("explained_by").notNull(),
    explainedAt: integer("explained_at").notNull(),
  },
  (table) => [index("measurements_explanation_reading").on(table.readingId)],
);

/** Readings that count now, each with its newest judgement: not voided, not corrected, not of a withdrawn delivery. */
export const readingInForce = sqliteView("measurements_reading_in_force", {
  id: integer("id").notNull(),
  uuid: text("uuid").notNull(),
  pointId: integer("point_id").notNull(),
  parameterId: integer("parameter_id").notNull(),
  typedText: text("typed_text").notNull(),
  typedUnit: text("typed_unit"),
  value: real("value"),
  qualifier: text("qualifier", { enum: QUALIFIERS }).notNull(),
  answer: text("answer"),
  takenAt: integer("taken_at").notNull(),
  enteredAt: integer("entered_at").notNull(),
  takenBy: integer("taken_by").notNull(),
  enteredBy: integer("entered_by").notNull(),
  methodId: integer("method_id"),
  instrumentId: integer("instrument_id"),
  source: text("source", { enum: READING_SOURCES }).notNull(),
  sourceRef: text("source_ref"),
  deliveryId: integer("delivery_id"),
  note: text("note"),
  supersedesId: integer("supersedes_id"),
  correctionReason: text("correction_reason"),
  confirmedBy: integer("confirmed_by"),
  confirmedAt: integer("confirmed_at"),
  judgementId: integer("judgement_id"),
  status: text("status", { enum: STATUSES }).notNull(),
  side: text("side", { enum: SIDES }),
  sentence: text("sentence").notNull(),
  limitVersionId: integer("limit_version_id"),
}).as(sql`
  select r.id, r.uuid, r.point_id, r.parameter_id, r.typed_text, r.typed_unit, r.value, r.qualifier, r.answer,
    r.taken_at, r.entered_at, r.taken_by, r.entered_by, r.method_id, r.instrument_id, r.source, r.source_ref,
    r.delivery_id, r.note, r.supersedes_id, r.correction_reason, r.confirmed_by, r.confirmed_at,
    j.id as judgement_id, coalesce(j.status, 'none') as status, j.side, coalesce(j.sentence, '') as sentence,
    j.limit_version_id
  from measurements_reading r
  left join measurements_judgement j
    on j.id = (select max(newest.id) from measurements_judgement newest where newest.reading_id = r.id)
  left join measurements_delivery d on d.id = r.delivery_id
  where r.voided_at is null
    and (r.delivery_id is null or (d.published_at is not null and d.withdrawn_at is null))
    and not exists (select 1 from measurements_reading later where later.supersedes_id = r.id)`);
