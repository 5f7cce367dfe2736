import "server-only";
import { lastDays } from "@/app/_server/facility-day";
import { askPage } from "@/app/_server/session";
import { waitingFor } from "@/app/_server/waiting";
import { type Actor, may } from "@/modules/access";
import { measurementsMay } from "@/modules/measurements";
import { listInstruments, methodsMay } from "@/modules/methods";
import { type DaySheetRow, listDaySheets, roundsMay } from "@/modules/rounds";
import { weekdayWords } from "@/modules/rounds/ui/sheet-words";
import type { WaitingItem } from "@/modules/rounds/ui/waiting-list";

const DAYS_BACK = 14;
const many = (count: number, one: string, more: string): string => `${count} ${count === 1 ? one : more}`;

function reviewItems(sheets: readonly DaySheetRow[]): WaitingItem[] {
  const waiting = sheets.filter(
    ({ state, isOver, counts }) =>
      isOver && (state === "waiting" || state === "changed") && counts.readings + counts.gaps > 0,
  );
  if (waiting.length === 0) return [];
  const out = waiting.reduce((sum, { counts }) => sum + counts.out + counts.implausible, 0);
  const isReady = waiting.filter(({ hindrances }) => hindrances.length === 0).length;
  return [
    {
      href: "/review",
      label: `${many(waiting.length, "day sheet waits", "day sheets wait")} for review`,
      says: `${isReady} can be signed by you now; ${out === 0 ? "nothing on them is off" : `${many(out, "reading is", "readings are")} off`}.`,
    },
  ];
}

/** What a person who walks rounds has left to do: returned sheets, values to confirm, gaps of today. */
function roundItems(sheets: readonly DaySheetRow[], today: string): WaitingItem[] {
  return sheets.flatMap((sheet): WaitingItem[] => {
    const { areaCode, areaName, onDay, counts, state, comment } = sheet;
    const href = `/rounds/${areaCode}/${onDay}`;
    const where = `${areaName}, ${onDay === today ? "today" : weekdayWords(onDay)}`;
    const items: WaitingItem[] = [];
    if (state === "returned")
      items.push({ href, label: `Returned: ${where}`, says: comment ? `“${comment}”` : "" });
    if (counts.unconfirmed > 0) {
      const label = `${many(counts.unconfirmed, "reading", "readings")} to confirm or measure again`;
      items.push({ href, label, says: where });
    }
    if (onDay === today && counts.gaps > 0) {
      items.push({ href: `${href}#gaps`, label: `${counts.gaps} not read yet`, says: where });
    }
    return items;
  });
}

async function instrumentItems(actor: Actor): Promise<WaitingItem[]> {
  if (!may(actor, methodsMay.checkInstruments)) return [];
  const instruments = await askPage(listInstruments, {});
  return instruments
    .filter(({ due, state }) => due.isOverdue && state === "in-use")
    .map(({ code, name, due }) => ({
      href: `/setup/instruments/${code}`,
      label: `Check ${code}, ${name}`,
      says:
        due.dueOn === null ? "It has never been checked." : `The check was due ${weekdayWords(due.dueOn)}.`,
    }));
}

/** Everything that waits for this person, by what their roles let them do. */
export async function waitsForMe(
  actor: Actor,
  names: Readonly<Record<number, string>>,
): Promise<WaitingItem[]> {
  const days = lastDays(DAYS_BACK);
  const sheets = await askPage(listDaySheets, { days: days.join(",") });
  const { decisions, own } = await waitingFor(actor, names);
  return [
    ...(may(actor, roundsMay.review) ? reviewItems(sheets) : []),
    ...decisions,
    // those who walk rounds; a lead finds the same on the sheets
    ...(may(actor, measurementsMay.record) && !may(actor, roundsMay.review)
      ? roundItems(sheets, days[0] ?? "")
      : []),
    ...(await instrumentItems(actor)),
    ...own,
  ];
}
