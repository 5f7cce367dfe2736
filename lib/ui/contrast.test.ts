import { readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";
import { contrastRatio, relativeLuminance } from "./contrast";
import { THEMES } from "./theme";

const css = readFileSync(fileURLToPath(new URL("./styles/tokens.css", import.meta.url)), "utf8");

/** The tokens of a theme as the style sheet has them. */
function tokensOf(theme: string): Record<string, string> {
  const block = new RegExp(`\\[data-theme="${theme}"\\]\\s*\\{([^}]*)\\}`).exec(css)?.[1] ?? "";
  return Object.fromEntries(
    [...block.matchAll(/--([a-z0-9-]+):\s*(#[0-9a-f]{6})/gi)].map((m) => [m[1], m[2]]),
  );
}

const PAPER = ["ground", "sheet", "field"];
const text = (ink: string, papers: string[]) => papers.map((paper) => ({ ink, paper, least: 4.5 }));
const shape = (ink: string, papers: string[]) => papers.map((paper) => ({ ink, paper, least: 3 }));

/** Every pair that is drawn together. Text: WCAG 2.2 SC 1.4.3 (4.5); shapes and outlines: SC 1.4.11 (3). */
const PAIRS = [
  ...["ink", "ink-2", "ink-3", "water", "watch", "out", "odd"].flatMap((ink) => text(ink, PAPER)),
  ...text("ink", ["wash", "band", "shoulder"]), // notes, chosen menu entries, pressed buttons
  ...text("ink-2", ["wash", "band"]),
  ...text("water", ["wash"]), // links in "Waiting for you", quiet buttons under the pointer
  ...text("on-water", ["water", "water-deep"]), // the next act
  ...text("sheet", ["ink"]), // a chosen pick
  ...text("water-deep", PAPER), // a link under the pointer
  ...shape("edge", [...PAPER, "wash"]), // outlines of controls, the staff on its water
  ...shape("water", [...PAPER, "wash", "band"]), // focus ring, meniscus of the menu, control limits on a chart
  ...["watch-mark", "out-mark", "odd-mark"].flatMap((ink) => shape(ink, [...PAPER, "band"])),
  ...["ink", "ink-2"].flatMap((ink) => shape(ink, ["band", "shoulder", "field"])), // limits, notch, last value, reading
  ...shape("watch-mark", ["shoulder"]), // a reading in the watch zone stands on the shoulder, in a halo of `field`
];

describe("contrast", () => {
  it("is computed as WCAG 2.2 defines it", () => {
    // The definition's own ends: 0 for darkest black, 1 for lightest white, hence 21:1.
    expect(relativeLuminance("#000000")).toBe(0);
    expect(relativeLuminance("#ffffff")).toBeCloseTo(1, 12);
    expect(contrastRatio("#ffffff", "#000000")).toBeCloseTo(21, 12);
    // The primaries' weights stand in the formula itself.
    expect(relativeLuminance("#00ff00")).toBeCloseTo(0.7152, 12);
    // #767676 is known as the lightest grey that passes 4.5 on white, #777777 the first that fails (from memory).
    expect(contrastRatio("#767676", "#ffffff")).toBeGreaterThanOrEqual(4.5);
    expect(contrastRatio("#777777", "#ffffff")).toBeLessThan(4.5);
    expect(() => relativeLuminance("red")).toThrow(RangeError);
  });

  for (const theme of THEMES) {
    it(`of every pair drawn together is enough in the ${theme} theme`, () => {
      const tokens = tokensOf(theme);
      const weak = PAIRS.map(({ ink, paper, least }) => {
        const [a, b] = [tokens[ink], tokens[paper]];
        if (a === undefined || b === undefined) return `${ink} or ${paper} is missing`;
        const ratio = contrastRatio(a, b);
        return ratio < least ? `${ink} on ${paper}: ${ratio.toFixed(2)} < ${least}` : null;
      }).filter((line) => line !== null);
      expect(weak).toEqual([]);
    });
  }

  it("is judged for the same set of tokens in all themes", () => {
    const names = THEMES.map((theme) => Object.keys(tokensOf(theme)).sort());
    expect(names[0]?.length).toBeGreaterThan(15);
    expect(names[1]).toEqual(names[0]);
    expect(names[2]).toEqual(names[0]);
  });
});
