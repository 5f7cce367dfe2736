import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";

/** A person's name under something: printed name, time, meaning, and the hash of exactly what was signed. Never changed. */
export const signature = sqliteTable(
  "signoff_signature",
  {
    id: integer("id").primaryKey(),
    personId: integer("person_id").notNull(),
    printedName: text("printed_name").notNull(),
    roles: text("roles").notNull(),
    meaning: text("meaning").notNull(),
    comment: text("comment"),
    signedAt: integer("signed_at").notNull(),
    subjectType: text("subject_type").notNull(),
    subjectId: text("subject_id").notNull(),
    contentHash: text("content_hash").notNull(),
    entryId: integer("entry_id").notNull(),
  },
  (table) => [index("signoff_signature_subject").on(table.subjectType, table.subjectId)],
);
