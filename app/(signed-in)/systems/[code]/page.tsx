import type { Metadata } from "next";
import Link from "next/link";
import { readingsToRead, rowReader } from "@/app/_server/preferred-units";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { LinkButton, Notice, PageHead, TimeText } from "@/lib/ui";
import { may, mayInArea } from "@/modules/access";
import { auditMay } from "@/modules/audit";
import { getOwnAccount, listPersonNames } from "@/modules/identity";
import { getSeriesFrame, listReadings, listWatch, measurementsMay } from "@/modules/measurements";
import type { WatchRow } from "@/modules/measurements/model";
import { NowPanel } from "@/modules/measurements/ui/now-panel";
import { RecentReadings } from "@/modules/measurements/ui/recent-readings";
import { SeriesPreview } from "@/modules/measurements/ui/series-preview";
import { listInstruments, listMethods, listParameters } from "@/modules/methods";
import { listIncidents } from "@/modules/quality";
import type { IncidentRow } from "@/modules/quality/model";
import { SystemIncidents } from "@/modules/quality/ui/system-incidents";
import { getSystem, systemsMay, volumeOf } from "@/modules/systems";
import {
  SYSTEM_KIND_WORDS,
  SYSTEM_STATE_WORDS,
  type SystemDetail,
  WATER_TYPE_WORDS,
} from "@/modules/systems/model";
import { EquipmentPanel, SystemVolumeFacts } from "@/modules/systems/ui/system-facts";
import { shownVolumeUnit } from "@/modules/systems/ui/volume-units";

type Search = { chart?: string; before?: string };
type Props = { params: Promise<{ code: string }>; searchParams: Promise<Search> };

const DAY_MS = 86_400_000;
const PREVIEW_DAYS = 90;
const UNCONFIRMED_DAYS = 7;
const PAGE = 25;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: (await params).code };
}

const keyOf = (row: WatchRow): string => `${row.pointId}-${row.parameter.code}`;

/** The row whose chart stands beside: the one asked for, else the first that is off, else the first number. */
function shownRow(rows: readonly WatchRow[], asked: string | undefined): WatchRow | null {
  const numbers = rows.filter(({ parameter }) => parameter.kind === "number" || parameter.kind === "count");
  const isOff = (row: WatchRow, statuses: readonly string[]) =>
    statuses.includes(row.recent[0]?.status ?? "none");
  return (
    rows.find((row) => keyOf(row) === asked) ??
    numbers.find((row) => isOff(row, ["out", "implausible"])) ??
    numbers.find((row) => isOff(row, ["watch"])) ??
    numbers[0] ??
    null
  );
}

export default async function SystemPage({ params, searchParams }: Props) {
  const actor = await pageActor();
  const search = await searchParams;
  const system = await askPage(getSystem, await params);
  const rows = await askPage(listWatch, { systemId: system.id, recent: 2 });
  const people = new Map((await askPage(listPersonNames, {})).map(({ id, name }) => [id, name]));
  const incidents = await askPage(listIncidents, { systemId: system.id, state: "all", limit: 200 });
  const zone = settings().STILLWELL_ZONE;
  const now = systemClock.now();
  const shown = shownRow(rows, search.chart);
  const path = `/systems/${system.code}`;
  return (
    <>
      <SystemHead system={system} incidents={incidents} />
      <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-5 xl:grid-cols-[minmax(0,7fr)_minmax(0,5fr)]">
        <NowPanel
          rows={rows.map(await rowReader())}
          shown={shown && { pointId: shown.pointId, parameterId: shown.parameter.id }}
          hrefOf={(row) => `${path}?chart=${encodeURIComponent(keyOf(row))}#chart`}
          people={people}
          zone={zone}
          now={now}
        />
        <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
          {shown && <ChartBeside row={shown} system={system} incidents={incidents} />}
          <SystemIncidents incidents={incidents.slice(0, 8)} people={people} zone={zone} now={now} />
          <EquipmentPanel
            equipment={system.equipment}
            setupHref={may(actor, systemsMay.manageEquipment) ? `/setup/systems/${system.code}` : null}
          />
        </div>
        <div className="xl:col-span-2">
          <Readings system={system} before={search.before} people={people} />
        </div>
      </div>
    </>
  );
}

