import { listDaySheets, reviewDays } from "@/modules/rounds";
import type { Stage } from "./stage";

/** Days that wait for a lead when the demonstration opens: yesterday's sheets, and today's. */
const NOT_YET = 1;

/** On the morning after, the lead signs the day's sheets in one act; one sheet goes back first. */
export function seedReview(stage: Stage, daysAgo: number): void {
  if (daysAgo <= NOT_YET) return;
  const at = stage.moment(daysAgo - 1, "11:30");
  stage.plan(at, () => review(stage, daysAgo, at));
}

function review(stage: Stage, daysAgo: number, at: number): void {
  const sheets = stage
    .ask("ines", listDaySheets, { days: stage.day(daysAgo) })
    .filter((sheet) => sheet.counts.readings > 0 && sheet.hindrances.length === 0)
    .map(({ areaId, onDay, contentHash }) => ({ areaId, onDay, contentHash }));
  const returned = daysAgo === 3 ? sheets.filter((sheet) => sheet.areaId === stage.areaIds.get("DRIFT")) : [];
  const reviewed = sheets.filter((sheet) => !returned.includes(sheet));
  if (returned.length > 0) {
    const comment = "JELLY-02: please look at salinity again, it does not fit the day before.";
    stage.act("ines", at, reviewDays, { outcome: "returned", comment, sheets: returned });
  }
  if (reviewed.length > 0)
    stage.act("ines", at + 60_000, reviewDays, { outcome: "reviewed", comment: "", sheets: reviewed });
}
