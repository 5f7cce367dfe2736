"use client";
import { Checkbox, Field } from "@/lib/ui";

export interface PickManyProps<Value extends string | number> {
  label: string;
  hint?: string;
  error?: string | undefined;
  options: readonly { value: Value; label: string; hint?: string }[];
  value: readonly Value[];
  onChange: (value: Value[]) => void;
}

/** Any number of a few. */
export function PickMany<Value extends string | number>({
  label,
  hint,
  error,
  options,
  value,
  onChange,
}: PickManyProps<Value>) {
  return (
    <Field label={label} hint={hint} error={error} group>
      <div className="grid gap-x-6 sm:grid-cols-2">
        {options.map((option) => (
          <Checkbox
            key={option.value}
            label={option.label}
            hint={option.hint}
            checked={value.includes(option.value)}
            onChange={(event) =>
              onChange(
                event.target.checked ? [...value, option.value] : value.filter((one) => one !== option.value),
              )
            }
          />
        ))}
      </div>
    </Field>
  );
}
