import Link from "next/link";
import type { ReactNode } from "react";
import { StatusShape, TimeText } from "@/lib/ui";
import { type Bounds, STATUS_WORDS } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import type { OldValue, SheetLine } from "../model";
import { type Deviation, deviationsOf } from "../rules/deviations";
import { LineStrip, ReadingFigure } from "./reading-figure";
import { type Names, nameOf } from "./sheet-words";

export interface DeviationListProps {
  lines: readonly SheetLine[];
  parameters: readonly FacilityParameter[];
  bounds: Readonly<Record<number, Bounds>>;
  oldValues: Readonly<Record<number, OldValue>>;
  names: Names;
  zone: string;
  /** What stands beside a reading that is off and not explained: the way to take it up. */
  besideOff?: ((readingId: number) => ReactNode) | undefined;
}

const TONES: Readonly<Record<string, string>> = {
  out: "text-out",
  watch: "text-watch",
  implausible: "text-odd",
};

/** Everything on a sheet that deviates, the gravest first: value, why, who, what was said about it, and the old value. */
export function DeviationList(props: DeviationListProps) {
  const deviations = deviationsOf(props.lines);
  if (deviations.length === 0) return <p className="text-ink-2">Nothing that was read deviates.</p>;
  return (
    <ul className="divide-y divide-rule border-t border-rule">
      {deviations.map((deviation) => (
        <DeviationItem key={deviation.line.readingId} deviation={deviation} {...props} />
      ))}
    </ul>
  );
}

function DeviationItem({ deviation, ...props }: DeviationListProps & { deviation: Deviation }) {
  const { line, marks } = deviation;
  const { parameters, bounds, names, zone } = props;
  const parameter = parameters.find((each) => each.id === line.parameterId);
  if (!parameter) return null;
  const direction = line.side === "low" || line.side === "high" ? line.side : null;
  const isPlain = line.status === "within" || line.status === "none";
  return (
    <li className="grid grid-cols-[1.25rem_minmax(0,1fr)] gap-x-2 py-3 break-inside-avoid sm:grid-cols-[1.25rem_minmax(0,1fr)_150px]">
      <span className="pt-1">
        <StatusShape status={line.status} direction={direction} />
      </span>
      <div className="min-w-0">
        <p className="flex flex-wrap items-baseline gap-x-3">
          <Link
            href={`/readings/${line.readingId}`}
            className={`min-h-6 font-semibold underline decoration-1 underline-offset-3 hover:decoration-2 ${TONES[line.status] ?? ""}`}
          >
            {line.systemCode} {parameter.name} <ReadingFigure reading={line} parameter={parameter} />
          </Link>
          <span className={`font-semibold ${TONES[line.status] ?? "font-normal text-ink-3"}`}>
            {STATUS_WORDS[line.status]}
          </span>
        </p>
        {!isPlain && <p className="text-[0.9375rem] text-ink-2">{line.sentence}</p>}
        <p className="text-sm text-ink-3">
          <TimeText at={line.takenAt} zone={zone} show="day-time" /> {nameOf(names, line.takenBy)}
          {line.note !== null && line.note !== "" && ` · “${line.note}”`}
        </p>
        <Marks line={line} marks={marks} parameter={parameter} {...props} />
        {marks.includes("unexplained") && (
          <div className="mt-2 print:hidden">{props.besideOff?.(line.readingId)}</div>
        )}
      </div>
      <span className="hidden pt-1 sm:block">
        <LineStrip
          value={line.qualifier === "" ? line.value : null}
          status={line.status}
          bounds={bounds[line.readingId]}
          parameter={parameter}
        />
      </span>
    </li>
  );
}

type MarksProps = Pick<DeviationListProps, "oldValues" | "names" | "zone"> &
  Deviation & { parameter: FacilityParameter };

function Marks({ line, marks, parameter, oldValues, names, zone }: MarksProps) {
  const old = line.supersedesId === null ? undefined : oldValues[line.supersedesId];
  return (
    <ul className="mt-0.5 text-[0.9375rem]">
      {line.explanations.map((each) => (
        <li key={`${each.at} ${each.text}`}>
          {nameOf(names, each.by)}: {each.text}
        </li>
      ))}
      {marks.includes("unexplained") && <li className="font-semibold">Not explained yet.</li>}
      {marks.includes("unconfirmed") && (
        <li className="font-semibold">Neither confirmed nor measured again yet.</li>
      )}
      {old !== undefined && (
        <li>
          Corrected: was{" "}
          <s className="decoration-1">
            <ReadingFigure reading={old} parameter={parameter} />
          </s>
          , now <ReadingFigure reading={line} parameter={parameter} />, by {nameOf(names, line.enteredBy)},{" "}
          <TimeText at={line.enteredAt} zone={zone} />. Reason: {line.correctionReason}
        </li>
      )}
      {marks.includes("late") && old === undefined && (
        <li>
          Entered late: <TimeText at={line.enteredAt} zone={zone} /> by {nameOf(names, line.enteredBy)}.
        </li>
      )}
    </ul>
  );
}
