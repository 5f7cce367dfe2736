import { notFound } from "@/lib/problem";
import { defineQuery } from "@/modules/audit";
import { allParameters } from "@/modules/methods";
import { signaturesUnder } from "@/modules/signoff";
import { listAreas } from "@/modules/systems";
import { z } from "zod";
import { roundsMay } from "../abilities";
import { type DaySheet, daySheet, newestReview } from "../day-sheet";
import { sheetKey } from "../input";
import { countSheet, reviewHindrances, sheetState } from "../rules/sheet-state";

/** One area's day as a lead reviews it: lines, gaps, counts, state, signatures, and what hinders a review by this person. */
export const getDaySheet = defineQuery({
  name: "getDaySheet",
  permission: roundsMay.read,
  input: sheetKey,
  run(ctx, { areaId, onDay }) {
    const area = listAreas.run(ctx, {}).find((each) => each.id === areaId);
    if (!area) throw notFound("such area");
    const sheet = daySheet(ctx.db, areaId, onDay);
    const newest = newestReview(ctx.db, areaId, onDay);
    return {
      sheet,
      area: { id: area.id, code: area.code, name: area.name },
      counts: countSheet(sheet.lines, sheet.gaps),
      state: sheetState(newest, sheet.contentHash),
      newest,
      signatures: signaturesUnder(ctx.db, { type: "day-sheet", id: `${areaId}/${onDay}` }, sheet.contentHash),
      hindrances: ctx.actor.personId === null ? [] : reviewHindrances(sheet.lines, ctx.actor.personId),
      parameters: allParameters(ctx.db),
    };
  },
});

export type DaySheetShown = ReturnType<(typeof getDaySheet)["run"]>;

/** The sheets of a span of operational days, newest day first, without their lines. */
export const listDaySheets = defineQuery({
  name: "listDaySheets",
  permission: roundsMay.read,
  input: z.strictObject({ days: z.string().transform((text) => text.split(",")).pipe(z.array(z.iso.date()).min(1).max(31)) }),
  run(ctx, { days }) {
    const areas = listAreas.run(ctx, {});
    return days.flatMap((onDay) =>
      areas.map((area) => {
        const sheet: DaySheet = daySheet(ctx.db, area.id, onDay);
        const newest = newestReview(ctx.db, area.id, onDay);
        return {
          areaId: area.id,
          areaCode: area.code,
          areaName: area.name,
          onDay,
          contentHash: sheet.contentHash,
          counts: countSheet(sheet.lines, sheet.gaps),
          state: sheetState(newest, sheet.contentHash),
          reviewedAt: newest?.reviewedAt ?? null,
          reviewedBy: newest?.reviewedBy ?? null,
          hindrances: ctx.actor.personId === null ? [] : reviewHindrances(sheet.lines, ctx.actor.personId),
        };
      }),
    );
  },
});
