"use client";
import type { ComponentProps } from "react";
import { useFieldAttributes } from "./field-context";

export interface SelectOption {
  value: string;
  label: string;
  disabled?: boolean;
}

/** Options under a heading of their own. */
export interface SelectGroup {
  label: string;
  options: readonly SelectOption[];
}

export interface SelectProps extends ComponentProps<"select"> {
  options?: readonly (SelectOption | SelectGroup)[];
  /** The first, empty entry ("Choose a system"); its value is "". */
  placeholder?: string;
}

/** One of many. The browser's own list: it works with a thumb, a keyboard and a screen reader alike. */
export function Select({ options, placeholder, className = "", children, ...rest }: SelectProps) {
  return (
    <select {...rest} {...useFieldAttributes(rest)} className={`control ${className}`}>
      {placeholder !== undefined && <option value="">{placeholder}</option>}
      {options?.map((entry) =>
        "options" in entry ? (
          <optgroup key={entry.label} label={entry.label}>
            {entry.options.map(toOption)}
          </optgroup>
        ) : (
          toOption(entry)
        ),
      )}
      {children}
    </select>
  );
}

function toOption(option: SelectOption) {
  return (
    <option key={option.value} value={option.value} disabled={option.disabled}>
      {option.label}
    </option>
  );
}
