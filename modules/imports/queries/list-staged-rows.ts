import { and, asc, eq, gt, inArray } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { importsMay } from "../abilities";
import { listStagedRowsInput } from "../input";
import type { StagedPage, StagedRowView } from "../model";
import { getImportRecord } from "../records";
import { stagedRow } from "../schema";

/** The readings that a file offers, in the order of the file, by what came of them. `next` is given as `after`. */
export const listStagedRows = defineQuery({
  name: "listStagedRows",
  permission: importsMay.read,
  input: listStagedRowsInput,
  run(ctx, { importId, outcome, off, after, limit }): StagedPage {
    const { header } = getImportRecord(ctx.db, importId);
    const rows = ctx.db
      .select()
      .from(stagedRow)
      .where(
        and(
          eq(stagedRow.importId, importId),
          outcome === "all" ? undefined : eq(stagedRow.outcome, outcome),
          off === "1" ? inArray(stagedRow.expectedStatus, ["out", "implausible"]) : undefined,
          gt(stagedRow.id, after),
        ),
      )
      .orderBy(asc(stagedRow.id))
      .limit(limit + 1)
      .all();
    const page = rows.slice(0, limit).map(
      (row): StagedRowView => ({
        id: row.id,
        line: row.line,
        columnName: header.columnMap.columns[row.column]?.header ?? null,
        outcome: row.outcome,
        texts: row.candidate.texts,
        remarks: row.candidate.remarks,
        problems: row.problems,
        expectedStatus: row.expectedStatus,
        expectedSentence: row.expectedSentence,
      }),
    );
    return { rows: page, next: rows.length > limit ? (page.at(-1)?.id ?? null) : null };
  },
});
