import type { QueryContext } from "@/modules/audit";
import { listPersonNames } from "@/modules/identity";
import type { ImportRow } from "../model";
import type { FileRecord, ImportRecord } from "../records";

/** Names of people by id, for records that name people by id. */
export function personNames(ctx: QueryContext): (id: number | null) => string | null {
  const names = new Map(listPersonNames.run(ctx, {}).map((each) => [each.id, each.name]));
  return (id) => (id === null ? null : (names.get(id) ?? "somebody"));
}

/** An import as lists show it. */
export function toImportRow(
  row: ImportRecord,
  file: Pick<FileRecord, "bytes">,
  nameOf: (id: number | null) => string | null,
): ImportRow {
  return {
    id: row.id,
    code: row.code,
    fileName: row.fileName,
    state: row.state,
    form: row.form,
    bytes: file.bytes,
    acceptedCount: row.acceptedCount,
    duplicateCount: row.duplicateCount,
    refusedCount: row.refusedCount,
    uploadedAt: row.uploadedAt,
    uploadedByName: nameOf(row.uploadedBy) ?? "",
    committedAt: row.committedAt,
    problem: row.problem,
  };
}
