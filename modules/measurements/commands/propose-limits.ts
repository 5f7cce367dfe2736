import { and, eq, max } from "drizzle-orm";
import type { z } from "zod";
import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { type FieldProblem, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { getParameter } from "@/modules/methods";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { type limitRowInput, proposeLimitsInput } from "../input";
import { getPoint } from "../points";
import { checkLimitShape } from "../rules/order-of-limits";
import { limitVersion, limitWorkbook } from "../schema";

type Row = z.output<typeof limitRowInput>;

/** What is wrong with one proposed row, as sentences that name the system and the parameter. */
export function rowProblems(db: Orm, row: Row, pointer: string): FieldProblem[] {
  const place = getPoint(db, row.pointId);
  const parameter = getParameter(db, row.parameterId);
  const name = `${place.systemCode} ${place.pointName}, ${parameter.name}`;
  const problems: FieldProblem[] = [];
  if (parameter.kind !== "number" && parameter.kind !== "count" && !row.suspendedReason) {
    problems.push({
      pointer: `${pointer}/shape`,
      code: "no-number",
      detail: `${name}: an answer needs no limits; it says itself what is off.`,
    });
  }
  if (row.effectiveToAt && row.effectiveToAt <= row.effectiveFromAt) {
    problems.push({
      pointer: `${pointer}/effectiveToAt`,
      code: "order",
      detail: `${name}: the limits would end before they begin.`,
    });
  }
  if (row.suspendedReason) return problems;
  for (const problem of checkLimitShape(row.shape, {
    plausible: parameter.plausible,
    decimals: parameter.decimals,
  })) {
    problems.push({
      pointer: `${pointer}/shape`,
      code: problem.code,
      detail: `${name}: ${problem.sentence}`,
    });
  }
  return problems;
}

/** The number that the next version of the limits of a point and parameter has. */
function nextVersion(db: Orm, pointId: number, parameterId: number): number {
  const row = db
    .select({ newest: max(limitVersion.version) })
    .from(limitVersion)
    .where(and(eq(limitVersion.pointId, pointId), eq(limitVersion.parameterId, parameterId)))
    .get();
  return (row?.newest ?? 0) + 1;
}

/** Proposes limits, one or a whole workbook; they hold once another person has approved them. */
export const proposeLimits = defineCommand({
  verb: "proposeLimits",
  permission: measurementsMay.proposeLimits,
  input: proposeLimitsInput,
  run(ctx, input) {
    invariant(ctx.actor.personId !== null, "a person proposes limits");
    const problems = input.rows.flatMap((row, index) => rowProblems(ctx.db, row, `/rows/${index}`));
    if (problems.length > 0)
      throw new Problem("invalid", problems[0]?.detail ?? "Some limits cannot be used.", problems);
    const book = ctx.db
      .insert(limitWorkbook)
      .values({
        title: input.title,
        reason: input.reason,
        state: "proposed",
        proposedBy: ctx.actor.personId,
        proposedAt: ctx.at,
      })
      .returning()
      .get();
    for (const row of input.rows) {
      ctx.db
        .insert(limitVersion)
        .values({
          workbookId: book.id,
          pointId: row.pointId,
          parameterId: row.parameterId,
          version: nextVersion(ctx.db, row.pointId, row.parameterId),
          state: "proposed",
          effectiveFromAt: row.effectiveFromAt,
          effectiveToAt: row.effectiveToAt ?? null,
          shape: row.shape,
          suspendedReason: row.suspendedReason ?? null,
        })
        .run();
    }
    return {
      result: { workbookId: book.id },
      event: {
        kind: measurementsEvents.limitsProposed,
        subject: { type: "limit-workbook", id: book.id },
        payload: { rows: input.rows.length },
        reason: input.reason,
      },
    };
  },
});
