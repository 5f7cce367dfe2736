"use client";
import type { ComponentProps } from "react";
import { useFieldAttributes } from "./field-context";

export type TextInputProps = ComponentProps<"input">;

/** One line of text. Spread react-hook-form's `register(name)` into it. */
export function TextInput({ className = "", type = "text", ...rest }: TextInputProps) {
  return <input {...rest} {...useFieldAttributes(rest)} type={type} className={`control ${className}`} />;
}

export type TextareaProps = ComponentProps<"textarea">;

/** Several lines of text. */
export function Textarea({ className = "", ...rest }: TextareaProps) {
  return <textarea {...rest} {...useFieldAttributes(rest)} className={`control ${className}`} />;
}

export type DateInputProps = Omit<ComponentProps<"input">, "type"> & {
  /** `date` gives "YYYY-MM-DD", `datetime-local` "YYYY-MM-DDTHH:mm" (no zone: the facility's), `time` "HH:mm". */
  kind?: "date" | "datetime-local" | "time";
};

/** A calendar day, a time of day, or both, in the facility's zone; the browser's own control. */
export function DateInput({ kind = "date", className = "", ...rest }: DateInputProps) {
  return (
    <input
      {...rest}
      {...useFieldAttributes(rest)}
      type={kind}
      className={`control num max-w-[15rem] ${className}`}
    />
  );
}
