import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { REVIEW_OUTCOMES } from "./model";

/** A lead's decision on what an area read on an operational day: appended, the newest counts. */
export const dayReview = sqliteTable(
  "rounds_day_review",
  {
    id: integer("id").primaryKey(),
    areaId: integer("area_id").notNull(),
    /** The operational day. */
    onDay: text("on_day").notNull(),
    outcome: text("outcome", { enum: REVIEW_OUTCOMES }).notNull(),
    comment: text("comment"),
    contentHash: text("content_hash").notNull(),
    signatureId: integer("signature_id").notNull(),
    reviewedBy: integer("reviewed_by").notNull(),
    reviewedAt: integer("reviewed_at").notNull(),
  },
  (table) => [index("rounds_day_review_sheet").on(table.areaId, table.onDay, table.id)],
);
