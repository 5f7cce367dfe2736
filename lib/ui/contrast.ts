/**
 * How bright does a colour look, from 0 (black) to 1 (white)?
 * Formula: L = 0.2126 R + 0.7152 G + 0.0722 B on linearised sRGB channels.
 * Source: W3C, WCAG 2.2 (2023), definition "relative luminance" (threshold 0.04045 as corrected there).
 * @throws RangeError when the text is not #rrggbb
 */
export function relativeLuminance(hex: string): number {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex);
  if (match === null) throw new RangeError(`${hex} is not a colour written #rrggbb`);
  const [r = 0, g = 0, b = 0] = match.slice(1).map((part) => {
    const channel = Number.parseInt(part, 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/**
 * How far apart do two colours look, from 1 to 21?
 * Source: W3C, WCAG 2.2 (2023), definition "contrast ratio": (L1 + 0.05) / (L2 + 0.05), L1 the lighter.
 * @example contrastRatio("#000000", "#ffffff") === 21
 */
export function contrastRatio(one: string, other: string): number {
  const a = relativeLuminance(one);
  const b = relativeLuminance(other);
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}
