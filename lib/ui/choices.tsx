"use client";
import type { ComponentProps, ReactNode } from "react";
import { useFieldAttributes } from "./field-context";

export interface CheckboxProps extends Omit<ComponentProps<"input">, "type"> {
  label: ReactNode;
  hint?: ReactNode;
}

/** Yes or no, with its sentence beside it; the whole line can be touched. */
export function Checkbox({ label, hint, className = "", ...rest }: CheckboxProps) {
  return (
    <label className={`choice ${className}`}>
      <input {...rest} type="checkbox" />
      <span>
        {label}
        {hint !== undefined && <span className="block text-sm text-ink-3">{hint}</span>}
      </span>
    </label>
  );
}

export interface RadioOption {
  value: string;
  label: ReactNode;
  disabled?: boolean;
}

export interface RadioButtonsProps
  extends Omit<ComponentProps<"input">, "type" | "value" | "defaultValue" | "onChange"> {
  name: string;
  options: readonly RadioOption[];
  /** Controlled value; leave out with react-hook-form's `register`. */
  value?: string;
  defaultValue?: string;
  onChange?: ComponentProps<"input">["onChange"];
  /** Name of the group when it stands outside a `Field group`. */
  label?: string;
}

/**
 * One of a few, as buttons big enough for a wet thumb. Arrow keys move between them. Use inside `<Field group>`.
 * With `register`, nothing picked comes as null: an optional pick is `.nullish()` in its schema.
 */
export function RadioButtons({
  options,
  value,
  defaultValue,
  label,
  className = "",
  ...rest
}: RadioButtonsProps) {
  const { "aria-invalid": invalid } = useFieldAttributes({});
  return (
    <div
      role="radiogroup"
      aria-label={label}
      aria-invalid={invalid}
      className={`flex flex-wrap gap-2.5 ${className}`}
    >
      {options.map((option) => (
        <label key={option.value} className="pick">
          <input
            {...rest}
            type="radio"
            value={option.value}
            disabled={option.disabled || rest.disabled}
            {...(value === undefined ? {} : { checked: value === option.value })}
            {...(defaultValue === undefined ? {} : { defaultChecked: defaultValue === option.value })}
          />
          <span>{option.label}</span>
        </label>
      ))}
    </div>
  );
}
