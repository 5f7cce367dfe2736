/** The theme's colours as the chart needs them, read from the page's tokens. */
export const CHART_TOKENS = [
  "sheet",
  "field",
  "rule",
  "edge",
  "ink",
  "ink-2",
  "ink-3",
  "water",
  "band",
  "shoulder",
  "watch-mark",
  "out-mark",
  "odd-mark",
] as const;
export type ChartPalette = Record<(typeof CHART_TOKENS)[number], string> & { sans: string; mono: string };
