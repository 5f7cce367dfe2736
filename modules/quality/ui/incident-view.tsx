import Link from "next/link";
import { Panel, StatusWord, TimeText } from "@/lib/ui";
import { STATUS_WORDS, shownValue } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import type { IncidentReading, IncidentRow } from "../model";
import { CloseForm } from "./close-form";
import { type Names, nameOf } from "./incident-words";
import { CareForms, NoteForm, RecheckForm } from "./incident-work";

type Value = Parameters<typeof shownValue>[0] & {
  parameterId: number;
  takenAt: number;
  takenBy: number;
  status: IncidentReading["status"];
};

export interface IncidentViewProps {
  incident: IncidentRow;
  closure: { at: number; by: number | null; text: string; stillOffReason: string | null } | null;
  readings: readonly IncidentReading[];
  notes: readonly { id: number; text: string; notedBy: number; notedAt: number }[];
  recheck: (Value & { id: number; sentence: string }) | null;
  candidates: readonly (Value & { id: number; label: string })[];
  isStillOff: boolean;
  onlyYouActed: boolean;
  parameters: readonly FacilityParameter[];
  people: readonly { id: number; name: string }[];
  names: Names;
  zone: string;
  mayHandle: boolean;
  mayClose: boolean;
}

/** One incident: its readings and notes on the left; recheck, care and closure on the right. */
export function IncidentView(props: IncidentViewProps) {
  const { incident, closure, candidates, people, mayHandle, mayClose } = props;
  const isClosed = incident.state === "closed";
  return (
    <div className="grid items-start gap-5 lg:grid-cols-2">
      <div className="grid gap-5">
        <Panel title="Readings of this trouble" id="readings">
          <Readings {...props} />
        </Panel>
        <Panel title="What was seen and done" id="notes">
          <Notes {...props} />
          {mayHandle && !isClosed && <NoteForm incidentId={incident.id} />}
        </Panel>
      </div>
      <div className="grid gap-5">
        <Panel title="Recheck" id="recheck">
          <Recheck {...props} />
          {mayHandle && !isClosed && (
            <RecheckForm
              key={candidates.map(({ id }) => id).join(",")}
              incidentId={incident.id}
              candidates={candidates}
              systemCode={incident.systemCode}
            />
          )}
        </Panel>
        {mayHandle && !isClosed && (
          <Panel title="Who and when" id="care">
            <CareForms
              key={incident.ownerId}
              incidentId={incident.id}
              ownerId={incident.ownerId}
              people={people}
            />
          </Panel>
        )}
        {closure !== null && (
          <Panel title="Closure" id="closure">
            <Closure closure={closure} names={props.names} zone={props.zone} />
          </Panel>
        )}
        {mayClose && !isClosed && (
          <Panel title="Your decision" id="decision" className="border-t-2 border-t-ink">
            <CloseForm
              incidentId={incident.id}
              code={incident.code}
              isStillOff={props.isStillOff}
              onlyYouActed={props.onlyYouActed}
            />
          </Panel>
        )}
      </div>
    </div>
  );
}

function Figure({ value, parameters }: { value: Value; parameters: readonly FacilityParameter[] }) {
  const parameter = parameters.find((each) => each.id === value.parameterId);
  if (!parameter) return <span className="num">{value.typedText}</span>;
  const { figure, unit } = shownValue(value, parameter);
  return (
    <>
      {parameter.name}{" "}
      <span className="num">
        {figure}
        {unit !== "" && <span className="unit">{unit}</span>}
      </span>
    </>
  );
}

function Readings({ readings, parameters, names, zone }: IncidentViewProps) {
  if (readings.length === 0) {
    return (
      <p className="text-ink-2">
        None: it was opened by hand. Readings that are off can join it from their page.
      </p>
    );
  }
  return (
    <ul className="divide-y divide-rule border-t border-rule">
      {readings.map((each) => (
        <li key={each.readingId} className="py-2.5">
          <p className="flex flex-wrap items-baseline gap-x-3">
            <Link href={`/readings/${each.readingId}`} className="link inline-block min-h-6 font-semibold">
              <Figure value={each} parameters={parameters} />
            </Link>
            {each.standing === "in force" ? (
              <StatusWord
                status={each.status}
                direction={each.side === "low" || each.side === "high" ? each.side : null}
              />
            ) : (
              <span className="text-ink-3">{each.standing} since</span>
            )}
          </p>
          <p className="text-[0.9375rem] text-ink-2">{each.sentence}</p>
          <p className="text-sm text-ink-3">
            <TimeText at={each.takenAt} zone={zone} /> {nameOf(names, each.takenBy)},{" "}
            {each.pointName.toLowerCase()}
          </p>
        </li>
      ))}
    </ul>
  );
}

function Notes({ notes, names, zone }: IncidentViewProps) {
  if (notes.length === 0) return <p className="text-ink-2">Nothing is written down yet.</p>;
  return (
    <ol className="divide-y divide-rule border-t border-rule">
      {notes.map((note) => (
        <li key={note.id} className="py-2.5">
          <p className="whitespace-pre-line">{note.text}</p>
          <p className="text-sm text-ink-3">
            {nameOf(names, note.notedBy)}, <TimeText at={note.notedAt} zone={zone} />
          </p>
        </li>
      ))}
    </ol>
  );
}

function Recheck({ recheck, parameters, names, zone }: IncidentViewProps) {
  if (recheck === null) return null;
  return (
    <p className="mb-4">
      <b className="font-semibold">
        <Figure value={recheck} parameters={parameters} />
      </b>
      , {STATUS_WORDS[recheck.status]}, <TimeText at={recheck.takenAt} zone={zone} />{" "}
      {nameOf(names, recheck.takenBy)}
    </p>
  );
}

function Closure({
  closure,
  names,
  zone,
}: {
  closure: NonNullable<IncidentViewProps["closure"]>;
  names: Names;
  zone: string;
}) {
  return (
    <>
      <p className="whitespace-pre-line">{closure.text}</p>
      {closure.stillOffReason !== null && (
        <p className="mt-2">
          <b className="font-semibold">Closed while the newest reading was off:</b> {closure.stillOffReason}
        </p>
      )}
      <p className="mt-1 text-sm text-ink-3">
        {nameOf(names, closure.by)}, <TimeText at={closure.at} zone={zone} />
      </p>
    </>
  );
}
