import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { operationalToday } from "@/app/_server/facility-day";
import { personNames } from "@/app/_server/names";
import { askPage, noSuchRecord, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { PageHead } from "@/lib/ui";
import { addDays, isCalendarDay } from "@/lib/zone";
import { may, mayInArea } from "@/modules/access";
import { measurementsMay } from "@/modules/measurements";
import { qualityMay } from "@/modules/quality";
import { IncidentLink } from "@/modules/quality/ui/incident-link";
import { getDaySheet, roundsMay } from "@/modules/rounds";
import { DaySheetView } from "@/modules/rounds/ui/day-sheet-view";
import { DaySteps } from "@/modules/rounds/ui/day-steps";
import { countWords, dayWords, nameOf, readingsWord, WAITED_FOR } from "@/modules/rounds/ui/sheet-words";
import { listAreas } from "@/modules/systems";

type Props = { params: Promise<{ areaCode: string; day: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { areaCode, day } = await params;
  return { title: `Day sheet ${decodeURIComponent(areaCode)} ${day}` };
}

export default async function DaySheetPage({ params }: Props) {
  const { areaCode, day } = await params;
  if (!isCalendarDay(day)) notFound();
  const code = decodeURIComponent(areaCode).toLowerCase();
  const area = (await askPage(listAreas, {})).find((each) => each.code.toLowerCase() === code);
  if (!area) return noSuchRecord(await pageActor(), "area");
  const shown = await askPage(getDaySheet, { areaId: area.id, onDay: day });
  const [actor, names, today] = [await pageActor(), await personNames(), operationalToday()];
  const { sheet, counts, state, newest } = shown;
  const found = countWords(counts);
  const takers = [...new Set(sheet.lines.map((line) => line.takenBy))].map((id) => nameOf(names, id));
  return (
    <>
      <PageHead
        title={area.name}
        name={`day sheet of ${dayWords(day)}`}
        facts={
          <>
            {readingsWord(counts.readings)}
            {takers.length > 0 && ` by ${takers.join(", ")}`} · {WAITED_FOR[state]}
            {state === "returned" && newest?.comment ? `: “${newest.comment}”` : ""}
            <span className="block">{found.length > 0 ? found.join(" · ") : "nothing deviates"}</span>
          </>
        }
      />
      <div className="mb-5">
        <DaySteps
          before={addDays(day, -1)}
          after={day < today ? addDays(day, 1) : null}
          hrefOf={(on) => `/rounds/${area.code}/${on}`}
        />
      </div>
      <DaySheetView
        {...shown}
        onDay={day}
        lines={sheet.lines}
        gaps={sheet.gaps}
        contentHash={sheet.contentHash}
        names={names}
        zone={settings().STILLWELL_ZONE}
        now={systemClock.now()}
        mayReview={may(actor, roundsMay.review)}
        mayEnter={mayInArea(actor, measurementsMay.record, area.id)}
        besideOff={
          mayInArea(actor, qualityMay.handle, area.id)
            ? (readingId) => <IncidentLink readingId={readingId} />
            : undefined
        }
      />
    </>
  );
}
