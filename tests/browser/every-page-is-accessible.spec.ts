import { readFileSync } from "node:fs";
import AxeBuilder from "@axe-core/playwright";
import type { BrowserContext, Page } from "@playwright/test";
import { THEME_COOKIE, THEMES, type Theme } from "../../lib/ui/theme";
import { type DemoRole, expect, SERVER_DATA, signedInStateFile, test } from "../support/browser";
import { demoFilling, everyStop, letterLinks, type Stop } from "../support/page-stops";

const TAGS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];
const WIDTHS_PX = [1440, 768, 390] as const;
const HEIGHT_PX = 900;
/** A walk takes a minute or two on two cores that nobody else uses. */
const MOST_MS = 300_000;

// The walks go beside each other, and keep no film of hundreds of steps.
test.describe.configure({ mode: "parallel" });
test.use({ trace: "off", screenshot: "off", contextOptions: { reducedMotion: "reduce" } });

/** What axe finds wrong on the page as it is, a line each. */
async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page }).withTags(TAGS).setLegacyMode(true).analyze();
  return found.flatMap(({ id, help, nodes }) =>
    nodes.map(({ target, failureSummary = "" }) => {
      const why = failureSummary.split("\n").slice(1, 3).join(" ").trim();
      return `${id} (${help}) at ${target.join(" ")}: ${why}`;
    }),
  );
}

/** By how much the document is wider than its window, and what sticks out; null where it is not. */
function sideways(page: Page): Promise<string | null> {
  return page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    if (scrollWidth <= clientWidth) return null;
    const out = [...document.querySelectorAll("body *")]
      .filter((each) => each.getBoundingClientRect().right > clientWidth + 0.5)
      .slice(0, 3)
      .map((each) => `<${each.tagName.toLowerCase()} class="${each.getAttribute("class") ?? ""}">`);
    return `scrolls sideways by ${scrollWidth - clientWidth} px: ${out.join(", ")}`;
  });
}

type Cookies = Parameters<BrowserContext["addCookies"]>[0];

/** Becomes somebody (or a visitor) who has chosen this theme. */
async function become(
  context: BrowserContext,
  as: DemoRole | null,
  theme: Theme,
  url: string,
): Promise<void> {
  await context.clearCookies();
  if (as !== null) {
    const { cookies } = JSON.parse(readFileSync(signedInStateFile(as), "utf8")) as { cookies: Cookies };
    await context.addCookies(cookies);
  }
  await context.addCookies([{ name: THEME_COOKIE, value: theme, url }]);
}

/** Waits until the page stands: its heading is there and nothing is being loaded. */
async function open(page: Page, { path, address }: Stop, theme: Theme): Promise<void> {
  const answer = await page.goto(path);
  expect(answer?.status(), path).toBe(200);
  await expect(page.locator("html"), path).toHaveAttribute("data-theme", theme);
  await expect(page.getByRole("heading", { level: 1 }).first(), path).toBeVisible();
  await expect(page.locator(".skeleton-line"), path).toHaveCount(0);
  if (address === "/rounds/grid") await expect(page.locator(".ag-cell").first()).toBeVisible();
}

/** Two frames, so that what was changed has been laid out and painted. */
const painted = (page: Page) =>
  page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))));

/** What is wrong in each theme with what the page shows; it is left in the first. */
async function inEveryTheme(page: Page, what: string): Promise<string[]> {
  const found: string[] = [];
  // The first last, so that the page is left as it came.
  for (const theme of [...THEMES].reverse()) {
    await page.evaluate((name) => document.documentElement.setAttribute("data-theme", name), theme);
    await painted(page);
    found.push(...(await violations(page)).map((each) => `${what} in ${theme}: ${each}`));
  }
  return found;
}

/** What is wrong on a page: in each theme on a desk, on a phone, and by what it is too wide. */
async function faultsOf(page: Page, stop: Stop): Promise<string[]> {
  await open(page, stop, THEMES[0]);
  const found = await inEveryTheme(page, stop.path);
  for (const width of WIDTHS_PX) {
    await page.setViewportSize({ width, height: HEIGHT_PX });
    await painted(page);
    const wide = await sideways(page);
    if (wide !== null) found.push(`${stop.path} at ${width} px ${wide}`);
  }
  found.push(...(await violations(page)).map((each) => `${stop.path} at 390 px: ${each}`));
  await page.setViewportSize({ width: WIDTHS_PX[0], height: HEIGHT_PX });
  return found;
}

/** The page addresses as filled from the demonstration. */
const stopsAt = async (url: string): Promise<Stop[]> => {
  const dataFolder = process.env[SERVER_DATA] ?? "";
  return everyStop(demoFilling(dataFolder), await letterLinks(url, dataFolder));
};

const WALKS = [
  { who: "a visitor and an auditor", as: [null, "auditor"] },
  { who: "a lead", as: ["lead"] },
  { who: "an administrator", as: ["admin"] },
] as const;

for (const walk of WALKS) {
  test(`every page for ${walk.who} is accessible in each theme and fits each width`, async ({
    page,
    context,
    baseURL,
  }) => {
    test.setTimeout(MOST_MS);
    const stops = await stopsAt(baseURL ?? "");
    for (const as of walk.as) {
      await become(context, as, THEMES[0], baseURL ?? "");
      for (const stop of stops.filter((each) => each.as === as)) {
        expect.soft(await faultsOf(page, stop), stop.address).toEqual([]);
      }
    }
  });
}

test("no page is left out of the walks", async ({ baseURL }) => {
  const walked: (DemoRole | null)[] = WALKS.flatMap(({ as }) => as);
  const stops = await stopsAt(baseURL ?? "");
  expect(stops.length).toBeGreaterThan(50);
  expect(stops.filter(({ as }) => !walked.includes(as))).toEqual([]);
});

test("the dialog in which a sheet is signed is accessible in each theme", async ({
  page,
  context,
  baseURL,
}) => {
  await become(context, "lead", "stone", baseURL ?? "");
  await open(page, { address: "/review", path: "/review", as: "lead" }, "stone");
  const waits = page.getByRole("region", { name: "Day sheets that wait" });
  await waits.getByRole("checkbox").last().check();
  await page.getByRole("button", { name: "Sign 1 sheet as reviewed…" }).click();
  const dialog = page.getByRole("dialog", { name: "Sign as reviewed" });
  await expect(dialog.getByLabel("Your password")).toBeVisible();
  expect(await inEveryTheme(page, "the dialog")).toEqual([]);
});

test("a theme that somebody chose is the page's from the server on", async ({ page, context, baseURL }) => {
  for (const theme of THEMES) {
    await become(context, "lead", theme, baseURL ?? "");
    await open(page, { address: "/today", path: "/today", as: "lead" }, theme);
    expect(await violations(page), theme).toEqual([]);
  }
});

test("what is wrong on a page is found: a picture without words, faint text, a line that is too wide", async ({
  page,
}) => {
  await page.setContent(`<html lang="en"><title>Poor</title><main><h1>Poor</h1>
    <img src="data:,"><p style="color:#bbb;background:#fff">faint</p>
    <div style="width:3000px">wide</div></main></html>`);
  const found = (await violations(page)).join("\n");
  expect(found).toContain("image-alt");
  expect(found).toContain("color-contrast");
  expect(await sideways(page)).toMatch(/sideways by 15\d\d px: .*<div/);
});
