"use client";
import { useState } from "react";
import { RadioButtons } from "./choices";
import { readTheme, THEME_COOKIE, THEME_WORDS, THEMES, type Theme } from "./theme";

export interface ThemeChoiceProps {
  /** What the server rendered. */
  current: Theme;
  onChoose?: (theme: Theme) => void;
}

const YEAR_S = 31_536_000;

/** Puts a theme on the page at once and keeps it on this device for a year. */
export function chooseTheme(theme: Theme): void {
  document.documentElement.dataset.theme = theme;
  const secure = location.protocol === "https:" ? "; Secure" : "";
  document.cookie = `${THEME_COOKIE}=${theme}; Path=/; Max-Age=${YEAR_S}; SameSite=Lax${secure}`;
}

/** Stone, dim or bright: for this device, from the next moment on. */
export function ThemeChoice({ current, onChoose }: ThemeChoiceProps) {
  const [theme, setTheme] = useState(current);
  return (
    <RadioButtons
      name="theme-choice"
      label="Theme of this device"
      value={theme}
      options={THEMES.map((value) => ({ value, label: THEME_WORDS[value].name }))}
      onChange={(event) => {
        const next = readTheme(event.target.value);
        setTheme(next);
        chooseTheme(next);
        onChoose?.(next);
      }}
    />
  );
}
