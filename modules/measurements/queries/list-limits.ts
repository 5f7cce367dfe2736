import { and, asc, desc, eq } from "drizzle-orm";
import { z } from "zod";
import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { contentHash, signaturesUnder } from "@/modules/signoff";
import { pointDirectory } from "@/modules/systems";
import { measurementsMay } from "../abilities";
import { workbookRows } from "../commands/decide-limits";
import { limitTemplate, limitVersion, limitWorkbook } from "../schema";

const id = z.coerce.number().int().positive();

/** Every version of the limits of a system's points, newest first. */
export const listLimits = defineQuery({
  name: "listLimits",
  permission: measurementsMay.read,
  input: z.strictObject({ systemId: id }),
  run(ctx, { systemId }) {
    return ctx.db
      .select()
      .from(limitVersion)
      .innerJoin(limitWorkbook, eq(limitWorkbook.id, limitVersion.workbookId))
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, limitVersion.pointId))
      .where(
        and(eq(pointDirectory.systemId, systemId), ctx.inMyAreas(pointDirectory.areaId)),
      )
      .orderBy(asc(limitVersion.pointId), asc(limitVersion.parameterId), desc(limitVersion.version))
      .all()
      .map((row) => ({
        ...row.measurements_limit_version,
        workbook: row.measurements_limit_workbook,
        place: row.systems_point_directory,
      }));
  },
});

/** Workbooks of limits by state, newest first. */
export const listLimitWorkbooks = defineQuery({
  name: "listLimitWorkbooks",
  permission: measurementsMay.read,
  input: z.strictObject({ state: z.enum(["proposed", "approved", "declined"]).optional() }),
  run(ctx, { state }) {
    return ctx.db
      .select()
      .from(limitWorkbook)
      .where(state === undefined ? undefined : eq(limitWorkbook.state, state))
      .orderBy(desc(limitWorkbook.id))
      .limit(200)
      .all();
  },
});

/** One workbook with its rows, what was in force before each, and the signatures under it. */
export const getLimitWorkbook = defineQuery({
  name: "getLimitWorkbook",
  permission: measurementsMay.read,
  input: z.strictObject({ workbookId: id }),
  run(ctx, { workbookId }) {
    const workbook = ctx.db.select().from(limitWorkbook).where(eq(limitWorkbook.id, workbookId)).get();
    if (!workbook) throw notFound("such workbook of limits");
    const rows = workbookRows(ctx.db, workbookId).map((row) => {
      const place = ctx.db.select().from(pointDirectory).where(eq(pointDirectory.pointId, row.pointId)).get();
      const before = ctx.db
        .select()
        .from(limitVersion)
        .where(
          and(
            eq(limitVersion.pointId, row.pointId),
            eq(limitVersion.parameterId, row.parameterId),
            eq(limitVersion.state, "approved"),
          ),
        )
        .orderBy(desc(limitVersion.version))
        .all()
        .find((version) => version.version < row.version);
      return { ...row, place: place ?? null, before: before ?? null };
    });
    const hash = contentHash(workbookRows(ctx.db, workbookId));
    return { workbook, rows, contentHash: hash, signatures: signaturesUnder(ctx.db, { type: "limit-workbook", id: workbookId }, hash) };
  },
});

/** Templates of limits by name. */
export const listLimitTemplates = defineQuery({
  name: "listLimitTemplates",
  permission: measurementsMay.read,
  input: z.strictObject({}),
  run(ctx) {
    return ctx.db.select().from(limitTemplate).orderBy(asc(limitTemplate.name)).all();
  },
});
