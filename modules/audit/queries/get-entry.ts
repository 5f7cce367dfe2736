import { and, asc, desc, eq, gt, lt } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineQuery } from "../define-query";
import { supersededBy } from "../lineage";
import { auditChange, auditEntry } from "../schema";

const CHANGES_SHOWN = 50;

/** One entry with its changes, before and after; an entry may have thousands of changes, so they come by pages. */
export const getEntry = defineQuery({
  name: "getEntry",
  permission: auditMay.readHistory,
  input: z.strictObject({
    entryId: z.coerce.number().int().positive(),
    /** Changes after this one (its number), or before that one. */
    afterChange: z.coerce.number().int().min(0).optional(),
    beforeChange: z.coerce.number().int().min(0).optional(),
    limit: z.coerce.number().int().min(1).max(200).default(CHANGES_SHOWN),
  }),
  run(ctx, { entryId, afterChange, beforeChange, limit }) {
    const entry = ctx.db.select().from(auditEntry).where(eq(auditEntry.id, entryId)).get();
    if (!entry) throw notFound("such entry");
    const backwards = beforeChange !== undefined;
    const rows = ctx.db
      .select()
      .from(auditChange)
      .where(
        and(
          eq(auditChange.entryId, entryId),
          afterChange === undefined ? undefined : gt(auditChange.id, afterChange),
          beforeChange === undefined ? undefined : lt(auditChange.id, beforeChange),
        ),
      )
      .orderBy(backwards ? desc(auditChange.id) : asc(auditChange.id))
      .limit(limit + 1)
      .all();
    const changes = rows.slice(0, limit).map((row) => ({
      ...row,
      superseded: row.operation === "insert" ? supersededBy(ctx.db, row.tableName, row.after) : null,
    }));
    if (backwards) changes.reverse();
    const more = rows.length > limit;
    return {
      entry,
      changes,
      hasEarlier: backwards ? more : (afterChange ?? 0) > 0,
      hasLater: backwards ? true : more,
    };
  },
});

export type EntryWithChanges = ReturnType<typeof getEntry.run>;
