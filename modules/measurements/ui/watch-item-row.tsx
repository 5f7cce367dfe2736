"use client";
import { Button, Field, Select, TextInput } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter, InstrumentRow, MethodRow } from "@/modules/methods/model";

/** One line of a point's list while it is changed. */
export interface WatchDraft {
  readonly parameterId: number;
  /** Days as typed; empty for whenever it is wanted. */
  readonly everyDays: string;
  readonly unit: string;
  readonly methodId: number | null;
  readonly instrumentId: number | null;
}

export interface WatchItemRowProps {
  draft: WatchDraft;
  position: number;
  isLast: boolean;
  parameters: readonly FacilityParameter[];
  methods: readonly MethodRow[];
  instruments: readonly InstrumentRow[];
  error: string | undefined | null;
  onMove: (by: -1 | 1) => void;
  onChange: (change: Partial<WatchDraft>) => void;
  onRemove: () => void;
}

const numberOrNull = (text: string) => (text === "" ? null : Number(text));

/** One parameter that is read at a point, with its place in the order. */
export function WatchItemRow(props: WatchItemRowProps) {
  const { draft, position, isLast, parameters, methods, instruments, error, onMove, onChange, onRemove } =
    props;
  const parameter = parameters.find((each) => each.id === draft.parameterId);
  const name = parameter?.name ?? "a retired parameter";
  const fitting = methods.filter((each) => each.parameterId === draft.parameterId);
  return (
    <li className="grid grid-cols-2 items-end gap-x-2.5 gap-y-2 py-3 lg:grid-cols-[minmax(9rem,1.4fr)_7rem_repeat(3,minmax(7rem,1fr))_auto]">
      <p className="col-span-full font-semibold lg:col-span-1 lg:self-center lg:pt-6">
        <span className="num mr-2 font-normal text-ink-3">{position + 1}</span>
        {name}
      </p>
      <Field label={<Short text="Every (days)" of={name} />} required>
        <TextInput
          inputMode="numeric"
          value={draft.everyDays}
          aria-invalid={error ? true : undefined}
          onChange={(event) => onChange({ everyDays: event.target.value })}
        />
      </Field>
      <Field label={<Short text="Typed in" of={name} />} required>
        <Select
          placeholder={parameter?.unit ? unitLabel(parameter.unit) || parameter.unit : "no unit"}
          options={(parameter?.acceptedUnits ?? [])
            .filter((code) => code !== parameter?.unit)
            .map((code) => ({ value: code, label: unitLabel(code) || code }))}
          value={draft.unit === parameter?.unit ? "" : draft.unit}
          onChange={(event) => onChange({ unit: event.target.value })}
        />
      </Field>
      <Field label={<Short text="Method" of={name} />} required>
        <Select
          placeholder="none"
          options={fitting.map((each) => ({ value: String(each.id), label: each.code }))}
          value={String(draft.methodId ?? "")}
          onChange={(event) => onChange({ methodId: numberOrNull(event.target.value) })}
        />
      </Field>
      <Field label={<Short text="Instrument" of={name} />} required>
        <Select
          placeholder="none"
          options={instruments.map((each) => ({
            value: String(each.id),
            label: `${each.code} ${each.name}`,
          }))}
          value={String(draft.instrumentId ?? "")}
          onChange={(event) => onChange({ instrumentId: numberOrNull(event.target.value) })}
        />
      </Field>
      <span className="col-span-full flex gap-2 lg:col-span-1">
        <Button
          size="small"
          disabled={position === 0}
          aria-label={`Move ${name} up`}
          onClick={() => onMove(-1)}
        >
          ↑
        </Button>
        <Button size="small" disabled={isLast} aria-label={`Move ${name} down`} onClick={() => onMove(1)}>
          ↓
        </Button>
        <Button size="small" variant="quiet" aria-label={`Take ${name} off the list`} onClick={onRemove}>
          Remove
        </Button>
      </span>
      {error && (
        <p className="col-span-full border-l-[3px] border-out-mark pl-3 font-semibold text-out">{error}</p>
      )}
    </li>
  );
}

/** A short label that says to those who only hear it which row it belongs to. */
function Short({ text, of }: { text: string; of: string }) {
  return (
    <>
      {text}
      <span className="sr-only">, {of}</span>
    </>
  );
}
