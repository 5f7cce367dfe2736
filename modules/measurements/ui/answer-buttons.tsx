"use client";
import type { ParameterChoice } from "@/modules/methods/model";
import type { EntryCell } from "./use-entry";

const YES_NO: readonly ParameterChoice[] = [
  { code: "yes", label: "Yes", means: "none" },
  { code: "no", label: "No", means: "none" },
];

/** The answers of a check in the order of its catalogue; plain yes and no where it names none. */
export function answersOf({ row }: Pick<EntryCell, "row">): readonly ParameterChoice[] {
  return row.parameter.choices.length > 0 ? row.parameter.choices : YES_NO;
}

interface AnswerButtonsProps {
  entry: EntryCell;
  label: string;
  describedBy: string;
  onDone: () => void;
}

/** The answers of a check as big buttons; a press hands over at once, except an answer that is off, which is confirmed. */
export function AnswerButtons({ entry, label, describedBy, onDone }: AnswerButtonsProps) {
  const { isOpen, item, draft, commit } = entry;
  const picked = isOpen ? draft.text : item?.reading.typedText;
  return (
    <div role="group" aria-label={label} aria-describedby={describedBy} className="flex flex-wrap gap-2.5">
      {answersOf(entry).map((choice, index) => {
        const isPicked = picked === choice.code;
        return (
          <button
            key={choice.code}
            type="button"
            className="btn answer-button max-sm:grow"
            data-entry={index === 0 && isOpen ? entry.cell : undefined}
            aria-pressed={isPicked}
            disabled={!isOpen && !isPicked}
            onClick={() => isOpen && commit({ text: choice.code }) && onDone()}
          >
            {choice.label}
          </button>
        );
      })}
    </div>
  );
}
