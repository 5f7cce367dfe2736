import { and, eq, ne, type SQL, sql } from "drizzle-orm";
import type { SQLiteColumn, SQLiteTable } from "drizzle-orm/sqlite-core";
import type { Orm } from "@/db/database";
import { Problem } from "@/lib/problem";

type CodedTable = SQLiteTable & { id: SQLiteColumn; code: SQLiteColumn };

/**
 * Refuses a code that another row has already, whatever its case; `within` narrows to rows of one system.
 * @throws Problem `invalid` that points at `/code`
 */
export function mustBeFreeCode(
  db: Orm,
  table: CodedTable,
  code: string,
  options: { exceptId?: number; within?: SQL } = {},
): void {
  const sameCode = eq(sql`lower(${table.code})`, code.toLowerCase());
  const another = options.exceptId === undefined ? undefined : ne(table.id, options.exceptId);
  const taken = db
    .select({ id: table.id })
    .from(table)
    .where(and(sameCode, another, options.within))
    .get();
  if (!taken) return;
  const detail = `The code ${code} is taken; choose another.`;
  throw new Problem("invalid", detail, [{ pointer: "/code", code: "taken", detail }]);
}
