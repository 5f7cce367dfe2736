import { and, asc, desc, eq, inArray } from "drizzle-orm";
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
      .where(and(eq(pointDirectory.systemId, systemId), ctx.inMyAreas(pointDirectory.areaId)))
      .orderBy(asc(limitVersion.pointId), asc(limitVersion.parameterId), desc(limitVersion.version))
      .all()
      .map((row) => ({
        ...row.measurements_limit_version,
        workbook: row.measurements_limit_workbook,
        place: row.systems_point_directory,
      }));
  },
});

/** Workbooks of limits by state, newest first; those that touch no water that the actor may see are left out. */
export const listLimitWorkbooks = defineQuery({
  name: "listLimitWorkbooks",
  permission: measurementsMay.read,
  input: z.strictObject({ state: z.enum(["proposed", "approved", "declined"]).optional() }),
  run(ctx, { state }) {
    const touchingMyAreas = ctx.db
      .select({ id: limitVersion.workbookId })
      .from(limitVersion)
      .innerJoin(pointDirectory, eq(pointDirectory.pointId, limitVersion.pointId))
      .where(ctx.inMyAreas(pointDirectory.areaId));
    return ctx.db
      .select()
      .from(limitWorkbook)
      .where(
        and(
          state === undefined ? undefined : eq(limitWorkbook.state, state),
          ctx.areaIds === null ? undefined : inArray(limitWorkbook.id, touchingMyAreas),
        ),
      )
      .orderBy(desc(limitWorkbook.id))
      .limit(200)
      .all();
  },
});

/** One workbook with its rows of the areas that the actor may see, what was in force before each, and the signatures under it. */
export const getLimitWorkbook = defineQuery({
  name: "getLimitWorkbook",
  permission: measurementsMay.read,
  input: z.strictObject({ workbookId: id }),
  run(ctx, { workbookId }) {
    const workbook = ctx.db.select().from(limitWorkbook).where(eq(limitWorkbook.id, workbookId)).get();
    if (!workbook) throw notFound("such workbook of limits");
    const all = workbookRows(ctx.db, workbookId);
    const rows = all.flatMap((row) => {
      const place = ctx.db.select().from(pointDirectory).where(eq(pointDirectory.pointId, row.pointId)).get();
      if (ctx.areaIds !== null && !(place && ctx.areaIds.includes(place.areaId))) return [];
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
      return [{ ...row, place: place ?? null, before: before ?? null }];
    });
    if (all.length > 0 && rows.length === 0) throw notFound("such workbook of limits");
    const hash = contentHash(all);
    return {
      workbook,
      rows,
      contentHash: hash,
      signatures: signaturesUnder(ctx.db, { type: "limit-workbook", id: workbookId }, hash),
    };
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
