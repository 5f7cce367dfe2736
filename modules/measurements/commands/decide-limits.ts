import { asc, eq } from "drizzle-orm";
import type { Orm } from "@/db/database";
import { notFound, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { mustBeAnother } from "@/modules/identity";
import { contentHash, sign } from "@/modules/signoff";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { decideLimitsInput } from "../input";
import { limitVersion, limitWorkbook } from "../schema";
import { judgeSeriesAgain } from "./judge-series-again";

/** The rows of a workbook as they are signed. */
export function workbookRows(db: Orm, workbookId: number) {
  return db
    .select({
      id: limitVersion.id,
      pointId: limitVersion.pointId,
      parameterId: limitVersion.parameterId,
      version: limitVersion.version,
      effectiveFromAt: limitVersion.effectiveFromAt,
      effectiveToAt: limitVersion.effectiveToAt,
      shape: limitVersion.shape,
      suspendedReason: limitVersion.suspendedReason,
    })
    .from(limitVersion)
    .where(eq(limitVersion.workbookId, workbookId))
    .orderBy(asc(limitVersion.id))
    .all();
}

/** Another person approves or declines a whole workbook of limits in one act, with their signature. */
export const decideLimits = defineCommand({
  verb: "decideLimits",
  permission: measurementsMay.approveLimits,
  input: decideLimitsInput,
  signed: true,
  run(ctx, { workbookId, decision, comment }) {
    const book = ctx.db.select().from(limitWorkbook).where(eq(limitWorkbook.id, workbookId)).get();
    if (!book) throw notFound("such workbook of limits");
    if (book.state !== "proposed")
      throw new Problem("conflict", "These limits have been decided on already.");
    mustBeAnother(ctx.actor.personId, book.proposedBy, "proposal");
    if (decision === "decline" && comment.length < 3) {
      throw new Problem("invalid", "Say why.", [
        { pointer: "/comment", code: "required", detail: "Say why you decline." },
      ]);
    }
    const rows = workbookRows(ctx.db, workbookId);
    const state = decision === "approve" ? "approved" : "declined";
    sign(ctx, {
      subject: { type: "limit-workbook", id: workbookId },
      meaning: decision === "approve" ? "approved" : "declined",
      comment: comment === "" ? null : comment,
      contentHash: contentHash(rows),
    });
    ctx.db
      .update(limitWorkbook)
      .set({ state, decidedBy: ctx.actor.personId, decidedAt: ctx.at, decisionComment: comment })
      .where(eq(limitWorkbook.id, workbookId))
      .run();
    ctx.db.update(limitVersion).set({ state }).where(eq(limitVersion.workbookId, workbookId)).run();
    if (decision === "approve") {
      for (const { pointId, parameterId, effectiveFromAt } of rows) {
        ctx.enqueue(judgeSeriesAgain, {
          pointId,
          parameterId,
          fromAt: effectiveFromAt,
          toAt: null,
          cause: "new-limits",
          after: null,
        });
      }
    }
    return {
      result: { workbookId, state },
      event: {
        kind: decision === "approve" ? measurementsEvents.limitsApproved : measurementsEvents.limitsDeclined,
        subject: { type: "limit-workbook", id: workbookId },
        payload: { rows: rows.length },
        reason: comment === "" ? null : comment,
      },
    };
  },
});
