import { and, desc, eq, notInArray } from "drizzle-orm";
import { z } from "zod";
import { settings } from "@/lib/env";
import { invariant } from "@/lib/invariant";
import { Problem } from "@/lib/problem";
import { epochToLocal, formatLocal } from "@/lib/zone";
import { type CommandContext, defineCommand } from "@/modules/audit";
import { importsMay } from "../abilities";
import { importsEvents } from "../events";
import { fileNameInput } from "../input";
import { type FileHeader, IMPORT_STATE_WORDS, type ImportState } from "../model";
import { nextImportCode, storageKey } from "../records";
import { importFile, imports } from "../schema";
import { CHECK_IMPORT } from "../work";

const input = z.strictObject({ name: fileNameInput, header: z.custom<FileHeader>() });

/** States in which an import of a file stands in the way of another one. */
const GONE: ImportState[] = ["withdrawn", "discarded", "failed"];

/** @throws Problem `conflict` where the same bytes have been imported, or are about to be. */
export function mustBeNew(db: CommandContext["db"], sha256: string): void {
  const known = db
    .select({ code: imports.code, state: imports.state, committedAt: imports.committedAt })
    .from(imports)
    .innerJoin(importFile, eq(importFile.id, imports.fileId))
    .where(and(eq(importFile.sha256, sha256), notInArray(imports.state, GONE)))
    .orderBy(desc(imports.id))
    .get();
  if (!known) return;
  const detail =
    known.committedAt === null
      ? `This file is here already as import ${known.code}, which is ${IMPORT_STATE_WORDS[known.state]}. Go on with that one, or discard it first.`
      : `This file was imported on ${formatLocal(known.committedAt, settings().STILLWELL_ZONE)} as ${known.code}; the same file adds nothing. If that import was wrong, withdraw it first.`;
  throw new Problem("conflict", detail, [{ pointer: "/file", code: "already-imported", detail: known.code }]);
}

function fileOf(ctx: CommandContext, { name, header }: z.output<typeof input>, personId: number): number {
  const known = ctx.db
    .select({ id: importFile.id })
    .from(importFile)
    .where(eq(importFile.sha256, header.sha256))
    .get();
  if (known) return known.id;
  const { sha256, bytes, kind } = header;
  return ctx.db
    .insert(importFile)
    .values({
      sha256,
      originalName: name,
      bytes,
      kind,
      storedPath: storageKey(sha256),
      uploadedBy: personId,
      uploadedAt: ctx.at,
    })
    .returning({ id: importFile.id })
    .get().id;
}

/** Takes a file that has arrived and can be read as the beginning of an import; its rows are looked through next. */
export const registerUpload = defineCommand({
  verb: "registerUpload",
  permission: importsMay.upload,
  input,
  // Which systems the rows name is not known yet: rows outside a person's own areas are refused one by one.
  areas: () => [],
  run(ctx, given) {
    const personId = ctx.actor.personId;
    invariant(personId !== null, "a person uploads a file");
    mustBeNew(ctx.db, given.header.sha256);
    const year = Number(epochToLocal(ctx.at, settings().STILLWELL_ZONE).on.slice(0, 4));
    const code = nextImportCode(ctx.db, year);
    const row = ctx.db
      .insert(imports)
      .values({
        code,
        fileId: fileOf(ctx, given, personId),
        fileName: given.name,
        state: "uploaded",
        form: given.header.columnMap.form,
        header: given.header,
        answers: {},
        defaults: {},
        uploadedBy: personId,
        uploadedAt: ctx.at,
      })
      .returning({ id: imports.id })
      .get();
    ctx.enqueue(CHECK_IMPORT, { importId: row.id });
    return {
      result: { importId: row.id, code },
      event: {
        kind: importsEvents.uploaded,
        subject: { type: "import", id: row.id },
        payload: { code, name: given.name, sha256: given.header.sha256, bytes: given.header.bytes },
      },
    };
  },
});
