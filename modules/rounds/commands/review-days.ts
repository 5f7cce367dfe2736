import type { Orm } from "@/db/database";
import { invariant } from "@/lib/invariant";
import { type FieldProblem, invalidField, Problem } from "@/lib/problem";
import { defineCommand } from "@/modules/audit";
import { sign } from "@/modules/signoff";
import { roundsMay } from "../abilities";
import { type DaySheet, daySheets, newestReviews, type Review } from "../day-sheet";
import { roundsEvents } from "../events";
import { reviewDaysInput } from "../input";
import type { ReviewOutcome } from "../model";
import { reviewHindrances, sheetState } from "../rules/sheet-state";
import { dayReview } from "../schema";

type Asked = { areaId: number; onDay: string; contentHash: string };
type Found = { sheet: DaySheet; newest: Review | null };

/** The sheets asked for as they are now, each day read once for all its areas; in the order asked. */
function sheetsAsked(db: Orm, asked: readonly Asked[]): Found[] {
  const days = [...new Set(asked.map((each) => each.onDay))];
  const sheets = days.flatMap((onDay) =>
    daySheets(
      db,
      [...new Set(asked.filter((each) => each.onDay === onDay).map((each) => each.areaId))],
      [onDay],
    ),
  );
  const newestOf = newestReviews(db, days);
  return asked.map(({ areaId, onDay }) => {
    const sheet = sheets.find((each) => each.areaId === areaId && each.onDay === onDay);
    invariant(sheet, "every sheet asked for was made");
    return { sheet, newest: newestOf(areaId, onDay) };
  });
}

function problemsOf(
  asked: Asked,
  { sheet, newest }: Found,
  outcome: ReviewOutcome,
  reviewerId: number,
  pointer: string,
): FieldProblem[] {
  const problem = (code: string, detail: string): FieldProblem => ({
    pointer,
    code,
    detail: `${asked.onDay}: ${detail}`,
  });
  if (sheet.contentHash !== asked.contentHash) {
    return [
      problem("changed", "the sheet has changed since you opened it. Look at it again before you sign."),
    ];
  }
  if (sheet.lines.length === 0 && sheet.gaps.length === 0)
    return [problem("empty", "there is nothing on this sheet.")];
  const state = sheetState(newest, sheet.contentHash);
  if (state === "reviewed") return [problem("reviewed", "this sheet has been reviewed already.")];
  if (outcome === "returned") return [];
  return reviewHindrances(sheet.lines, reviewerId).map((detail) =>
    problem(detail.startsWith("You took") ? "own-work" : "not-ready", detail),
  );
}

/**
 * A lead signs day sheets, many in one act: reviewed, or returned with a comment. Nobody reviews a sheet on which they took
 * or entered a reading; what is off must be confirmed or measured again before.
 */
export const reviewDays = defineCommand({
  verb: "reviewDays",
  permission: roundsMay.review,
  input: reviewDaysInput,
  signed: true,
  run(ctx, { outcome, comment, sheets }) {
    const reviewer = ctx.actor.personId;
    invariant(reviewer !== null, "a person reviews");
    if (outcome === "returned" && comment.length < 3) {
      throw invalidField("/comment", "required", "Say what is to be done before it can be reviewed.");
    }
    const problems = sheetsAsked(ctx.db, sheets).flatMap((found, index) => {
      const asked = sheets[index];
      invariant(asked, "found in the order asked");
      return problemsOf(asked, found, outcome, reviewer, `/sheets/${index}`);
    });
    const own = problems.find((problem) => problem.code === "own-work");
    if (own) throw new Problem("own-work", own.detail, problems);
    if (problems.length > 0) throw new Problem("conflict", problems[0]?.detail ?? "", problems);
    for (const { areaId, onDay, contentHash } of sheets) {
      const signatureId = sign(ctx, {
        subject: { type: "day-sheet", id: `${areaId}/${onDay}` },
        meaning: outcome,
        comment: comment === "" ? null : comment,
        contentHash,
      });
      ctx.db
        .insert(dayReview)
        .values({
          areaId,
          onDay,
          outcome,
          comment: comment === "" ? null : comment,
          contentHash,
          signatureId,
          reviewedBy: reviewer,
          reviewedAt: ctx.at,
        })
        .run();
    }
    return {
      result: { sheets: sheets.length, outcome },
      event: {
        kind: outcome === "reviewed" ? roundsEvents.reviewed : roundsEvents.returned,
        ...(sheets.length === 1 && sheets[0]
          ? { subject: { type: "day-sheet", id: `${sheets[0].areaId}/${sheets[0].onDay}` } }
          : {}),
        payload: { sheets: sheets.map(({ areaId, onDay }) => `${areaId}/${onDay}`) },
        reason: comment === "" ? null : comment,
      },
    };
  },
});
