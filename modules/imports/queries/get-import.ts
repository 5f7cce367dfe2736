import { eq, sql } from "drizzle-orm";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { importsMay } from "../abilities";
import { getImportInput, importIdInput } from "../input";
import type { ImportDetail, ImportProgress } from "../model";
import { findProgress } from "../progress";
import { openQuestions } from "../questions";
import { getFileRecord, getImportRecord, type ImportRecord } from "../records";
import { imports } from "../schema";
import { personNames, toImportRow } from "./views";

/** How far the server is; null before it has begun, and for progress of an earlier check. */
function progressOf(db: Parameters<typeof findProgress>[0], row: ImportRecord): ImportProgress | null {
  const found = findProgress(db, row.id);
  if (!found || (row.state !== "uploaded" && found.checkRun !== row.checkRun)) return null;
  const { share, rowsRead, accepted, duplicate, refused, statusCounts, committed } = found;
  return { share, rowsRead, accepted, duplicate, refused, statusCounts, committed };
}

/** One import by id or number, with its open questions and how far the server is. @throws Problem `not-found` */
export const getImport = defineQuery({
  name: "getImport",
  permission: importsMay.read,
  input: getImportInput,
  run(ctx, input): ImportDetail {
    const where =
      "code" in input
        ? sql`lower(${imports.code}) = ${input.code.toLowerCase()}`
        : eq(imports.id, input.importId);
    const row = ctx.db.select().from(imports).where(where).get();
    if (!row) throw notFound("such import");
    const file = getFileRecord(ctx.db, row.fileId);
    const nameOf = personNames(ctx);
    return {
      ...toImportRow(row, file, nameOf),
      sha256: file.sha256,
      kind: file.kind,
      header: row.header,
      answers: row.answers,
      defaults: row.defaults,
      sheet: row.sheet,
      ...(row.state === "questions" ? openQuestions(ctx.db, row) : { questions: [], systemQuestion: null }),
      statusCounts: row.statusCounts,
      progress: progressOf(ctx.db, row),
      checkedAt: row.checkedAt,
      committedByName: nameOf(row.committedBy),
      withdrawnAt: row.withdrawnAt,
      withdrawnByName: nameOf(row.withdrawnBy),
      withdrawnReason: row.withdrawnReason,
    };
  },
});

/** Where the file of an import lies, for handing it out as it came. @throws Problem `not-found` */
export const getOriginal = defineQuery({
  name: "getOriginal",
  permission: importsMay.read,
  input: importIdInput,
  run(ctx, { importId }): { fileName: string; storedPath: string; bytes: number; code: string } {
    const row = getImportRecord(ctx.db, importId);
    const file = getFileRecord(ctx.db, row.fileId);
    return { fileName: row.fileName, storedPath: file.storedPath, bytes: file.bytes, code: row.code };
  },
});
