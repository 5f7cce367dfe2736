import { and, desc, eq } from "drizzle-orm";
import { z } from "zod";
import { Problem } from "@/lib/problem";
import { auditMay } from "../abilities";
import { defineQuery, type QueryContext } from "../define-query";
import { mustSeeRecord } from "../record-gates";
import { auditChange } from "../schema";

/** The columns by which people call a record, the best first. */
const NAMING = ["code", "name", "title", "file_name", "original_name"];

function nameOf(ctx: QueryContext, table: string, key: string): string | null {
  try {
    mustSeeRecord(ctx, table, key);
  } catch (cause) {
    if (cause instanceof Problem) return null;
    throw cause;
  }
  const change = ctx.db
    .select({ after: auditChange.after, before: auditChange.before })
    .from(auditChange)
    .where(and(eq(auditChange.tableName, table), eq(auditChange.rowKey, key)))
    .orderBy(desc(auditChange.id))
    .limit(1)
    .get();
  const text = change?.after ?? change?.before;
  if (!text) return null;
  const row = JSON.parse(text) as Record<string, unknown>;
  const column = NAMING.find((name) => typeof row[name] === "string");
  return column === undefined ? null : String(row[column]);
}

/** What people call the records that a page of the history speaks of, by `table/key`; those without a name are left out. */
export const nameRecords = defineQuery({
  name: "nameRecords",
  permission: auditMay.readRecord,
  input: z.strictObject({
    records: z.array(z.strictObject({ table: z.string(), key: z.string() })).max(2000),
  }),
  run(ctx, { records }): Record<string, string> {
    const names: Record<string, string> = {};
    const wanted = new Map(records.map((record) => [`${record.table}/${record.key}`, record]));
    for (const [id, { table, key }] of wanted) {
      const name = nameOf(ctx, table, key);
      if (name !== null) names[id] = name;
    }
    return names;
  },
});
