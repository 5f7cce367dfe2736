import { and, asc, eq, gt, gte, lte, or } from "drizzle-orm";
import { z } from "zod";
import { type Command, defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { judgeAndStore } from "../judge";
import { approvedVersions } from "../limits";
import { JUDGEMENT_CAUSES } from "../model";
import { readingInForce } from "../schema";

const inputSchema = z.strictObject({
  pointId: z.number().int(),
  parameterId: z.number().int(),
  fromAt: z.number().int(),
  toAt: z.number().int().nullable(),
  cause: z.enum(JUDGEMENT_CAUSES),
  after: z.strictObject({ takenAt: z.number().int(), id: z.number().int() }).nullable().default(null),
});

/** Readings judged in one slice, so that nobody who walks a round waits. */
const SLICE = 100;

/** Judges the readings of a point and parameter again, oldest first, slice by slice; each slice asks for the next. */
export const judgeSeriesAgain: Command<typeof inputSchema, { judged: number }> = defineCommand({
  verb: "judgeSeriesAgain",
  permission: measurementsMay.judgeAgain,
  input: inputSchema,
  run(ctx, input) {
    const { pointId, parameterId, fromAt, toAt, cause, after } = input;
    const rows = ctx.db
      .select()
      .from(readingInForce)
      .where(
        and(
          eq(readingInForce.pointId, pointId),
          eq(readingInForce.parameterId, parameterId),
          gte(readingInForce.takenAt, after?.takenAt ?? fromAt),
          toAt === null ? undefined : lte(readingInForce.takenAt, toAt),
          after === null
            ? undefined
            : or(
                gt(readingInForce.takenAt, after.takenAt),
                and(eq(readingInForce.takenAt, after.takenAt), gt(readingInForce.id, after.id)),
              ),
        ),
      )
      .orderBy(asc(readingInForce.takenAt), asc(readingInForce.id))
      .limit(SLICE)
      .all();
    const parameter = getParameter(ctx.db, parameterId);
    const versions = approvedVersions(ctx.db, pointId, parameterId);
    for (const row of rows) judgeAndStore(ctx.db, row, ctx.at, cause, { parameter, versions });
    const last = rows.at(-1);
    if (last && rows.length === SLICE) {
      ctx.enqueue(judgeSeriesAgain, { ...input, after: { takenAt: last.takenAt, id: last.id } });
    }
    return {
      result: { judged: rows.length },
      event: {
        kind: measurementsEvents.judgedAgain,
        payload: { pointId, parameterId, cause, judged: rows.length },
      },
    };
  },
});
