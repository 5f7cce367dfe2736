import { sql } from "drizzle-orm";
import { index, integer, real, sqliteTable, sqliteView, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { CHECK_VERDICTS, INSTRUMENT_STATES, PARAMETER_GROUPS, PARAMETER_KINDS } from "./model";

/** What is measured or checked. The code is what people type and files carry; it never changes. */
export const parameter = sqliteTable(
  "methods_parameter",
  {
    id: integer("id").primaryKey(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: PARAMETER_KINDS }).notNull(),
    /** Canonical unit, a code of lib/units; null for answers, texts and bare numbers. */
    unit: text("unit"),
    acceptedUnits: text("accepted_units", { mode: "json" }).$type<string[]>().notNull(),
    decimals: integer("decimals").notNull(),
    plausibleLow: real("plausible_low"),
    plausibleHigh: real("plausible_high"),
    choices: text("choices", { mode: "json" })
      .$type<{ code: string; label: string; means: "within" | "watch" | "out" | "none" }[]>()
      .notNull(),
    group: text("parameter_group", { enum: PARAMETER_GROUPS }).notNull(),
    mayBeNegative: integer("may_be_negative", { mode: "boolean" }).notNull(),
    note: text("note").notNull().default(""),
    retiredAt: integer("retired_at"),
    retiredReason: text("retired_reason"),
  },
  (table) => [uniqueIndex("methods_parameter_code").on(sql`lower(${table.code})`)],
);

/** A written procedure by which a parameter is measured. */
export const method = sqliteTable(
  "methods_method",
  {
    id: integer("id").primaryKey(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    parameterId: integer("parameter_id")
      .notNull()
      .references(() => parameter.id),
    principle: text("principle").notNull(),
    retiredAt: integer("retired_at"),
  },
  (table) => [uniqueIndex("methods_method_code").on(sql`lower(${table.code})`)],
);

/** One device by its serial number. `scale` says what its marks mean (a refractometer: seawater or brine). */
export const instrument = sqliteTable(
  "methods_instrument",
  {
    id: integer("id").primaryKey(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    serial: text("serial").notNull(),
    principle: text("principle").notNull(),
    scale: text("scale"),
    state: text("state", { enum: INSTRUMENT_STATES }).notNull(),
    checkEveryDays: integer("check_every_days"),
    retiredReason: text("retired_reason"),
  },
  (table) => [uniqueIndex("methods_instrument_code").on(sql`lower(${table.code})`)],
);

/** One check of an instrument against a standard: as found, as left, and whether it was good. */
export const instrumentCheck = sqliteTable(
  "methods_instrument_check",
  {
    id: integer("id").primaryKey(),
    instrumentId: integer("instrument_id")
      .notNull()
      .references(() => instrument.id),
    parameterId: integer("parameter_id").references(() => parameter.id),
    checkedAt: integer("checked_at").notNull(),
    checkedBy: integer("checked_by").notNull(),
    standard: text("standard").notNull(),
    standardValue: real("standard_value"),
    asFound: real("as_found"),
    asLeft: real("as_left"),
    unit: text("unit"),
    verdict: text("verdict", { enum: CHECK_VERDICTS }).notNull(),
    note: text("note").notNull().default(""),
    dueOn: text("due_on"),
  },
  (table) => [index("methods_instrument_check_latest").on(table.instrumentId, table.checkedAt)],
);

/** Parameters by id, code and name: how other modules join this one (through the door). */
export const parameterDirectory = sqliteView("methods_parameter_directory", {
  parameterId: integer("parameter_id").notNull(),
  parameterCode: text("parameter_code").notNull(),
  parameterName: text("parameter_name").notNull(),
  parameterUnit: text("parameter_unit"),
  parameterDecimals: integer("parameter_decimals").notNull(),
}).as(sql`
  select p.id as parameter_id, p.code as parameter_code, p.name as parameter_name, p.unit as parameter_unit,
    p.decimals as parameter_decimals
  from methods_parameter p`);
