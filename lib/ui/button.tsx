import Link from "next/link";
import type { ComponentProps, ReactNode } from "react";

/** `next` is the one filled button of a screen: the act that is due. Everything else is outlined or quiet. */
export type ButtonVariant = "next" | "plain" | "quiet" | "danger";
export type ButtonSize = "small" | "normal" | "large";

interface ButtonLook {
  variant?: ButtonVariant;
  /** `small` is 36 px with a mouse and 48 px on touch; `large` (56 px) is for wet hands. */
  size?: ButtonSize;
}

export interface ButtonProps extends Omit<ComponentProps<"button">, "type">, ButtonLook {
  type?: "button" | "submit" | "reset";
  /** What the button says while its work runs; it cannot be pressed again meanwhile. */
  busy?: boolean;
  busyText?: string;
}

/** A button. It never submits a form unless it says `type="submit"`. */
export function Button({
  variant = "plain",
  size = "normal",
  type = "button",
  busy = false,
  busyText,
  className = "",
  children,
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={busy ? "button" : type}
      className={`btn ${className}`}
      data-variant={variant}
      data-size={size}
      data-busy={busy || undefined}
      aria-disabled={busy || undefined}
      onClick={busy ? undefined : onClick}
    >
      {busy && busyText !== undefined ? busyText : children}
    </button>
  );
}

export interface LinkButtonProps extends Omit<ComponentProps<typeof Link>, "className">, ButtonLook {
  className?: string;
}

/** A link that looks like a button: it goes somewhere, it does nothing. */
export function LinkButton({ variant = "plain", size = "normal", className = "", ...rest }: LinkButtonProps) {
  return <Link {...rest} className={`btn ${className}`} data-variant={variant} data-size={size} />;
}

/** Buttons in a row that wraps; `end` pushes the group to the right edge. */
export function ButtonRow({ children, end = false }: { children: ReactNode; end?: boolean }) {
  return <div className={`flex flex-wrap gap-2.5 ${end ? "justify-end" : ""}`}>{children}</div>;
}
