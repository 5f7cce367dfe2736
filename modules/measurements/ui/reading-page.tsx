import Link from "next/link";
import { Facts, Notice, PageHead, Panel, StatusWord, TimeText } from "@/lib/ui";
import type { FacilityParameter } from "@/modules/methods/model";
import { needsConfirmation } from "../model";
import { ReadingActs } from "./reading-acts";
import { ReadingVersions } from "./reading-versions";
import {
  asCounted,
  asTyped,
  CAUSE_WORDS,
  type ExplanationRow,
  type JudgementRow,
  type ReadingVersion,
  SOURCE_WORDS,
} from "./reading-view";

export interface ReadingPageProps {
  reading: ReadingVersion;
  place: { readonly systemCode: string; readonly pointName: string; readonly areaName: string };
  parameter: FacilityParameter;
  isInForce: boolean;
  versions: readonly ReadingVersion[];
  judgements: readonly JudgementRow[];
  explanations: readonly ExplanationRow[];
  /** Names by id. */
  people: Readonly<Record<number, string>>;
  methods: Readonly<Record<number, string>>;
  instruments: Readonly<Record<number, string>>;
  zone: string;
  may: { readonly record: boolean; readonly correct: boolean; readonly explain: boolean };
}

const nobody = "a person who is not listed";

/** One reading with everything said about it. */
export function ReadingPage(props: ReadingPageProps) {
  const { reading, place, parameter, isInForce, versions, judgements, people, zone, may } = props;
  const own = judgements.filter((each) => each.readingId === reading.id);
  const newest = own.at(-1);
  const name = (id: number | null) => (id === null ? nobody : (people[id] ?? nobody));
  const newer = versions[versions.findIndex((each) => each.id === reading.id) + 1];
  const side = newest?.side === "change" ? null : (newest?.side ?? null);
  return (
    <div className="grid max-w-5xl gap-5 pb-10">
      <PageHead
        title={<span className="num">{asCounted(reading, parameter)}</span>}
        name={`${parameter.name}, ${place.systemCode} ${place.pointName.toLowerCase()}`}
        facts={
          <>
            <Link href={`/systems/${place.systemCode}`}>{place.systemCode}</Link> in {place.areaName} · taken{" "}
            <TimeText at={reading.takenAt} zone={zone} /> by {name(reading.takenBy)}
          </>
        }
        actions={
          isInForce && (
            <ReadingActs
              readingId={reading.id}
              typedText={reading.typedText}
              typedUnit={reading.typedUnit}
              parameter={parameter}
              canConfirm={
                newest !== undefined && needsConfirmation(newest.status) && reading.confirmedAt === null
              }
              may={may}
            />
          )
        }
      />
      {!isInForce && <CountsNoMore reading={reading} newerId={newer?.id} name={name} zone={zone} />}
      {newest && (
        <p className="text-lg">
          <StatusWord status={newest.status} direction={side} />
          <span className="ml-3 text-base text-ink-2">{newest.sentence}</span>
        </p>
      )}
      <div className="grid gap-5 desk:grid-cols-2">
        <Origin {...props} name={name} />
        <Explanations {...props} name={name} />
        <ReadingVersions {...{ versions, parameter, judgements, zone, name }} shownId={reading.id} />
        <Judgements judgements={own} zone={zone} />
      </div>
      <p>
        <Link href={`/history/record/measurements_reading/${reading.id}`}>The history of this record</Link>
      </p>
    </div>
  );
}

type Named = { name: (id: number | null) => string };

function CountsNoMore({
  reading,
  newerId,
  name,
  zone,
}: Named & { reading: ReadingVersion; newerId: number | undefined; zone: string }) {
  if (reading.voidedAt !== null) {
    return (
      <Notice kind="stop" title="Struck out; it counts no more">
        <p>
          By {name(reading.voidedBy)}, <TimeText at={reading.voidedAt} zone={zone} />: {reading.voidReason}
        </p>
      </Notice>
    );
  }
  if (newerId !== undefined) {
    return (
      <Notice title="Corrected; another value counts">
        <p>
          <Link href={`/readings/${newerId}`}>Look at the newer value</Link>
        </p>
      </Notice>
    );
  }
  return (
    <Notice title="This reading came in bulk and does not count: its delivery is not published, or was withdrawn." />
  );
}

function Origin({ reading, methods, instruments, zone, name }: ReadingPageProps & Named) {
  const facts = [
    { label: "As typed", value: <span className="num">{asTyped(reading)}</span> },
    {
      label: "Taken",
      value: <TimeText at={reading.takenAt} zone={zone} />,
      note: `by ${name(reading.takenBy)}`,
    },
    {
      label: "Entered",
      value: <TimeText at={reading.enteredAt} zone={zone} />,
      note: `by ${name(reading.enteredBy)}`,
    },
    { label: "It came", value: SOURCE_WORDS[reading.source] },
    {
      label: "Method",
      value: reading.methodId === null ? "none named" : (methods[reading.methodId] ?? "not listed"),
    },
    {
      label: "Instrument",
      value:
        reading.instrumentId === null ? "none named" : (instruments[reading.instrumentId] ?? "not listed"),
    },
    ...(reading.confirmedAt === null
      ? []
      : [
          {
            label: "Confirmed",
            value: <TimeText at={reading.confirmedAt} zone={zone} />,
            note: `by ${name(reading.confirmedBy)}: the instrument showed this`,
          },
        ]),
    ...(reading.note ? [{ label: "Note", value: <span className="font-normal">{reading.note}</span> }] : []),
  ];
  return (
    <Panel title="How it came about">
      <Facts facts={facts} />
    </Panel>
  );
}

function Explanations({ explanations, zone, name }: ReadingPageProps & Named) {
  return (
    <Panel title="Explanations">
      {explanations.length === 0 ? (
        <p className="text-ink-3">Nobody has explained it.</p>
      ) : (
        <ul className="grid gap-3">
          {explanations.map((each) => (
            <li key={each.id} className="border-l-2 border-rule pl-3">
              <p>{each.text}</p>
              <p className="text-sm text-ink-3">
                {name(each.explainedBy)}, <TimeText at={each.explainedAt} zone={zone} />
              </p>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}

function Judgements({ judgements, zone }: { judgements: readonly JudgementRow[]; zone: string }) {
  return (
    <Panel title="Judgements" aside="in order; the last one counts">
      <ol className="grid gap-3">
        {judgements.map((each) => (
          <li key={each.id}>
            <StatusWord status={each.status} direction={each.side === "change" ? null : each.side} />
            <p>{each.sentence}</p>
            <p className="text-sm text-ink-3">
              <TimeText at={each.judgedAt} zone={zone} />, {CAUSE_WORDS[each.cause]} (rules, version{" "}
              {each.ruleVersion})
            </p>
          </li>
        ))}
      </ol>
    </Panel>
  );
}
