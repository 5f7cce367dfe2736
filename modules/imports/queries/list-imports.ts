import { desc, eq, lt } from "drizzle-orm";
import { defineQuery } from "@/modules/audit";
import { importsMay } from "../abilities";
import { listImportsInput } from "../input";
import type { ImportRow } from "../model";
import { importFile, imports } from "../schema";
import { personNames, toImportRow } from "./views";

/** The imports, newest first, a page at a time. `next` is given as `before` for the page after. */
export const listImports = defineQuery({
  name: "listImports",
  permission: importsMay.read,
  input: listImportsInput,
  run(ctx, { before, limit }): { rows: ImportRow[]; next: number | null } {
    const found = ctx.db
      .select()
      .from(imports)
      .innerJoin(importFile, eq(importFile.id, imports.fileId))
      .where(before === undefined ? undefined : lt(imports.id, before))
      .orderBy(desc(imports.id))
      .limit(limit + 1)
      .all();
    const nameOf = personNames(ctx);
    const page = found.slice(0, limit);
    const rows = page.map(({ imports_import: row, imports_file: file }) => toImportRow(row, file, nameOf));
    return { rows, next: found.length > limit ? (page.at(-1)?.imports_import.id ?? null) : null };
  },
});
