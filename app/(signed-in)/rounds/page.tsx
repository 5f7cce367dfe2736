import type { Metadata } from "next";
import { operationalToday } from "@/app/_server/facility-day";
import { personNames } from "@/app/_server/names";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { EmptyState, LinkButton, PageHead } from "@/lib/ui";
import { addDays, isCalendarDay } from "@/lib/zone";
import { may, mayInArea } from "@/modules/access";
import { measurementsMay } from "@/modules/measurements";
import { qualityMay } from "@/modules/quality";
import { IncidentLink } from "@/modules/quality/ui/incident-link";
import { getDaySheet } from "@/modules/rounds";
import { AreaRound } from "@/modules/rounds/ui/area-round";
import { DaySteps } from "@/modules/rounds/ui/day-steps";
import { readingsWord, weekdayWords } from "@/modules/rounds/ui/sheet-words";
import { listAreas } from "@/modules/systems";

export const metadata: Metadata = { title: "Rounds" };

type Props = { searchParams: Promise<{ day?: string | string[] }> };

export default async function RoundsPage({ searchParams }: Props) {
  const today = operationalToday();
  const asked = (await searchParams).day;
  const onDay = typeof asked === "string" && isCalendarDay(asked) && asked <= today ? asked : today;
  const [actor, areas, names] = [await pageActor(), await askPage(listAreas, {}), await personNames()];
  const sheets = [];
  for (const area of areas) sheets.push(await askPage(getDaySheet, { areaId: area.id, onDay }));
  const readings = sheets.reduce((sum, { counts }) => sum + counts.readings, 0);
  const off = sheets.reduce((sum, { counts }) => sum + counts.out + counts.implausible, 0);
  const gaps = sheets.reduce((sum, { counts }) => sum + counts.gaps, 0);
  const mayEnter = may(actor, measurementsMay.record);
  // what is off comes first, then what is missing, then the walk
  const ordered = [...sheets].sort(
    (one, other) =>
      Number(other.counts.out + other.counts.implausible > 0) -
        Number(one.counts.out + one.counts.implausible > 0) ||
      Number(other.counts.gaps > 0) - Number(one.counts.gaps > 0),
  );
  return (
    <>
      <PageHead
        title="Rounds"
        name={`${weekdayWords(onDay)}${onDay === today ? ", today" : ""}`}
        facts={`${readingsWord(readings)} · ${off === 0 ? "nothing out of tolerance" : `${off} off`} · ${gaps === 0 ? "nothing missing" : `${gaps} not read${onDay === today ? " yet" : ""}`}`}
        actions={
          mayEnter && areas.length > 0 ? (
            <LinkButton href="/rounds/grid" variant="next">
              Enter at the desk grid
            </LinkButton>
          ) : undefined
        }
      />
      <div className="mb-5">
        <DaySteps
          before={addDays(onDay, -1)}
          after={onDay < today ? addDays(onDay, 1) : null}
          hrefOf={(on) => `/rounds?day=${on}`}
        />
      </div>
      {sheets.length === 0 && (
        <EmptyState title="No areas yet">
          <p>
            A round walks the systems of an area. An administrator sets up areas and systems under Setup; then
            what is read each day stands here, area by area.
          </p>
        </EmptyState>
      )}
      <div className="grid gap-5">
        {ordered.map(({ area, sheet, counts, state, bounds, oldValues, parameters }) => (
          <AreaRound
            key={area.id}
            area={area}
            onDay={onDay}
            counts={counts}
            state={state}
            lines={sheet.lines}
            gaps={sheet.gaps}
            bounds={bounds}
            oldValues={oldValues}
            parameters={parameters}
            names={names}
            zone={settings().STILLWELL_ZONE}
            now={systemClock.now()}
            mayEnter={mayEnter && mayInArea(actor, measurementsMay.record, area.id)}
            besideOff={
              mayInArea(actor, qualityMay.handle, area.id)
                ? (readingId) => <IncidentLink readingId={readingId} />
                : undefined
            }
          />
        ))}
      </div>
    </>
  );
}
