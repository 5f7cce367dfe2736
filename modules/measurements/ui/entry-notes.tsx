"use client";
import Link from "next/link";
import { type FormEvent, type ReactNode, useState } from "react";
import { Button, StatusWord, timeText } from "@/lib/ui";
import { needsConfirmation, parameterInUnit } from "../model";
import { verdictInUnit } from "../rules/verdict-in-unit";
import { statusOf } from "./hand-over";
import { applySlip, shortGround, slipLabel } from "./judge-typed";
import type { EntryCell } from "./use-entry";

interface EntryNotesProps {
  entry: EntryCell;
  id: string;
  zone: string;
  /** After a button here has done its work: on to the next box. */
  onDone: () => void;
  renderIncidentLink?: ((readingId: number) => ReactNode) | undefined;
}

/** What is to be said under a box: its status, what may have been meant, how its sending goes, the explanation. */
export function EntryNotes(props: EntryNotesProps) {
  const { entry, id } = props;
  return (
    <div id={id} className="flex flex-col items-end gap-2 text-right empty:hidden" aria-live="polite">
      {entry.isOpen ? <TypedNotes {...props} /> : <SentNotes {...props} />}
    </div>
  );
}

function TypedNotes({ entry, onDone }: EntryNotesProps) {
  const { draft, verdict, row, change, commit } = entry;
  if (verdict.state === "empty") return null;
  if (verdict.state === "wrong") {
    return draft.asked ? <p className="font-semibold text-out">{verdict.sentence}</p> : null;
  }
  if (verdict.state === "left-to-server") return <p className="text-sm text-ink-3">{verdict.sentence}</p>;
  const { status, side } = verdict.verdict;
  const { parameter } = row;
  const { decimals, unit } = parameterInUnit(parameter, draft.unit);
  const shown = verdictInUnit(verdict.verdict, verdict.value, parameter, unit);
  const ground = shortGround(shown, decimals, unit !== parameter.unit);
  const isShown = status !== "within" && status !== "none";
  if (!isShown && verdict.slips.length === 0) return null;
  const typed = { text: draft.text, unit: draft.unit, takenAt: 0 };
  return (
    <>
      {isShown && (
        <StatusWord
          status={status}
          direction={side === "change" ? null : side}
          detail={ground || undefined}
        />
      )}
      {draft.asked && verdict.mustBeConfirmed && <p className="text-sm text-ink-2">{shown.sentence}</p>}
      <span className="flex flex-wrap justify-end gap-2">
        {verdict.slips.map((slip) => (
          <Button
            key={slipLabel(typed, slip)}
            title={slip.sentence}
            aria-label={`${slip.sentence} Use ${slipLabel(typed, slip).replace("?", "")}`}
            onClick={() => change({ ...applySlip(typed, slip), asked: false })}
          >
            {slipLabel(typed, slip)}
          </Button>
        ))}
        {verdict.mustBeConfirmed && (
          <Button onClick={() => commit({ confirmed: true }) && onDone()}>It really shows this</Button>
        )}
      </span>
    </>
  );
}

function SentNotes({ entry, zone, renderIncidentLink }: EntryNotesProps) {
  const { item, anew, mend, confirmStored } = entry;
  if (!item) return null;
  const status = statusOf(item);
  const isOff = status !== null && needsConfirmation(status);
  const readingId = item.answer?.readingId;
  const asksConfirmation =
    item.answer?.mustBeConfirmed === true && !item.followers.some((each) => each.path === "confirmation");
  const side = item.answer?.side;
  return (
    <>
      {status !== null && status !== "within" && status !== "none" && (
        <StatusWord status={status} direction={side === "high" || side === "low" ? side : null} />
      )}
      {isOff && item.answer?.sentence ? <p className="text-sm text-ink-2">{item.answer.sentence}</p> : null}
      {asksConfirmation && <Button onClick={confirmStored}>It really shows this</Button>}
      {item.stage === "refused" ? (
        <>
          <p className="font-semibold text-out">Not stored: {item.sentence}</p>
          <Button onClick={mend}>Mend it</Button>
        </>
      ) : (
        <span className="flex flex-wrap items-center justify-end gap-x-1 text-sm text-ink-3">
          <span>
            {STAGE_WORDS[item.stage]}
            {item.stage === "sent" ? ` ${timeText(item.reading.takenAt, zone, "time")}` : ""}
          </span>
          {readingId !== undefined && (
            <Link href={`/readings/${readingId}`} className="btn" data-variant="quiet" data-size="small">
              Correct…
            </Link>
          )}
          <Button variant="quiet" size="small" onClick={anew}>
            Measure again
          </Button>
        </span>
      )}
      {isOff && item.stage !== "refused" && <ExplainField entry={entry} />}
      {isOff && readingId !== undefined && renderIncidentLink?.(readingId)}
    </>
  );
}

const STAGE_WORDS = {
  queued: "about to be sent",
  sending: "sending",
  waiting: "not sent yet",
  sent: "sent",
} as const;

/** Why it is off, in the person's words; kept with the reading. */
function ExplainField({ entry: { item, row, explain } }: { entry: EntryCell }) {
  const [text, setText] = useState("");
  const said = item?.followers.filter((each) => each.path === "explanation") ?? [];
  const isTooShort = text.trim().length < 3;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (isTooShort) return;
    explain(text.trim());
    setText("");
  };
  return (
    <div className="w-full max-w-xl text-left">
      {said.map((each) => (
        <p key={each.key} className="border-l-2 border-rule pl-3 text-[0.9375rem]">
          {String(each.body.text)}{" "}
          <span className="text-sm text-ink-3">
            {each.stage === "refused" ? `not stored: ${each.sentence}` : STAGE_WORDS[each.stage]}
          </span>
        </p>
      ))}
      {said.every((each) => each.stage === "refused") && (
        <form onSubmit={submit} className="flex flex-wrap items-end gap-2">
          <label className="min-w-48 flex-1">
            <span className="mb-1 block text-sm text-ink-2">{row.parameter.name}: why is it off?</span>
            <input
              className="control"
              value={text}
              maxLength={500}
              placeholder="What was found, what was done"
              onChange={(event) => setText(event.target.value)}
            />
          </label>
          <Button type="submit" disabled={isTooShort}>
            Explain
          </Button>
        </form>
      )}
    </div>
  );
}
