import type { Metadata } from "next";
import { askPage, pageActor } from "@/app/_server/session";
import { settings } from "@/lib/env";
import { Panel } from "@/lib/ui";
import { may, mayInArea } from "@/modules/access";
import { identityMay, listPersonNames } from "@/modules/identity";
import { getReading, measurementsMay } from "@/modules/measurements";
import { needsConfirmation } from "@/modules/measurements/model";
import { ReadingPage } from "@/modules/measurements/ui/reading-page";
import { listInstruments, listMethods } from "@/modules/methods";
import { incidentOfReading, qualityMay } from "@/modules/quality";
import { IncidentLink } from "@/modules/quality/ui/incident-link";

export const metadata: Metadata = { title: "Reading" };

type Props = { params: Promise<{ readingId: string }> };

const byId = <T extends { id: number }>(
  rows: readonly T[],
  text: (row: T) => string,
): Record<number, string> => Object.fromEntries(rows.map((row) => [row.id, text(row)]));

export default async function ReadingRoute({ params }: Props) {
  const actor = await pageActor();
  const found = await askPage(getReading, await params);
  const { areaId } = found.place;
  const people = may(actor, identityMay.listPeople) ? await askPage(listPersonNames, {}) : [];
  const methods = await askPage(listMethods, { includeRetired: true });
  const instruments = await askPage(listInstruments, { includeRetired: true });
  const { joined } = await askPage(incidentOfReading, { readingId: found.reading.id });
  const newest = found.judgements.findLast((each) => each.readingId === found.reading.id);
  const mayTakeUp =
    found.isInForce &&
    newest !== undefined &&
    needsConfirmation(newest.status) &&
    mayInArea(actor, qualityMay.handle, areaId);
  return (
    <>
      <ReadingPage
        {...found}
        people={byId(people, (row) => row.name)}
        methods={byId(methods, (row) => row.name)}
        instruments={byId(instruments, (row) => `${row.code}, ${row.name}`)}
        zone={settings().STILLWELL_ZONE}
        may={{
          record: mayInArea(actor, measurementsMay.record, areaId),
          correct: mayInArea(actor, measurementsMay.correct, areaId),
          explain: mayInArea(actor, measurementsMay.explain, areaId),
        }}
      />
      {(joined !== null || mayTakeUp) && (
        <Panel title="Incident" className="max-w-5xl">
          <IncidentLink readingId={found.reading.id} mayHandle={mayTakeUp} />
        </Panel>
      )}
    </>
  );
}
