import { sql } from "drizzle-orm";
import { index, integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { INCIDENT_STATES } from "./model";

/** A trouble taken up: what, where, who is waited for, and how it ended. */
export const incident = sqliteTable(
  "quality_incident",
  {
    id: integer("id").primaryKey(),
    /** `26-0007`: the year in which it was opened and a count within it. */
    code: text("code").notNull(),
    systemId: integer("system_id").notNull(),
    /** Both null where it was opened by hand for a system as a whole. */
    pointId: integer("point_id"),
    parameterId: integer("parameter_id"),
    title: text("title").notNull(),
    state: text("state", { enum: INCIDENT_STATES }).notNull(),
    ownerId: integer("owner_id").notNull(),
    /** When the first reading of the trouble was taken; rechecks are later. */
    beganAt: integer("began_at").notNull(),
    openedAt: integer("opened_at").notNull(),
    openedBy: integer("opened_by").notNull(),
    recheckDueAt: integer("recheck_due_at"),
    /** The newest recheck, whatever it showed. */
    recheckReadingId: integer("recheck_reading_id"),
    closedAt: integer("closed_at"),
    closedBy: integer("closed_by"),
    closureText: text("closure_text"),
    /** Why it was closed although the newest reading was still off. */
    stillOffReason: text("still_off_reason"),
  },
  (table) => [
    uniqueIndex("quality_incident_code").on(table.code),
    uniqueIndex("quality_incident_one_open")
      .on(table.pointId, table.parameterId)
      .where(sql`${table.state} <> 'closed' and ${table.pointId} is not null`),
    index("quality_incident_state").on(table.state, table.recheckDueAt),
    index("quality_incident_system").on(table.systemId),
  ],
);

/** A reading of the same trouble. A reading belongs to one incident. */
export const incidentReading = sqliteTable(
  "quality_incident_reading",
  {
    id: integer("id").primaryKey(),
    incidentId: integer("incident_id")
      .notNull()
      .references(() => incident.id),
    readingId: integer("reading_id").notNull(),
    joinedBy: integer("joined_by").notNull(),
    joinedAt: integer("joined_at").notNull(),
  },
  (table) => [
    uniqueIndex("quality_incident_reading_once").on(table.readingId),
    index("quality_incident_reading_incident").on(table.incidentId),
  ],
);

/** What was seen or done. */
export const incidentNote = sqliteTable(
  "quality_incident_note",
  {
    id: integer("id").primaryKey(),
    incidentId: integer("incident_id")
      .notNull()
      .references(() => incident.id),
    text: text("text").notNull(),
    notedBy: integer("noted_by").notNull(),
    notedAt: integer("noted_at").notNull(),
  },
  (table) => [index("quality_incident_note_incident").on(table.incidentId)],
);
