import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { LinkButton, Notice, PageHead } from "@/lib/ui";
import { epochToLocal } from "@/lib/zone";
import { mayInArea } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { chartPeriod, getSeriesFrame, listWatch, measurementsMay } from "@/modules/measurements";
import { PERIODS, PeriodChoice } from "@/modules/measurements/ui/period-choice";
import { SeriesPage } from "@/modules/measurements/ui/series-page";
import { listInstruments, listMethods, listParameters } from "@/modules/methods";
import { listIncidents } from "@/modules/quality";
import { getSystem } from "@/modules/systems";

type Search = Partial<Record<"point" | "period" | "from" | "to" | "base-from" | "base-to", string>>;
type Props = { params: Promise<{ code: string; parameter: string }>; searchParams: Promise<Search> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { code, parameter } = await params;
  return { title: `Chart of ${parameter}, ${code}` };
}

/** What the address names: system, parameter and point; the page for what is not there otherwise. */
async function subjectOf({ code, parameter }: { code: string; parameter: string }, pointCode?: string) {
  const system = await askPage(getSystem, { code });
  const parameters = await askPage(listParameters, { includeRetired: true });
  const wanted = parameters.find((each) => each.code.toLowerCase() === parameter.toLowerCase());
  const point = system.points.find((each) => (pointCode ? each.code === pointCode : each.isDefault));
  if (!wanted || !point) notFound();
  return { system, parameter: wanted, point };
}

export default async function ChartPage({ params, searchParams }: Props) {
  const search = await searchParams;
  const { system, parameter, point } = await subjectOf(await params, search.point);
  const actor = await pageActor();
  const zone = settings().STILLWELL_ZONE;
  const preset = PERIODS.find((each) => each.code === search.period) ?? PERIODS[2];
  const period = chartPeriod(search, preset.days, systemClock.now(), zone);
  const frame = await askPage(getSeriesFrame, {
    pointId: point.id,
    parameterId: parameter.id,
    toAt: period.toAt,
    ...(period.fromAt === null ? {} : { fromAt: period.fromAt }),
  });
  const path = `/systems/${system.code}/charts/${parameter.code}`;
  const watch = await askPage(listWatch, { systemId: system.id, recent: 1 });
  const elsewhere = watch.filter((each) => each.parameter.id === parameter.id && each.pointId !== point.id);
  const incidents = await askPage(listIncidents, { systemId: system.id, state: "all", limit: 200 });
  return (
    <>
      <PageHead
        title={parameter.name}
        name={
          <>
            <span className="whitespace-nowrap">{system.code}</span> {system.name}, {point.name.toLowerCase()}
          </>
        }
        facts={
          <>
            <Link href={`/systems/${system.code}`}>{system.code}'s page</Link>
            {elsewhere.map((each) => (
              <span key={each.pointId}>
                {" · "}
                <Link href={`${path}?${new URLSearchParams({ point: codeOf(system.points, each.pointId) })}`}>
                  the same at {each.pointName.toLowerCase()}
                </Link>
              </span>
            ))}
          </>
        }
        actions={
          mayInArea(actor, measurementsMay.record, system.areaId) &&
          system.state !== "retired" && (
            <LinkButton href={`/systems/${system.code}/entry`}>Enter readings</LinkButton>
          )
        }
      />
      {period.problem !== null && (
        <div className="pb-4">
          <Notice title="Showing another period">{period.problem}</Notice>
        </div>
      )}
      <PeriodChoice
        path={path}
        point={point.isDefault ? null : point.code}
        period={period.isChosen ? null : preset.code}
        fromOn={epochToLocal(frame.fromAt, zone).on}
        toOn={period.toOn}
      />
      <SeriesPage
        key={`${point.id} ${parameter.id} ${search.from} ${search.to} ${preset.code}`}
        frame={frame}
        people={await askPage(listPersonNames, {})}
        methods={(await askPage(listMethods, { includeRetired: true })).map(named)}
        instruments={(await askPage(listInstruments, { includeRetired: true })).map(named)}
        incidents={incidents
          .filter((each) => each.pointId === point.id && each.parameterId === parameter.id)
          .map((each) => ({ at: each.beganAt, label: `incident ${each.code}` }))}
        baseline={{
          ...(search["base-from"] ? { fromOn: search["base-from"] } : {}),
          ...(search["base-to"] ? { toOn: search["base-to"] } : {}),
        }}
        zone={zone}
      />
    </>
  );
}

const named = ({ id, code }: { id: number; code: string }) => ({ id, name: code });
const codeOf = (points: readonly { id: number; code: string }[], id: number): string =>
  points.find((each) => each.id === id)?.code ?? "";
