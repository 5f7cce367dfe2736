import Link from "next/link";
import { Panel, TimeText } from "@/lib/ui";
import { INCIDENT_STATE_WORDS, type IncidentRow } from "../model";

interface SystemIncidentsProps {
  incidents: readonly IncidentRow[];
  people: ReadonlyMap<number, string>;
  zone: string;
  now: number;
}

/** A system's incidents: the open ones first, each with who is waited for. */
export function SystemIncidents({ incidents, people, zone, now }: SystemIncidentsProps) {
  return (
    <Panel title="Incidents" id="incidents">
      {incidents.length === 0 ? (
        <p className="text-ink-2">None so far. A reading out of tolerance can be taken up as one.</p>
      ) : (
        <ul className="border-t border-rule">
          {incidents.map((each) => (
            <li key={each.id} className="border-b border-rule py-2.5">
              <Link
                className="link inline-flex min-h-6 items-center font-semibold"
                href={`/incidents/${each.id}`}
              >
                {each.code} {each.title}
              </Link>
              <p className="text-sm text-ink-2">
                {INCIDENT_STATE_WORDS[each.state]}
                {each.state === "closed" ? (
                  each.closedAt !== null && (
                    <>
                      {" "}
                      <TimeText at={each.closedAt} zone={zone} show="day" />
                    </>
                  )
                ) : (
                  <>
                    , {people.get(each.ownerId) ?? "somebody"} has it
                    <RecheckDue incident={each} zone={zone} now={now} />
                  </>
                )}
              </p>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}

function RecheckDue({ incident, zone, now }: { incident: IncidentRow; zone: string; now: number }) {
  if (incident.recheckDueAt === null || incident.state !== "open") return null;
  const isLate = incident.recheckDueAt < now;
  return (
    <>
      , recheck {isLate ? <b className="font-semibold text-watch">was due</b> : "due"}{" "}
      <TimeText at={incident.recheckDueAt} zone={zone} />
    </>
  );
}
