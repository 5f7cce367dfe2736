import type { Metadata } from "next";
import { personNames } from "@/app/_server/names";
import { askPage, pageActor } from "@/app/_server/session";
import { systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { EmptyState, LinkButton, PageHead, Panel } from "@/lib/ui";
import { may } from "@/modules/access";
import { listIncidents, qualityMay } from "@/modules/quality";
import { IncidentList } from "@/modules/quality/ui/incident-list";

export const metadata: Metadata = { title: "Incidents" };

export default async function IncidentsPage() {
  const open = await askPage(listIncidents, { state: "unclosed" });
  const closed = await askPage(listIncidents, { state: "closed", limit: 100 });
  const [actor, names] = [await pageActor(), await personNames()];
  const shown = { names, zone: settings().STILLWELL_ZONE, now: systemClock.now() };
  const overdue = open.filter(
    (row) => row.state === "open" && row.recheckDueAt !== null && row.recheckDueAt < shown.now,
  );
  return (
    <>
      <PageHead
        title="Incidents"
        facts={
          open.length === 0
            ? "Nothing is open."
            : `${open.length} open${overdue.length > 0 ? `, ${overdue.length} with an overdue recheck` : ""}. The recheck that is due longest stands first.`
        }
        actions={
          may(actor, qualityMay.handle) ? (
            <LinkButton href="/incidents/open">Open one by hand</LinkButton>
          ) : undefined
        }
      />
      <div className="grid gap-5">
        <Panel title="Open">
          {open.length === 0 ? (
            <EmptyState title="No open incidents">
              <p>
                A reading that is out of tolerance is taken up as an incident where it was entered, on its own
                page, or on the day sheet. Later readings of the same trouble join it; a recheck within
                tolerance lets a lead close it.
              </p>
            </EmptyState>
          ) : (
            <IncidentList rows={open} caption="Open incidents" {...shown} />
          )}
        </Panel>
        {closed.length > 0 && (
          <Panel title="Closed" aside="the last 100">
            <IncidentList rows={closed} caption="Closed incidents" {...shown} />
          </Panel>
        )}
      </div>
    </>
  );
}
