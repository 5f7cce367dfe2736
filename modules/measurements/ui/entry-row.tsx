"use client";
import { type ReactNode, useId } from "react";
import { agoText, WellStrip } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import { type RecentReading, rowInUnit, type WatchRow } from "../model";
import { inUnit } from "../rules/in-unit";
import { AnswerButtons, answersOf } from "./answer-buttons";
import { EntryBox } from "./entry-box";
import { EntryNotes } from "./entry-notes";
import { statusOf } from "./hand-over";
import { ReadingFigure } from "./reading-figure";
import type { EntryCell } from "./use-entry";

interface EntryRowProps {
  entry: EntryCell;
  /** What stands before the parameter's name for those who do not see the page: system and point. */
  place: string;
  now: number;
  zone: string;
  onEnter: (from: HTMLElement) => void;
  renderIncidentLink?: ((readingId: number) => ReactNode) | undefined;
}

/** One thing to read: its name and last value, the well strip, the box, and what is to be said about it. */
export function EntryRow({ entry, place, now, zone, onEnter, renderIncidentLink }: EntryRowProps) {
  const { row, isOpen, cell } = entry;
  const { kind, name } = row.parameter;
  const notes = useId();
  const isAnswer = kind === "choice" || kind === "yes-no";
  const isNumber = kind === "number" || kind === "count";
  const label = `${place}, ${name}`;
  const goOn = () => {
    const here = document.querySelector<HTMLElement>(`[data-cell="${cell}"]`);
    if (here) onEnter(here);
  };
  return (
    <li
      data-cell={cell}
      className="entry-row"
      data-kind={isAnswer ? "answer" : kind === "text" ? "text" : "number"}
    >
      <div className="entry-name">
        <h3 className="!font-sans text-[1.0625rem]">{name}</h3>
        <p className="text-sm text-ink-3">
          <LastValue entry={entry} now={now} />
        </p>
      </div>
      {isNumber && <Strip entry={entry} />}
      <div className="entry-place">
        {isAnswer ? (
          <AnswerButtons entry={entry} label={label} describedBy={notes} onDone={goOn} />
        ) : isOpen ? (
          <EntryBox
            entry={entry}
            label={label}
            describedBy={notes}
            onEnter={(input) => {
              if (entry.commit() || input.value.trim() === "") onEnter(input);
            }}
          />
        ) : (
          <SentBox entry={entry} />
        )}
      </div>
      <div className="entry-notes">
        <EntryNotes
          entry={entry}
          id={notes}
          zone={zone}
          onDone={goOn}
          renderIncidentLink={renderIncidentLink}
        />
      </div>
    </li>
  );
}

/** A value that has been handed over: it stands, and is no longer typed in. */
function SentBox({ entry: { item, row } }: { entry: EntryCell }) {
  if (!item) return null;
  const isText = row.parameter.kind === "text";
  const { typedText, typedUnit } = item.reading;
  return (
    <div
      className={`entry-box items-center !border-dashed ${isText ? "" : "justify-end"}`}
      data-size="large"
      data-status={statusOf(item) ?? undefined}
    >
      <span className={`px-2.5 ${isText ? "py-2" : "num text-[1.6875rem] leading-none"}`}>{typedText}</span>
      <span className="entry-unit">{unitLabel(typedUnit)}</span>
    </div>
  );
}

/** The strip in the unit in which the value is typed, where a factor is enough; else in the canonical one. */
function Strip({ entry: { row: canonical, draft, verdict, item, isOpen } }: { entry: EntryCell }) {
  const row = rowInUnit(canonical, draft.unit);
  const bounds = row.limits.state === "in-force" ? row.limits.bounds : {};
  const { decimals, name, unit, plausible } = row.parameter;
  const judged = isOpen && verdict.state === "judged" ? verdict : null;
  const value = (isOpen ? judged?.value.value : item?.canonical) ?? null;
  const status = isOpen ? judged?.verdict.status : ((item && statusOf(item)) ?? undefined);
  const previous = row.recent.find((each) => each.value !== null && each.qualifier === "")?.value ?? null;
  return (
    <div className="entry-strip">
      <WellStrip
        fluid
        name={name}
        unit={unitLabel(unit)}
        decimals={decimals}
        value={value === null ? null : inUnit(value, canonical.parameter.unit, unit)}
        previous={previous}
        {...(status ? { status } : {})}
        target={bounds.target}
        watchLow={bounds.watchLow}
        watchHigh={bounds.watchHigh}
        toleranceLow={bounds.toleranceLow}
        toleranceHigh={bounds.toleranceHigh}
        possibleLow={plausible.low}
        possibleHigh={plausible.high}
      />
    </div>
  );
}

function LastValue({ entry, now }: { entry: EntryCell; now: number }) {
  const shown = rowInUnit(entry.row, entry.draft.unit);
  const last = shown.recent[0];
  if (!last) return <>not read yet</>;
  return (
    <>
      last <LastFigure entry={entry} row={shown} last={last} /> <span aria-hidden="true">·</span>{" "}
      <span className="whitespace-nowrap">{agoText(last.takenAt, now)}</span>
    </>
  );
}

/** The last value in the unit in which the next one is typed, where a factor is enough; else in the canonical one. */
function LastFigure({ entry, row, last }: { entry: EntryCell; row: WatchRow; last: RecentReading }) {
  if (last.answer !== null) {
    const choice = answersOf(entry).find((each) => each.code === last.answer);
    return <b className="font-semibold text-ink-2">{choice?.label ?? last.answer}</b>;
  }
  return <ReadingFigure className="font-semibold text-ink-2" reading={last} parameter={row.parameter} />;
}
