import { sql } from "drizzle-orm";
import { index, integer, real, sqliteTable, sqliteView, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import {
  DETERMINATION_METHODS,
  DETERMINATION_STATUSES,
  EQUIPMENT_KINDS,
  POINT_KINDS,
  SYSTEM_KINDS,
  SYSTEM_STATES,
  WATER_TYPES,
} from "./model";

/** A place with its own address; one for now, the key is everywhere. */
export const site = sqliteTable(
  "systems_site",
  { id: integer("id").primaryKey(), code: text("code").notNull(), name: text("name").notNull() },
  (table) => [uniqueIndex("systems_site_code").on(sql`lower(${table.code})`)],
);

/** A gallery or building. */
export const area = sqliteTable(
  "systems_area",
  {
    id: integer("id").primaryKey(),
    siteId: integer("site_id")
      .notNull()
      .references(() => site.id),
    code: text("code").notNull(),
    name: text("name").notNull(),
    biosecurityLevel: integer("biosecurity_level").notNull(),
    walkingOrder: integer("walking_order").notNull(),
  },
  (table) => [uniqueIndex("systems_area_code").on(sql`lower(${table.code})`)],
);

/** One body of water with its own life support. */
export const system = sqliteTable(
  "systems_system",
  {
    id: integer("id").primaryKey(),
    areaId: integer("area_id")
      .notNull()
      .references(() => area.id),
    code: text("code").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: SYSTEM_KINDS }).notNull(),
    waterType: text("water_type", { enum: WATER_TYPES }).notNull(),
    state: text("state", { enum: SYSTEM_STATES }).notNull(),
    walkingOrder: integer("walking_order").notNull(),
    notes: text("notes").notNull().default(""),
    createdAt: integer("created_at").notNull(),
    retiredAt: integer("retired_at"),
    retiredReason: text("retired_reason"),
  },
  (table) => [
    uniqueIndex("systems_system_code").on(sql`lower(${table.code})`),
    index("systems_system_area").on(table.areaId),
  ],
);

/** Where in a system a reading is taken; exactly one is the default. */
export const point = sqliteTable(
  "systems_point",
  {
    id: integer("id").primaryKey(),
    systemId: integer("system_id")
      .notNull()
      .references(() => system.id),
    code: text("code").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: POINT_KINDS }).notNull(),
    isDefault: integer("is_default", { mode: "boolean" }).notNull(),
    isInUse: integer("is_in_use", { mode: "boolean" }).notNull().default(true),
  },
  (table) => [
    uniqueIndex("systems_point_code").on(table.systemId, sql`lower(${table.code})`),
    uniqueIndex("systems_point_default").on(table.systemId).where(sql`${table.isDefault} = 1`),
  ],
);

/** A machine or vessel of a system's life support. */
export const equipment = sqliteTable(
  "systems_equipment",
  {
    id: integer("id").primaryKey(),
    systemId: integer("system_id")
      .notNull()
      .references(() => system.id),
    code: text("code").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: EQUIPMENT_KINDS }).notNull(),
    state: text("state", { enum: SYSTEM_STATES }).notNull(),
    notes: text("notes").notNull().default(""),
  },
  (table) => [uniqueIndex("systems_equipment_code").on(table.systemId, sql`lower(${table.code})`)],
);

/**
 * A determination of a system's volume: proposed, then approved (of record from `effectiveFromAt` on) or declined by
 * somebody else. `components` keeps the geometry as typed and as computed at that time (JSON, null for a tracer test).
 */
export const volumeDetermination = sqliteTable(
  "systems_volume_determination",
  {
    id: integer("id").primaryKey(),
    systemId: integer("system_id")
      .notNull()
      .references(() => system.id),
    method: text("method", { enum: DETERMINATION_METHODS }).notNull(),
    volumeL: real("volume_l").notNull(),
    standardUncertaintyL: real("standard_uncertainty_l").notNull(),
    surfaceAreaM2: real("surface_area_m2"),
    surfaceAreaUncertaintyM2: real("surface_area_uncertainty_m2"),
    correlation: real("correlation").notNull().default(0),
    components: text("components"),
    note: text("note").notNull(),
    status: text("status", { enum: DETERMINATION_STATUSES }).notNull(),
    proposedBy: integer("proposed_by").notNull(),
    proposedAt: integer("proposed_at").notNull(),
    effectiveFromAt: integer("effective_from_at").notNull(),
    decidedBy: integer("decided_by"),
    decidedAt: integer("decided_at"),
    decisionReason: text("decision_reason"),
  },
  (table) => [
    index("systems_volume_of_record").on(table.systemId, table.status, table.effectiveFromAt),
    index("systems_volume_waiting").on(table.status),
  ],
);

/** How a system stands against its volume of record from a moment on; appended, the latest counts. */
export const operatingLevel = sqliteTable(
  "systems_operating_level",
  {
    id: integer("id").primaryKey(),
    systemId: integer("system_id")
      .notNull()
      .references(() => system.id),
    levelOffsetM: real("level_offset_m").notNull(),
    levelOffsetUncertaintyM: real("level_offset_uncertainty_m").notNull(),
    isDrained: integer("is_drained", { mode: "boolean" }).notNull(),
    reason: text("reason").notNull(),
    setBy: integer("set_by"),
    setAt: integer("set_at").notNull(),
  },
  (table) => [index("systems_operating_level_latest").on(table.systemId, table.id)],
);

/** Two systems that share their water for a time; `oneSystemId` is the smaller id. Ended, never deleted. */
export const join = sqliteTable(
  "systems_join",
  {
    id: integer("id").primaryKey(),
    oneSystemId: integer("one_system_id")
      .notNull()
      .references(() => system.id),
    otherSystemId: integer("other_system_id")
      .notNull()
      .references(() => system.id),
    joinedBy: integer("joined_by"),
    joinedAt: integer("joined_at").notNull(),
    endedBy: integer("ended_by"),
    endedAt: integer("ended_at"),
  },
  (table) => [
    uniqueIndex("systems_join_open")
      .on(table.oneSystemId, table.otherSystemId)
      .where(sql`${table.endedAt} is null`),
  ],
);

/**
 * Points with their system and area in one row: how other modules read this one (through the door), to name a point and to
 * keep to the areas that a person may see.
 */
export const pointDirectory = sqliteView("systems_point_directory", {
  pointId: integer("point_id").notNull(),
  pointCode: text("point_code").notNull(),
  pointName: text("point_name").notNull(),
  isDefaultPoint: integer("is_default_point", { mode: "boolean" }).notNull(),
  isPointInUse: integer("is_point_in_use", { mode: "boolean" }).notNull(),
  systemId: integer("system_id").notNull(),
  systemCode: text("system_code").notNull(),
  systemName: text("system_name").notNull(),
  systemState: text("system_state", { enum: SYSTEM_STATES }).notNull(),
  systemOrder: integer("system_order").notNull(),
  areaId: integer("area_id").notNull(),
  areaCode: text("area_code").notNull(),
  areaName: text("area_name").notNull(),
  areaOrder: integer("area_order").notNull(),
}).as(sql`
  select p.id as point_id, p.code as point_code, p.name as point_name, p.is_default as is_default_point,
    p.is_in_use as is_point_in_use, s.id as system_id, s.code as system_code, s.name as system_name,
    s.state as system_state, s.walking_order as system_order, a.id as area_id, a.code as area_code,
    a.name as area_name, a.walking_order as area_order
  from systems_point p join systems_system s on s.id = p.system_id join systems_area a on a.id = s.area_id`);
