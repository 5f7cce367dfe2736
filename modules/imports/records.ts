import { desc, eq, like } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { notFound, Problem } from "@/lib/problem";
import { IMPORT_STATE_WORDS, type ImportState } from "./model";
import { importFile, imports } from "./schema";

export type ImportRecord = typeof imports.$inferSelect;
export type FileRecord = typeof importFile.$inferSelect;

/** @throws Problem `not-found` */
export function getImportRecord(db: Orm, importId: number): ImportRecord {
  const row = db.select().from(imports).where(eq(imports.id, importId)).get();
  if (!row) throw notFound("such import");
  return row;
}

/** The file of an import. */
export function getFileRecord(db: Orm, fileId: number): FileRecord {
  const row = db.select().from(importFile).where(eq(importFile.id, fileId)).get();
  invariant(row, "an import has its file");
  return row;
}

/** An import in one of these states. @throws Problem `not-found`, `conflict` where it stands elsewhere. */
export function getImportIn(db: Orm, importId: number, states: readonly ImportState[]): ImportRecord {
  const row = getImportRecord(db, importId);
  if (states.includes(row.state)) return row;
  const meanwhile = IMPORT_STATE_WORDS[row.state];
  throw new Problem("conflict", `Import ${row.code} ${standing(row.state)} ${meanwhile}. Look at it again.`);
}

const standing = (state: ImportState): string =>
  state === "questions" || state === "checked" || state === "failed" ? "meanwhile" : "is";

/** The next number of a year: `I26-0001`, `I26-0002` … */
export function nextImportCode(db: Orm, year: number): string {
  const prefix = `I${String(year % 100).padStart(2, "0")}-`;
  const newest = db
    .select({ code: imports.code })
    .from(imports)
    .where(like(imports.code, `${prefix}%`))
    .orderBy(desc(imports.id))
    .limit(1)
    .get();
  const count = newest ? Number(newest.code.slice(prefix.length)) : 0;
  return `${prefix}${String(count + 1).padStart(4, "0")}`;
}

/** Where the bytes of a file lie in the store of uploads. */
export const storageKey = (sha256: string): string => `uploads/${sha256}`;