async function SystemHead({
  system,
  incidents,
}: {
  system: SystemDetail;
  incidents: readonly IncidentRow[];
}) {
  const actor = await pageActor();
  const account = await askPage(getOwnAccount, {});
  const sheet = await askPage(volumeOf, { code: system.code });
  const zone = settings().STILLWELL_ZONE;
  const inUse = system.points.filter((point) => point.isInUse);
  const mayRecord = mayInArea(actor, measurementsMay.record, system.areaId) && system.state !== "retired";
  return (
    <>
      <PageHead
        title={system.code}
        name={system.name}
        facts={
          <>
            {system.areaName} · {SYSTEM_KIND_WORDS[system.kind]}, {WATER_TYPE_WORDS[system.waterType]} ·{" "}
            {system.state === "in-service" ? (
              SYSTEM_STATE_WORDS[system.state]
            ) : (
              <b className="font-semibold text-ink">{SYSTEM_STATE_WORDS[system.state]}</b>
            )}{" "}
            · {inUse.length === 1 ? "read at " : `${inUse.length} points: `}
            {inUse.map((point) => point.name.toLowerCase()).join(", ")}
          </>
        }
        figures={
          <SystemVolumeFacts
            sheet={sheet}
            unit={shownVolumeUnit(account?.preferredUnits ?? {}, sheet.record?.volumeL ?? null)}
            zone={zone}
          />
        }
        waiting={mayRecord && (await Waiting({ system, incidents }))}
      />
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2 pb-5">
        {mayRecord && (
          <LinkButton variant="next" href={`/systems/${system.code}/entry`}>
            Enter readings
          </LinkButton>
        )}
        <Link href={`/systems/${system.code}/charts`}>Charts</Link>
        <Link href={`/setup/limits?system=${encodeURIComponent(system.code)}`}>Limits</Link>
        <Link href={`/systems/${system.code}/volume`}>Volume</Link>
        {may(actor, auditMay.readRecord) && (
          <Link href={`/history/record/systems_system/${system.id}`}>History of this record</Link>
        )}
      </div>
      {system.retiredReason !== null && (
        <div className="pb-5">
          <Notice title="Retired">{system.retiredReason}</Notice>
        </div>
      )}
      {system.notes !== "" && <p className="prose pb-5 text-ink-2">{system.notes}</p>}
    </>
  );
}

/** What waits for somebody who may enter readings here: rechecks that are due, values that must be confirmed. */
async function Waiting({ system, incidents }: { system: SystemDetail; incidents: readonly IncidentRow[] }) {
  const zone = settings().STILLWELL_ZONE;
  const off = await askPage(listReadings, {
    systemId: system.id,
    status: "out,implausible",
    fromAt: systemClock.now() - UNCONFIRMED_DAYS * DAY_MS,
    limit: 50,
  });
  const unconfirmed = off.filter((reading) => reading.confirmedAt === null);
  const rechecks = incidents.filter((each) => each.state === "open" && each.recheckDueAt !== null);
  if (unconfirmed.length === 0 && rechecks.length === 0) return undefined;
  return (
    <ul className="grid gap-1">
      {rechecks.map((each) => (
        <li key={each.id}>
          <Link className="link" href={`/incidents/${each.id}`}>
            Recheck of {each.parameterName?.toLowerCase() ?? each.title}
            {each.pointName && `, ${each.pointName.toLowerCase()}`}, due{" "}
            <TimeText at={each.recheckDueAt ?? 0} zone={zone} /> ({each.code})
          </Link>
        </li>
      ))}
      {unconfirmed.slice(0, 3).map((reading) => (
        <li key={reading.id}>
          <Link className="link" href={`/readings/${reading.id}`}>
            Confirm {reading.typedText} of <TimeText at={reading.takenAt} zone={zone} />, or measure again
          </Link>
        </li>
      ))}
      {unconfirmed.length > 3 && <li>and {unconfirmed.length - 3} more to confirm</li>}
    </ul>
  );
}

async function ChartBeside({
  row,
  system,
  incidents,
}: {
  row: WatchRow;
  system: SystemDetail;
  incidents: readonly IncidentRow[];
}) {
  const frame = await askPage(getSeriesFrame, {
    pointId: row.pointId,
    parameterId: row.parameter.id,
    fromAt: systemClock.now() - PREVIEW_DAYS * DAY_MS,
  });
  const point = system.points.find((each) => each.id === row.pointId);
  const search = point && !point.isDefault ? `?${new URLSearchParams({ point: point.code })}` : "";
  return (
    <SeriesPreview
      key={keyOf(row)}
      frame={frame}
      href={`/systems/${system.code}/charts/${row.parameter.code}${search}`}
      methods={await askPage(listMethods, { includeRetired: true })}
      instruments={await askPage(listInstruments, { includeRetired: true })}
      incidents={incidents
        .filter((each) => each.pointId === row.pointId && each.parameterId === row.parameter.id)
        .map((each) => ({ at: each.beganAt, label: `incident ${each.code}` }))}
      zone={settings().STILLWELL_ZONE}
    />
  );
}

/** "taken-id" of the last reading that was seen; anything else begins with the newest. */
function pageFrom(before: string | undefined): { beforeAt?: number; beforeId?: number } {
  const found = /^(\d{1,15})-(\d{1,12})$/.exec(before ?? "");
  return found ? { beforeAt: Number(found[1]), beforeId: Number(found[2]) } : {};
}

async function Readings({
  system,
  before,
  people,
}: {
  system: SystemDetail;
  before: string | undefined;
  people: ReadonlyMap<number, string>;
}) {
  const from = pageFrom(before);
  const readings = await askPage(listReadings, { systemId: system.id, limit: PAGE + 1, ...from });
  const shown = readings.slice(0, PAGE);
  const last = readings.length > PAGE ? shown.at(-1) : undefined;
  const path = `/systems/${system.code}`;
  return (
    <RecentReadings
      {...(await readingsToRead(shown, await askPage(listParameters, { includeRetired: true })))}
      people={people}
      zone={settings().STILLWELL_ZONE}
      newestHref={from.beforeAt === undefined ? null : `${path}#readings`}
      olderHref={last ? `${path}?before=${last.takenAt}-${last.id}#readings` : null}
    />
  );
}
