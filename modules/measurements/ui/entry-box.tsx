"use client";
import type { KeyboardEvent } from "react";
import { flipSign } from "@/lib/ui/flip-sign";
import { unitLabel } from "@/lib/units/factors";
import type { EntryCell } from "./use-entry";

interface EntryBoxProps {
  entry: EntryCell;
  label: string;
  describedBy: string;
  /** Enter: hand over, then on to the next box. */
  onEnter: (input: HTMLInputElement) => void;
}

/** The box in which a number or a text is typed: 56 px high, decimal keypad, ± where it may be negative, unit beside it. */
export function EntryBox({ entry, label, describedBy, onEnter }: EntryBoxProps) {
  const { row, draft, verdict, change, commit } = entry;
  const { kind, mayBeNegative } = row.parameter;
  const isText = kind === "text";
  const status = verdict.state === "judged" ? verdict.verdict.status : undefined;
  const isWrong = draft.asked && verdict.state === "wrong";
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key !== "Enter" || event.nativeEvent.isComposing) return;
    event.preventDefault();
    onEnter(event.currentTarget);
  };
  return (
    <span className="entry-box" data-size="large" data-status={status}>
      {!isText && mayBeNegative && (
        <button
          type="button"
          className="sign-key"
          aria-label={`Change the sign of ${label}`}
          // keeps the keypad up and the box in focus
          onPointerDown={(event) => event.preventDefault()}
          onClick={() => change({ text: flipSign(draft.text) })}
        >
          ±
        </button>
      )}
      <input
        data-entry={entry.cell}
        type="text"
        inputMode={isText ? "text" : "decimal"}
        enterKeyHint="next"
        autoComplete="off"
        autoCorrect="off"
        spellCheck={isText}
        className={isText ? "!text-left !font-sans !text-lg" : undefined}
        aria-label={label}
        aria-describedby={describedBy}
        aria-invalid={isWrong || undefined}
        value={draft.text}
        onChange={(event) => change({ text: event.target.value })}
        onKeyDown={onKeyDown}
        onBlur={(event) => {
          // the buttons under the box belong to it: leaving it for them hands nothing over
          if (!event.relatedTarget?.closest(`[data-cell="${entry.cell}"]`)) commit();
        }}
      />
      <UnitPart entry={entry} label={label} />
    </span>
  );
}

/** The unit: a label, or a list where the value may be typed in several. */
function UnitPart({ entry: { row, draft, change }, label }: { entry: EntryCell; label: string }) {
  const { acceptedUnits, kind } = row.parameter;
  if (kind === "text" || draft.unit === null) return null;
  if (acceptedUnits.length < 2) {
    const text = unitLabel(draft.unit);
    return text === "" ? null : (
      <span className="entry-unit" aria-hidden="true">
        {text}
      </span>
    );
  }
  return (
    <select
      className="entry-units"
      aria-label={`Unit of ${label}`}
      value={draft.unit}
      onChange={(event) => change({ unit: event.target.value })}
    >
      {acceptedUnits.map((unit) => (
        <option key={unit} value={unit}>
          {unitLabel(unit) || "number"}
        </option>
      ))}
    </select>
  );
}
