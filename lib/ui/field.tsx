"use client";
import { type ReactNode, useId, useMemo } from "react";
import { FieldContext } from "./field-context";
import { fieldId } from "./field-id";

export interface FieldProps {
  label: ReactNode;
  /** The field's name in the form; gives the control the id `field-<name>`, to which an error summary links. */
  name?: string;
  hint?: ReactNode;
  /** A sentence: what is wrong and how to mend it. */
  error?: ReactNode;
  required?: boolean;
  /** Several controls under one label (picks, check boxes): a group with a legend instead of a label. */
  group?: boolean;
  className?: string;
  children: ReactNode;
}

/** A label, its control, a hint and the error, tied together for eyes and for assistive technology. */
export function Field({
  label,
  name,
  hint,
  error,
  required = false,
  group = false,
  className = "",
  children,
}: FieldProps) {
  const auto = useId();
  const id = name ? fieldId(name) : `field${auto}`;
  const hasHint = hint !== undefined && hint !== null && hint !== false;
  const hasError = error !== undefined && error !== null && error !== false && error !== "";
  const describedBy =
    [hasHint && `${id}-hint`, hasError && `${id}-error`].filter(Boolean).join(" ") || undefined;
  const context = useMemo(
    () => ({ id, describedBy, invalid: hasError, required }),
    [id, describedBy, hasError, required],
  );
  const labelText = (
    <>
      {label}
      {!required && <span className="font-normal text-ink-3"> (optional)</span>}
    </>
  );
  const notes = (
    <>
      {hasHint && (
        <p id={`${id}-hint`} className="mt-1 text-sm text-ink-3">
          {hint}
        </p>
      )}
      {hasError && (
        <p id={`${id}-error`} className="mt-1.5 flex gap-1.5 text-[0.9375rem] font-semibold text-out">
          <span aria-hidden="true" className="mt-[0.3em] h-[0.8em] w-[3px] flex-none bg-out-mark" />
          <span>{error}</span>
        </p>
      )}
    </>
  );
  if (group) {
    return (
      <FieldContext value={context}>
        <fieldset id={id} aria-describedby={describedBy} className={className} tabIndex={-1}>
          <legend className="mb-1.5 font-semibold">{labelText}</legend>
          {children}
          {notes}
        </fieldset>
      </FieldContext>
    );
  }
  return (
    <FieldContext value={context}>
      <div className={className}>
        <label htmlFor={id} className="mb-1 block font-semibold">
          {labelText}
        </label>
        {children}
        {notes}
      </div>
    </FieldContext>
  );
}
