import type { Metadata } from "next";
import { operationalToday } from "@/app/_server/facility-day";
import { historyWords, recordsOfSubjects } from "@/app/_server/history-words";
import { personNames } from "@/app/_server/names";
import { rowReader } from "@/app/_server/preferred-units";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { EmptyState, LinkButton, PageHead, Panel } from "@/lib/ui";
import { type Actor, may } from "@/modules/access";
import { auditMay, getHealth, listEntries } from "@/modules/audit";
import { EntriesTable } from "@/modules/audit/ui/entries-table";
import { listWatch, measurementsMay } from "@/modules/measurements";
import { countMail, notificationsMay } from "@/modules/notifications";
import { listIncidents } from "@/modules/quality";
import { IncidentLines } from "@/modules/quality/ui/incident-list";
import { offNow } from "@/modules/rounds";
import { OffNowList } from "@/modules/rounds/ui/off-now-list";
import { weekdayWords } from "@/modules/rounds/ui/sheet-words";
import { WaitingList } from "@/modules/rounds/ui/waiting-list";
import { HealthPanel } from "./health-panel";
import { waitsForMe } from "./waits-for-me";

export const metadata: Metadata = { title: "Today" };

export default async function TodayPage() {
  const actor = await pageActor();
  const names = await personNames();
  const rows = await askPage(listWatch, { recent: 2 });
  const off = offNow(rows.map(await rowReader()));
  const isSeen = rows.some((row) => row.recent.length > 0);
  const waiting = await waitsForMe(actor, names);
  const now = systemClock.now();
  const outs = off.filter(({ newest }) => newest.status !== "watch").length;
  const mayEnter = may(actor, measurementsMay.record);
  return (
    <>
      <PageHead
        title="Today"
        name={weekdayWords(operationalToday())}
        facts={off.length === 0 ? "Nothing is off." : `${outs} off, ${off.length - outs} to watch.`}
        actions={
          mayEnter && rows.length > 0 ? (
            <LinkButton href="/rounds" variant="next">
              To the rounds
            </LinkButton>
          ) : undefined
        }
      />
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="grid gap-5">
          <Panel title="Off now" id="off" aside="by the newest reading of everything that is watched">
            {off.length > 0 ? (
              <OffNowList items={off} names={names} now={now} mayEnter={mayEnter} />
            ) : (
              <CalmWater isSeen={isSeen} />
            )}
          </Panel>
          <OpenIncidents names={names} now={now} />
        </div>
        <div className="grid gap-5">
          {waiting.length === 0 ? (
            <Panel title="Waits for you">
              <p className="text-ink-2">Nothing waits for you at the moment.</p>
            </Panel>
          ) : (
            <WaitingList title="Waits for you" items={waiting} />
          )}
          <Health actor={actor} now={now} />
        </div>
      </div>
      {may(actor, auditMay.readHistory) && actor.roles.includes("auditor") && <RecentChanges />}
    </>
  );
}

/** Nothing is off: because all is well, or because nothing was ever read. */
function CalmWater({ isSeen }: { isSeen: boolean }) {
  if (isSeen) return <p className="text-ink-2">Every newest reading is within its limits.</p>;
  return (
    <EmptyState title="No readings yet">
      <p>
        As soon as readings come in, whatever is out of tolerance, implausible or to be watched stands here,
        the gravest first. An administrator or a lead says under Setup what is read where, and within which
        limits.
      </p>
    </EmptyState>
  );
}

async function OpenIncidents({ names, now }: { names: Record<number, string>; now: number }) {
  const rows = await askPage(listIncidents, {});
  if (rows.length === 0) return null;
  return (
    <Panel title="Open incidents" id="incidents" aside="the recheck that is due longest first">
      <IncidentLines rows={rows} names={names} zone={settings().STILLWELL_ZONE} now={now} />
    </Panel>
  );
}

async function Health({ actor, now }: { actor: Actor; now: number }) {
  if (!may(actor, auditMay.readHealth)) return null;
  const health = await askPage(getHealth, {});
  const mail = may(actor, notificationsMay.readOutbox) ? await askPage(countMail, {}) : null;
  return <HealthPanel health={health} mail={mail} zone={settings().STILLWELL_ZONE} now={now} />;
}

const ENTRIES_SHOWN = 20;

async function RecentChanges() {
  const { entries } = await askPage(listEntries, { limit: ENTRIES_SHOWN });
  const words = await historyWords(recordsOfSubjects(entries));
  return (
    <Panel title="Recent changes" id="changes" className="mt-5">
      <EntriesTable entries={entries} words={words} searched={false} />
    </Panel>
  );
}
