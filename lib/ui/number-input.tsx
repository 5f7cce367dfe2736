"use client";
import { type ComponentProps, type Ref, useCallback, useRef } from "react";
import { useFieldAttributes } from "./field-context";
import { flipSign } from "./flip-sign";

export interface NumberInputProps extends Omit<ComponentProps<"input">, "type" | "size"> {
  unit?: string;
  /** Shows a ± key: the decimal pad of some phones has no minus. */
  signed?: boolean;
  size?: "normal" | "large";
  /** The outline of a judged value; the word belongs beside it (StatusWord). */
  status?: "within" | "watch" | "out" | "implausible" | "unjudged" | "none";
  ref?: Ref<HTMLInputElement>;
}

/** A number as typed: text with a decimal keypad, so that nothing typed is ever lost or silently changed. */
export function NumberInput({
  unit,
  signed = false,
  size = "normal",
  status,
  className = "",
  ref,
  ...rest
}: NumberInputProps) {
  const input = useRef<HTMLInputElement | null>(null);
  const setRef = useCallback(
    (element: HTMLInputElement | null) => {
      input.current = element;
      if (typeof ref === "function") return ref(element);
      if (ref) ref.current = element;
    },
    [ref],
  );
  return (
    <span className={`entry-box ${className}`} data-size={size} data-status={status}>
      {signed && (
        <button
          type="button"
          className="sign-key"
          aria-label="Change sign"
          disabled={rest.disabled || rest.readOnly}
          onClick={() => input.current && typeInto(input.current, flipSign(input.current.value))}
        >
          ±
        </button>
      )}
      <input
        {...rest}
        {...useFieldAttributes(rest)}
        ref={setRef}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        autoCorrect="off"
        spellCheck={false}
        enterKeyHint={rest.enterKeyHint ?? "next"}
      />
      {unit !== undefined && unit !== "" && (
        <span className="entry-unit" aria-hidden="true">
          {unit}
        </span>
      )}
    </span>
  );
}

/** Sets a value as if it had been typed, so that React and react-hook-form both hear of it. */
function typeInto(input: HTMLInputElement, value: string): void {
  Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, "value")?.set?.call(input, value);
  input.dispatchEvent(new Event("input", { bubbles: true }));
  input.focus();
}
