"use client";
import type { ReactNode } from "react";
import { Menu as AriaMenu, Button, MenuItem, MenuTrigger, Popover } from "react-aria-components";

export interface MenuEntry {
  id: string;
  label: ReactNode;
  onAction?: () => void;
  href?: string;
  disabled?: boolean;
}

export interface MenuProps {
  /** On the button that opens it. */
  label: ReactNode;
  /** Spoken instead of the label when that is not plain text. */
  ariaLabel?: string;
  entries: readonly MenuEntry[];
  variant?: "plain" | "quiet";
}

/** Rarer acts behind one button. Opens on press, works by arrow keys and by first letters. */
export function Menu({ label, ariaLabel, entries, variant = "plain" }: MenuProps) {
  return (
    <MenuTrigger>
      <Button className="btn" data-variant={variant} aria-label={ariaLabel}>
        {label}
        <svg width="10" height="6" viewBox="0 0 10 6" aria-hidden="true">
          <path d="M1 1L5 5L9 1" fill="none" stroke="currentColor" strokeWidth="1.6" />
        </svg>
      </Button>
      <Popover className="menu-pop" placement="bottom start">
        <AriaMenu
          className="outline-none"
          aria-label={ariaLabel ?? (typeof label === "string" ? label : "Menu")}
        >
          {entries.map((entry) => (
            <MenuItem
              key={entry.id}
              id={entry.id}
              href={entry.href}
              onAction={entry.onAction}
              isDisabled={entry.disabled ?? false}
              className="menu-item"
            >
              {entry.label}
            </MenuItem>
          ))}
        </AriaMenu>
      </Popover>
    </MenuTrigger>
  );
}
