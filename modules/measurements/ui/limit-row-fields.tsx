"use client";
import { memo, type ReactNode, useId } from "react";
import { Button, DateInput, NumberInput, Select, TextInput } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter } from "@/modules/methods/model";
import {
  BOUND_FIELDS,
  type DraftKind,
  type DraftKnot,
  type DraftProblem,
  FIELD_WORDS,
  type LimitDraft,
  withKind,
} from "./limit-draft";

const KIND_WORDS: Readonly<Record<DraftKind, string>> = {
  constant: "Constant",
  ramp: "Ramp",
  season: "Season",
  suspended: "No limits",
};

/** Columns of the sheet on a desk: what, how, six limits, and what removes the row. Below that each row is a card. */
export const SHEET_COLUMNS =
  "grid grid-cols-2 gap-x-2.5 gap-y-2 sm:grid-cols-3 xl:grid-cols-[minmax(10rem,1.5fr)_8.75rem_repeat(6,minmax(5.25rem,1fr))_5.25rem]";

export interface LimitRowFieldsProps {
  /** What the row is called, for sentences and for those who hear it. */
  name: string;
  title: ReactNode;
  parameter: FacilityParameter;
  draft: LimitDraft;
  problems: readonly DraftProblem[];
  /** Kinds that can be chosen: a template has no suspension. */
  kinds: readonly DraftKind[];
  onChange: (draft: LimitDraft) => void;
  onRemove: () => void;
}

/** One row of a sheet of limits: its kind, its cells, and what is wrong under them. */
export const LimitRowFields = memo(function LimitRowFields(props: LimitRowFieldsProps) {
  const { name, title, parameter, draft, problems, kinds, onChange, onRemove } = props;
  const problemsId = useId();
  const cell = { ...props, problemsId };
  const isConstant = draft.kind === "constant";
  return (
    <fieldset className={`${SHEET_COLUMNS} items-start py-3`}>
      <legend className="sr-only">{name}</legend>
      <div className="col-span-full self-center xl:col-span-1">
        <b className="font-semibold">{title}</b>
        {unitLabel(parameter.unit) !== "" && <span className="unit">{unitLabel(parameter.unit)}</span>}
      </div>
      <div className="max-xl:col-span-full">
        <span className="text-sm text-ink-3 xl:sr-only">How it runs</span>
        <Select
          aria-label={`How the limits of ${name} run`}
          options={kinds.map((value) => ({ value, label: KIND_WORDS[value] }))}
          value={draft.kind}
          onChange={(event) => onChange(withKind(draft, event.target.value as DraftKind))}
        />
      </div>
      {isConstant && draft.knots[0] && <BoundCells {...cell} knot={draft.knots[0]} index={0} />}
      {draft.kind === "suspended" && <ReasonCell {...cell} />}
      {(draft.kind === "ramp" || draft.kind === "season") && (
        <p className="col-span-full self-center text-sm text-ink-2 xl:col-span-6">
          {draft.kind === "ramp"
            ? "In a straight line from day to day, each from 00:00; level before the first and after the last."
            : "In a straight line from day to day of every year, each from 00:00."}
        </p>
      )}
      <Button
        size="small"
        variant="quiet"
        className="max-xl:col-span-full max-xl:justify-self-start xl:col-start-9 xl:row-start-1 xl:self-center"
        aria-label={`Take ${name} off the sheet`}
        onClick={onRemove}
      >
        Remove
      </Button>
      {(draft.kind === "ramp" || draft.kind === "season") && <KnotLines {...cell} />}
      {problems.length > 0 && (
        <ul
          id={problemsId}
          className="col-span-full border-l-[3px] border-out-mark pl-3 font-semibold text-out"
        >
          {problems.map((problem) => (
            <li key={`${problem.knot} ${problem.sentence}`}>{problem.sentence}</li>
          ))}
        </ul>
      )}
    </fieldset>
  );
});

type CellProps = LimitRowFieldsProps & { problemsId: string };

function withKnot(draft: LimitDraft, index: number, change: Partial<DraftKnot>): LimitDraft {
  return { ...draft, knots: draft.knots.map((knot, at) => (at === index ? { ...knot, ...change } : knot)) };
}

const isWrong = (problems: readonly DraftProblem[], knot: number, field: string) =>
  problems.some((problem) => problem.knot === knot && (problem.fields as readonly string[]).includes(field));

