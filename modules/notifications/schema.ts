import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { MAIL_STATES } from "./model";

/** Mail that is to go out: written in the transaction of the command that causes it, sent after COMMIT. */
export const mail = sqliteTable(
  "notifications_mail",
  {
    id: integer("id").primaryKey(),
    toAddress: text("to_address").notNull(),
    subject: text("subject").notNull(),
    body: text("body").notNull(),
    kind: text("kind").notNull(),
    state: text("state", { enum: MAIL_STATES }).notNull(),
    causeEntryId: integer("cause_entry_id").notNull(),
    queuedAt: integer("queued_at").notNull(),
    sentAt: integer("sent_at"),
    attempts: integer("attempts").notNull().default(0),
    error: text("error"),
    /** Name of the written file, where mail goes to a folder. */
    fileName: text("file_name"),
  },
  (table) => [index("notifications_mail_queued").on(table.queuedAt)],
);
