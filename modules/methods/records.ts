import { and, eq, ne, sql } from "drizzle-orm";
import type { SQLiteColumn, SQLiteTable } from "drizzle-orm/sqlite-core";
import type { Orm } from "@/db/database";
import { invalidField, notFound } from "@/lib/problem";
import { instrument, method } from "./schema";

type CodedTable = SQLiteTable & { id: SQLiteColumn; code: SQLiteColumn; name: SQLiteColumn };

/**
 * Refuses a code or a name that another row has already, whatever its case.
 * @throws Problem `invalid` that points at the field
 */
export function mustBeFree(
  db: Orm,
  table: CodedTable,
  field: "code" | "name",
  text: string,
  exceptId?: number,
): void {
  const same = eq(sql`lower(${table[field]})`, text.toLowerCase());
  const another = exceptId === undefined ? undefined : ne(table.id, exceptId);
  const taken = db.select({ id: table.id }).from(table).where(and(same, another)).get();
  if (taken) throw invalidField(`/${field}`, "taken", `The ${field} ${text} is taken; choose another.`);
}

/** @throws Problem `not-found` */
export function getMethod(db: Orm, methodId: number): typeof method.$inferSelect {
  const row = db.select().from(method).where(eq(method.id, methodId)).get();
  if (!row) throw notFound("such method");
  return row;
}

/** @throws Problem `not-found` */
export function getInstrumentById(db: Orm, instrumentId: number): typeof instrument.$inferSelect {
  const row = db.select().from(instrument).where(eq(instrument.id, instrumentId)).get();
  if (!row) throw notFound("such instrument");
  return row;
}
