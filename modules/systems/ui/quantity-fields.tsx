"use client";
import { Field, NumberInput } from "@/lib/ui";
import type { TypedQuantity } from "../model";

type QuantityFieldsProps = {
  label: string;
  /** Path in the form; a refusal of the server points at it. */
  name: string;
  unit: string;
  value: TypedQuantity;
  onChange: (value: TypedQuantity) => void;
  error?: string | undefined;
  hint?: string;
  signed?: boolean;
};

/** A quantity and, after ±, its standard uncertainty in the same unit. */
export function QuantityFields({
  label,
  name,
  unit,
  value,
  onChange,
  error,
  hint,
  signed,
}: QuantityFieldsProps) {
  return (
    <div className="grid grid-cols-[1fr_9rem] items-start gap-x-3">
      <Field label={label} name={name} required error={error} hint={hint}>
        <NumberInput
          unit={unit}
          signed={signed ?? false}
          value={value.text}
          onChange={(event) => onChange({ ...value, text: event.target.value })}
        />
      </Field>
      <Field
        label={
          <>
            <span aria-hidden="true">± u</span>
            <span className="sr-only">Standard uncertainty of {label.toLowerCase()}</span>
          </>
        }
        name={`${name}.uncertainty`}
        required
      >
        <NumberInput
          unit={unit}
          value={value.uncertainty}
          placeholder="0"
          onChange={(event) => onChange({ ...value, uncertainty: event.target.value })}
        />
      </Field>
    </div>
  );
}
