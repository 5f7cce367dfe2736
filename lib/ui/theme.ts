/** The three themes; `stone` is the default. */
export const THEMES = ["stone", "dim", "bright"] as const;
export type Theme = (typeof THEMES)[number];

/** The cookie in which a device's theme is kept; the server writes it to `<html data-theme>`. */
export const THEME_COOKIE = "theme";

export const THEME_WORDS: Record<Theme, { name: string; use: string }> = {
  stone: { name: "Stone", use: "indoors, by day" },
  dim: { name: "Dim", use: "night rounds and dark galleries" },
  bright: { name: "Bright", use: "outdoors, in the sun" },
};

/** Which theme does a cookie's value name? Anything unknown is `stone`. */
export function readTheme(value: string | undefined | null): Theme {
  return THEMES.find((theme) => theme === value) ?? "stone";
}