function BoundCells(props: CellProps & { knot: DraftKnot; index: number }) {
  const { name, parameter, draft, problems, problemsId, onChange, knot, index } = props;
  const when = draft.kind === "constant" ? "" : ` on ${knot.when === "" ? `day ${index + 1}` : knot.when}`;
  return BOUND_FIELDS.map((field) => {
    const wrong = isWrong(problems, index, field);
    return (
      <div key={field} className="min-w-0">
        <span aria-hidden="true" className="text-sm text-ink-3 xl:sr-only">
          {FIELD_WORDS[field]}
        </span>
        <NumberInput
          aria-label={`${FIELD_WORDS[field]}, ${name}${when}`}
          aria-invalid={wrong || undefined}
          aria-describedby={wrong ? problemsId : undefined}
          className="w-full"
          signed={false}
          inputMode={parameter.mayBeNegative ? "text" : "decimal"}
          value={knot.texts[field]}
          onChange={(event) =>
            onChange(withKnot(draft, index, { texts: { ...knot.texts, [field]: event.target.value } }))
          }
        />
      </div>
    );
  });
}

function ReasonCell({ name, draft, problems, problemsId, onChange }: CellProps) {
  const wrong = isWrong(problems, 0, "reason");
  return (
    <div className="col-span-full xl:col-span-6">
      <span aria-hidden="true" className="text-sm text-ink-3 xl:sr-only">
        Why there are none
      </span>
      <TextInput
        aria-label={`Why there are no limits, ${name}`}
        aria-invalid={wrong || undefined}
        aria-describedby={wrong ? problemsId : undefined}
        placeholder="Why there are none: no animals, works …"
        value={draft.suspendedReason}
        onChange={(event) => onChange({ ...draft, suspendedReason: event.target.value })}
      />
    </div>
  );
}

function KnotLines(props: CellProps) {
  const { name, draft, problems, problemsId, onChange } = props;
  const last = draft.knots.at(-1);
  return (
    <>
      {draft.knots.map((knot, index) => {
        const wrong = isWrong(problems, index, "when");
        const attributes = {
          "aria-label": `Day ${index + 1} of ${name}`,
          "aria-invalid": wrong || undefined,
          "aria-describedby": wrong ? problemsId : undefined,
          value: knot.when,
          onChange: (event: { target: { value: string } }) =>
            onChange(withKnot(draft, index, { when: event.target.value })),
        };
        return (
          // a knot has no name of its own: its place in the list is what it is
          <div key={index} className="contents">
            <div className="col-span-full xl:col-span-2 xl:pl-6">
              <span aria-hidden="true" className="text-sm text-ink-3 xl:sr-only">
                Day {index + 1}
              </span>
              {draft.kind === "ramp" ? (
                <DateInput {...attributes} className="w-full" />
              ) : (
                <TextInput {...attributes} placeholder="month-day: 03-21" inputMode="numeric" />
              )}
            </div>
            <BoundCells {...props} knot={knot} index={index} />
            <Button
              size="small"
              variant="quiet"
              className="max-xl:col-span-full max-xl:justify-self-start"
              disabled={draft.knots.length <= 2}
              aria-label={`Remove day ${index + 1} of ${name}`}
              onClick={() => onChange({ ...draft, knots: draft.knots.filter((_, at) => at !== index) })}
            >
              Remove
            </Button>
          </div>
        );
      })}
      <div className="col-span-full xl:pl-6">
        <Button
          size="small"
          aria-label={`Add a day to ${name}`}
          onClick={() =>
            last && onChange({ ...draft, knots: [...draft.knots, { when: "", texts: last.texts }] })
          }
        >
          Add a day
        </Button>
      </div>
    </>
  );
}

/** The heads of the columns, on a desk. */
export function SheetHead() {
  return (
    <div
      aria-hidden="true"
      className={`${SHEET_COLUMNS} sticky top-0 z-10 hidden! border-b border-rule bg-sheet py-2 text-sm text-ink-3 xl:grid!`}
    >
      <span>Point, parameter</span>
      <span>How it runs</span>
      {BOUND_FIELDS.map((field) => (
        <span key={field}>{FIELD_WORDS[field]}</span>
      ))}
    </div>
  );
}
