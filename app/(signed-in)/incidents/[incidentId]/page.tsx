import type { Metadata } from "next";
import Link from "next/link";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { PageHead, timeText } from "@/lib/ui";
import { may, mayInArea } from "@/modules/access";
import { listPersonNames } from "@/modules/identity";
import { STATUS_WORDS, shownValue } from "@/modules/measurements/model";
import { getIncident, qualityMay } from "@/modules/quality";
import { IncidentView } from "@/modules/quality/ui/incident-view";
import { nameOf, waitedFor, whereWords } from "@/modules/quality/ui/incident-words";

export const metadata: Metadata = { title: "Incident" };

type Props = { params: Promise<{ incidentId: string }> };

export default async function IncidentPage({ params }: Props) {
  const shown = await askPage(getIncident, await params);
  const [actor, people] = [await pageActor(), await askPage(listPersonNames, {})];
  const names = Object.fromEntries(people.map(({ id, name }) => [id, name]));
  const zone = settings().STILLWELL_ZONE;
  const { incident } = shown;
  const candidates = shown.candidates.map((each) => {
    const parameter = shown.parameters.find((one) => one.id === each.parameterId);
    const value = parameter ? shownValue(each, parameter) : { figure: each.typedText, unit: "" };
    const figure = `${parameter?.name ?? ""} ${value.figure} ${value.unit}`.trim();
    const when = timeText(each.takenAt, zone, "day-time");
    return { ...each, label: `${figure}, ${STATUS_WORDS[each.status]}, ${when}` };
  });
  return (
    <>
      <PageHead
        title={<span className="num">{incident.code}</span>}
        name={incident.title}
        facts={
          <>
            <Link href={`/systems/${incident.systemCode}`}>{whereWords(incident)}</Link> · opened by{" "}
            {nameOf(names, incident.openedBy)}, {timeText(incident.openedAt, zone, "day-time")}
            <span className="block">{waitedFor(incident, names, zone, systemClock.now())}</span>
          </>
        }
      />
      <IncidentView
        {...shown}
        candidates={candidates}
        people={people.filter(({ state }) => state === "active").map(({ id, name }) => ({ id, name }))}
        names={names}
        zone={zone}
        mayHandle={mayInArea(actor, qualityMay.handle, incident.areaId)}
        mayClose={may(actor, qualityMay.close)}
      />
    </>
  );
}
