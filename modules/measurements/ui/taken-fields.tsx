"use client";
import { useCallback, useMemo, useState } from "react";
import { systemClock } from "@/lib/clock";
import { Button, DateInput, Field, RadioButtons, Select } from "@/lib/ui";
import type { Taken } from "./hand-over";
import { readTakenAt, type TakenMoment } from "./taken-moment";

export interface PersonName {
  readonly id: number;
  readonly name: string;
}

interface TakenState {
  text: string;
  which: "earlier" | "later" | null;
  by: number | null;
}

/** When and by whom the values of a sheet were taken; `taken` is null while the time cannot be used. */
export function useTaken(zone: string) {
  const [state, setState] = useState<TakenState>({ text: "", which: null, by: null });
  const moment: TakenMoment = readTakenAt(state.text, zone, systemClock.now(), state.which);
  const usable = moment.ok;
  const at = moment.ok ? moment.at : null;
  const taken = useMemo<Taken | null>(() => (usable ? { at, by: state.by } : null), [usable, at, state.by]);
  const change = useCallback((part: Partial<TakenState>) => setState((old) => ({ ...old, ...part })), []);
  return { state, moment, taken, change };
}

interface TakenFieldsProps {
  taken: ReturnType<typeof useTaken>;
  people: readonly PersonName[];
  personId: number;
}

/** "Taken now, by me", and the fields to say otherwise. */
export function TakenFields({ taken: { state, moment, change }, people, personId }: TakenFieldsProps) {
  const [open, setOpen] = useState(false);
  if (!open) {
    return (
      <p className="flex flex-wrap items-center gap-x-2 text-ink-2">
        Taken now, by you.
        <Button variant="quiet" size="small" onClick={() => setOpen(true)}>
          Another time or person
        </Button>
      </p>
    );
  }
  const others = people.filter((each) => each.id !== personId);
  return (
    <div className="flex flex-wrap items-start gap-x-5 gap-y-3">
      <Field
        label="Taken at"
        required
        hint={moment.ok && moment.at === null ? "Empty: now" : undefined}
        error={moment.ok ? undefined : moment.sentence}
      >
        <DateInput
          kind="datetime-local"
          value={state.text}
          onChange={(event) => change({ text: event.target.value, which: null })}
        />
      </Field>
      {((!moment.ok && moment.kind === "doubled") || state.which !== null) && (
        <Field label="Which of the two" group required>
          <RadioButtons
            name="which"
            value={state.which ?? ""}
            onChange={(event) => change({ which: event.target.value === "later" ? "later" : "earlier" })}
            options={[
              { value: "earlier", label: "the first" },
              { value: "later", label: "the second" },
            ]}
          />
        </Field>
      )}
      <Field label="Taken by" required>
        <Select
          value={state.by === null ? "" : String(state.by)}
          onChange={(event) => change({ by: event.target.value === "" ? null : Number(event.target.value) })}
          placeholder="You"
          options={others.map((each) => ({ value: String(each.id), label: each.name }))}
        />
      </Field>
      {(state.text !== "" || state.by !== null) && (
        <Button
          variant="quiet"
          className="self-end"
          onClick={() => {
            change({ text: "", which: null, by: null });
            setOpen(false);
          }}
        >
          Back to now, by you
        </Button>
      )}
    </div>
  );
}
